import { minusSign } from './minus-sign';
import { powerForm } from './power-form';

/** Sizes from here up are written plainly. */
const PLAIN_FROM = 0.1;
/** Sizes from here up are written with a power again. */
const PLAIN_BELOW = 10_000;

/** A size with two significant digits: `8.8·10⁻¹²`, `0.94`, `8.6`, `212`. */
export function formatSize(value: number, digits = 2): string {
  if (value === 0) return '0';
  if (!Number.isFinite(value)) return '∞';
  const size = Math.abs(value);
  if (size < PLAIN_FROM || size >= PLAIN_BELOW) return powerForm(value, digits);
  const plain = size >= 10 ** digits ? String(Math.round(value)) : value.toPrecision(digits);
  return minusSign(plain);
}
