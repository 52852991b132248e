import { multiplyMatrices } from '@/server/numerics/linear/multiply-matrices';
import { orthonormalise } from '@/server/numerics/linear/orthonormalise';
import { scatteredMatrix } from '../scattered-matrix';

function factors(a: Float64Array, n: number) {
  const q = Float64Array.from(a);
  const r = new Float64Array(n * n);
  orthonormalise(q, r, n);
  return { q, r };
}

function expectOrthonormal(q: Float64Array, n: number): void {
  for (let i = 0; i < n; i += 1) {
    for (let j = 0; j < n; j += 1) {
      let product = 0;
      for (let k = 0; k < n; k += 1) product += q[k * n + i]! * q[k * n + j]!;
      expect(Math.abs(product - (i === j ? 1 : 0))).toBeLessThan(4 * n * Number.EPSILON);
    }
  }
}

describe('orthonormalise', () => {
  it('gives the matrix back from orthonormal columns and a triangle', () => {
    const a = scatteredMatrix(7, 7, 4);
    const { q, r } = factors(a, 7);
    expectOrthonormal(q, 7);
    multiplyMatrices(q, r, 7, 7).forEach((entry, k) => expect(Math.abs(entry - a[k]!)).toBeLessThan(1e-14));
    for (let i = 0; i < 7; i += 1) for (let j = 0; j < i; j += 1) expect(r[i * 7 + j]).toBe(0);
  });

  it('stays orthonormal for the Hilbert matrix of order 10, whose condition is 1e13', () => {
    const hilbert = Float64Array.from({ length: 100 }, (_, k) => 1 / (Math.floor(k / 10) + (k % 10) + 1));
    expectOrthonormal(factors(hilbert, 10).q, 10);
  });

  it('completes the basis where columns depend on each other', () => {
    const { q, r } = factors(Float64Array.of(1, 2, 0, 2, 4, 0, 2, 4, 0), 3);
    expectOrthonormal(q, 3);
    expect([r[4], r[8]]).toEqual([0, 0]);
  });

  it('is not disturbed by scales of 1e200', () => {
    const { q, r } = factors(Float64Array.of(1e200, 1e-200, 1e200, -1e-200), 2);
    expectOrthonormal(q, 2);
    expect(r[0]! / 1e200).toBeCloseTo(Math.SQRT2, 14);
    expect(r[3]! / 1e-200).toBeCloseTo(Math.SQRT2, 14);
  });
});
