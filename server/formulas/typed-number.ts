import { NUMBER_CHARACTERS_LIMIT, NUMBER_SIZE_LIMIT } from '@/server/formulas/limits';
import { nearestDouble } from '@/server/formulas/nearest-double';

/** A number as a person typed it. */
export interface TypedNumberRead {
  text: string;
  /** The nearest double. */
  value: number;
  /** Half of the last typed place; 0 where the number is exact: typed without a decimal point, or as p/q. */
  halfUnit: number;
  /** Significant digits as typed. */
  digits: number;
}

export type TypedNumberResult = { ok: true; number: TypedNumberRead } | { ok: false; message: string };

const DECIMAL = /^[+-]?([0-9]+)(?:\.([0-9]+))?(?:[eE]([+-]?[0-9]+))?$/;
const FRACTION = /^([+-]?)([0-9]+)\/([0-9]+)$/;

/**
 * Read a typed number: `[+-]digits[.digits][e[+-]digits]` or `p/q` of integers.
 *
 * @param typed text, or a JSON number, which counts as its shortest decimal text.
 * @returns the number, or a sentence that says what is wrong with it.
 */
export function readTypedNumber(typed: string | number): TypedNumberResult {
  const text = String(typed);
  if (text === '') return { ok: false, message: 'A number is missing.' };
  if (text.length > NUMBER_CHARACTERS_LIMIT) {
    return {
      ok: false,
      message: `A number has at most ${NUMBER_CHARACTERS_LIMIT} characters; this one has ${text.length}.`,
    };
  }
  const number = readFraction(text) ?? readDecimal(text);
  if (number === null) {
    return { ok: false, message: `“${text}” is not a number. Write it like -13.76, 1.5e-3 or 8/3.` };
  }
  if (Number.isNaN(number.value)) return { ok: false, message: `“${text}” divides by zero.` };
  if (Math.abs(number.value) >= NUMBER_SIZE_LIMIT) {
    return { ok: false, message: `“${text}” is too large: numbers are smaller than ${NUMBER_SIZE_LIMIT}.` };
  }
  if (number.value === 0 && number.digits > 0) {
    return { ok: false, message: `“${text}” is too small: a double holds nothing between 0 and 5e-324.` };
  }
  return { ok: true, number };
}

function readFraction(text: string): TypedNumberRead | null {
  const [, sign = '', p = '', q = ''] = FRACTION.exec(text) ?? [];
  if (q === '') return null;
  const numerator = BigInt(p);
  const size = BigInt(q) === 0n ? NaN : nearestDouble(numerator, BigInt(q));
  return { text, value: sign === '-' ? -size : size, halfUnit: 0, digits: significant(p) };
}

function readDecimal(text: string): TypedNumberRead | null {
  const [, whole, decimals = '', exponent = '0'] = DECIMAL.exec(text) ?? [];
  if (whole === undefined) return null;
  const place = Number(exponent) - decimals.length;
  return {
    text,
    value: Number(text),
    halfUnit: decimals === '' ? 0 : 0.5 * 10 ** place,
    digits: significant(whole + decimals),
  };
}

/** Digits from the first that is not 0 on. */
const significant = (digits: string): number => digits.replace(/^0+/, '').length;
