import { decimalParts } from './decimal-parts';
import { minusSign } from './minus-sign';
import { superscript } from './superscript';

/** Decimals shown in lists and cards. */
const LIST_DECIMALS = 12;

export interface CutNumber {
  text: string;
  /** More verified digits are known than are shown. */
  more: boolean;
}

/** Fraction digits that are among the first `verified` significant ones. */
function verifiedDecimals(whole: string, fraction: string, verified: number): number {
  const wholeDigits = whole.replace(/^0+/, '').length;
  if (wholeDigits > 0) return Math.max(0, verified - wholeDigits);
  const leadingZeros = /^0*/.exec(fraction)?.[0].length ?? 0;
  return verified + leadingZeros;
}

/** A number for lists: verified digits only, cut (not rounded) after at most twelve decimals. */
export function cutDecimals(value: string, verified = Infinity, decimals = LIST_DECIMALS): CutNumber {
  const parts = decimalParts(value);
  if (!parts) return { text: value, more: false };
  const known = parts.fraction.slice(0, verifiedDecimals(parts.whole, parts.fraction, verified));
  const shown = known.slice(0, decimals);
  const number = `${parts.sign}${parts.whole}${shown ? `.${shown}` : ''}`;
  const power = parts.exponent === 0 ? '' : `·10${superscript(parts.exponent)}`;
  return { text: minusSign(number) + power, more: known.length > shown.length };
}
