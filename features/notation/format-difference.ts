import { powerForm } from './power-form';
import { subtractDecimals } from './subtract-decimals';

/** Decimals of a difference that is large enough to show any. */
const DECIMALS = 6;
/** Smaller differences keep too few digits at six decimals and take the exponent form. */
const POWER_BELOW = 1e-4;

/** The difference of two decimal strings, with its sign: `−0.074696`, `+0.001582`, `−1.7·10⁻¹⁰`, `0`. */
export function formatDifference(a: string, b: string): string {
  const difference = Number(subtractDecimals(a, b));
  if (difference === 0) return '0';
  const sign = difference < 0 ? '−' : '+';
  const size = Math.abs(difference);
  return sign + (size < POWER_BELOW ? powerForm(size, 2) : size.toFixed(DECIMALS));
}
