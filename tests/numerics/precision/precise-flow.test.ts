import Decimal from 'decimal.js';
import { checkSystem } from '@/server/formulas/check-system';
import { parseSection } from '@/server/formulas/parse-section';
import { preciseSystem } from '@/server/checks/precise-system';
import { decimalOfFixed } from '@/server/numerics/precision/decimal-of-fixed';
import { StoppedRun, type PreciseFlow } from '@/server/numerics/precision/precise-flow';
import { fixedOfRational, parseRational } from '@/server/numerics/precision/rational';

const Exact = Decimal.clone({ precision: 90, toExpNeg: -100, toExpPos: 100 });
const DIGITS = 50;
const BITS = 220;
/** e^(-2p) is below 1e-52 for the steps taken here, which are at most e^-2 of the radius of convergence. */
const ORDER = 64;
const STEPS = Array.from({ length: 10 }, () => 0.05);
const END = new Exact('0.5');

function flowOf(equations: Record<string, string>, parameters: Record<string, string> = {}): PreciseFlow {
  const result = checkSystem({
    name: 'under test',
    variables: Object.keys(equations).map((name) => ({ name })),
    parameters: Object.entries(parameters).map(([name, value]) => ({ name, value })),
    equations,
  });
  if (!result.ok) throw new Error(JSON.stringify(result.errors));
  const section = parseSection(result.system, { formula: Object.keys(equations)[0]! });
  if (!section.ok) throw new Error(JSON.stringify(section.errors));
  return preciseSystem(result.system, { section: section.section, hold: null });
}

const fixed = (text: string): bigint => fixedOfRational(parseRational(text), BITS);

/** The state at 0.5 of what starts at 0. */
function endOf(flow: PreciseFlow, start: string[]): string[] {
  const state = flow.follow({
    ...{ start: start.map(fixed), duration: fixed('0.5'), steps: STEPS, bits: BITS, order: ORDER },
  });
  return state.map((x) => decimalOfFixed(x, BITS, DIGITS + 5));
}

const expectDigits = (text: string, expected: Decimal): void => {
  const miss = new Exact(text).minus(expected).abs();
  expect(miss.lessThan(new Exact(10).pow(-DIGITS)) ? 'near' : miss.toExponential(2)).toBe('near');
};

const e = Exact.exp(END);
const one = new Exact(1);

describe('the flow with many digits', () => {
  /** y' = f(t), t' = 1 from 0 makes y the integral of f: every operation against its closed form. */
  it.each<[string, Decimal]>([
    ['exp(t)', e.minus(1)],
    ['log(1 + t)', one.plus(END).ln().times(one.plus(END)).minus(END)],
    ['sin(t)', one.minus(END.cos())],
    ['cos(t)', END.sin()],
    ['tan(t)', END.cos().ln().negated()],
    ['sinh(t)', Exact.cosh(END).minus(1)],
    ['cosh(t)', Exact.sinh(END)],
    ['tanh(t)', Exact.cosh(END).ln()],
    ['atan(t)', END.times(END.atan()).minus(one.plus(END.pow(2)).ln().div(2))],
    [
      'asin(t)',
      END.times(END.asin())
        .plus(one.minus(END.pow(2)).sqrt())
        .minus(1),
    ],
    [
      'acos(t)',
      END.times(END.acos())
        .minus(one.minus(END.pow(2)).sqrt())
        .plus(1),
    ],
    ['sqrt(1 + t)', one.plus(END).pow(1.5).minus(1).times(2).div(3)],
    ['(1 + t)^(1/3)', one.plus(END).pow(new Exact(4).div(3)).minus(1).times(3).div(4)],
    ['(1 + t)^(-3/2)', one.minus(one.plus(END).pow(-0.5)).times(2)],
    ['(1 + t)^pi', one.plus(END).pow(Exact.acos(-1).plus(1)).minus(1).div(Exact.acos(-1).plus(1))],
    ['2^t', new Exact(2).pow(END).minus(1).div(new Exact(2).ln())],
    ['1/(1 + t)', one.plus(END).ln()],
    ['t^5 - 3*t^2/7', END.pow(6).div(6).minus(END.pow(3).div(7))],
    ['-(t - 0.1)*(t + 0.1)', END.times('0.01').minus(END.pow(3).div(3))],
    [
      'sqrt(2)*exp(1)*t^2/log(3)',
      new Exact(2).sqrt().times(one.exp()).times(END.pow(3)).div(new Exact(3).ln().times(3)),
    ],
    ['1e-3*t', END.pow(2).div(2000)],
  ])('integrates %s to 50 digits', (formula, expected) => {
    const [, y] = endOf(flowOf({ t: '1', y: formula }), ['0', '0']);
    expectDigits(y!, expected);
  });

  it('grows like the exponential', () => {
    expectDigits(endOf(flowOf({ x: 'k*x' }, { k: '1/3' }), ['1'])[0]!, END.div(3).exp());
  });

  it('takes a parameter as typed: 0.1 is a tenth, not its double', () => {
    expectDigits(endOf(flowOf({ x: 'k' }, { k: '0.1' }), ['0'])[0]!, new Exact('0.05'));
  });

  it('comes back when the field is turned round', () => {
    const there = flowOf({ x: 'y', y: '(1 - x^2)*y - x' });
    const back = flowOf({ x: '-y', y: '-((1 - x^2)*y - x)' });
    const [x, y] = endOf(back, endOf(there, ['2', '0']));
    expectDigits(x!, new Exact(2));
    expectDigits(y!, new Exact(0));
  });

  it('says where the field is not defined', () => {
    expect(() => endOf(flowOf({ x: 'log(x)' }), ['-1'])).toThrow(/logarithm/);
    expect(() => endOf(flowOf({ x: '1/x' }), ['0'])).toThrow(/division by zero/);
    expect(() => flowOf({ x: 'x/(k - k)' }, { k: '2' }).valuesAt([1n], { bits: BITS, order: 2 })).toThrow(/zero/);
  });

  it('can be stopped', () => {
    const flow = flowOf({ x: '-x' });
    const run = { start: [fixed('1')], duration: fixed('0.5'), steps: STEPS, bits: BITS, order: ORDER };
    expect(() => flow.follow({ ...run, shouldStop: () => true })).toThrow(StoppedRun);
  });

  it('estimates how rounding grows in the field', () => {
    // d(x^-2) = 2 x^-3 dx: an argument of 0.001 magnifies what it misses by 2e9.
    const growth = flowOf({ x: '1/x^2' }).roundingGrowth([1e-3]);
    expect(growth).toBeGreaterThan(1e9);
    expect(growth).toBeLessThan(1e13);
    expect(flowOf({ x: '-x' }).roundingGrowth([1])).toBeLessThan(10);
  });
});
