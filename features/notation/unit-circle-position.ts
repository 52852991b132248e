import { type Multiplier, multiplierSize } from './format-multiplier';
import { toDouble } from './to-double';

/** Decades over which distances from the circle are drawn; beyond, they stay where they are. */
const DECADES = 6;
/** Gap between the circle and a multiplier just outside, in radii. */
const OUTSIDE_GAP = 0.28;
/** Room for six decades outside, in radii. */
const OUTSIDE_ROOM = 1.25;
/** Closer to the circle than this counts as on it. */
const ON_CIRCLE = 1e-9;

/** Distance from the centre in radii: a log scale that meets the circle at |μ| = 1 and its centre at 10⁻⁶. */
export function drawnDistance(size: number): number {
  if (size === 0) return 0;
  const decades = Math.log10(size);
  if (Math.abs(decades) < ON_CIRCLE) return 1;
  if (decades > 0) return 1 + OUTSIDE_GAP + (OUTSIDE_ROOM * Math.min(decades, DECADES)) / DECADES;
  return 1 - Math.min(-decades, DECADES) / DECADES;
}

/** Where a multiplier lies around a unit circle of radius 1 at the origin; y upward. */
export function unitCirclePosition(multiplier: Multiplier): { x: number; y: number } {
  const distance = drawnDistance(multiplierSize(multiplier));
  const angle = Math.atan2(toDouble(multiplier.im), toDouble(multiplier.re));
  return { x: distance * Math.cos(angle), y: distance * Math.sin(angle) };
}
