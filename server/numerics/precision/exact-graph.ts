import { type BinaryOperation, Graph, type Unary } from '@/server/numerics/expression/graph';
import { combineRationals, rational, type Rational, rationalOfDouble } from '@/server/numerics/precision/rational';

/** Powers up to this are looked at whether they are exact. */
const LARGEST_POWER = 64;

/**
 * A graph whose constants are exact: an operation on constants is folded only where its double is the very result.
 * What is left stands as a static value, to be computed with as many bits as are wanted.
 */
export class ExactGraph extends Graph {
  protected override fold(operation: BinaryOperation, x: number, y: number): number | null {
    const value = super.fold(operation, x, y);
    if (value === null || !Number.isFinite(value)) return null;
    const exact = exactResult(operation, x, y);
    const { p, q } = rationalOfDouble(value);
    return exact !== null && exact.p === p && exact.q === q ? value : null;
  }

  protected override foldUnary(operation: Unary, x: number): number | null {
    const value = super.foldUnary(operation, x);
    return operation === 'sqrt' && value !== null && this.fold('multiply', value, value) === x ? value : null;
  }
}

function exactResult(operation: BinaryOperation, x: number, y: number): Rational | null {
  const [a, b] = [rationalOfDouble(x), rationalOfDouble(y)];
  if (operation !== 'power') return combineRationals(operation, a, b);
  if (!Number.isInteger(y) || Math.abs(y) > LARGEST_POWER || (y < 0 && x === 0)) return null;
  const size = BigInt(Math.abs(y));
  return y < 0 ? rational(a.q ** size, a.p ** size) : rational(a.p ** size, a.q ** size);
}
