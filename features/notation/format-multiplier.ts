import { powerForm } from './power-form';
import { toDouble } from './to-double';

/** A multiplier as the API gives it. */
export interface Multiplier {
  re: string;
  im: string;
}

/** From here up four significant digits, below three decimals. */
const FOUR_DIGITS_FROM = 10;
/** From here up nothing is left of a fraction. */
const WHOLE_FROM = 1000;
/** From here up a power of ten. */
const POWER_FROM = 1e6;
/** Below this three decimals would be all zeros. */
const POWER_BELOW = 0.001;

/** |μ|. */
export const multiplierSize = ({ re, im }: Multiplier): number => Math.hypot(toDouble(re), toDouble(im));

/** |μ| for lists: `274.7`, `4.713`, `1.75·10⁶`. */
export function formatMultiplierSize(multiplier: Multiplier): string {
  const size = multiplierSize(multiplier);
  if (size >= POWER_FROM || (size > 0 && size < POWER_BELOW)) return powerForm(size, 3);
  if (size >= WHOLE_FROM) return String(Math.round(size));
  return size >= FOUR_DIGITS_FROM ? size.toPrecision(4) : size.toFixed(3);
}
