import { correctOrbit, type CorrectedOrbit } from '@/server/numerics/periodic/correct-orbit';
import { floquetMultipliers } from '@/server/numerics/periodic/floquet-multipliers';
import { followOrbit } from '@/server/numerics/periodic/follow-orbit';
import { orbitSizes } from '@/server/numerics/periodic/orbit-sizes';
import { scaleMatrix } from '@/server/numerics/periodic/scale-matrix';
import { unitSpace } from '@/server/numerics/periodic/unit-space';
import { createSectionWatch } from '@/server/numerics/section/create-section-watch';
import type { Flow } from '@/server/numerics/taylor/flow';
import { loadLorenzOrbits } from '@/tests/reference/load-orbits';
import { AB, flowOf, keplerFlow, lorenzFlow } from '../flows';

function correct(flow: Flow, start: Float64Array, period: number) {
  const watch = createSectionWatch(flow.dimension);
  const run = followOrbit({ flow, start, from: 0, duration: period, onSection: true, maxSteps: 1e5, watch });
  if (!run.ok) throw new Error(run.reason);
  const moduli = Array.from(start, () => null);
  const sizes = orbitSizes(watch.extent(), moduli);
  return { sizes, orbit: correctOrbit({ flow, start, period, stepEnds: run.stepEnds, sizes, moduli, maxSteps: 1e5 }) };
}

function converged(flow: Flow, start: Float64Array, period: number) {
  const { sizes, orbit } = correct(flow, start, period);
  expect(orbit.converged).toBe(true);
  return { sizes, orbit: orbit as CorrectedOrbit };
}

describe('correctOrbit', () => {
  it('finds the cycle of the Hopf normal form from a start beside it', () => {
    const hopf = flowOf({ x: 'x - y - x*(x^2 + y^2)', y: 'x + y - y*(x^2 + y^2)' }, 'y');
    const { orbit } = converged(hopf, Float64Array.of(1.2, 0), 6.2);
    expect(Math.abs(orbit.nodes[0]![0]! - 1)).toBeLessThan(1e-14);
    expect(Math.abs(orbit.period - 2 * Math.PI)).toBeLessThan(1e-14);
    expect(orbit.freeDirections).toBe(0);
  });

  it('leaves the point of a family where it is and corrects the period alone', () => {
    // Every circle of x'' = −x has period 2π.
    const { orbit } = converged(flowOf({ x: 'y', y: '-x' }, 'x'), Float64Array.of(0, 0.7), 6.2832);
    expect(orbit.nodes[0]![1]).toBe(0.7);
    expect(Math.abs(orbit.period - 2 * Math.PI)).toBeLessThan(2e-15);
    expect(orbit.freeDirections).toBe(1);
  });

  it.each([0.5, 0.9, 0.99])('finds the period 2π of a Kepler orbit of eccentricity %d and all its units', (e) => {
    const start = Float64Array.of(1 - e, 0, 0, Math.sqrt((1 + e) / (1 - e)));
    const { orbit } = converged(keplerFlow('y'), start, 2 * Math.PI);
    // The speed at the pericentre is rounded by half an ulp: the period changes by 3 ulp v²a of 2π, (1 + e)/(1 − e) = v².
    const rounding = 20 * Number.EPSILON * ((1 + e) / (1 - e));
    expect(Math.abs(orbit.period / (2 * Math.PI) - 1)).toBeLessThan(rounding);
    expect(orbit.freeDirections).toBe(3);
    expect(unitSpace(orbit.relation, orbit.rankCutOff).size).toBe(4);
  });

  it('finds 16 digits of AB from six', () => {
    const { orbit } = converged(lorenzFlow('z - 27'), Float64Array.of(-13.7636, -19.5788, 27), 1.55865);
    // T = 1.558652210716174727567870…, x = −13.763610682134200525014… (computed to 60 digits elsewhere).
    expect(Math.abs(orbit.period - 1.5586522107161747)).toBeLessThan(5e-16);
    expect(Math.abs(orbit.nodes[0]![0]! + 13.763610682134200525)).toBeLessThan(2e-14);
  });

  it('keeps the accuracy of a shot in many segments: three turns of a 12-letter orbit grow 5e11-fold', () => {
    const orbit = loadLorenzOrbits().find(({ code }) => code === 'AAABBABABABB')!;
    const [x, y] = orbit.points[0]!.map(Number);
    const period = Number(orbit.period);
    // The period to 35 digits is 9.2548632989744575117453309198190198 (computed elsewhere).
    expect(period).toBe(9.2548632989744575);
    const { orbit: tripled, sizes } = converged(lorenzFlow('z - 27'), Float64Array.of(x!, y!, 27), 3 * period);
    expect(tripled.plan.length).toBeGreaterThan(3);
    expect(Math.abs(tripled.period / (3 * period) - 1)).toBeLessThan(1e-15);
    expect(Math.abs(tripled.nodes[0]![0]! - x!)).toBeLessThan(2e-14 * sizes[0]!);
    const pieces = tripled.segments.flatMap((segment) => segment.pieces.map((piece) => scaleMatrix(piece, sizes)));
    const [unstable, neutral, stable] = floquetMultipliers(pieces, 3)!.map(({ logModulus }) => logModulus);
    const [first, second] = orbit.logAbsMultipliers.map(Number);
    expect(Math.abs(unstable! - 3 * first!)).toBeLessThan(1e-9);
    expect(Math.abs(neutral!)).toBeLessThan(1e-9);
    expect(Math.abs(stable! - 3 * second!)).toBeLessThan(1e-9);
    expect(Math.abs(unstable! + neutral! + stable! - tripled.divergenceIntegral)).toBeLessThan(1e-9);
  });

  it('does not take an equilibrium for an orbit', () => {
    const vdp = flowOf({ x: 'y', y: '(1 - x^2)*y - x' }, '-y');
    expect(correct(vdp, Float64Array.of(3, 0), 6.66).orbit.converged).toBe(false);
  });

  it('gives up where a torus is filled by orbits that never close', () => {
    // Frequencies 1 and the golden mean; after 8 turns the second angle misses by 0.35.
    const w = (1 + Math.sqrt(5)) / 2;
    const torus = flowOf(
      {
        x: '-y + x*(1 - x^2 - y^2)',
        y: 'x + y*(1 - x^2 - y^2)',
        u: `-${w}*v + u*(1 - u^2 - v^2)`,
        v: `${w}*u + v*(1 - u^2 - v^2)`,
      },
      'y',
    );
    expect(correct(torus, Float64Array.of(1, 0, 0.6, 0.8), 16 * Math.PI).orbit.converged).toBe(false);
  });

  it('says what stopped it', () => {
    const flow = lorenzFlow('z - 27');
    const sizes = Float64Array.of(30, 40, 30);
    const options = { flow, ...AB, stepEnds: [AB.period], sizes, moduli: [null, null, null], maxSteps: 10 };
    const orbit = correctOrbit(options);
    expect(orbit.converged || orbit.failure?.reason).toBe('too-many-steps');
  });
});
