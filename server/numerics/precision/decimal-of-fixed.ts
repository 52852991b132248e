/**
 * A fixed-point number as a decimal, rounded to so many places after the point.
 *
 * @param places ≥ 0; zeros at the end that stand for nothing but the rounding of a short decimal are left out.
 */
export function decimalOfFixed(x: bigint, bits: number, places: number): string {
  const scaled = (x < 0n ? -x : x) * 10n ** BigInt(places);
  const rounded = (scaled + (1n << BigInt(bits - 1))) >> BigInt(bits);
  const digits = rounded.toString().padStart(places + 1, '0');
  const whole = digits.slice(0, digits.length - places);
  const fraction = digits.slice(digits.length - places).replace(/0+$/, '');
  const sign = x < 0n && rounded !== 0n ? '-' : '';
  return sign + whole + (fraction === '' ? '' : `.${fraction}`);
}
