import { closingCorrection } from '@/server/numerics/periodic/closing-correction';
import { condenseSegments, type LinearSegment } from '@/server/numerics/periodic/condense-segments';
import { scatteredMatrix } from '../scattered-matrix';

const N = 3;

const scattered = (seed: number): LinearSegment => ({
  m: scatteredMatrix(N, N, seed),
  v: scatteredMatrix(N, 1, seed + 100),
  defect: scatteredMatrix(N, 1, seed + 200).map((entry) => entry * 1e-3),
});

const apply = (m: Float64Array, x: Float64Array) =>
  Float64Array.from(x, (_, i) => x.reduce((sum, value, j) => sum + m[i * N + j]! * value, 0));

describe('condenseSegments and closingCorrection', () => {
  it('close every segment of a linear chain exactly and keep the start on the section', () => {
    const segments = [1, 2, 3, 4].map(scattered);
    const chain = condenseSegments(segments);
    const gradient = Float64Array.of(0, 1, 2);
    const { first, theta, freeDirections } = closingCorrection(chain.relation, { gradient, value: 0.25 }, 1e-9);
    const nodes = chain.recover(first, first, theta);
    expect(freeDirections).toBe(0);
    expect(nodes).toHaveLength(4);
    expect(Math.abs(first[1]! + 2 * first[2]! + 0.25)).toBeLessThan(1e-14);
    segments.forEach(({ m, v, defect }, i) => {
      const end = apply(m, nodes[i]!);
      const next = nodes[(i + 1) % 4]!;
      for (let j = 0; j < N; j += 1) {
        expect(Math.abs(end[j]! + v[j]! * theta + defect[j]! - next[j]!)).toBeLessThan(1e-13);
      }
    });
  });

  it('stay exact where the product of the segments grows by 1e60 and shrinks by 1e60', () => {
    const strong: LinearSegment = {
      m: Float64Array.of(1e3, 5, 0, 0, 1e-3, 0, 0, 0, 1),
      v: Float64Array.of(0, 0, 1),
      defect: Float64Array.of(1e-6, 1e-6, 1e-6),
    };
    const segments = Array.from({ length: 20 }, () => strong);
    const chain = condenseSegments(segments);
    const section = { gradient: Float64Array.of(0, 0, 1), value: 0 };
    const { first, theta } = closingCorrection(chain.relation, section, 1e-9);
    // The same defect everywhere: every node moves by the fixed point of x = M x + d, the time shift by −1e-6.
    const y = 1e-6 / (1 - 1e-3);
    const x = (1e-6 + 5 * y) / (1 - 1e3);
    chain.recover(first, first, theta).forEach((node) => {
      expect(Math.abs(node[0]! - x)).toBeLessThan(1e-19);
      expect(Math.abs(node[1]! - y)).toBeLessThan(1e-19);
    });
    expect(Math.abs(theta + 1e-6)).toBeLessThan(1e-20);
  });

  it('take the shortest change of the point where a direction is free, whatever the period does', () => {
    // End = start + (0, 0, 1)·θ + shear: coordinate 1 shears coordinate 0 by 2; every point with x₁ = −1e-3 closes.
    const segment: LinearSegment = {
      m: Float64Array.of(1, 2, 0, 0, 1, 0, 0, 0, 1),
      v: Float64Array.of(0, 0, 1),
      defect: Float64Array.of(2e-3, 0, 5),
    };
    const chain = condenseSegments([segment]);
    const section = { gradient: Float64Array.of(0, 0, 1), value: 0 };
    const { first, theta, freeDirections } = closingCorrection(chain.relation, section, 1e-9);
    [0, -1e-3, 0].forEach((value, i) => expect(Math.abs(first[i]! - value)).toBeLessThan(2e-15));
    expect(theta).toBeCloseTo(-5, 13);
    expect(freeDirections).toBe(1);
  });
});
