import { createSectionWatch, type SectionWatch } from '@/server/numerics/section/create-section-watch';
import { type TaylorStep } from '@/server/numerics/taylor/flow';

const ORDER = 20;

/** Taylor coefficients of a·sin(ω t + φ) + b at t. */
function sine({
  t,
  omega = 1,
  phase = 0,
  a = 1,
  b = 0,
}: {
  t: number;
  omega?: number;
  phase?: number;
  a?: number;
  b?: number;
}) {
  let factorial = 1;
  return Float64Array.from({ length: ORDER + 1 }, (_, k) => {
    if (k > 0) factorial *= k;
    const value = (a * omega ** k * Math.sin(omega * t + phase + (k * Math.PI) / 2)) / factorial;
    return k === 0 ? value + b : value;
  });
}

type Function = (t: number) => Float64Array;

/** Steps of a motion with one coordinate x(t) and section function u(t), up to t = end. */
function follow(
  watch: SectionWatch,
  { u, x = u, h, end, onSection = false }: { u: Function; x?: Function; h: number; end: number; onSection?: boolean },
) {
  watch.begin({ time: 0, timeLow: 0, onSection });
  for (let index = 0; index * h < end - 1e-12; index += 1) {
    const t = index * h;
    const step: TaylorStep = { index, t, tLow: 0, h: Math.min(h, end - t), state: x(t), section: u(t) };
    watch.onStep(step);
  }
}

describe('createSectionWatch', () => {
  it('finds every zero of a sine with its direction, to rounding', () => {
    const watch = createSectionWatch(1);
    follow(watch, { u: (t) => sine({ t, phase: 0.1 }), h: 0.7, end: 20 });
    const exact = Array.from({ length: 6 }, (_, k) => (k + 1) * Math.PI - 0.1);
    expect(watch.zeros.map((zero) => zero.direction)).toEqual([-1, 1, -1, 1, -1, 1]);
    watch.zeros.forEach((zero, k) => expect(Math.abs(zero.time - exact[k]!)).toBeLessThan(4e-15));
    expect(watch.counted()).toBe(3);
  });

  it('finds zeros once that fall on the seam of two steps', () => {
    const watch = createSectionWatch(1);
    follow(watch, { u: (t) => sine({ t, phase: 0.5 }), h: Math.PI - 0.5, end: 8 * (Math.PI - 0.5) });
    const h = Math.PI / 4;
    const seams = createSectionWatch(1);
    follow(seams, { u: (t) => sine({ t: t + 0.25 * h }), h, end: 40 * h });
    expect(seams.zeros).toHaveLength(10);
    const onSeams = createSectionWatch(1);
    follow(onSeams, { u: (t) => sine({ t }), h, end: 40.5 * h, onSection: true });
    expect(onSeams.zeros.map((zero) => zero.direction)).toEqual([-1, 1, -1, 1, -1, 1, -1, 1, -1, 1]);
  });

  it('does not report the start, however exactly it lies on the section', () => {
    for (const offset of [0, 1e-17, -1e-17]) {
      const watch = createSectionWatch(1);
      follow(watch, { u: (t) => sine({ t, b: offset }), h: 0.4, end: 3, onSection: true });
      expect(watch.zeros).toHaveLength(0);
    }
  });

  it('counts many zeros inside one step', () => {
    const roots = [0.1, 0.2, 0.35, 0.5, 0.6, 0.8, 0.9];
    let product = [1];
    for (const root of roots) {
      const next = [...product.map(() => 0), 0];
      product.forEach((entry, k) => {
        next[k + 1]! += entry;
        next[k]! -= root * entry;
      });
      product = next;
    }
    const section = new Float64Array(ORDER + 1);
    product.forEach((entry, k) => (section[k] = entry));
    const watch = createSectionWatch(1);
    watch.begin({ time: 0, timeLow: 0, onSection: false });
    watch.onStep({ index: 0, t: 0, tLow: 0, h: 1, state: section, section });
    // Near a root the slope is at least 2e-5 of the coefficients, so roots are known to about 1e-11.
    watch.zeros.forEach((zero, k) => expect(Math.abs(zero.time - roots[k]!)).toBeLessThan(1e-11));
    expect(watch.counted()).toBe(4);
  });

  it('keeps time beyond one double over many runs', () => {
    const watch = createSectionWatch(1);
    watch.begin({ time: 1e6, timeLow: 3e-11, onSection: false });
    watch.onStep({ index: 0, t: 0, tLow: 0, h: 1, state: sine({ t: 3 }), section: sine({ t: 3 }) });
    const zero = watch.zeros[0]!;
    expect(Math.abs(zero.time - 1e6 + zero.timeLow - (0.14159265358979324 + 3e-11))).toBeLessThan(1e-16);
  });

  it('reports a maximum that comes near zero without reaching it', () => {
    const watch = createSectionWatch(1);
    follow(watch, { u: (t) => sine({ t, b: -1 - 1e-8 }), h: 0.7, end: 6 });
    expect(watch.zeros).toHaveLength(0);
    expect(watch.nearMisses).toHaveLength(1);
    expect(Math.abs(watch.nearMisses[0]!.time - Math.PI / 2)).toBeLessThan(1e-9);
    expect(watch.nearMisses[0]!.value).toBeCloseTo(-1e-8, 14);
    expect(watch.nearMisses[0]!.curvature).toBeCloseTo(-1, 12);
  });

  it('says nothing of a maximum far from zero', () => {
    const watch = createSectionWatch(1);
    follow(watch, { u: (t) => sine({ t, b: -1.1 }), h: 0.7, end: 6 });
    expect(watch.nearMisses).toHaveLength(0);
  });

  it('gives the range of the coordinate with the extrema between the steps', () => {
    const watch = createSectionWatch(1);
    follow(watch, { u: (t) => sine({ t }), x: (t) => sine({ t, a: 3, b: 1 }), h: 0.7, end: 7 });
    const { lowest, highest } = watch.extent();
    expect(Math.abs(highest[0]! - 4)).toBeLessThan(1e-14);
    expect(Math.abs(lowest[0]! + 2)).toBeLessThan(1e-14);
  });

  it('finds no zero in a function that is zero throughout', () => {
    const watch = createSectionWatch(1);
    follow(watch, { u: () => new Float64Array(ORDER + 1), x: (t) => sine({ t }), h: 0.5, end: 2 });
    expect(watch.zeros).toHaveLength(0);
  });
});
