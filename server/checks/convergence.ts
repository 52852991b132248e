import { type Finding } from '@/schemas/generated/contract';
import { figure } from '@/server/checks/figure';
import { finding } from '@/server/checks/finding';
import { type Study } from '@/server/checks/study';

/** Say where Newton found no orbit near a point that closes, or found one further away than allowed. */
export function convergence({ claim, verdict, shifts, correction }: Study): Finding[] {
  const { tolerance } = claim;
  if (shifts === null || !correction.converged) {
    if (verdict !== 'closes') return [];
    return [
      finding('not-converged', {
        message:
          `The orbit closes as typed, but the correction found no periodic orbit there: after ${correction.iterations} ` +
          `steps it still missed by ${figure(correction.residual)} of the extent.`,
        value: correction.residual,
      }),
    ];
  }
  const shift = Math.max(shifts.point, shifts.period);
  if (shift <= tolerance) return [];
  const where =
    `a periodic orbit of period ${String(correction.period)}, ${figure(shifts.point)} of the extent from the point and ` +
    `${figure(shifts.period)} from the period`;
  if (verdict === 'closes') {
    return [
      finding('not-converged', {
        message: `The orbit closes as typed, but the correction ends on ${where}.`,
        value: shift,
        limit: tolerance,
      }),
    ];
  }
  return [finding('orbit-nearby', { message: `The correction ends on ${where}.`, value: shift, limit: tolerance })];
}
