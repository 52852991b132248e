import { checkSystem } from '@/server/formulas/check-system';
import { flowDefinition } from '@/server/formulas/flow-definition';
import { createFlow, type Flow } from '@/server/numerics/taylor/flow';

/** A phase that turns a million radians per unit of time, beside a decay that it has nothing to do with. */
function turning(isAngle: boolean): Flow {
  return flowWith(isAngle, { x: '-x', theta: '1e6' }, 'x');
}

/** A phase that turns at one radian per unit of time, and what it drives: x' = cos θ, so x = sin θ from the origin. */
function driven(isAngle: boolean): Flow {
  return flowWith(isAngle, { x: 'cos(theta)', theta: '1' }, 'sin(theta)');
}

function flowWith(isAngle: boolean, equations: Record<string, string>, formula: string): Flow {
  const checked = checkSystem({
    name: 'with a phase',
    variables: [{ name: 'x' }, { name: 'theta', ...(isAngle && { modulus: '2*pi' }) }],
    parameters: [],
    equations,
    sections: [{ name: 'section', formula }],
  });
  if (!checked.ok) throw new Error(checked.errors[0]?.message);
  const section = checked.system.sections[0]!.expression;
  return createFlow(flowDefinition(checked.system, { parameters: new Map(), section, outputs: [] }));
}

const TURNS = 200;
const options = { start: Float64Array.of(0, 0), duration: TURNS * 2 * Math.PI, variations: false, maxSteps: 1e5 };

describe('an angle', () => {
  it('runs on in results and steps, without a jump', () => {
    const flow = driven(true);
    let expected = 0;
    const result = flow.integrate({
      ...options,
      onStep: ({ t, state }) => {
        const theta = state[flow.order + 1]!;
        expect(Math.abs(theta - t)).toBeLessThan(1e-11);
        expect(theta).toBeGreaterThanOrEqual(expected);
        expected = theta;
      },
    });
    if (!result.ok) throw new Error(result.reason);
    expect(Math.abs(result.end[1]! - options.duration)).toBeLessThan(1e-11);
  });

  it('has the same flow, and derivatives, as a coordinate that is not declared one', () => {
    const [one, other] = [true, false].map((isAngle) => driven(isAngle).integrate({ ...options, variations: true }));
    if (!one!.ok || !other!.ok) throw new Error('an integration failed');
    // x and theta end where they do within the rounding of a few thousand steps of size 1.
    expect(Math.abs(one!.end[0]! - other!.end[0]!)).toBeLessThan(1e-11);
    one!.monodromy!.forEach((entry, i) => expect(Math.abs(entry - other!.monodromy![i]!)).toBeLessThan(1e-10));
  });

  it('keeps its rounding small over many turns', () => {
    const result = driven(true).integrate(options);
    if (!result.ok) throw new Error(result.reason);
    // 2π as a double is off by 2.5e-16 a turn, and each of some thousand steps rounds by an ulp of at most π. A phase
    // that ran on to 400π would round by 1e-13 at every step.
    expect(Math.abs(result.end[0]! - Math.sin(options.duration))).toBeLessThan(3e-13);
  });

  it.each([
    [true, { ok: true }],
    [false, { ok: false, reason: 'escape' }],
  ])('may turn a million times; what is declared no angle (%s) escapes', (isAngle, outcome) => {
    const flow = turning(isAngle);
    expect(flow.integrate({ ...options, start: Float64Array.of(1, 0), duration: 10 })).toMatchObject(outcome);
  });
});
