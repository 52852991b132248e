import { checkSystem } from '@/server/formulas/check-system';
import { flowDefinition } from '@/server/formulas/flow-definition';
import { createFlow, type FlowResult } from '@/server/numerics/taylor/flow';
import { flowOf } from '@/tests/support/flow-of';

const options = { duration: 2, variations: false, maxSteps: 1e5 };

function failureOf(result: FlowResult): Extract<FlowResult, { ok: false }> {
  if (result.ok) throw new Error('it went on');
  return result;
}

describe('a singularity', () => {
  // Separable equations: the time at which the denominator, the root's or the logarithm's argument reaches 0 is exact.
  it.each([
    ['-1/x', 'x² = 1 − 2t', 1 / 2, 'x = 0'],
    ['-1/sqrt(x)', 'x^(3/2) = 1 − 3t/2', 2 / 3, 'x = 0'],
    ['-1/x^(1/3)', 'x^(4/3) = 1 − 4t/3', 3 / 4, 'x = 0'],
    ['-1/(2*x - 1)', '(2x − 1)² = 1 − 4t', 1 / 4, 'a denominator = 0'],
  ])("is found at its time and named: x' = %s, so %s", (field, _, time, node) => {
    const result = failureOf(flowOf({ x: field }).integrate({ ...options, start: Float64Array.of(1) }));
    expect(result.reason).toBe('singularity');
    // The last step is 1e-14 of the duration, at e⁻² of the way that is left; rounding of x² adds as much.
    expect(Math.abs(result.t - time)).toBeLessThan(2e-12);
    expect(result.node).toBe(node);
  });

  it('is met at the end of a fall onto the origin, and named by the distance that the system defines', () => {
    const checked = checkSystem({
      name: 'radial fall',
      variables: ['x', 'y', 'u', 'v'].map((name) => ({ name })),
      parameters: [],
      definitions: [{ name: 'r', formula: 'sqrt(x^2 + y^2)' }],
      equations: { x: 'u', y: 'v', u: '-x/r^3', v: '-y/r^3' },
    });
    if (!checked.ok) throw new Error(checked.errors[0]?.message);
    const definition = flowDefinition(checked.system, {
      parameters: new Map(),
      section: { kind: 'name', name: 'y' },
      outputs: [],
    });
    const result = failureOf(createFlow(definition).integrate({ ...options, start: Float64Array.of(1, 0, 0, 0) }));
    // From rest at distance 1 the fall takes π/(2√2), half the period of the ellipse of axis 1/2 (Kepler's third law).
    expect(result.reason).toBe('singularity');
    expect(Math.abs(result.t - Math.PI / (2 * Math.SQRT2))).toBeLessThan(1e-8);
    expect(result.node).toBe('r = 0');
  });

  it('is met at once by a start outside the domain', () => {
    const result = failureOf(flowOf({ x: 'log(x)' }).integrate({ ...options, start: Float64Array.of(-1) }));
    expect(result).toMatchObject({ reason: 'singularity', t: 0, steps: 0 });
  });
});

describe('an escape', () => {
  it('is told when a coordinate passes a million times 1 + |x0|', () => {
    const result = failureOf(flowOf({ x: 'x' }).integrate({ ...options, duration: 100, start: Float64Array.of(1) }));
    expect(result.reason).toBe('escape');
    expect(result.state[0]).toBeGreaterThan(2e6);
    // x = e^t: the step that passes ln 2e6 is at most a few units long.
    expect(result.t - Math.log(2e6)).toBeGreaterThanOrEqual(0);
    expect(result.t - Math.log(2e6)).toBeLessThan(3);
  });
});
