import { horner } from '@/server/numerics/section/horner';
import { polynomialSlope } from '@/server/numerics/section/polynomial-slope';
import { type RootInterval } from '@/server/numerics/section/isolate-roots';

/** Bisection alone needs 53 + 10 halvings to reach one ulp of a root that is not below 1e-3; Newton needs few. */
const MAX_STEPS = 100;

/**
 * Refine an isolated root of a polynomial to one unit in the last place.
 *
 * Newton's rule inside a bracket that shrinks with every sign seen; a step that leaves it is replaced by a bisection.
 *
 * @param c         coefficients, lowest first.
 * @param interval  from isolateRoots, with one sign change inside.
 * @returns         the root in [low, high].
 *
 * Accuracy: 1 ulp of the argument, as far as rounding of the polynomial lets its sign be known.
 * Cost: usually 3 to 5 evaluations of value and slope.
 * Source: safeguarded Newton (common practice).
 */
export function polishRoot(c: Float64Array, interval: RootInterval): number {
  let { low, high } = interval;
  let s = low + (high - low) / 2;
  for (let step = 0; step < MAX_STEPS; step += 1) {
    const value = horner(c, s);
    if (value === 0) return s;
    if (value > 0 === interval.before > 0) low = s;
    else high = s;
    const newton = s - value / polynomialSlope(c, s);
    const next = newton > low && newton < high ? newton : low + (high - low) / 2;
    if (Math.abs(next - s) <= Number.EPSILON * s || next <= low || next >= high) return next;
    s = next;
  }
  return s;
}
