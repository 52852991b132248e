import { factorQr } from '@/server/numerics/linear/factor-qr';
import { multiplyMatrices } from '@/server/numerics/linear/multiply-matrices';
import { floquetMultipliers } from '@/server/numerics/periodic/floquet-multipliers';
import { quotientPieces } from '@/server/numerics/periodic/quotient-pieces';
import { scatteredMatrix } from '../scattered-matrix';

const transpose = (a: Float64Array, n: number) =>
  Float64Array.from({ length: n * n }, (_, k) => a[(k % n) * n + Math.floor(k / n)]!);

const columns = (a: Float64Array, n: number, u: number) =>
  Float64Array.from({ length: n * u }, (_, k) => a[Math.floor(k / u) * n + (k % u)]!);

describe('quotientPieces', () => {
  it('leaves the other multipliers, however defective those that are taken out', () => {
    // A Jordan block of size 3 at 1 with couplings of 3, and 1.2 and 1/1.2 beside it.
    const n = 5;
    const m = [1, 3, 5, 7, 1, 0, 1, 3, 2, 3, 0, 0, 1, 4, 1, 0, 0, 0, 1.2, 6, 0, 0, 0, 0, 1 / 1.2];
    const { q } = factorQr(scatteredMatrix(n, n, 9), n, n);
    const turned = multiplyMatrices(multiplyMatrices(q, Float64Array.from(m), n, n), transpose(q, n), n, n);
    const pieces = quotientPieces([{ pieces: [turned], basis: columns(q, n, 3) }], n);
    const found = floquetMultipliers(pieces, 2)!.map(({ re, logModulus }) => re * Math.exp(logModulus));
    // Rounding of the basis, 1 ulp, grows by coupling² / gap³ = 9 / 0.2³; the units themselves scatter by ulp^(1/3).
    expect(Math.abs(found[0]! - 1.2)).toBeLessThan(2.5e-13);
    expect(Math.abs(found[1]! - 1 / 1.2)).toBeLessThan(2.5e-13);
  });

  it('puts the subspace back at every segment, against growth of 1e20', () => {
    // Two directions: one kept, (cos a, sin a) turning from segment to segment, one growing tenfold.
    const segments = Array.from({ length: 20 }, (_, i) => {
      const frame = (k: number) => {
        const a = 0.3 * (k % 20);
        return Float64Array.of(Math.cos(a), -Math.sin(a), Math.sin(a), Math.cos(a));
      };
      const grow = Float64Array.of(1, 3, 0, 10);
      const piece = multiplyMatrices(multiplyMatrices(frame(i + 1), grow, 2, 2), transpose(frame(i), 2), 2, 2);
      return { pieces: [piece], basis: columns(frame(i), 2, 1) };
    });
    const [only] = floquetMultipliers(quotientPieces(segments, 2), 1)!;
    expect(Math.abs(only!.logModulus - 20 * Math.LN10)).toBeLessThan(1e-13 * 20);
    expect(only!.re).toBe(1);
  });
});
