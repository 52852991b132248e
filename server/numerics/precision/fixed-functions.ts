import {
  bitLength,
  changeBits,
  doubleOfFixed,
  fixedOfDouble,
  integerSquareRoot,
} from '@/server/numerics/precision/fixed-number';
import type { Rational } from '@/server/numerics/precision/rational';

/** Bits beyond those asked for that the functions work with. */
const GUARD_BITS = 32;
/** Arguments of series are halved so often first: it trades terms for squarings. */
const HALVINGS = 8;
/** Correct bits of a starting value from a double. */
const DOUBLE_BITS = 46;

const kept = new Map<string, bigint>();

function keptConstant(name: string, bits: number, compute: (bits: number) => bigint): bigint {
  const key = `${name} ${bits}`;
  const value = kept.get(key) ?? changeBits(compute(bits + GUARD_BITS), bits + GUARD_BITS, bits);
  kept.set(key, value);
  return value;
}

/** π. Source: J. Machin (1706), π/4 = 4 arctan 1/5 − arctan 1/239. */
export const fixedPi = (bits: number): bigint =>
  keptConstant('pi', bits, (b) => 4n * (4n * inverseSeries(5n, b, -1n) - inverseSeries(239n, b, -1n)));

/** log 2 = 2 artanh 1/3. */
const fixedLog2 = (bits: number): bigint => keptConstant('log 2', bits, (b) => 2n * inverseSeries(3n, b, 1n));

/** Σ sign^k / ((2k + 1) n^(2k + 1)): arctan 1/n for sign −1, artanh 1/n for 1. */
function inverseSeries(n: bigint, bits: number, sign: bigint): bigint {
  let power = (1n << BigInt(bits)) / n;
  let sum = power;
  for (let k = 1n; power !== 0n; k += 1n) {
    power = (sign * power) / (n * n);
    sum += power / (2n * k + 1n);
  }
  return sum;
}

/** √x for x ≥ 0. */
export const fixedSqrt = (x: bigint, bits: number): bigint => integerSquareRoot(x << BigInt(bits));

/**
 * e^x by x = k log 2 + r, the series of e^(r/2^8), squared eight times.
 *
 * Accuracy: about one unit times the size of the result.
 */
export function fixedExp(x: bigint, bits: number): bigint {
  const size = Math.max(0, bitLength(x < 0n ? -x : x) - bits);
  const work = bits + GUARD_BITS + 2 * size;
  const argument = changeBits(x, bits, work);
  const log2 = fixedLog2(work);
  const k = floorDivide(argument, log2);
  const grown = expSeries(argument - k * log2, work);
  // Few bits are lost below the point when the result is small, many are needed when it is large.
  return changeBits(k >= 0n ? grown << k : grown >> -k, work, bits);
}

function expSeries(r: bigint, bits: number): bigint {
  const b = BigInt(bits);
  const small = r >> BigInt(HALVINGS);
  let term = 1n << b;
  let sum = term;
  for (let k = 1n; term !== 0n && term !== -1n; k += 1n) {
    term = ((term * small) >> b) / k;
    sum += term;
  }
  for (let k = 0; k < HALVINGS; k++) sum = (sum * sum) >> b;
  return sum;
}

/**
 * log x for x > 0: y ← y + 2 (x − e^y)/(x + e^y), which triples the correct digits, from the double's logarithm.
 *
 * @throws {RangeError} for x ≤ 0.
 */
export function fixedLog(x: bigint, bits: number): bigint {
  if (x <= 0n) throw new RangeError('only a positive number has a real logarithm');
  const work = bits + GUARD_BITS;
  // x = m 2^k with m between 1/2 and 1.
  const k = bitLength(x) - bits;
  const m = changeBits(x, bits + k, work);
  let y = fixedOfDouble(Math.log(doubleOfFixed(m, work)), work);
  for (let correct = DOUBLE_BITS; correct < work; correct *= 3) {
    const grown = fixedExp(y, work);
    y += ((2n * (m - grown)) << BigInt(work)) / (m + grown);
  }
  return changeBits(y + BigInt(k) * fixedLog2(work), work, bits);
}

/** Sine and cosine, by reduction to an eighth of a turn and the series of both. */
export function fixedSinCos(x: bigint, bits: number): { sin: bigint; cos: bigint } {
  const work = bits + GUARD_BITS + Math.max(0, bitLength(x < 0n ? -x : x) - bits);
  const quarter = fixedPi(work) >> 1n;
  const argument = changeBits(x, bits, work);
  const k = floorDivide(argument + (quarter >> 1n), quarter);
  const { sin, cos } = sinCosSeries(argument - k * quarter, work);
  const turned = [
    { sin, cos },
    { sin: cos, cos: -sin },
    { sin: -sin, cos: -cos },
    { sin: -cos, cos: sin },
  ][Number(((k % 4n) + 4n) % 4n)]!;
  return { sin: changeBits(turned.sin, work, bits), cos: changeBits(turned.cos, work, bits) };
}

function sinCosSeries(r: bigint, bits: number): { sin: bigint; cos: bigint } {
  const b = BigInt(bits);
  let term = 1n << b;
  // Terms of e^(ir): the powers of i go round cos, sin, −cos, −sin.
  const sums = [term, 0n, 0n, 0n];
  for (let k = 1; term !== 0n && term !== -1n; k++) {
    term = ((term * r) >> b) / BigInt(k);
    sums[k % 4]! += term;
  }
  return { sin: sums[1]! - sums[3]!, cos: sums[0]! - sums[2]! };
}

/** arctan x: y ← y + arctan of (x cos y − sin y)/(cos y + x sin y), from the double's value; its own argument is tiny. */
export function fixedAtan(x: bigint, bits: number): bigint {
  const work = bits + GUARD_BITS;
  const argument = changeBits(x, bits, work);
  let y = fixedOfDouble(Math.atan(doubleOfFixed(x, bits)), work);
  for (let correct = DOUBLE_BITS; correct < work; correct *= 3) {
    const { sin, cos } = fixedSinCos(y, work);
    const below = cos + ((argument * sin) >> BigInt(work));
    const d = ((((argument * cos) >> BigInt(work)) - sin) << BigInt(work)) / below;
    y += d - ((((d * d) >> BigInt(work)) * d) >> BigInt(work)) / 3n;
  }
  return changeBits(y, work, bits);
}

/** arcsin x for |x| < 1. */
export function fixedAsin(x: bigint, bits: number): bigint {
  const one = 1n << BigInt(bits);
  if (x <= -one || x >= one) throw new RangeError('the arc sine is smooth between −1 and 1 only');
  const work = 2 * bits + GUARD_BITS;
  const argument = changeBits(x, bits, work);
  const root = integerSquareRoot((1n << BigInt(2 * work)) - argument * argument);
  return changeBits(fixedAtan((argument << BigInt(work)) / root, work), work, bits);
}

/** arccos x for |x| < 1. */
export const fixedAcos = (x: bigint, bits: number): bigint => (fixedPi(bits) >> 1n) - fixedAsin(x, bits);

/**
 * a^(p/q) for a > 0. Halves go by square roots, all other exponents by exp and log.
 *
 * @throws {RangeError} for a ≤ 0.
 */
export function fixedPower(a: bigint, { p, q }: Rational, bits: number): bigint {
  if (a <= 0n) throw new RangeError('only a positive number has every real power');
  const work = bits + GUARD_BITS + Math.abs(bitLength(a) - bits);
  const base = changeBits(a, bits, work);
  const isHalf = q === 1n || q === 2n;
  if (!isHalf || p > MULTIPLIED_POWER || p < -MULTIPLIED_POWER) {
    return changeBits(fixedExp((fixedLog(base, work) * p) / q, work), work, bits);
  }
  const root = q === 2n ? fixedSqrt(base, work) : base;
  const raised = integerPower(root, p < 0n ? -p : p, work);
  return changeBits(p < 0n ? (1n << BigInt(2 * work)) / raised : raised, work, bits);
}

/** Powers up to this are multiplied out. */
const MULTIPLIED_POWER = 64n;

function integerPower(base: bigint, exponent: bigint, bits: number): bigint {
  let result = 1n << BigInt(bits);
  for (let k = 0n; k < exponent; k += 1n) result = (result * base) >> BigInt(bits);
  return result;
}

function floorDivide(a: bigint, b: bigint): bigint {
  const quotient = a / b;
  return a % b !== 0n && a < 0n !== b < 0n ? quotient - 1n : quotient;
}
