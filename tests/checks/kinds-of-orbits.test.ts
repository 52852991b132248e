import type { CheckReport, SystemDocument } from '@/schemas/generated/contract';
import { checkOrbit } from '@/server/checks/check-orbit';
import type { ClaimBody } from '@/server/checks/read-claim';
import { systemOf } from './claims';

const TURN = '6.283185307179586';
const codesOf = ({ findings }: CheckReport) => findings.map(({ code }) => code);

const documentOf = (equations: Record<string, string>): SystemDocument => ({
  name: 'closed form',
  variables: Object.keys(equations).map((name) => ({ name })),
  parameters: [],
  equations,
});

const check = (equations: Record<string, string>, claim: ClaimBody, more: Partial<SystemDocument> = {}): CheckReport =>
  checkOrbit({ system: systemOf({ ...documentOf(equations), ...more }), claim });

/** Growth and turning rates of seven pairs beside a cycle of period 2π: two pairs of one modulus at each end. */
const PAIRS = [
  [2, 0.3],
  [2, 0.7],
  [0.25, 0.4],
  [0, 0.15],
  [-1, 0.6],
  [-3, 0.2],
  [-3, 0.45],
] as const;

/** 16 variables: the unit circle attracts in (x, y); every pair turns and grows at its rates, driven by the one before. */
function sixteen(): Record<string, string> {
  const pairs = PAIRS.flatMap(([a, b], k) => {
    const before = k === 0 ? '(x^2 + y^2 - 1)' : `u${k - 1}`;
    return [
      [`u${k}`, `${a}*u${k} - ${b}*v${k} + ${before}`],
      [`v${k}`, `${b}*u${k} + ${a}*v${k}`],
    ];
  });
  return {
    x: 'x - y - x*(x^2 + y^2)',
    y: 'x + y - y*(x^2 + y^2)',
    ...(Object.fromEntries(pairs) as Record<string, string>),
  };
}

describe('an orbit in sixteen dimensions', () => {
  const report = check(sixteen(), {
    section: { formula: 'y + u3' },
    point: ['1', ...Array<string>(15).fill('0')],
    period: TURN,
  });

  it('closes and returns once', () => {
    expect(report.verdict).toBe('closes');
    expect(report.findings).toEqual([]);
    expect(report.orbit!.returns).toBe(1);
    expect(Math.abs(Number(report.orbit!.period) - 2 * Math.PI)).toBeLessThan(2e-15);
  });

  it('has all its multipliers: pairs of one modulus, 2.9e5 and 6.5e-9, and a pair on the circle', () => {
    const found = report.orbit!.multipliers.map(({ re, im }) => ({ re: Number(re), im: Number(im) }));
    const expected = [
      ...PAIRS.flatMap(([a, b]) => {
        const modulus = Math.exp(2 * Math.PI * a);
        const [re, im] = [modulus * Math.cos(2 * Math.PI * b), modulus * Math.sin(2 * Math.PI * b)];
        return [
          { re, im },
          { re, im: -im },
        ];
      }),
      { re: Math.exp(-4 * Math.PI), im: 0 },
    ];
    expect(found).toHaveLength(15);
    for (const { re, im } of expected) {
      const distances = found.map((one) => Math.hypot(one.re - re, one.im - im) / Math.hypot(re, im));
      // Rounding of about 50 pieces with couplings of 1, for moduli 14 decades apart.
      expect(Math.min(...distances)).toBeLessThan(1e-11);
    }
    expect(report.orbit!.unstableDirections).toBe(6);
    expect(Math.abs(report.orbit!.selfCheck.liouville!)).toBeLessThan(1e-12);
  });
});

describe('multipliers beyond the range of doubles', () => {
  it('are written out, and their exponents are right', () => {
    // z grows by e^(400·2π) = 10^1091.50…, w shrinks by as much.
    const report = check(
      { x: 'x - y - x*(x^2 + y^2)', y: 'x + y - y*(x^2 + y^2)', z: '400*z + w', w: '-400*w' },
      { section: { formula: 'y' }, point: ['1', '0', '0', '0'], period: TURN },
    );
    const [largest, , smallest] = report.orbit!.multipliers.map(({ re }) => re.split('e').map(Number));
    const power = (800 * Math.PI) / Math.LN10;
    expect(largest![1]).toBe(1091);
    expect(smallest![1]).toBe(-1092);
    expect(Math.log10(largest![0]!) + 1091).toBeCloseTo(power, 9);
    expect(Math.log10(smallest![0]!) - 1092).toBeCloseTo(-power, 9);
    expect(report.orbit!.exponents[0]).toBeCloseTo(400, 10);
    expect(report.orbit!.exponents[2]).toBeCloseTo(-400, 10);
    expect(report.orbit!.stability).toBe('saddle');
  });
});

describe('a forced oscillator', () => {
  // x'' + x'/2 + x = cos θ, θ' = 1: the answer is x = 2 sin θ, and T can be nothing but 2π.
  const forced = { theta: '1', x: 'v', v: 'cos(theta) - v/2 - x' };
  const variables = [{ name: 'theta', modulus: '2*pi' }, { name: 'x' }, { name: 'v' }];
  const claim: ClaimBody = { section: { formula: 'sin(theta)' }, point: ['0', '0', '2'], period: TURN };

  it('closes modulo its phase, keeps its period and counts the turn', () => {
    const report = check(forced, claim, { variables });
    expect(report.verdict).toBe('closes');
    expect(report.findings).toEqual([]);
    expect(report.correction!.periodShift).toBe(0);
    expect(report.orbit!.winding).toEqual([1, null, null]);
    expect(report.orbit!.returns).toBe(1);
    // λ = exp(2π (−1/4 ± i √15/4)).
    const modulus = Math.exp(-Math.PI / 2);
    expect(Number(report.orbit!.multipliers[0]!.re)).toBeCloseTo(modulus * Math.cos((Math.PI * Math.sqrt(15)) / 2), 13);
  });

  it('is corrected in its point alone', () => {
    const report = check(forced, { ...claim, point: ['0', '0.001', '1.999'], tolerance: '1e-4' }, { variables });
    expect(report.findings.map(({ code }) => code)).toEqual(['too-few-digits']);
    const [theta, x, v] = report.orbit!.point.map(Number);
    [theta!, x!, v! - 2].forEach((off) => expect(Math.abs(off)).toBeLessThan(1e-14));
    expect(Number(report.orbit!.period)).toBe(Number(TURN));
  });

  it('closes for no other period than a multiple of the forcing', () => {
    expect(check(forced, { ...claim, period: '6.28' }, { variables }).verdict).toBe('does-not-close');
    const twice = check(forced, { ...claim, period: '12.566370614359172' }, { variables });
    expect(codesOf(twice)).toEqual(['period-is-multiple']);
    expect(twice.orbit!.winding).toEqual([2, null, null]);
  });

  it('is the same from a phase given a turn further on', () => {
    const report = check(forced, { ...claim, point: ['62.83185307179586', '0', '2'] }, { variables });
    expect(report.verdict).toBe('closes');
    expect(report.orbit!.winding).toEqual([1, null, null]);
  });
});

describe('a solution that ends', () => {
  it('names the time and what left its domain', () => {
    // x² = 1 − 2t vanishes at t = 1/2.
    const report = check({ x: '-1/x', y: '1' }, { section: { formula: 'y' }, point: ['1', '0'], period: '2' });
    expect(codesOf(report)).toEqual(['singularity']);
    expect(report.findings[0]!.value).toBeCloseTo(0.5, 9);
    expect(report.findings[0]!.message).toMatch(/near t = 0\.5 .*x/);
  });

  it('names the definition of which a root was taken', () => {
    const document = { definitions: [{ name: 'room', formula: '1 - y' }] };
    const report = check(
      { x: 'sqrt(room)', y: '1' },
      { section: { formula: 'y' }, point: ['1', '0'], period: '2' },
      document,
    );
    expect(codesOf(report)).toEqual(['singularity']);
    expect(report.findings[0]!.message).toMatch(/room/);
  });

  it('is inconclusive where only its stiffness outlasts the steps', () => {
    const system = systemOf(documentOf({ x: 'y', y: '1000*(1 - x^2)*y - x' }));
    const claim = { section: { formula: '-y' }, point: ['2', '0'], period: '1614.2886' };
    const report = checkOrbit({ system, claim, limits: { maxSteps: 5000 } });
    expect(report.verdict).toBe('inconclusive');
    expect(report.findings).toEqual([expect.objectContaining({ code: 'too-long', severity: 'blocker', limit: 5000 })]);
  });
});
