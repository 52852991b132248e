import { type ShootingPlan } from '@/server/numerics/periodic/shooting-plan';

/** Steps in a piece: short enough that its derivative is well conditioned, long enough to cost little. */
const STEPS_PER_PIECE = 8;

/**
 * Plan one segment over the whole period, its pieces cut where a first run ended a step.
 *
 * @param stepEnds  times at which the steps of a run over the period ended, ascending, the last being the period.
 * @param period    the period, in the unit of stepEnds.
 */
export function planSingleShot(stepEnds: readonly number[], period: number): ShootingPlan {
  const borders = [0];
  for (let k = STEPS_PER_PIECE; k < stepEnds.length - STEPS_PER_PIECE / 2; k += STEPS_PER_PIECE) {
    borders.push(stepEnds[k - 1]! / period);
  }
  borders.push(1);
  return [{ borders }];
}
