import { decimalParts } from './decimal-parts';

/** value = mantissa · 10^−scale. */
interface Scaled {
  mantissa: bigint;
  scale: number;
}

function scaled(text: string): Scaled {
  const parts = decimalParts(text);
  if (!parts) throw new RangeError(`not a decimal number: ${text}`);
  const mantissa = BigInt(`${parts.sign}${parts.whole}${parts.fraction}`);
  const scale = parts.fraction.length - parts.exponent;
  return scale >= 0 ? { mantissa, scale } : { mantissa: mantissa * 10n ** BigInt(-scale), scale: 0 };
}

/** a − b, exactly, as a decimal string. */
export function subtractDecimals(a: string, b: string): string {
  const left = scaled(a);
  const right = scaled(b);
  const scale = Math.max(left.scale, right.scale);
  const lift = ({ mantissa, scale: own }: Scaled) => mantissa * 10n ** BigInt(scale - own);
  const difference = lift(left) - lift(right);
  const digits = String(difference < 0n ? -difference : difference).padStart(scale + 1, '0');
  const whole = digits.slice(0, digits.length - scale);
  const fraction = digits.slice(digits.length - scale).replace(/0+$/, '');
  return `${difference < 0n ? '-' : ''}${whole}${fraction ? `.${fraction}` : ''}`;
}
