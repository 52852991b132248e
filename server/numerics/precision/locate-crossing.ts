import { fixedOfDouble } from '@/server/numerics/precision/fixed-number';
import type { PreciseFlow, PreciseStep } from '@/server/numerics/precision/precise-flow';

/** A crossing in fixed point. */
export interface PreciseCrossing {
  /** Since the start of the run. */
  time: bigint;
  point: bigint[];
}

/** Newton doubles the digits of the crossing: from 12 to more than 400. */
const MAX_STEPS = 6;

/**
 * Locate a crossing inside a step by Newton's rule on the series of u, from where doubles have found it.
 *
 * @param share where in the step, between 0 and 1.
 * @returns     null where u is so flat that no crossing can be told.
 */
export function locateCrossing(
  flow: PreciseFlow,
  { kernel, time, h, bits }: PreciseStep,
  share: number,
): PreciseCrossing | null {
  let s = fixedOfDouble(share, bits);
  for (let step = 0; step < MAX_STEPS; step++) {
    const slope = kernel.slope(flow.sectionRoot, s);
    if (slope === 0n) return null;
    const change = (kernel.evaluate(flow.sectionRoot, s) << BigInt(bits)) / slope;
    s -= change;
    if (change === 0n) break;
  }
  return {
    time: time + ((s * h) >> BigInt(bits)),
    point: Array.from({ length: flow.dimension }, (_, i) => kernel.evaluate(i, s)),
  };
}
