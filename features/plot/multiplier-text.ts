import type { Multiplier } from '@/features/notation/format-multiplier';
import { minusSign } from '@/features/notation/minus-sign';
import { powerForm } from '@/features/notation/power-form';
import { toDouble } from '@/features/notation/to-double';

/** Significant digits of a multiplier in a picture or its table. */
const DIGITS = 6;
const PLAIN_FROM = 1e-3;
const PLAIN_BELOW = 1e5;

const partText = (value: number): string => {
  const size = Math.abs(value);
  return size !== 0 && (size < PLAIN_FROM || size >= PLAIN_BELOW)
    ? powerForm(value, DIGITS - 1)
    : minusSign(String(parseFloat(value.toPrecision(DIGITS))));
};

/** A multiplier in figures: `349.594`, `0.6 ± 0.8i` as its two parts. */
export function multiplierText({ re, im }: Multiplier): string {
  const imaginary = toDouble(im);
  if (imaginary === 0) return partText(toDouble(re));
  return `${partText(toDouble(re))} ${imaginary < 0 ? '−' : '+'} ${partText(Math.abs(imaginary))}i`;
}
