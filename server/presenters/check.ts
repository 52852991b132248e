import type { Check, CheckReport } from '@/schemas/generated/contract';
import type { OrbitCheck } from '@/server/models/orbit-check';

/** A check: its state and, once done, the members of its report. */
export const presentCheck = (check: OrbitCheck, report: CheckReport | null): Check => ({
  id: check.id,
  checkState: check.state,
  body: check.body,
  progress: check.state === 'running' ? check.progress : null,
  failure: check.failure === null ? null : { message: check.failure, attempts: check.attempts },
  createdAt: check.createdAt.toISOString(),
  verdict: report?.verdict ?? null,
  closure: report?.closure ?? null,
  correction: report?.correction ?? null,
  orbit: report?.orbit ?? null,
  findings: report?.findings ?? null,
  matches: report?.matches ?? null,
  digits: report?.digits ?? null,
  expectedClosure: report?.expectedClosure ?? null,
  endPoint: report?.endPoint ?? null,
  suggestion: report?.suggestion ?? null,
  engine: report?.engine ?? null,
});

/** What a stream of events tells of a check on its way. */
export const presentProgress = ({ state, progress }: OrbitCheck): Pick<Check, 'checkState' | 'progress'> => ({
  checkState: state,
  progress: state === 'running' ? progress : null,
});
