import { type Finding } from '@/schemas/generated/contract';
import { figure } from '@/server/checks/figure';
import { finding } from '@/server/checks/finding';
import { SELF_CHECK_FLOW, SELF_CHECK_LIOUVILLE, SELF_CHECK_PAIRING } from '@/server/checks/limits';
import { type Survey } from '@/server/checks/study';

/** Check the computation against what must hold: M f = f, Liouville's formula and, where they are due, reciprocal pairs. */
export function selfCheck({ flowCheck, liouville, pairing }: Survey): Finding[] {
  const findings: Finding[] = [];
  if (!(flowCheck <= SELF_CHECK_FLOW)) {
    findings.push(
      finding('self-check-failed', {
        message:
          `The derivative of the flow does not carry the flow's own direction along: it misses by ${figure(flowCheck)} ` +
          `(at most ${figure(SELF_CHECK_FLOW)}). The multipliers cannot be trusted.`,
        value: flowCheck,
        limit: SELF_CHECK_FLOW,
      }),
    );
  }
  if (liouville !== null && !(Math.abs(liouville) <= SELF_CHECK_LIOUVILLE)) {
    findings.push(
      finding('self-check-failed', {
        message:
          `The logarithms of the multipliers miss the integral of the divergence by ${figure(liouville)} ` +
          `(at most ${figure(SELF_CHECK_LIOUVILLE)}). The multipliers cannot be trusted.`,
        value: liouville,
        limit: SELF_CHECK_LIOUVILLE,
      }),
    );
  }
  if (pairing !== null && !(pairing <= SELF_CHECK_PAIRING)) {
    findings.push(
      finding('self-check-failed', {
        message:
          `The multipliers of this orbit come in reciprocal pairs; the logarithms of those found miss that by ` +
          `${figure(pairing)} (at most ${figure(SELF_CHECK_PAIRING)}). They cannot be trusted.`,
        value: pairing,
        limit: SELF_CHECK_PAIRING,
      }),
    );
  }
  return findings;
}
