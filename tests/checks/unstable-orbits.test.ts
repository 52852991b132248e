import type { CheckReport } from '@/schemas/generated/contract';
import { checkOrbit } from '@/server/checks/check-orbit';
import { type ClaimBody, readClaim } from '@/server/checks/read-claim';
import forty from '@/tests/reference/lorenz-40.json';
import { loadLorenzOrbits } from '@/tests/reference/load-orbits';
import { roundDecimal } from '@/tests/reference/round-decimal';
import { lorenz, LORENZ_AB, systemOf } from './claims';

const check = (claim: ClaimBody): CheckReport => checkOrbit({ system: lorenz, claim });
const codesOf = ({ findings }: CheckReport) => findings.map(({ code }) => code);

const LETTERS = 40;

/** The orbit of 40 letters, from its first point alone or from all, to a number of digits. */
function statedTo(digits: number, { withPoints }: { withPoints: boolean }): ClaimBody {
  const round = (text: string) => roundDecimal(text, digits);
  const points = forty.points.map(([x, y]) => [round(x!), round(y!), '27']);
  return {
    section: 'z-27',
    point: points[0]!,
    ...(withPoints && { points: points.slice(1) }),
    period: round(forty.period),
    returns: LETTERS,
    itinerary: forty.word,
  };
}

/** Largest error of a crossing, in units of the orbit's extent. */
function worstError({ orbit }: CheckReport): number {
  const errors = orbit!.crossings.flatMap(({ point }, i) => {
    return forty.points[(i + 1) % LETTERS]!.map((value, axis) => {
      const [low, high] = orbit!.extent[axis]!;
      return Math.abs(Number(point[axis]) - Number(value)) / (high! - low!);
    });
  });
  return Math.max(...errors);
}

/** Nothing better than this is asked of any crossing: 2e-14 of the extent. */
const NODE_ERROR = 2e-14;

describe('an orbit that grows 1.6e12-fold', () => {
  it.each([
    ['one point to 17 digits', 17, false],
    ['one point to 15 digits', 15, false],
    ['all its points to 17 digits', 17, true],
    ['all its points to 12 digits', 12, true],
  ])('is found from %s, every crossing as good as doubles are', (_, digits, withPoints) => {
    const report = check(statedTo(digits, { withPoints }));
    expect(report.verdict).toBe('closes-after-correction');
    expect(report.findings).toEqual([]);
    expect(report.closure!.relative).toBeGreaterThan(1e-4);
    expect(worstError(report)).toBeLessThan(NODE_ERROR);
    const orbit = report.orbit!;
    // One ulp of the period is 3.6e-15; it is a sum of segments, each with its own rounding.
    expect(Math.abs(Number(orbit.period) - Number(forty.period))).toBeLessThan(1e-14);
    expect(orbit.returns).toBe(LETTERS);
    const [unstable, stable] = orbit.multipliers.map(({ re }) => re);
    expect(Math.abs(Math.log(Number(unstable)) - Number(forty.logMultiplier))).toBeLessThan(1e-11);
    // Liouville: log of the stable one is −41/3 T minus that of the unstable one.
    const logStable = (-41 / 3) * Number(forty.period) - Number(forty.logMultiplier);
    expect(Math.abs(Math.log(Number(stable)) - logStable)).toBeLessThan(1e-10);
    expect(Math.abs(orbit.selfCheck.liouville!)).toBeLessThan(1e-10);
    expect(orbit.selfCheck.flow).toBeLessThan(1e-14);
  });

  it('is told that one point to 13 digits does not identify it, and what would', () => {
    const report = check(statedTo(13, { withPoints: false }));
    expect(report.verdict).toBe('does-not-close');
    expect(report.findings).toEqual([
      expect.objectContaining({ code: 'too-few-digits', severity: 'blocker', limit: 1e-9 }),
    ]);
    expect(report.findings[0]!.message).toMatch(/section point of every return/);
    expect(report.findings[0]!.value).toBeGreaterThan(1);
  });

  it('is not accepted when one of its points is another', () => {
    const claim = statedTo(17, { withPoints: true });
    const points = claim.points!.map((point, k) => (k === 20 ? [point[0]!, '-10', '27'] : point));
    expect(check({ ...claim, points }).verdict).toBe('does-not-close');
  });
});

describe('section points in a claim', () => {
  it('stand for the number of returns where none is stated', () => {
    const { returns: _, ...claim } = LORENZ_AB;
    const points = [
      ['13.763610682134', '19.578751942452', '27'],
      ['-13.763610682134', '-19.578751942452', '27'],
    ];
    expect(codesOf(check({ ...claim, points: points.slice(0, 1) }))).toEqual([]);
    expect(codesOf(check({ ...claim, points }))).toEqual(['returns-differ']);
  });

  it.each([
    [{ returns: 2, points: [] as string[][] }, []],
    [
      {
        returns: 2,
        points: [
          ['1', '2', '3'],
          ['1', '2', '3'],
        ],
      },
      ['/points'],
    ],
    [{ returns: 2, points: [['1', '2']] }, ['/points/0']],
    [{ returns: 2, points: [['1', 'x', '27']] }, ['/points/0/1']],
  ])('%j are refused at %j', (stated, pointers) => {
    const read = readClaim(lorenz, { ...LORENZ_AB, ...stated });
    expect(read.ok ? [] : read.errors.map(({ pointer }) => pointer)).toEqual(pointers);
  });
});

describe('an orbit run through so often that it departs from itself', () => {
  it.each([10, 50, 500])('is recognised as AB, %d times', (turns) => {
    const period = String(1.5586522107161747 * turns);
    const report = check({
      ...LORENZ_AB,
      point: ['-13.763610682134201', '-19.578751942451796', '27'],
      period,
      returns: 2 * turns,
    });
    expect(report.verdict).toBe('closes-after-correction');
    expect(report.findings).toEqual([
      expect.objectContaining({ code: 'period-is-multiple', severity: 'blocker', value: turns, limit: 1 }),
    ]);
    const orbit = report.orbit!;
    expect(orbit.returns).toBe(2 * turns);
    expect(orbit.prime).toBe(false);
    expect(orbit.crossings.at(-1)!.time).toBe(orbit.period);
    // The multiplier of AB is 4.712947273…; its powers soon leave the range of doubles.
    expect(orbit.exponents[0]).toBeCloseTo(Math.log(4.712947273424) / 1.5586522107161747, 11);
    expect(report.suggestion).toMatchObject({ field: 'period', verdict: 'closes' });
    expect(Math.abs(Number(report.suggestion!.value) - 1.5586522107161747)).toBeLessThan(1e-15);
  });

  it('is said to be a multiple, and to want digits, where it is typed with seven', () => {
    const point = ['-13.76361', '-19.57875', '27'];
    const report = check({ section: 'z-27', point, period: '31.17304', returns: 40 });
    expect(report.verdict).toBe('does-not-close');
    expect(codesOf(report)).toEqual(['too-few-digits', 'period-is-multiple']);
  });
});

describe('the same orbit with time turned round', () => {
  const backwards = systemOf({
    name: 'Lorenz, time turned round',
    variables: [{ name: 'x' }, { name: 'y' }, { name: 'z' }],
    parameters: [{ name: 'beta', value: '8/3' }],
    equations: { x: '-10*(y - x)', y: '-(28*x - y - x*z)', z: '-(x*y - beta*z)' },
  });
  const table = loadLorenzOrbits();

  /** A line of the table, run through the other way, from its first point or from all. */
  function turnedRound(code: string, { withPoints }: { withPoints: boolean }): CheckReport {
    const { points, period } = table.find((one) => one.code === code)!;
    const [first, ...others] = [points[0]!, ...points.slice(1).reverse()].map(([x, y]) => [x, y, '27']);
    const claim = {
      ...{ section: { formula: '27 - z' }, point: first!, period, returns: points.length },
      ...(withPoints && { points: others }),
    };
    return checkOrbit({ system: backwards, claim, limits: { maxSteps: 3000 } });
  }

  // What shrank by e^(−∫|div|) grows by as much: 8.4e9, 4.5e14, 4.1e24, 6.7e58.
  it.each([
    ['AB', false],
    ['AAB', false],
    ['AABAB', true],
    ['AAABBABABABB', true],
  ])('%s closes, points stated: %s, and has the inverse multipliers', (code, withPoints) => {
    const { verdict, findings, orbit } = turnedRound(code, { withPoints });
    expect(verdict).toBe('closes-after-correction');
    expect(findings).toEqual([]);
    const { logAbsMultipliers, period } = table.find((one) => one.code === code)!;
    expect(Math.abs(Number(orbit!.period) / Number(period) - 1)).toBeLessThan(1e-14);
    const found = orbit!.multipliers.map(({ re }) => -Math.log(Number(re)));
    const [unstable, stable] = logAbsMultipliers.map(Number);
    expect(Math.abs(found[0]! - stable!)).toBeLessThan(1e-11);
    expect(Math.abs(found[1]! - unstable!)).toBeLessThan(1e-11);
  });

  it('has no closure where its run ends early, and ends so where one point is all there is', () => {
    expect(turnedRound('AABAB', { withPoints: true })).toMatchObject({ closure: null, endPoint: null });
    expect(codesOf(turnedRound('AABAB', { withPoints: false }))).toEqual(['too-long']);
  });
});

describe('an orbit from another of its crossings', () => {
  it.each(['AABAB', 'AAABBABABABB'])('%s is the same', (code) => {
    const { points, period } = loadLorenzOrbits().find((one) => one.code === code)!;
    const reports = [0, 1, 4].map((k) =>
      check({ section: 'z-27', point: [...points[k]!, '27'], period, returns: points.length }),
    );
    const [first, ...others] = reports;
    for (const { verdict, findings, orbit } of others) {
      expect(verdict).toBe(first!.verdict);
      expect(findings).toEqual(first!.findings);
      expect(orbit!.itinerary).toBe(code);
      expect(Math.abs(Number(orbit!.period) / Number(period) - 1)).toBeLessThan(1e-14);
      orbit!.exponents.forEach((exponent, i) => {
        expect(Math.abs(exponent - first!.orbit!.exponents[i]!)).toBeLessThan(1e-11);
      });
    }
  });
});
