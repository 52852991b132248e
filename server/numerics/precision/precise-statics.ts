import type { StaticStep } from '@/server/numerics/expression/tape';
import {
  fixedAcos,
  fixedAsin,
  fixedAtan,
  fixedExp,
  fixedLog,
  fixedPi,
  fixedPower,
  fixedSinCos,
  fixedSqrt,
} from '@/server/numerics/precision/fixed-functions';
import {
  combineRationals,
  fixedOfRational,
  rational,
  type Rational,
  rationalOfDouble,
} from '@/server/numerics/precision/rational';

/** An exact parameter, or π. */
export type ExactValue = Rational | 'pi';

/** A static value: to so many bits after the point, and exactly where it is a ratio of integers. */
export interface PreciseStatic {
  fixed: bigint;
  ratio: Rational | null;
}

/** Ratios are kept exact up to so many digits. */
const LARGEST_RATIO = 10n ** 400n;

/**
 * The static values of an exact graph.
 *
 * @param values of the parameters, in their order.
 * @throws {RangeError} where an operation is not defined.
 */
export function preciseStatics(
  statics: readonly StaticStep[],
  values: readonly ExactValue[],
  bits: number,
): PreciseStatic[] {
  const done: PreciseStatic[] = [];
  for (const step of statics) {
    const [a, b] = [done[step.a], done[step.b]];
    const ratio = exactly(step, values, [a?.ratio ?? null, b?.ratio ?? null]);
    const kept = ratio !== null && size(ratio.p) < LARGEST_RATIO && ratio.q < LARGEST_RATIO ? ratio : null;
    const fixed = ratio === null ? approximately(step, [a, b], bits) : fixedOfRational(ratio, bits);
    done.push({ fixed, ratio: kept });
  }
  return done;
}

const size = (x: bigint): bigint => (x < 0n ? -x : x);

function exactly(
  { operation, value }: StaticStep,
  values: readonly ExactValue[],
  [a, b]: readonly [Rational | null, Rational | null],
): Rational | null {
  if (operation === 'constant') return rationalOfDouble(value);
  if (operation === 'parameter') {
    const given = values[value];
    return given === undefined || given === 'pi' ? null : given;
  }
  if (a === null) return null;
  if (operation === 'negate') return { p: -a.p, q: a.q };
  if (operation === 'square') return rational(a.p * a.p, a.q * a.q);
  if (b === null) return null;
  switch (operation) {
    case 'add':
    case 'subtract':
    case 'multiply':
    case 'divide': {
      const exact = combineRationals(operation, a, b);
      if (exact === null) throw new RangeError('a constant is divided by zero');
      return exact;
    }
    default:
      return null;
  }
}

function approximately(
  { operation }: StaticStep,
  [a, b]: readonly [PreciseStatic | undefined, PreciseStatic | undefined],
  bits: number,
): bigint {
  const [x, y] = [a?.fixed ?? 0n, b?.fixed ?? 0n];
  const shift = BigInt(bits);
  switch (operation) {
    case 'add':
      return x + y;
    case 'subtract':
      return x - y;
    case 'multiply':
      return (x * y) >> shift;
    case 'square':
      return (x * x) >> shift;
    case 'negate':
      return -x;
    case 'divide':
      if (y === 0n) throw new RangeError('a constant is divided by zero');
      return (x << shift) / y;
    case 'power':
      return b?.ratio ? fixedPower(x, b.ratio, bits) : fixedExp((y * fixedLog(x, bits)) >> shift, bits);
    case 'constant':
    case 'parameter':
      return fixedPi(bits);
    case 'state':
      throw new RangeError('a state variable is no static value');
    default:
      return fixedFunction(operation, x, bits);
  }
}

/** A function of one argument, in fixed point. */
export function fixedFunction(
  operation: 'sqrt' | 'exp' | 'log' | 'sin' | 'cos' | 'asin' | 'acos' | 'atan',
  x: bigint,
  bits: number,
): bigint {
  switch (operation) {
    case 'sqrt':
      return fixedSqrt(x, bits);
    case 'exp':
      return fixedExp(x, bits);
    case 'log':
      return fixedLog(x, bits);
    case 'sin':
      return fixedSinCos(x, bits).sin;
    case 'cos':
      return fixedSinCos(x, bits).cos;
    case 'asin':
      return fixedAsin(x, bits);
    case 'acos':
      return fixedAcos(x, bits);
    case 'atan':
      return fixedAtan(x, bits);
  }
}
