import { decimalOf } from '@/server/checks/decimal-of';
import { type Multiplier } from '@/server/numerics/periodic/floquet-multipliers';

/** Exponents of ten at which a double still has all its digits. */
const SMALLEST_POWER = -300;
const LARGEST_POWER = 300;

/** Digits of a multiplier that no double holds: its logarithm, beyond 690, is right to 1e-13. */
const DIGITS = 12;

/** Write a multiplier as decimals, also where it is beyond the range of doubles. */
export function multiplierDecimals({ re, im, logModulus }: Multiplier): { re: string; im: string } {
  const write = (share: number): string => {
    if (share === 0 || logModulus === -Infinity) return '0';
    const power = (logModulus + Math.log(Math.abs(share))) / Math.LN10;
    if (power > SMALLEST_POWER && power < LARGEST_POWER) return decimalOf(share * Math.exp(logModulus));
    const exponent = Math.floor(power);
    const mantissa = String(Number((10 ** (power - exponent)).toPrecision(DIGITS)));
    return `${share < 0 ? '-' : ''}${mantissa}e${exponent}`;
  };
  return { re: write(re), im: write(im) };
}
