import { leastNormSolve } from '@/server/numerics/linear/least-norm-solve';
import { type Flow } from '@/server/numerics/taylor/flow';

/** Newton is quadratic: from within rounding of an equilibrium it needs one or two steps. */
const MAX_STEPS = 8;

/** Directions in which the field does not change are not moved along. */
const CUT_OFF = 1e-12;

/** An equilibrium typed to all digits is off by its rounding, and rounding of the field moves it as much again. */
const ROUNDING = 1e-14;

/**
 * Tell whether a point is an equilibrium as far as its digits say.
 *
 * Newton for f(x) = 0 from the point, shortest steps; it is one when Newton converges to a place whose every coordinate is
 * within the half-unit as typed, or 1e-14 of its value, of the point.
 *
 * @param flow       the field.
 * @param point      n coordinates.
 * @param halfUnits  half of the last typed place of each coordinate, 0 where typed exactly.
 *
 * Cost: a field, a Jacobian and a singular value decomposition a step; one step for an ordinary point.
 */
export function isEquilibrium(flow: Flow, point: Float64Array, halfUnits: Float64Array): boolean {
  const n = flow.dimension;
  const reach = point.map((value, i) => Math.max(halfUnits[i]!, ROUNDING * Math.abs(value)));
  const x = Float64Array.from(point);
  for (let step = 0; step < MAX_STEPS; step += 1) {
    const field = flow.field(x);
    const jacobian = flow.jacobian(x);
    if (!field.every(Number.isFinite) || !jacobian.every(Number.isFinite)) return false;
    const { x: change } = leastNormSolve({ a: jacobian, rows: n, cols: n, b: field, cutOff: CUT_OFF });
    let moved = false;
    for (let i = 0; i < n; i += 1) {
      const before = x[i]!;
      x[i] = before - change[i]!;
      if (Math.abs(x[i]! - point[i]!) > reach[i]!) return false;
      if (Math.abs(x[i]! - before) > Number.EPSILON * Math.abs(before)) moved = true;
    }
    if (!moved) return vanishes(flow, x);
  }
  return vanishes(flow, x);
}

/** Whether the field is zero up to the rounding of the point itself. */
function vanishes(flow: Flow, x: Float64Array): boolean {
  const n = flow.dimension;
  const field = flow.field(x);
  const jacobian = flow.jacobian(x);
  return field.every((entry, i) => {
    let noise = Number.MIN_VALUE;
    for (let j = 0; j < n; j += 1) noise += Math.abs(jacobian[i * n + j]! * x[j]!);
    return Math.abs(entry) <= ROUNDING * noise;
  });
}
