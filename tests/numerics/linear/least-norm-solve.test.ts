import { leastNormSolve } from '@/server/numerics/linear/least-norm-solve';
import { scatteredMatrix } from '../scattered-matrix';

describe('leastNormSolve', () => {
  it('solves a regular system', () => {
    const { x, rank } = leastNormSolve({
      a: Float64Array.of(2, 1, 1, 3),
      rows: 2,
      cols: 2,
      b: Float64Array.of(3, 5),
      cutOff: 1e-12,
    });
    expect(rank).toBe(2);
    expect(Math.abs(x[0]! - 0.8)).toBeLessThan(1e-15);
    expect(Math.abs(x[1]! - 1.4)).toBeLessThan(1e-15);
  });

  it('takes the shortest of many solutions', () => {
    // x + 2y + 2z = 9: the shortest solution is 9 (1, 2, 2) / 9.
    const { x, rank } = leastNormSolve({
      a: Float64Array.of(1, 2, 2),
      rows: 1,
      cols: 3,
      b: Float64Array.of(9),
      cutOff: 1e-12,
    });
    expect(rank).toBe(1);
    [1, 2, 2].forEach((value, i) => expect(Math.abs(x[i]! - value)).toBeLessThan(1e-14));
  });

  it('leaves out what lies below the cut-off', () => {
    const { x, rank } = leastNormSolve({
      a: Float64Array.of(1, 0, 0, 1e-10),
      rows: 2,
      cols: 2,
      b: Float64Array.of(1, 1),
      cutOff: 1e-9,
    });
    expect(rank).toBe(1);
    expect(Array.from(x)).toEqual([1, 0]);
  });

  it('makes the residual orthogonal to the columns of an overdetermined system', () => {
    const a = scatteredMatrix(7, 3, 11);
    const b = scatteredMatrix(7, 1, 5);
    const { x } = leastNormSolve({ a, rows: 7, cols: 3, b, cutOff: 1e-12 });
    const residual = b.map((entry, i) => entry - x.reduce((sum, value, j) => sum + a[i * 3 + j]! * value, 0));
    for (let j = 0; j < 3; j += 1) {
      const product = residual.reduce((sum, entry, i) => sum + entry * a[i * 3 + j]!, 0);
      expect(Math.abs(product)).toBeLessThan(1e-14);
    }
  });

  it('refuses a right-hand side of another length', () => {
    expect(() =>
      leastNormSolve({ a: Float64Array.of(1), rows: 1, cols: 1, b: Float64Array.of(1, 2), cutOff: 0 }),
    ).toThrow(RangeError);
  });
});
