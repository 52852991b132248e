import { multiplyMatrices } from '@/server/numerics/linear/multiply-matrices';
import { singularValues } from '@/server/numerics/linear/singular-values';
import { scatteredMatrix } from '../scattered-matrix';

const transpose = (a: Float64Array, rows: number, cols: number) =>
  Float64Array.from({ length: a.length }, (_, k) => a[(k % rows) * cols + Math.floor(k / rows)]!);

function expectDecomposition(a: Float64Array, rows: number, cols: number): void {
  const { u, sigma, v } = singularValues(a, rows, cols);
  const scaled = Float64Array.from(u, (entry, k) => entry * sigma[k % cols]!);
  const back = multiplyMatrices(scaled, transpose(v, cols, cols), rows, cols);
  const gram = multiplyMatrices(transpose(v, cols, cols), v, cols, cols);
  back.forEach((entry, k) => expect(Math.abs(entry - a[k]!)).toBeLessThan(1e-14 * cols * Math.max(1, sigma[0]!)));
  gram.forEach((entry, k) => expect(Math.abs(entry - (k % (cols + 1) === 0 ? 1 : 0))).toBeLessThan(1e-14));
}

describe('singularValues', () => {
  it.each([
    [6, 6, 1],
    [9, 4, 2],
    [4, 9, 3],
  ])('puts a %d × %d matrix together again from orthogonal factors', (rows, cols, seed) => {
    expectDecomposition(scatteredMatrix(rows, cols, seed), rows, cols);
  });

  it('knows the golden ratio of [[1, 1], [0, 1]]', () => {
    const { sigma } = singularValues(Float64Array.of(1, 1, 0, 1), 2, 2);
    const golden = (1 + Math.sqrt(5)) / 2;
    expect(Math.abs(sigma[0]! - golden)).toBeLessThan(1e-15);
    expect(Math.abs(sigma[1]! - 1 / golden)).toBeLessThan(1e-15);
  });

  it('agrees with the eigenvalues of the Hilbert matrix of order 3', () => {
    // Roots of the characteristic polynomial λ³ − (23/15) λ² + (127/720) λ − 1/2160, found from it by Newton's rule.
    const hilbert = Float64Array.from({ length: 9 }, (_, k) => 1 / (Math.floor(k / 3) + (k % 3) + 1));
    const roots = [1.4, 0.12, 0.0027].map((start) => {
      let x = start;
      for (let i = 0; i < 50; i += 1) {
        x -= (((x - 23 / 15) * x + 127 / 720) * x - 1 / 2160) / ((3 * x - 46 / 15) * x + 127 / 720);
      }
      return x;
    });
    const { sigma } = singularValues(hilbert, 3, 3);
    roots.forEach((root, i) => expect(Math.abs(sigma[i]! - root)).toBeLessThan(1e-14));
  });

  it('spans the null space with the last columns of V, also where there are more columns than rows', () => {
    const a = Float64Array.of(1, 2, 3, 2, 4, 6.5);
    const { sigma, v } = singularValues(a, 2, 3);
    expect(sigma[2]).toBeLessThan(1e-15);
    const nullVector = Float64Array.of(v[2]!, v[5]!, v[8]!);
    multiplyMatrices(a, nullVector, 2, 3).forEach((entry) => expect(Math.abs(entry)).toBeLessThan(1e-14));
  });

  it('keeps small singular values that come from scaling', () => {
    const { sigma } = singularValues(Float64Array.of(1, 0, 0, 1e-200), 2, 2);
    expect(Array.from(sigma)).toEqual([1, 1e-200]);
  });

  it('refuses a ragged matrix and an entry that is not finite', () => {
    expect(() => singularValues(Float64Array.of(1, 2, 3), 2, 2)).toThrow(RangeError);
    expect(() => singularValues(Float64Array.of(1, Infinity, 3, 4), 2, 2)).toThrow(RangeError);
  });
});
