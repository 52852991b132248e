import { type Complex, eigenvalues } from '@/server/numerics/linear/eigenvalues';
import { factorQr } from '@/server/numerics/linear/factor-qr';
import { multiplyMatrices } from '@/server/numerics/linear/multiply-matrices';
import { scatteredMatrix } from '../scattered-matrix';

/** Companion matrix of Π (x − rootᵢ), roots real or in conjugate pairs, so its eigenvalues are known exactly. */
function companion(roots: Complex[]): Float64Array {
  let coefficients: Complex[] = [{ re: 1, im: 0 }];
  for (const root of roots) {
    const next = [...coefficients.map(() => ({ re: 0, im: 0 })), { re: 0, im: 0 }];
    coefficients.forEach((c, k) => {
      next[k + 1]!.re += c.re;
      next[k + 1]!.im += c.im;
      next[k]!.re -= c.re * root.re - c.im * root.im;
      next[k]!.im -= c.re * root.im + c.im * root.re;
    });
    coefficients = next;
  }
  const n = roots.length;
  const a = new Float64Array(n * n);
  for (let i = 1; i < n; i += 1) a[i * n + i - 1] = 1;
  for (let i = 0; i < n; i += 1) a[i * n + n - 1] = -coefficients[i]!.re;
  return a;
}

const sorted = (values: Complex[]) => [...values].sort((p, q) => p.re - q.re || p.im - q.im);

function expectEigenvalues(a: Float64Array, expected: Complex[], tolerance: number): void {
  const found = sorted(eigenvalues(a, expected.length)!);
  sorted(expected).forEach((value, i) => {
    expect(Math.hypot(found[i]!.re - value.re, found[i]!.im - value.im)).toBeLessThanOrEqual(
      tolerance * (1 + Math.hypot(value.re, value.im)),
    );
  });
}

const real = (...values: number[]): Complex[] => values.map((re) => ({ re, im: 0 }));

describe('eigenvalues', () => {
  it('finds the roots of a companion matrix', () => {
    // Coefficients are integers, exact in double; the roots' condition is below 1e3.
    expectEigenvalues(companion(real(-3, -1, 2, 5)), real(-3, -1, 2, 5), 1e-12);
  });

  it('finds conjugate pairs, neighbours in the list, positive imaginary part first', () => {
    const roots = [
      { re: 1, im: 2 },
      { re: 1, im: -2 },
      { re: -0.5, im: 0.25 },
      { re: -0.5, im: -0.25 },
      { re: 3, im: 0 },
    ];
    expectEigenvalues(companion(roots), roots, 1e-13);
    const found = eigenvalues(companion(roots), 5)!;
    found.forEach((value, i) => {
      if (value.im > 0) expect(found[i + 1]).toEqual({ re: value.re, im: -value.im });
    });
  });

  it('agrees with the closed form of the second-difference matrix', () => {
    // Eigenvalues 2 − 2 cos(kπ/(n+1)); symmetric, so each is right to a few ulp of the norm 4.
    const n = 15;
    const a = new Float64Array(n * n);
    for (let i = 0; i < n; i += 1) {
      a[i * n + i] = 2;
      if (i > 0) a[i * n + i - 1] = -1;
      if (i < n - 1) a[i * n + i + 1] = -1;
    }
    const expected = Array.from({ length: n }, (_, k) => 2 - 2 * Math.cos(((k + 1) * Math.PI) / (n + 1)));
    expectEigenvalues(a, real(...expected), 2e-14);
  });

  it('finds the n-th roots of unity in a cyclic permutation, where unshifted steps stand still', () => {
    const n = 8;
    const a = new Float64Array(n * n);
    for (let i = 0; i < n; i += 1) a[((i + 1) % n) * n + i] = 1;
    const expected = Array.from({ length: n }, (_, k) => ({
      re: Math.cos((2 * Math.PI * k) / n),
      im: Math.sin((2 * Math.PI * k) / n),
    }));
    const found = eigenvalues(a, n)!;
    for (const value of expected) {
      const distance = Math.min(...found.map((f) => Math.hypot(f.re - value.re, f.im - value.im)));
      expect(distance).toBeLessThan(1e-14);
    }
  });

  it('does not change under an orthogonal similarity', () => {
    const n = 10;
    const diagonal = Float64Array.from({ length: n * n }, (_, k) => (k % (n + 1) === 0 ? 2 ** (k / (n + 1) - 4) : 0));
    const { q } = factorQr(scatteredMatrix(n, n, 7), n, n);
    const transposed = Float64Array.from({ length: n * n }, (_, k) => q[(k % n) * n + Math.floor(k / n)]!);
    const similar = multiplyMatrices(multiplyMatrices(q, diagonal, n, n), transposed, n, n);
    expectEigenvalues(similar, real(...Array.from({ length: n }, (_, i) => 2 ** (i - 4))), 1e-13);
  });

  it('is helped by balancing where the scales differ by 1e12', () => {
    // D⁻¹ [[1, 1], [1, 1]] D with D = diag(1, 1e12): eigenvalues 0 and 2.
    expectEigenvalues(Float64Array.of(1, 1e12, 1e-12, 1), real(0, 2), 1e-15);
  });

  it('gives the diagonal of a triangle, and nothing for nothing', () => {
    expectEigenvalues(Float64Array.of(1, 5, 7, 0, 2, 9, 0, 0, 3), real(1, 2, 3), 0);
    expect(eigenvalues(new Float64Array(0), 0)).toEqual([]);
  });

  it('is null where an entry is not finite and refuses a ragged matrix', () => {
    expect(eigenvalues(Float64Array.of(1, NaN, 0, 1), 2)).toBeNull();
    expect(() => eigenvalues(Float64Array.of(1, 2, 3), 2)).toThrow(RangeError);
  });
});
