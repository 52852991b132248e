import { createSectionWatch } from '@/server/numerics/section/create-section-watch';
import type { Flow, TaylorStep } from '@/server/numerics/taylor/flow';
import { AB, keplerFlow, lorenzFlow } from '../flows';

function watched(flow: Flow, start: Float64Array, duration: number, onSection: boolean) {
  const watch = createSectionWatch(flow.dimension);
  watch.begin({ time: 0, timeLow: 0, onSection });
  const onStep = (step: TaylorStep) => watch.onStep(step);
  const result = flow.integrate({ start, duration, variations: false, maxSteps: 10_000, onStep });
  if (!result.ok) throw new Error(result.reason);
  return watch;
}

describe('zeros of u along a flow', () => {
  it('are found to full precision: AB crosses again at T/2, at its image', () => {
    const { zeros } = watched(lorenzFlow('z - 27'), AB.start, AB.period, true);
    const half = zeros.find(({ direction }) => direction === 1)!;
    expect(Math.abs(half.time + half.timeLow - AB.period / 2)).toBeLessThanOrEqual(4.5e-16);
    expect(Math.abs(half.state[0]! + AB.start[0]!)).toBeLessThan(1e-13);
  });

  it('are all found where u oscillates quicker than the solution', () => {
    const section = 'sin(40*x) + 0.01*y';
    const { zeros } = watched(lorenzFlow(section), AB.start, AB.period, false);
    // A million equal steps of time from the polynomials themselves, and the sign of u there.
    let changes = 0;
    let sign = 0;
    const flow = lorenzFlow(section);
    flow.integrate({
      start: AB.start,
      duration: AB.period,
      variations: false,
      maxSteps: 10_000,
      onStep: ({ h, state }) => {
        const length = state.length / 3;
        const at = (i: number, s: number) => {
          let value = 0;
          for (let k = length - 1; k >= 0; k -= 1) value = value * s + state[i * length + k]!;
          return value;
        };
        for (let j = 0; j < 20_000; j += 1) {
          const s = (j * h) / 20_000;
          const now = Math.sign(Math.sin(40 * at(0, s)) + 0.01 * at(1, s));
          if (sign !== 0 && now !== sign) changes += 1;
          sign = now;
        }
        return undefined;
      },
    });
    expect(zeros).toHaveLength(changes);
    // Counted before with another program.
    expect(changes).toBe(786);
  });

  it('agree with Kepler’s equation', () => {
    // e = 1/2 from the pericentre: x = 0 at true anomaly 90°, eccentric anomaly E = 60°, t = E − e sin E.
    const flow = keplerFlow('x');
    const { zeros } = watched(flow, Float64Array.of(0.5, 0, 0, Math.sqrt(3)), 2 * Math.PI, false);
    const quarter = Math.PI / 3 - Math.sqrt(3) / 4;
    expect(zeros.map(({ direction }) => direction)).toEqual([-1, 1]);
    expect(Math.abs(zeros[0]!.time - quarter)).toBeLessThan(1e-14);
    expect(Math.abs(zeros[1]!.time - (2 * Math.PI - quarter))).toBeLessThan(4e-14);
  });

  it('give the extents of a Kepler orbit', () => {
    const { lowest, highest } = watched(
      keplerFlow('y'),
      Float64Array.of(0.5, 0, 0, Math.sqrt(3)),
      2 * Math.PI,
      true,
    ).extent();
    // Semi-axes 1 and √3/2, focus at the origin: x from −3/2 to 1/2.
    expect(highest[0]).toBeCloseTo(0.5, 14);
    expect(lowest[0]).toBeCloseTo(-1.5, 13);
    expect(highest[1]).toBeCloseTo(Math.sqrt(3) / 2, 13);
  });
});
