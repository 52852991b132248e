/** Bounds as exact decimal texts: `from` belongs to the interval, `to` does not. */
export interface Interval {
  from: string;
  to: string;
}

const HALF = 5n;
const TEN = 10n;

/** A positive decimal number as somebody types it. */
export const DECIMAL = /^\+?([0-9]+)(?:\.([0-9]+))?(?:[eE]([+-]?[0-9]{1,2}))?$/;

/**
 * All numbers that round to the digits of a decimal text, halves rounding up: 1.5587 is [1.55865, 1.55875).
 *
 * Exact: works on the digits, never on doubles. Trailing zeros count: 1.50 is a smaller interval than 1.5.
 *
 * @returns null when the text is not a decimal number.
 */
export function roundingInterval(text: string): Interval | null {
  const [whole, integer, fraction = '', exponent = '0'] = DECIMAL.exec(text) ?? [];
  if (whole === undefined) return null;
  const digits = BigInt(integer! + fraction) * TEN;
  const power = parseInt(exponent, 10) - fraction.length - 1;
  return { from: decimalText(digits - HALF, power), to: decimalText(digits + HALF, power) };
}

/** digits × 10^power, written out for PostgreSQL's numeric. */
const decimalText = (digits: bigint, power: number): string => `${digits}e${power}`;
