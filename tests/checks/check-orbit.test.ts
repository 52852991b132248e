import type { CheckReport } from '@/schemas/generated/contract';
import { checkOrbit, type CheckOptions } from '@/server/checks/check-orbit';
import type { CheckProgress } from '@/server/checks/check-progress';
import { type ClaimBody, readClaim } from '@/server/checks/read-claim';
import { createSectionWatch } from '@/server/numerics/section/create-section-watch';
import type { TaylorStep } from '@/server/numerics/taylor/flow';
import { validatorOf } from '@/server/schema-registry';
import { builtInSystems } from '@/server/systems/built-in-systems';
import { lorenz, LORENZ_AB, planar, systemOf } from './claims';

const check = (claim: Partial<ClaimBody>, more: Partial<CheckOptions> = {}): CheckReport =>
  checkOrbit({ system: lorenz, claim: { ...LORENZ_AB, ...claim }, ...more });

const codesOf = ({ findings }: CheckReport) => findings.map(({ code }) => code);

/** r' = r (1 − r²), φ' = 1: the unit circle is the cycle, period 2π, multiplier exp(−4π). */
const hopf = planar('x - y - x*(x^2 + y^2)', 'x + y - y*(x^2 + y^2)');
const TURN = '6.283185307179586';
const HOPF: ClaimBody = { section: { formula: 'y' }, point: ['1', '0'], period: TURN };

describe('a report', () => {
  it.each([
    ['an orbit that closes', {}],
    ['one that does not', { period: '1.6' }],
    ['a point off the section', { point: ['-13', '-19', '28'] }],
    ['an equilibrium', { point: ['8.485281374238570', '8.485281374238570', '27'] }],
  ])('of %s has the shape that is promised', (_, claim) => {
    const validate = validatorOf('check-report');
    expect(validate(check(claim)) ? [] : validate.errors).toEqual([]);
  });

  it('is the same every time, the clock apart', () => {
    const { engine: first, ...one } = check({});
    const { engine: second, ...two } = check({});
    expect(one).toEqual(two);
    expect(first.steps).toBe(second.steps);
  });

  it('gives the period of AB to all digits of a double, and the itinerary', () => {
    const { orbit, verdict, digits } = check({});
    expect(verdict).toBe('closes');
    // T = 1.558652210716174727567870… (34-digit value); one ulp is 2.2e-16.
    expect(Math.abs(Number(orbit!.period) - 1.5586522107161747)).toBeLessThan(5e-16);
    expect(orbit).toMatchObject({
      returns: 2,
      prime: true,
      itinerary: 'AB',
      stability: 'saddle',
      unstableDirections: 1,
    });
    expect(digits!.typed).toBe(13);
  });

  it('finds the half-period crossing of AB at T/2, at the image of the start', () => {
    const { crossings, point } = check({}).orbit!;
    // AB is its own image under (−x, −y, z), so the first return is exactly half-way.
    expect(Math.abs(Number(crossings[0]!.time) - Number(crossings[1]!.time) / 2)).toBeLessThan(2e-15);
    expect(Math.abs(Number(crossings[0]!.point[0]) + Number(point[0]))).toBeLessThan(1e-13);
    expect(crossings[1]!.point).toEqual(point);
  });
});

describe('the verdict', () => {
  it('is closes-after-correction where instability alone spreads the digits', () => {
    // AABAB has the multiplier 44: seven digits are right to 5e-7 of the extent, and the end misses 2e-6.
    const unstable = {
      section: 'z-27',
      point: ['-12.69894', '-17.1975', '27'],
      period: '3.869539',
      tolerance: '1e-6',
    };
    const { verdict, closure, correction, findings } = check({ ...unstable, returns: 5 });
    expect(closure!.relative).toBeGreaterThan(1e-6);
    expect(correction!.shift).toBeLessThan(1e-6);
    expect(correction!.periodShift).toBeLessThan(1e-6);
    expect(verdict).toBe('closes-after-correction');
    expect(findings).toEqual([]);
  });

  it('is does-not-close with a tighter tolerance, for want of digits', () => {
    const report = check({ point: ['-12.69894', '-17.1975', '27'], period: '3.869539', returns: 5 });
    expect(report.verdict).toBe('does-not-close');
    expect(codesOf(report)).toEqual(['too-few-digits']);
    expect(report.findings[0]!.message).toMatch(/8 decimal places/);
    expect(report.orbit!.itinerary).toBe('AABAB');
  });

  it('takes a number without a decimal point, or a fraction, for exact', () => {
    const near = (x: string, period = TURN) =>
      checkOrbit({ system: hopf, claim: { ...HOPF, point: [x, '0'], period } });
    // The cycle has radius 1: 2 and 3/2 are simply other points, 1.1 may be meant.
    expect(codesOf(near('2'))).toEqual(['orbit-nearby']);
    expect(codesOf(near('3/2'))).toEqual(['orbit-nearby']);
    expect(codesOf(near('1.1'))).toEqual(['too-few-digits']);
    expect(codesOf(near('1', '6.3'))).toEqual(['too-few-digits']);
    expect(codesOf(near('1', '63/10'))).toEqual(['orbit-nearby']);
  });

  it('is inconclusive when the steps run out, and when it is stopped', () => {
    const short = check({}, { limits: { maxSteps: 20 } });
    expect(short.verdict).toBe('inconclusive');
    expect(short.findings[0]).toMatchObject({ code: 'too-long', severity: 'blocker', limit: 20 });
    let asked = 0;
    const stopped = check({}, { shouldStop: () => (asked += 1) > 100 });
    expect(stopped.verdict).toBe('inconclusive');
    expect(codesOf(stopped)).toEqual(['too-long']);
  });
});

describe('suggestions, each tried', () => {
  it('offer the period with two digits exchanged', () => {
    const { suggestion, verdict } = check({ period: '1.5568522107161747' });
    expect(verdict).toBe('does-not-close');
    expect(suggestion).toEqual({ field: 'period', value: '1.5586522107161747', verdict: 'closes' });
  });

  it('offer the corrected period', () => {
    const { suggestion } = check({ period: '1.55865224' });
    expect(suggestion).toMatchObject({ field: 'period', verdict: 'closes' });
    expect(Number(suggestion!.value)).toBeCloseTo(1.5586522107161747, 13);
  });

  it('offer the section turned round, and the prime period', () => {
    expect(check({ section: { formula: '27 - z' } }).suggestion).toEqual({
      field: 'section',
      value: '-(27 - z)',
      verdict: 'closes',
    });
    const twice = checkOrbit({ system: hopf, claim: { ...HOPF, period: '12.566370614359172' } });
    expect(codesOf(twice)).toEqual(['period-is-multiple']);
    expect(Number(twice.suggestion!.value)).toBeCloseTo(2 * Math.PI, 14);
  });
});

/** Highest point of AB. */
const TOP = 39.823466120761275;

/** AB from where it first rises through the section. */
function grazing(formula: string): CheckReport {
  const section = { formula };
  const read = readClaim(lorenz, { ...LORENZ_AB, section });
  if (!read.ok) throw new Error(read.errors[0]!.message);
  const { flow } = read.claim;
  const watch = createSectionWatch(3);
  watch.begin({ time: 0, timeLow: 0, onSection: false });
  const start = Float64Array.of(-13.763610682134201, -19.578751942451796, 27);
  const onStep = (step: TaylorStep) => watch.onStep(step);
  flow.integrate({ start, duration: 1.5586522107161747, variations: false, maxSteps: 1000, onStep });
  const point = Array.from(watch.zeros.find(({ direction }) => direction === 1)!.state, String);
  return check({ section, point });
}

describe('the section', () => {
  it('is off when the point is, and the orbit may still close', () => {
    const report = check({ point: ['-13.763610682134', '-19.578751942452', '27.1'] });
    expect(report.findings[0]).toMatchObject({ code: 'point-off-section', severity: 'blocker' });
  });

  it('is reached within the digits as typed', () => {
    const claim = { section: { formula: 'x^2 + y^2 - 3*x + 2' }, point: ['1.0', '0.0'], period: TURN };
    expect(codesOf(checkOrbit({ system: hopf, claim }))).not.toContain('point-off-section');
  });

  it.each([
    [1e-4, []],
    [1e-9, ['near-tangent-crossing']],
    // The flow runs along the section here, so that Newton's condition to stay on it is singular as well.
    [1e-14, ['not-converged', 'tangent-crossing']],
  ])('is grazed by AB where its plane lies %d below the highest point', (gap, codes) => {
    expect(codesOf(grazing(`z - ${String(TOP - gap)}`))).toEqual(codes);
  });

  it.each([
    [1e-4, []],
    [1e-9, ['near-tangent-crossing']],
  ])('is nearly missed by AB where a second sheet lies %d above the highest point', (gap, codes) => {
    const report = grazing(`(z - 27)*(${String(TOP + gap)} - z)`);
    expect(codesOf(report)).toEqual(codes);
    expect(report.orbit!.returns).toBe(2);
  });

  it('is never met again', () => {
    const report = checkOrbit({ system: planar('1', '0.5'), claim: { ...HOPF, point: ['1', '0'], period: '5' } });
    expect(codesOf(report)).toEqual(['no-return', 'escapes']);
  });
});

describe('claims', () => {
  it('of an itinerary are compared up to rotation', () => {
    expect(check({ itinerary: 'BA' }).findings).toEqual([]);
    expect(check({ itinerary: 'AA' }).findings[0]).toMatchObject({ code: 'itinerary-differs', severity: 'warning' });
  });

  it('of returns, return times and multipliers are compared to their digits', () => {
    expect(check({ returns: 3 }).findings[0]).toMatchObject({ code: 'returns-differ', value: 2, limit: 3 });
    expect(check({ returnTimes: ['0.7793', '0.7793'] }).findings).toEqual([]);
    expect(codesOf(check({ returnTimes: ['0.7783', '0.7803'] }))).toEqual(['return-times-differ']);
    expect(check({ multipliers: ['4.713', '0'] }).findings).toEqual([]);
    expect(check({ multipliers: ['4.7129472734', '1', '1.19e-10'] }).findings).toEqual([]);
    expect(codesOf(check({ multipliers: ['4.72'] }))).toEqual(['multipliers-differ']);
    expect(codesOf(check({ multipliers: [{ re: '4.713', im: '0.1' }] }))).toEqual(['multipliers-differ']);
  });

  it('of invariants that are none are noticed', () => {
    const system = systemOf({
      name: 'false invariant',
      variables: [{ name: 'x' }, { name: 'y' }],
      parameters: [],
      equations: { x: '-y', y: 'x' },
      invariants: [
        { name: 'radius', formula: 'x^2 + y^2' },
        { name: 'height', formula: 'x' },
      ],
    });
    const claim = { section: { formula: 'y*(x^2 - 1/4)' }, point: ['1', '0'], period: TURN };
    const report = checkOrbit({ system, claim });
    expect(report.findings.filter(({ code }) => code === 'invariant-drifts')).toHaveLength(1);
    expect(report.orbit!.invariants[0]).toMatchObject({ name: 'radius', value: '1' });
    expect(report.orbit!.invariants[0]!.drift).toBeLessThan(1e-14);
  });
});

describe('angles', () => {
  const duffing = systemOf(builtInSystems.find(({ slug }) => slug === 'duffing')!);

  it('close to the nearest turn, which is counted', () => {
    // θ' = 2, r' = r (1 − r) on a cylinder: after π the angle has made one turn of 2π.
    const system = systemOf({
      name: 'cylinder',
      variables: [{ name: 'theta', modulus: '2*pi' }, { name: 'r' }],
      parameters: [],
      equations: { theta: '2', r: 'r*(1 - r) + 0.1*sin(theta)*(r - 1)' },
    });
    const claim = { section: { formula: 'sin(theta)' }, point: ['0', '1'], period: '3.141592653589793' };
    const report = checkOrbit({ system, claim });
    expect(report.verdict).toBe('closes');
    expect(report.orbit!.winding).toEqual([1, null]);
    // The multiplier is exp(∫ 1 − 2r + 0.1 sin 2t dt) over π at r = 1: exp(−π).
    expect(Math.abs(Number(report.orbit!.multipliers[0]!.re) / Math.exp(-Math.PI) - 1)).toBeLessThan(1e-13);
    expect(report.findings).toEqual([]);
  });

  it('are declared by a built-in system', () => {
    expect(duffing.variables.some(({ modulus }) => modulus !== null)).toBe(true);
  });
});

describe('progress', () => {
  it('tells the phases in order, with counts that only grow', () => {
    const seen: CheckProgress[] = [];
    check({}, { onProgress: (progress) => seen.push(progress) });
    const phases = seen.map(({ phase }) => phase);
    expect([...new Set(phases)]).toEqual(['integrating', 'correcting', 'measuring']);
    expect(seen.at(-1)).toMatchObject({ returns: 2, period: 1.5586522107161747 });
  });
});

describe('an unreadable claim', () => {
  it('is misuse', () => {
    expect(() => check({ period: '-1' })).toThrow(RangeError);
  });
});
