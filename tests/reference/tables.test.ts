import { checkOrbit } from '@/server/checks/check-orbit';
import { builtInSystems } from '@/server/systems/built-in-systems';
import { soundSystem } from '@/tests/reference/check-body';
import { loadLorenzOrbits, loadRosslerOrbits, type SectionOrbit } from '@/tests/reference/load-orbits';
import { lorenzBody, rosslerBody } from '@/tests/reference/orbit-body';

/** What is asked of every orbit of the tables. */
const PERIOD = 1e-12;
const MULTIPLIER = 1e-8;
/** Smallest multipliers reach 1e-99; their logarithm is right to the rounding of some hundred steps. */
const LOGARITHM = 1e-8;

const systemOf = (slug: string) => soundSystem(builtInSystems.find((system) => system.slug === slug)!);

function groups(orbits: SectionOrbit[]): Map<string, SectionOrbit[]> {
  const byReturns = new Map<string, SectionOrbit[]>();
  for (const orbit of orbits) byReturns.set(orbit.n, [...(byReturns.get(orbit.n) ?? []), orbit]);
  return byReturns;
}

function expectOrbit(orbit: SectionOrbit, report: ReturnType<typeof checkOrbit>): void {
  expect(report.findings).toEqual([]);
  expect(report.verdict).toBe('closes');
  const found = report.orbit!;
  const period = Number(orbit.period);
  expect(found.returns).toBe(Number(orbit.n));
  expect(Math.abs(Number(found.period) - period)).toBeLessThan(PERIOD * period);
  const [unstable, stable] = found.multipliers.map(({ re, im }) => ({ re: Number(re), im: Number(im) }));
  const expected = Number(orbit.signs[0]) * Math.exp(Number(orbit.logAbsMultipliers[0]));
  expect(unstable!.im).toBe(0);
  expect(Math.abs(unstable!.re / expected - 1)).toBeLessThan(MULTIPLIER);
  expect(Math.sign(stable!.re)).toBe(Number(orbit.signs[1]));
  expect(Math.abs(Math.log(Math.abs(stable!.re)) - Number(orbit.logAbsMultipliers[1]))).toBeLessThan(LOGARITHM);
  found.crossings.forEach(({ returnTime }, i) => {
    expect(Math.abs(Number(returnTime) - Number(orbit.times[i]))).toBeLessThan(PERIOD * period);
  });
}

describe('the Lorenz table', () => {
  const system = systemOf('lorenz');
  const byReturns = groups(loadLorenzOrbits());

  it.each([...byReturns])('verifies every orbit of %s returns, itinerary and all', (_, orbits) => {
    for (const orbit of orbits) {
      const report = checkOrbit({ system, claim: lorenzBody(orbit) });
      expectOrbit(orbit, report);
      expect(report.orbit!.itinerary).toBe(orbit.code);
    }
  });

  it('holds 745 orbits', () => {
    expect([...byReturns.values()].flat()).toHaveLength(745);
  });
});

describe('the Rössler table', () => {
  const system = systemOf('rossler');
  const byReturns = groups(loadRosslerOrbits());

  it.each([...byReturns])('verifies every orbit of %s returns', (_, orbits) => {
    for (const orbit of orbits) expectOrbit(orbit, checkOrbit({ system, claim: rosslerBody(orbit) }));
  });

  it('holds 106 orbits', () => {
    expect([...byReturns.values()].flat()).toHaveLength(106);
  });
});
