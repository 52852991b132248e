import type { Expression } from '@/server/numerics/expression/expression';
import { createFlow, type FlowDefinition } from '@/server/numerics/taylor/flow';
import { preparedFlow } from '@/server/numerics/taylor/prepared-flow';

const name = (text: string): Expression => ({ kind: 'name', name: text });

/** x' = rate·x. */
const growth = (rate: number, variable = 'x'): FlowDefinition => ({
  variables: [{ name: variable, modulus: null }],
  parameters: [{ name: 'rate', value: rate }],
  definitions: [],
  equations: [{ kind: 'binary', operator: '*', left: name('rate'), right: name(variable) }],
  section: name(variable),
  outputs: [],
});

describe('preparedFlow', () => {
  it('builds code once per formula text, whatever the parameters', () => {
    expect(preparedFlow(growth(1))).toBe(preparedFlow(growth(2)));
    expect(preparedFlow(growth(1))).not.toBe(preparedFlow(growth(1, 'y')));
  });

  it('keeps flows with the same code and other parameters apart', () => {
    const [slow, fast] = [createFlow(growth(1)), createFlow(growth(2))];
    const endOf = (flow: typeof slow): number => {
      const result = flow.integrate({ start: Float64Array.of(1), duration: 1, variations: false, maxSteps: 100 });
      return result.ok ? result.end[0]! : NaN;
    };
    // Closed form e^(rate t), a few steps of an ulp each.
    expect(Math.abs(endOf(slow) - Math.E)).toBeLessThan(4e-15);
    expect(Math.abs(endOf(fast) - Math.E ** 2)).toBeLessThan(1e-14);
    expect(Math.abs(endOf(slow) - Math.E)).toBeLessThan(4e-15);
  });

  it('forgets the flow that was used longest ago', () => {
    const first = preparedFlow(growth(1, 'first'));
    Array.from({ length: 100 }, (_, i) => preparedFlow(growth(1, `v${i}`)));
    expect(preparedFlow(growth(1, 'first'))).not.toBe(first);
  });

  it('refuses a name that stands for nothing', () => {
    expect(() => createFlow({ ...growth(1), section: name('constructor') })).toThrow(RangeError);
  });
});
