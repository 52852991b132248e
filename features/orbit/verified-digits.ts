import { toDouble } from '@/features/notation/to-double';

/**
 * How many significant digits of a coordinate are confirmed. A check confirms digits in sizes of the orbit's extent:
 * a coordinate that is small beside it has correspondingly fewer, none where only rounding is left.
 */
export function verifiedDigits(value: string, extent: readonly number[] | undefined, digits: number): number {
  const [low = 0, high = 0] = extent ?? [];
  const size = Math.abs(toDouble(value));
  const span = high - low;
  if (size === 0 || span <= 0) return digits;
  return Math.max(0, Math.min(digits, Math.floor(digits + Math.log10(size / span))));
}
