import { chainOfPoints } from '@/server/numerics/periodic/chain-of-points';
import { correctOrbit } from '@/server/numerics/periodic/correct-orbit';
import { orbitSizes } from '@/server/numerics/periodic/orbit-sizes';
import { loadLorenzOrbits } from '@/tests/reference/load-orbits';
import { lorenzFlow } from '../flows';

const flow = lorenzFlow('z - 27');
const orbit = loadLorenzOrbits().find(({ code }) => code === 'AAABBABABABB')!;

/** The points of the orbit, each moved by about this much. */
const pointsWithin = (error: number) =>
  orbit.points.map(([x, y], i) =>
    Float64Array.of(Number(x) + error * Math.sin(i), Number(y) + error * Math.cos(3 * i), 27),
  );

const LIMITS = { flow, longest: Number(orbit.period), maxSteps: 1e4 };

describe('chainOfPoints', () => {
  it('makes one segment a return, of its duration, that ends where the next begins', () => {
    const chain = chainOfPoints({ ...LIMITS, points: pointsWithin(0) })!;
    expect(Math.abs(chain.period / Number(orbit.period) - 1)).toBeLessThan(1e-14);
    expect(chain.plan).toHaveLength(12);
    chain.plan.forEach(({ borders }, i) => {
      expect(borders).toEqual([...borders].sort((a, b) => a - b));
      expect(borders[0]).toBe(i === 0 ? 0 : chain.plan[i - 1]!.borders.at(-1));
    });
    expect(chain.plan.at(-1)!.borders.at(-1)).toBe(1);
  });

  it('leads Newton from points within 0.03 to the orbit, where growth is 7.9e3', () => {
    const points = pointsWithin(0.03);
    const chain = chainOfPoints({ ...LIMITS, points })!;
    const moduli = [null, null, null];
    const sizes = orbitSizes(chain.watch.extent(), moduli);
    const found = correctOrbit({
      ...{ flow, start: points[0]!, period: chain.period, stepEnds: [], chain, sizes, moduli, maxSteps: 1e5 },
    });
    if (!found.converged) throw new Error('it did not converge');
    expect(found.basinRatio).toBeLessThan(0.25);
    expect(Math.abs(found.period - Number(orbit.period))).toBeLessThan(4e-15);
    expect(Math.abs(found.nodes[0]![0]! - Number(orbit.points[0]![0]))).toBeLessThan(2e-14 * sizes[0]!);
  });

  it('is null where a point does not return in time, or the steps run out', () => {
    expect(chainOfPoints({ ...LIMITS, longest: 0.3, points: pointsWithin(0) })).toBeNull();
    expect(chainOfPoints({ ...LIMITS, maxSteps: 60, points: pointsWithin(0) })).toBeNull();
  });
});
