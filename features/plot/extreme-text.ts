import { minusSign } from '@/features/notation/minus-sign';
import { powerForm } from '@/features/notation/power-form';

/** Significant digits at the ends of an axis. */
const DIGITS = 4;
const PLAIN_FROM = 0.001;
const PLAIN_BELOW = 100_000;

/** A number at an axis: four significant digits, no trailing zeros. */
export function extremeText(value: number): string {
  const size = Math.abs(value);
  if (size !== 0 && (size < PLAIN_FROM || size >= PLAIN_BELOW)) return powerForm(value, 3);
  return minusSign(String(parseFloat(value.toPrecision(DIGITS))));
}
