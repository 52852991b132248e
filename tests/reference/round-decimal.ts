const PLAIN_DECIMAL = /^([+-]?)(\d+)(?:\.(\d+))?$/;

/**
 * A decimal string rounded to so many significant digits, half to even, without passing through a double.
 * Shorter ones, and whatever is no plain decimal, come back as they are.
 */
export function roundDecimal(text: string, significant: number): string {
  const match = PLAIN_DECIMAL.exec(text);
  if (!match) return text;
  const [, sign = '', whole = '', fraction = ''] = match;
  const digits = whole + fraction;
  const first = /[1-9]/.exec(digits)?.index ?? digits.length;
  const drop = digits.length - first - significant;
  if (drop <= 0 || drop > fraction.length) return text;

  const unit = 10n ** BigInt(drop);
  const value = BigInt(digits);
  const [quotient, rest] = [value / unit, (value % unit) * 2n];
  const up = rest > unit || (rest === unit && quotient % 2n === 1n);
  const places = fraction.length - drop;
  const rounded = (quotient + (up ? 1n : 0n)).toString().padStart(places + 1, '0');
  return sign + rounded.slice(0, rounded.length - places) + (places > 0 ? `.${rounded.slice(-places)}` : '');
}
