import { factorQr } from '@/server/numerics/linear/factor-qr';
import { multiplyMatrices } from '@/server/numerics/linear/multiply-matrices';
import { scatteredMatrix } from '../scattered-matrix';

describe('factorQr', () => {
  it('knows the factors of a matrix of 3-4-5 triangles', () => {
    const { q, r } = factorQr(Float64Array.of(3, 1, 4, 2), 2, 2);
    const expectedQ = [0.6, -0.8, 0.8, 0.6];
    const expectedR = [5, 2.2, 0, 0.4];
    expectedQ.forEach((value, k) => expect(Math.abs(q[k]! - value)).toBeLessThan(1e-15));
    expectedR.forEach((value, k) => expect(Math.abs(r[k]! - value)).toBeLessThan(1e-15));
  });

  it('gives orthonormal columns, a triangle without negative diagonal, and the matrix back', () => {
    const a = scatteredMatrix(8, 5, 3);
    const { q, r } = factorQr(a, 8, 5);
    multiplyMatrices(q, r, 8, 5).forEach((entry, k) => expect(Math.abs(entry - a[k]!)).toBeLessThan(1e-14));
    for (let i = 0; i < 5; i += 1) {
      expect(r[i * 5 + i]).toBeGreaterThan(0);
      for (let j = 0; j < i; j += 1) expect(r[i * 5 + j]).toBe(0);
      for (let j = 0; j < 5; j += 1) {
        let product = 0;
        for (let k = 0; k < 8; k += 1) product += q[k * 5 + i]! * q[k * 5 + j]!;
        expect(Math.abs(product - (i === j ? 1 : 0))).toBeLessThan(1e-14);
      }
    }
  });

  it('keeps Q orthonormal where columns depend on each other', () => {
    const { q, r } = factorQr(Float64Array.of(1, 2, 2, 4), 2, 2);
    expect(Math.abs(r[3]!)).toBeLessThan(1e-15);
    expect(Math.abs(q[0]! * q[1]! + q[2]! * q[3]!)).toBeLessThan(1e-15);
  });

  it('refuses more columns than rows', () => {
    expect(() => factorQr(Float64Array.of(1, 2), 1, 2)).toThrow(RangeError);
  });
});
