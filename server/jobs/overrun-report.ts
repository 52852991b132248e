import type { CheckReport } from '@/schemas/generated/contract';
import type { CheckProgress } from '@/server/checks/check-progress';
import { ENGINE_VERSION } from '@/server/checks/engine-version';
import { figure } from '@/server/checks/figure';
import { finding } from '@/server/checks/finding';
import { emptyReport } from '@/server/checks/report';

interface Overrun {
  /** Computing time that was allowed. */
  seconds: number;
  computeMs: number;
  /** The last that was heard of the check. */
  latest: CheckProgress | null;
}

/** The report of a check that had to be ended from outside: inconclusive, with how far it had come. */
export function overrunReport({ seconds, computeMs, latest }: Overrun): CheckReport {
  const reached = latest === null ? '' : `; it had come to t = ${figure(latest.time)} of ${figure(latest.period)}`;
  const message = `The check took more time or memory than its ${seconds} s allow and was ended${reached}.`;
  return {
    ...emptyReport,
    verdict: 'inconclusive',
    findings: [finding('too-long', { message, value: computeMs / 1000, limit: seconds })],
    matches: [],
    engine: { version: ENGINE_VERSION, steps: 0, cpuMs: computeMs },
  };
}
