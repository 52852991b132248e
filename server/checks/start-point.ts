import { type Finding } from '@/schemas/generated/contract';
import { type Claim } from '@/server/checks/claim';
import { figure } from '@/server/checks/figure';
import { finding } from '@/server/checks/finding';
import { TANGENT } from '@/server/checks/limits';
import { transversality } from '@/server/numerics/periodic/transversality';

/** Rounding of a coordinate and of u at it: a few units in the last place. */
const ROUNDING = 8 * Number.EPSILON;

/** The point as typed, moved onto the section within its digits. */
export interface StartPoint {
  start: Float64Array;
  /** |u| there, beyond what the digits account for; 0 where the digits reach the section. */
  beyond: number;
}

/**
 * Put the typed point on the section: each coordinate moves at most by its half-unit, or its rounding.
 *
 * The move is the shortest in those units. Where they do not reach the section the point stays as typed.
 */
export function startPoint(claim: Claim): StartPoint {
  const { flow } = claim;
  const typed = Float64Array.from(claim.point, ({ value }) => value);
  const u = flow.section(typed);
  if (u === 0 || !Number.isFinite(u)) return { start: typed, beyond: 0 };
  const gradient = flow.sectionGradient(typed);
  const reach = Float64Array.from(claim.point, ({ value, halfUnit }) => Math.max(halfUnit, ROUNDING * Math.abs(value)));
  let within = 0;
  let weight = 0;
  for (let i = 0; i < typed.length; i += 1) {
    within += Math.abs(gradient[i]!) * reach[i]!;
    weight += (gradient[i]! * reach[i]!) ** 2;
  }
  if (Math.abs(u) > within || weight === 0) return { start: typed, beyond: Math.max(0, Math.abs(u) - within) };
  const moved = typed.map((value, i) => value - (u * gradient[i]! * reach[i]! ** 2) / weight);
  return { start: moved, beyond: 0 };
}

/**
 * Check that the point lies on the section: the distance, in sizes, that its digits do not account for is within the
 * tolerance.
 */
export function offSection(claim: Claim, { start, beyond }: StartPoint, sizes: Float64Array): Finding[] {
  if (beyond === 0) return [];
  const gradient = claim.flow.sectionGradient(start);
  const steepness = Math.hypot(...gradient.map((entry, i) => entry * sizes[i]!));
  const distance = steepness === 0 ? Infinity : beyond / steepness;
  if (distance <= claim.tolerance) return [];
  const u = claim.flow.section(start);
  return [
    finding('point-off-section', {
      message:
        `The point is not on the section: u = ${figure(u)} there, which is ${figure(distance)} of the orbit's extent ` +
        `away and more than its digits leave open (tolerance ${figure(claim.tolerance)}).`,
      value: distance,
      limit: claim.tolerance,
    }),
  ];
}

/** Check that the flow crosses the section at the point in the counted direction. */
export function crossingDirection(claim: Claim, start: Float64Array, sizes: Float64Array): Finding[] {
  const cosine = transversality(claim.flow, start, sizes);
  if (cosine > -TANGENT) return [];
  return [
    finding('wrong-crossing-direction', {
      message:
        `At the point u falls through zero (cosine ${figure(cosine)}), and only crossings where it rises count. ` +
        `The section ${claim.negatedSection} counts this one.`,
      value: cosine,
      limit: 0,
    }),
  ];
}
