import { flowOf } from '@/tests/support/flow-of';

/** A saddle-focus: it turns with ω and shrinks with −α in a plane, and grows with β along an axis. */
const [ALPHA, OMEGA, BETA] = [0.3, 2, 0.5];
const focus = { x: '-alpha*x - omega*y', y: 'omega*x - alpha*y', z: 'beta*z' };
const parameters = { alpha: '3/10', omega: '2', beta: '1/2' };

/** The same seen from a frame that is sheared by a fixed linear map: x = p + q, y = q, z = r − p. */
const sheared = {
  p: '(-alpha*(p + q) - omega*q) - (omega*(p + q) - alpha*q)',
  q: 'omega*(p + q) - alpha*q',
  r: 'beta*(r - p) + (-alpha*(p + q) - omega*q) - (omega*(p + q) - alpha*q)',
};

const exact = (t: number, [x, y, z]: readonly [number, number, number]): [number, number, number] => {
  const [c, s, shrink] = [Math.cos(OMEGA * t), Math.sin(OMEGA * t), Math.exp(-ALPHA * t)];
  return [shrink * (c * x - s * y), shrink * (s * x + c * y), Math.exp(BETA * t) * z];
};

describe.each([0.1, 1, 10])('over the time %d', (duration) => {
  const options = { duration, variations: true, maxSteps: 1e4 };
  // Growth e^(βt) of the rounding of some steps a unit of time.
  const bound = 2e-15 * (1 + 20 * duration) * Math.exp(BETA * duration);

  it('a saddle-focus ends where its closed form does, and so do its derivatives', () => {
    const result = flowOf(focus, { parameters }).integrate({ ...options, start: Float64Array.of(1, -2, 0.5) });
    if (!result.ok) throw new Error(result.reason);
    exact(duration, [1, -2, 0.5]).forEach((value, i) => {
      expect(Math.abs(result.end[i]! - value)).toBeLessThan(bound);
    });
    const columns = [exact(duration, [1, 0, 0]), exact(duration, [0, 1, 0]), exact(duration, [0, 0, 1])];
    result.monodromy!.forEach((entry, at) => {
      expect(Math.abs(entry - columns[at % 3]![Math.floor(at / 3)]!)).toBeLessThan(bound);
    });
    expect(Math.abs(result.divergenceIntegral - (BETA - 2 * ALPHA) * duration)).toBeLessThan(1e-14 * (1 + duration));
  });

  it('and in another frame it ends at the image', () => {
    const start = Float64Array.of(3, -2, 3.5);
    const result = flowOf(sheared, { parameters }).integrate({ ...options, start });
    if (!result.ok) throw new Error(result.reason);
    const [p, q, r] = result.end;
    [p! + q!, q!, r! - p!].forEach((value, i) => {
      expect(Math.abs(value - exact(duration, [1, -2, 0.5])[i]!)).toBeLessThan(8 * bound);
    });
  });
});

describe('an anharmonic oscillator', () => {
  it('preserves area: det M = 1, since its divergence vanishes', () => {
    const flow = flowOf({ q: 'p', p: '-sin(q)' });
    const result = flow.integrate({
      start: Float64Array.of(2, 0),
      duration: 20,
      variations: true,
      maxSteps: 1e4,
    });
    if (!result.ok) throw new Error(result.reason);
    const [a, b, c, d] = result.monodromy!;
    const size = Math.abs(a! * d!) + Math.abs(b! * c!);
    expect(Math.abs(a! * d! - b! * c! - 1)).toBeLessThan(1e-13 * size);
    expect(result.divergenceIntegral).toBe(0);
  });

  it('goes back to where it started when time is reversed', () => {
    const there = flowOf({ q: 'p', p: '-sin(q)' });
    const back = flowOf({ q: '-p', p: 'sin(q)' });
    const options = { duration: 20, variations: false, maxSteps: 1e4 };
    const out = there.integrate({ ...options, start: Float64Array.of(2, 0) });
    if (!out.ok) throw new Error(out.reason);
    const home = back.integrate({ ...options, start: out.end });
    if (!home.ok) throw new Error(home.reason);
    // Errors grow with the time alone: shear of the periods, about 20 here.
    expect(Math.abs(home.end[0]! - 2)).toBeLessThan(2e-13);
    expect(Math.abs(home.end[1]!)).toBeLessThan(2e-13);
  });
});
