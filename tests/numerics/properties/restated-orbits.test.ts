import fc from 'fast-check';
import type { CheckReport } from '@/schemas/generated/contract';
import { checkBody } from '@/tests/reference/check-body';
import { loadCases } from '@/tests/reference/load-cases';
import { loadLorenzOrbits } from '@/tests/reference/load-orbits';
import { lorenzBody } from '@/tests/reference/orbit-body';
import { StatedOrbit } from './stated-orbit';

type Orbit = CheckReport['orbit'] & object;
type Complex = readonly [re: number, im: number];

/** Larger systems take long to compile, and every statement is another formula. */
const LARGEST = 6;
const orbits = loadCases()
  .filter(({ expect: { verdict }, system: { variables } }) => verdict === 'accept' && variables.length <= LARGEST)
  .map((reference) => ({ id: reference.id, orbit: StatedOrbit.of(reference) }));
const orbit = fc.constantFrom(...orbits);

/** Nodes may miss by 1e-12 + 100 eps ‖M_i‖ with ‖M_i‖ < 1e3; two orbits are compared. */
const PERIOD = 2 * (1e-12 + 100 * Number.EPSILON * 1e3);
/** What is promised of multipliers, twice. */
const MULTIPLIER = 2e-8;
/** Largest growth over a period that is promised to be followed. */
const GROWTH = 1e12;

const known = new Map<string, CheckReport>();

/** What is said about an orbit as the table states it. */
function plainReport({ id, orbit: stated }: (typeof orbits)[number]): CheckReport {
  const report = known.get(id) ?? stated.report();
  known.set(id, report);
  return report;
}

const multipliersOf = ({ multipliers }: Orbit): Complex[] => multipliers.map(({ re, im }) => [Number(re), Number(im)]);

/** Lay one list of multipliers on another: where moduli are equal, rounding orders them. */
function expectMultipliers(found: readonly Complex[], others: readonly Complex[]): void {
  const left = [...found];
  expect(left).toHaveLength(others.length);
  for (const [re, im] of others) {
    const misses = left.map(([a, b]) => Math.hypot(a - re, b - im));
    const nearest = misses.indexOf(Math.min(...misses));
    expect(misses[nearest]! / Math.hypot(re, im)).toBeLessThanOrEqual(MULTIPLIER);
    left.splice(nearest, 1);
  }
}

/** That two reports say the same of one orbit, whatever its axes. */
function expectSame(found: CheckReport, other: CheckReport, timeUnit = 1): void {
  const told = ({ verdict, findings, correction, orbit: of }: CheckReport) => ({
    verdict,
    findings: findings.map(({ code, severity }) => `${severity} ${code}`),
    freeDirections: correction!.freeDirections,
    returns: of!.returns,
    prime: of!.prime,
    unitMultipliers: of!.unitMultipliers,
    unstableDirections: of!.unstableDirections,
    stability: of!.stability,
    isHamiltonian: of!.selfCheck.pairing !== null,
  });
  expect(told(found)).toEqual(told(other));
  expect(Math.abs((Number(found.orbit!.period) * timeUnit) / Number(other.orbit!.period) - 1)).toBeLessThan(PERIOD);
  expectMultipliers(multipliersOf(found.orbit!), multipliersOf(other.orbit!));
}

/** That what is measured in sizes of the orbit is the same too: no unit is left in it. */
function expectSameSizes(found: CheckReport, other: CheckReport): void {
  // Each run ends as far off as the digits of its statement and rounding let expect.
  const slack = found.expectedClosure! + other.expectedClosure!;
  expect(Math.abs(found.closure!.relative - other.closure!.relative)).toBeLessThanOrEqual(slack);
  const [cosine, expected] = [found, other].map(({ orbit: of }) => of!.smallestTransversality);
  expect(Math.abs(cosine! - expected!)).toBeLessThan(1e-9);
}

/** Other formulas with the same zeros, rising on the same side. */
const sameSurface: ((u: string, name: string) => string)[] = [
  (u) => `1000*(${u})`,
  (u) => `(${u})/3`,
  (u, name) => `(${u})*(1 + ${name}^2)`,
  (u, name) => `(${u})*(2 + sin(${name}))`,
  (u, name) => `(${u})/(2 + cos(3*${name}))`,
  (u) => `(${u}) + (${u})^3`,
  (u) => `2*(${u}) - sin(${u})`,
];

describe('the check of an orbit', () => {
  it('says the same in whatever units', () => {
    const unit = fc.integer({ min: -300, max: 300 }).map((n) => Number((10 ** (n / 100)).toPrecision(6)));
    const units = fc.array(unit, { minLength: LARGEST, maxLength: LARGEST });
    fc.assert(
      fc.property(orbit, units, unit, (chosen, scales, timeUnit) => {
        const restated = chosen.orbit.inUnits(scales, timeUnit).report();
        expectSame(restated, plainReport(chosen), timeUnit);
        expectSameSizes(restated, plainReport(chosen));
      }),
      { numRuns: 60, seed: 31 },
    );
  });

  it('says the same in axes that are turned', () => {
    fc.assert(
      fc.property(orbit, fc.nat(), fc.nat(), fc.integer({ min: 1, max: 628 }), (chosen, i, j, angle) => {
        const n = chosen.orbit.statement.variables.length;
        const first = i % n;
        const second = (first + 1 + (j % (n - 1))) % n;
        expectSame(chosen.orbit.turned([first, second], angle / 100).report(), plainReport(chosen));
      }),
      { numRuns: 40, seed: 32 },
    );
  });

  it('says the same whatever the names are and however the variables are ordered', () => {
    const names = [
      'a',
      'Q7',
      'e',
      'x_1',
      'y2x',
      'Beta',
      'constructor',
      'toString',
      'i',
      'E',
      'x',
      'y',
      'z',
      '__proto__x',
    ].slice(0, 13);
    const order = Array.from({ length: LARGEST }, (_, i) => i);
    fc.assert(
      fc.property(
        orbit,
        fc.shuffledSubarray(names, { minLength: 13 }),
        fc.shuffledSubarray(order, { minLength: LARGEST }),
        (chosen, others, places) => {
          const n = chosen.orbit.statement.variables.length;
          const restated = chosen.orbit
            .renamed(
              others,
              places.filter((place) => place < n),
            )
            .report();
          expectSame(restated, plainReport(chosen));
          expectSameSizes(restated, plainReport(chosen));
        },
      ),
      { numRuns: 40, seed: 33 },
    );
  });

  it('says the same of a section that is written otherwise', () => {
    fc.assert(
      fc.property(orbit, fc.constantFrom(...sameSurface), fc.nat(), (chosen, restate, place) => {
        const { variables } = chosen.orbit.statement;
        const formula = restate(chosen.orbit.formula, variables[place % variables.length]!);
        const restated = chosen.orbit.with({ section: { formula } }).report();
        expectSame(restated, plainReport(chosen));
        expectSameSizes(restated, plainReport(chosen));
      }),
      { numRuns: 60, seed: 34 },
    );
  });

  it('says the same from another crossing', () => {
    const several = orbits.filter((chosen) => plainReport(chosen).orbit!.returns > 1);
    fc.assert(
      fc.property(fc.constantFrom(...several), fc.nat(), (chosen, place) => {
        const { crossings } = plainReport(chosen).orbit!;
        const { point } = crossings[place % crossings.length]!;
        expectSame(chosen.orbit.with({ point: point.map(Number) }).report(), plainReport(chosen));
      }),
      { numRuns: 40, seed: 35 },
    );
  });

  it('says the same of the orbit run backwards, with the multipliers inverted', () => {
    const followed = orbits.filter((chosen) => {
      const { exponents, period } = plainReport(chosen).orbit!;
      return exponents.every((exponent) => exponent * Number(period) > -Math.log(GROWTH));
    });
    fc.assert(
      fc.property(fc.constantFrom(...followed), (chosen) => {
        const plain = plainReport(chosen).orbit!;
        const { verdict, orbit: back } = chosen.orbit.reversed().report();
        expect(verdict).toMatch(/^closes/);
        expect(back!.returns).toBe(plain.returns);
        expect(Math.abs(Number(back!.period) / Number(plain.period) - 1)).toBeLessThan(PERIOD);
        const inverted = multipliersOf(plain).map(([re, im]): Complex => [
          re / (re * re + im * im),
          -im / (re * re + im * im),
        ]);
        expectMultipliers(multipliersOf(back!), inverted);
        const times = (of: Orbit): number[] => of.crossings.map(({ returnTime }) => Number(returnTime));
        times(back!)
          .reverse()
          .forEach((time, i) => {
            expect(Math.abs(time - times(plain)[i]!)).toBeLessThan(
              (PERIOD * Number(plain.period)) / plain.smallestTransversality,
            );
          });
      }),
      { numRuns: 40, seed: 36 },
    );
  });
});

describe('an itinerary', () => {
  it('is the same from whatever crossing the orbit starts', () => {
    const lines = loadLorenzOrbits();
    fc.assert(
      fc.property(fc.constantFrom(...lines), fc.nat(), (line, place) => {
        const { points, times, code } = line;
        const start = place % points.length;
        const body = lorenzBody({
          ...line,
          points: [points[start]!],
          times: [...times.slice(start), ...times.slice(0, start)],
        });
        const { report } = checkBody(body);
        expect([report!.findings, report!.orbit!.itinerary]).toEqual([[], code]);
      }),
      { numRuns: 40, seed: 37 },
    );
  });
});
