import { type Multiplier } from '@/server/numerics/periodic/floquet-multipliers';

/** What the multipliers say about neighbouring orbits. */
export type StabilityWord = 'stable' | 'saddle' | 'unstable' | 'neutral' | 'undecided';

/** What stability is judged by. */
export interface StabilityInput {
  /** The n − 1 multipliers without the trivial one; those of a family exactly 1. */
  multipliers: readonly Multiplier[];
  /** A modulus within this distance of 1 cannot be told from 1. */
  accuracy: number;
  /** Integral of the divergence over the period: zero for flows that preserve volume. */
  divergenceIntegral: number;
}

/** Below this the flow preserves volume along the orbit as far as doubles can tell. */
const VOLUME_PRESERVING = 1e-8;

/**
 * Judge the stability of a periodic orbit from its multipliers.
 *
 * stable: all inside the unit circle; saddle: some outside, others not; unstable: all outside; neutral: none outside,
 * some on it; undecided: some are too near the circle to tell. A multiplier counts as on the circle when it is exactly 1
 * (of a family) or, in a flow that preserves volume, within the accuracy: there it can leave the circle only in pairs.
 *
 * @returns the word and the number of multipliers outside.
 */
export function judgeStability(input: StabilityInput): { stability: StabilityWord; unstableDirections: number } {
  let inside = 0;
  let on = 0;
  let outside = 0;
  let unclear = 0;
  const preserving = Math.abs(input.divergenceIntegral) <= VOLUME_PRESERVING;
  for (const { logModulus } of input.multipliers) {
    if (logModulus === 0) on += 1;
    else if (Math.abs(logModulus) > input.accuracy) {
      if (logModulus > 0) outside += 1;
      else inside += 1;
    } else if (preserving) on += 1;
    else unclear += 1;
  }
  const word = (): StabilityWord => {
    if (unclear > 0 && outside === 0) return 'undecided';
    if (outside === 0) return on > 0 ? 'neutral' : 'stable';
    return inside + on + unclear > 0 ? 'saddle' : 'unstable';
  };
  return { stability: word(), unstableDirections: outside };
}
