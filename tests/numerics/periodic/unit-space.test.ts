import { condenseSegments } from '@/server/numerics/periodic/condense-segments';
import { unitSpace } from '@/server/numerics/periodic/unit-space';
import { factorQr } from '@/server/numerics/linear/factor-qr';
import { multiplyMatrices } from '@/server/numerics/linear/multiply-matrices';
import { scatteredMatrix } from '../scattered-matrix';

/** The matrix in another orthonormal basis. */
function turned(m: number[], n: number, seed: number): Float64Array {
  const { q } = factorQr(scatteredMatrix(n, n, seed), n, n);
  const transposed = Float64Array.from({ length: n * n }, (_, k) => q[(k % n) * n + Math.floor(k / n)]!);
  return multiplyMatrices(multiplyMatrices(q, Float64Array.from(m), n, n), transposed, n, n);
}

const units = (m: Float64Array, n: number) =>
  unitSpace(condenseSegments([{ m, v: new Float64Array(n), defect: new Float64Array(n) }]).relation, 1e-9).size;

describe('unitSpace', () => {
  it('is one for an isolated orbit', () => {
    expect(units(turned([1, 0, 0, 0, 4.7, 0, 0, 0, 1e-10], 3, 1), 3)).toBe(1);
  });

  it('counts a Jordan block with its size, where eigenvalues would scatter', () => {
    const m = [1, 3, 0, 0, 0, 1, -2, 0, 0, 0, 1, 0, 0, 0, 0, 266];
    expect(units(turned(m, 4, 2), 4)).toBe(3);
  });

  it('adds blocks and single units', () => {
    const m = [1, 5, 0, 0, 0, 1, 0, 0, 0, 0, 1, 0, 0, 0, 0, 0.5];
    expect(units(turned(m, 4, 3), 4)).toBe(3);
    expect(units(turned([1, 0, 0, 0, 1, 0, 0, 0, 1], 3, 4), 3)).toBe(3);
  });

  it('counts none where none is 1, however near', () => {
    expect(units(turned([1.0001, 0, 0, -1], 2, 5), 2)).toBe(0);
  });

  it('is not disturbed by growth of 3.6e4 and decay of its inverse', () => {
    const m = [1, 40, 0, 0, 0, 1, 0, 0, 0, 0, 3.6e4, 0, 0, 0, 0, 1 / 3.6e4];
    expect(units(turned(m, 4, 6), 4)).toBe(2);
  });
});
