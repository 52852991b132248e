import type { Flow } from '@/server/numerics/taylor/flow';
import { flowOf } from '@/tests/support/flow-of';

const run = (flow: Flow, start: number[], duration: number, variations = false) => {
  const result = flow.integrate({ start: Float64Array.from(start), duration, variations, maxSteps: 1e5 });
  if (!result.ok) throw new Error(`${result.reason} at ${result.t}`);
  return result;
};

const lorenz = { x: 'sigma*(y - x)', y: 'rho*x - y - x*z', z: 'x*y - beta*z' };
const classical = { sigma: '10', rho: '28', beta: '8/3' };
/** Period and point of the orbit AB: tests/reference/lorenz-12.ndjson, first line (113-bit arithmetic). */
const AB = { period: 1.5586522107161747, point: [-13.763610682134201, -19.578751942451796, 27] };

const kepler = {
  x: 'u',
  y: 'v',
  u: '-x/(x^2 + y^2)^(3/2)',
  v: '-y/(x^2 + y^2)^(3/2)',
};

describe('integrate', () => {
  it('follows the harmonic oscillator round', () => {
    const { end } = run(flowOf({ q: 'p', p: '-q' }), [1, 0], 1);
    // Closed form: cos t, -sin t; a handful of steps, each good to an ulp.
    expect(Math.abs(end[0]! - Math.cos(1))).toBeLessThan(1e-15);
    expect(Math.abs(end[1]! + Math.sin(1))).toBeLessThan(1e-15);
  });

  it.each([0, 0.5, 0.9, 0.99])('closes the Kepler ellipse of eccentricity %d after 2π', (e) => {
    const start = [1 - e, 0, 0, Math.sqrt((1 + e) / (1 - e))];
    const { end } = run(flowOf(kepler), start, 2 * Math.PI);
    // The error is a shift along the orbit: rounding of the energy (1e-16/(1 − e)) times the speed at perihelion.
    const bound = (200 * Number.EPSILON) / (1 - e) ** 2;
    end.forEach((x, i) => expect(Math.abs(x - start[i]!)).toBeLessThan(bound * (i < 2 ? 1 : start[3]!)));
  });

  it('gives the derivatives of a linear flow in closed form', () => {
    // A saddle and a rotation: d/dt (x, y, z) = (y, -x, z/2).
    const { monodromy } = run(flowOf({ x: 'y', y: '-x', z: 'z/2' }), [1, 0, 1], 2, true);
    const [c, s] = [Math.cos(2), Math.sin(2)];
    const exact = [c, s, 0, -s, c, 0, 0, 0, Math.E];
    monodromy!.forEach((entry, i) => expect(Math.abs(entry - exact[i]!)).toBeLessThan(4e-15));
  });

  it('crosses half of the symmetric Lorenz orbit AB onto the image of its start', () => {
    const { end } = run(flowOf(lorenz, { parameters: classical }), AB.point, AB.period / 2);
    const image = [-AB.point[0]!, -AB.point[1]!, 27];
    end.forEach((x, i) => expect(Math.abs(x - image[i]!)).toBeLessThan(1e-12));
  });

  it('carries f along: M f(x0) = f(x(T)), and det M follows the divergence', () => {
    const flow = flowOf(lorenz, { parameters: classical });
    const start = Float64Array.from(AB.point);
    const result = run(flow, AB.point, AB.period, true);
    const m = result.monodromy!;
    const [before, after] = [flow.field(start), flow.field(result.end)];
    const carried = [0, 1, 2].map((i) => before.reduce((sum, f, j) => sum + m[3 * i + j]! * f, 0));
    carried.forEach((f, i) => expect(Math.abs(f - after[i]!)).toBeLessThan(1e-11));
    // div f = -(sigma + 1 + beta) = -41/3, exactly (Lorenz 1963).
    expect(Math.abs(result.divergenceIntegral + (41 / 3) * AB.period)).toBeLessThan(1e-13);
  });

  it('returns to its start when time is reversed', () => {
    const { end } = run(flowOf(lorenz, { parameters: classical }), AB.point, AB.period);
    const reversed = Object.fromEntries(Object.entries(lorenz).map(([name, f]) => [name, `-(${f})`]));
    const back = run(flowOf(reversed, { parameters: classical }), [...end], AB.period);
    // Backwards the strongest contraction, e^22.9, grows (log multiplier of the data file): nothing better than e^22.9 ulps of 40.
    back.end.forEach((x, i) => expect(Math.abs(x - AB.point[i]!)).toBeLessThan(Math.exp(22.9) * 40 * Number.EPSILON));
  });

  it.each([
    ["x' = -1/x at t = 1/2", { x: '-1/x' }, 0.5, /x = 0/],
    ["x' = x^2 at t = 1", { x: 'x^2' }, 1, null],
  ])('says when %s leaves its domain', (_, equations, at, node) => {
    const result = flowOf(equations).integrate({
      start: Float64Array.of(1),
      duration: 2,
      variations: false,
      maxSteps: 1e5,
    });
    if (result.ok) throw new Error('it went on');
    expect(['singularity', 'escape']).toContain(result.reason);
    expect(Math.abs(result.t - at)).toBeLessThan(2e-6);
    if (node) expect(result.node).toMatch(node);
  });

  it('ends at the step budget, and where it is told to stop', () => {
    const flow = flowOf({ q: 'p', p: '-q' });
    const options = { start: Float64Array.of(1, 0), duration: 1000, variations: false };
    expect(flow.integrate({ ...options, maxSteps: 3 })).toMatchObject({
      ok: false,
      reason: 'too-many-steps',
      steps: 3,
    });
    const stopped = flow.integrate({ ...options, maxSteps: 1e5, shouldStop: () => true });
    expect(stopped).toMatchObject({ ok: false, reason: 'stopped', steps: 0 });
  });

  it('stays at rest at an equilibrium', () => {
    const { end, steps } = run(flowOf({ q: 'p', p: '-q' }), [0, 0], 100);
    expect([...end]).toEqual([0, 0]);
    expect(steps).toBe(1);
  });

  it('gives the same bits twice', () => {
    const flow = flowOf(lorenz, { parameters: classical });
    expect(run(flow, AB.point, AB.period, true)).toEqual(run(flow, AB.point, AB.period, true));
  });

  it('refuses a start of the wrong dimension', () => {
    expect(() => run(flowOf({ q: 'p', p: '-q' }), [1], 1)).toThrow(RangeError);
  });
});
