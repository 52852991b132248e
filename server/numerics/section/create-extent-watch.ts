import { horner } from '@/server/numerics/section/horner';
import { polishRoot } from '@/server/numerics/section/polish-root';
import { polynomialSlope } from '@/server/numerics/section/polynomial-slope';
import { type TaylorStep } from '@/server/numerics/taylor/flow';

/** Smallest and largest value of each coordinate. */
export interface Extent {
  lowest: Float64Array;
  highest: Float64Array;
}

/** Follows the range of every coordinate along Taylor steps. */
export interface ExtentWatch {
  onStep(step: TaylorStep): void;
  extent(): Extent;
}

/**
 * Create a watch over the range of every coordinate along an orbit, from its Taylor coefficients.
 *
 * Ends of steps, and inside a step the extremum where the velocity changes sign.
 *
 * @param dimension  number of state variables.
 *
 * Accuracy: the extremum's value to rounding; two extrema of one coordinate inside one step are overlooked (heuristic: a
 *           step is a small part of the convergence radius, where a coordinate hardly turns twice).
 * Cost: dimension·order additions a step; a root search only where a new extremum is possible.
 */
export function createExtentWatch(dimension: number): ExtentWatch {
  const lowest = new Float64Array(dimension).fill(Infinity);
  const highest = new Float64Array(dimension).fill(-Infinity);

  function include(i: number, value: number): void {
    if (value < lowest[i]!) lowest[i] = value;
    if (value > highest[i]!) highest[i] = value;
  }

  return {
    extent: () => ({ lowest: Float64Array.from(lowest), highest: Float64Array.from(highest) }),
    onStep({ state, h }) {
      const length = state.length / dimension;
      for (let i = 0; i < dimension; i += 1) {
        const from = i * length;
        const start = state[from]!;
        include(i, start);
        const reach = possibleMove(state, from, length, h);
        if (start + reach <= highest[i]! && start - reach >= lowest[i]!) continue;
        include(i, horner(state, h, from, length));
        const turn = turningPoint(state, { from, length, h });
        if (turn !== null) include(i, horner(state, turn, from, length));
      }
    },
  };
}

/** Σ |xₖ| hᵏ over k ≥ 1: how far the coordinate can move in the step. */
function possibleMove(state: Float64Array, from: number, length: number, h: number): number {
  let sum = 0;
  for (let k = length - 1; k >= 1; k -= 1) sum = (sum + Math.abs(state[from + k]!)) * h;
  return sum;
}

/** Time in (0, h) at which the coordinate turns, or null. */
function turningPoint(
  state: Float64Array,
  { from, length, h }: { from: number; length: number; h: number },
): number | null {
  const before = state[from + 1]!;
  const after = polynomialSlope(state, h, from, length);
  if (before === 0 || after === 0 || before > 0 === after > 0) return null;
  const slope = new Float64Array(length - 1);
  for (let k = 1, power = 1; k < length; k += 1, power *= h) slope[k - 1] = k * state[from + k]! * power;
  const sign = before > 0 ? 1 : -1;
  return h * polishRoot(slope, { low: 0, high: 1, before: sign, after: sign === 1 ? -1 : 1, tangent: false });
}
