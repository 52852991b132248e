import { type Flow } from '@/server/numerics/taylor/flow';

/**
 * Compute the cosine between the section's gradient and the flow, in coordinates divided by the sizes.
 *
 *   cos α = Σ uᵢ fᵢ / ( √Σ (uᵢ sᵢ)² · √Σ (fᵢ / sᵢ)² )
 *
 * @param flow   gives f and grad u.
 * @param x      n coordinates.
 * @param sizes  n positive sizes, see orbitSizes.
 * @returns      −1 … 1; 0 where the gradient or the field vanishes.
 */
export function transversality(flow: Flow, x: Float64Array, sizes: Float64Array): number {
  const field = flow.field(x);
  const gradient = flow.sectionGradient(x);
  let speed = 0;
  for (let i = 0; i < sizes.length; i += 1) speed += gradient[i]! * field[i]!;
  const product = headOn(field, gradient, sizes);
  return product === 0 ? 0 : Math.max(-1, Math.min(1, speed / product));
}

/**
 * The denominator of the cosine, ‖s·grad u‖ ‖f/s‖: the speed of u if the flow met the section head-on.
 *
 * @returns 0 where the gradient or the field vanishes.
 */
export function transversalScale(flow: Flow, x: Float64Array, sizes: Float64Array): number {
  return headOn(flow.field(x), flow.sectionGradient(x), sizes);
}

function headOn(field: Float64Array, gradient: Float64Array, sizes: Float64Array): number {
  let steepness = 0;
  let motion = 0;
  for (let i = 0; i < sizes.length; i += 1) {
    steepness += (gradient[i]! * sizes[i]!) ** 2;
    motion += (field[i]! / sizes[i]!) ** 2;
  }
  return Math.sqrt(steepness) * Math.sqrt(motion);
}
