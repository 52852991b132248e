import fc from 'fast-check';
import { createSectionWatch } from '@/server/numerics/section/create-section-watch';
import { flowOf } from '../flows';
import { followWithOdex, type PolynomialFlow, type SecondRun } from './follow-with-odex';
import { polynomials } from './polynomial';

const NAMES = ['x', 'y', 'z', 'w'];
/** Times of up to 5 are summed and printed in doubles. */
const ROUNDING = 1e-15;
/** Closer to a tangency than this the number of zeros is left to rounding. */
const CLEAR = 1e-5;

/** A random field that turns in the plane of the first two variables, where it often returns, and is damped far out. */
const flows: fc.Arbitrary<PolynomialFlow> = fc
  .integer({ min: 2, max: 4 })
  .chain((n) =>
    fc.record({
      field: fc
        .record({
          pulls: fc.tuple(...Array.from({ length: n }, () => polynomials(n))),
          turn: fc.integer({ min: 1, max: 6 }),
          damping: fc.constantFrom(0, 0.25, 1),
        })
        .map(({ pulls, turn, damping }) => {
          const one = (at: number, power = 1): number[] => Array.from({ length: n }, (_, i) => (i === at ? power : 0));
          return pulls.map((pull, i) => {
            const turned = i > 1 ? [] : [{ coefficient: i === 0 ? -turn : turn, exponents: one(1 - i) }];
            return pull.plus(...turned, { coefficient: -damping, exponents: one(i, 3) });
          });
        }),
      level: fc.integer({ min: -300, max: 300 }),
      surface: polynomials(n),
      start: fc.array(
        fc.integer({ min: -1500, max: 1500 }).map((k) => k / 1000),
        { minLength: n, maxLength: n },
      ),
      duration: fc.integer({ min: 1, max: 40 }).map((k) => k / 8),
    }),
  )
  .map(({ surface, level, ...flow }) => {
    // A surface that passes near the start is crossed more often than one anywhere.
    const coefficient = (level - Math.round(1000 * surface.at(flow.start))) / 1000;
    return { ...flow, section: surface.plus({ coefficient, exponents: flow.start.map(() => 0) }) };
  });

/** The same flow in the product: its text parsed, compiled and run. */
function follow({ field, section, start, duration }: PolynomialFlow) {
  const names = NAMES.slice(0, start.length);
  const flow = flowOf(Object.fromEntries(field.map((f, i) => [names[i]!, f.text(names)])), section.text(names));
  const watch = createSectionWatch(start.length);
  const onStep = watch.onStep.bind(watch);
  const options = { start: Float64Array.from(start), duration, maxSteps: 10_000 };
  const plain = flow.integrate({ ...options, variations: false, onStep });
  const varied = flow.integrate({ ...options, variations: true });
  if (!plain.ok || !varied.ok) throw new Error('the product gave up where the other integrator did not');
  return { end: plain.end, varied, zeros: watch.zeros };
}

/** Runs of both; what goes far away, or grows so much that errors could hide, is drawn again. */
function both(flow: PolynomialFlow): { second: SecondRun; own: ReturnType<typeof follow> } {
  const second = followWithOdex(flow);
  fc.pre(second !== null && second.error < 1e-8);
  return { second, own: follow(flow) };
}

const size = (values: Iterable<number>): number => Math.max(...[...values].map(Math.abs));
const miss = (found: ArrayLike<number>, other: readonly number[]): number => size(other.map((x, i) => x - found[i]!));

describe('random polynomial fields', () => {
  it('lead where another integrator leads, with the same derivatives, and cross random sections when it does', () => {
    let compared = 0;
    fc.assert(
      fc.property(flows, (flow) => {
        const { second, own } = both(flow);
        expect(miss(own.end, second.end)).toBeLessThanOrEqual(second.error);
        expect(miss(own.varied.end, second.end)).toBeLessThanOrEqual(second.error);
        // What the state is off by reaches its derivatives through the field's second ones, which are a few units here.
        expect(miss(own.varied.monodromy!, second.monodromy)).toBeLessThanOrEqual(10 * second.error);
        if (second.margin < CLEAR) return;
        expect(own.zeros.map(({ direction }) => direction)).toEqual(second.zeros.map(({ direction }) => direction));
        second.zeros.forEach(({ time, state, slope }, i) => {
          // u is off by its gradient times what the state is off by, the time by that over du/dt.
          const error = (second.error * Math.hypot(...flow.section.gradient(state))) / Math.abs(slope) + ROUNDING;
          expect(Math.abs(own.zeros[i]!.time - time)).toBeLessThanOrEqual(error);
        });
        compared += second.zeros.length;
      }),
      { numRuns: 120, seed: 20_262 },
    );
    expect(compared).toBeGreaterThan(120);
  });
});
