import { factorQr } from '@/server/numerics/linear/factor-qr';
import { multiplyMatrices } from '@/server/numerics/linear/multiply-matrices';
import { floquetMultipliers, type Multiplier } from '@/server/numerics/periodic/floquet-multipliers';
import { judgeStability } from '@/server/numerics/periodic/judge-stability';
import { scatteredMatrix } from '../scattered-matrix';

const transpose = (a: Float64Array, n: number) =>
  Float64Array.from({ length: n * n }, (_, k) => a[(k % n) * n + Math.floor(k / n)]!);

/** N pieces whose product is Q₀ (T_N … T₁) Q₀ᵀ for given triangles: orthogonal changes of basis between the pieces. */
function piecesOf(triangles: number[][], n: number): Float64Array[] {
  const count = triangles.length;
  const bases = triangles.map((_, i) => factorQr(scatteredMatrix(n, n, 31 * i + 7), n, n).q);
  return triangles.map((t, i) => {
    const middle = multiplyMatrices(bases[(i + 1) % count]!, Float64Array.from(t), n, n);
    return multiplyMatrices(middle, transpose(bases[i]!, n), n, n);
  });
}

const value = ({ re, im, logModulus }: Multiplier) => ({
  re: re * Math.exp(logModulus),
  im: im * Math.exp(logModulus),
});

describe('floquetMultipliers', () => {
  it('keeps the relative accuracy of multipliers that are 1e200 apart', () => {
    const triangles = Array.from({ length: 50 }, () => [100, 3, -2, 0, 1, 4, 0, 0, 0.01]);
    const found = floquetMultipliers(piecesOf(triangles, 3), 3)!;
    [50 * Math.log(100), 0, 50 * Math.log(0.01)].forEach((log, i) => {
      // The pieces themselves are rounded: 50 times ulp·‖piece‖ / smallest singular value = 50 · 2.2e-16 · 1e4 at worst.
      expect(Math.abs(found[i]!.logModulus - log)).toBeLessThan(1.2e-10);
      expect(found[i]!.re).toBeCloseTo(1, 12);
    });
  });

  it('keeps signs', () => {
    const triangles = [
      [-2, 1, 0, 0.5],
      [1, 0, 0, 1],
      [1, 7, 0, -1],
    ];
    const found = floquetMultipliers(piecesOf(triangles, 2), 2)!.map(value);
    expect(found[0]!.re).toBeCloseTo(-2, 13);
    expect(found[1]!.re).toBeCloseTo(-0.5, 13);
  });

  it('finds a conjugate pair between a large and a small one', () => {
    const c = Math.cos(1);
    const s = Math.sin(1);
    const turn = [50, 1, 2, 3, 0, c, -s, 4, 0, s, c, 5, 0, 0, 0, 0.02];
    const found = floquetMultipliers(piecesOf([turn, turn], 4), 4)!;
    expect(Math.abs(found[0]!.logModulus - Math.log(2500))).toBeLessThan(1e-13);
    expect(Math.abs(found[3]!.logModulus + Math.log(2500))).toBeLessThan(1e-12);
    expect(value(found[1]!).re).toBeCloseTo(Math.cos(2), 12);
    expect(value(found[1]!).im).toBeCloseTo(Math.sin(2), 12);
    expect(value(found[2]!).im).toBeCloseTo(-Math.sin(2), 12);
  });

  it('leaves equal and nearly equal moduli together', () => {
    const triangles = [[1.2, 1, 0, 0, 1, 2, 0, 0, 1 / 1.2]];
    const found = floquetMultipliers(piecesOf(triangles, 3), 3)!.map(value);
    [1.2, 1, 1 / 1.2].forEach((modulus, i) => expect(found[i]!.re).toBeCloseTo(modulus, 12));
  });

  it('gives nothing for dimension 0 and null where an entry is not finite', () => {
    expect(floquetMultipliers([], 0)).toEqual([]);
    expect(floquetMultipliers([Float64Array.of(1, NaN, 0, 1)], 2)).toBeNull();
  });
});

describe('judgeStability', () => {
  const multiplier = (re: number, im = 0): Multiplier => {
    const modulus = Math.hypot(re, im);
    return { re: re / modulus, im: im / modulus, logModulus: Math.log(modulus) };
  };

  const judge = (values: Multiplier[], divergenceIntegral = -1) =>
    judgeStability({ multipliers: values, accuracy: 1e-9, divergenceIntegral });
  const ONE = { re: 1, im: 0, logModulus: 0 };

  it.each([
    ['stable', 0, [multiplier(0.5), multiplier(-0.1)]],
    ['saddle', 1, [multiplier(4.7), multiplier(1e-10)]],
    ['unstable', 2, [multiplier(-1.1, 0.5), multiplier(-1.1, -0.5)]],
    ['neutral', 0, [ONE, multiplier(0.1)]],
    ['saddle', 1, [multiplier(3), ONE, multiplier(1 / 3)]],
    ['undecided', 0, [multiplier(1 + 1e-10), multiplier(0.1)]],
  ] as const)('judges %s with %d unstable directions', (stability, unstableDirections, values) => {
    expect(judge([...values])).toEqual({ stability, unstableDirections });
  });

  it('leaves a pair on the circle there when the flow preserves volume', () => {
    const pair = [multiplier(Math.cos(1) * (1 + 1e-12), Math.sin(1)), multiplier(Math.cos(1), -Math.sin(1))];
    expect(judge(pair, 0).stability).toBe('neutral');
    expect(judge(pair, -2).stability).toBe('undecided');
  });
});
