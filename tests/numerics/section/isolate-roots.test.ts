import { isolateRoots } from '@/server/numerics/section/isolate-roots';
import { polishRoot } from '@/server/numerics/section/polish-root';

/** Coefficients of Π (s − rootᵢ), lowest first. */
function fromRoots(...roots: number[]): Float64Array {
  let c = [1];
  for (const root of roots) {
    const next = [...c.map(() => 0), 0];
    c.forEach((entry, k) => {
      next[k + 1]! += entry;
      next[k]! -= root * entry;
    });
    c = next;
  }
  return Float64Array.from(c);
}

const rootsOf = (c: Float64Array) => isolateRoots(c).map((interval) => polishRoot(c, interval));

describe('isolateRoots and polishRoot', () => {
  it('find the roots inside (0, 1) and no other', () => {
    const found = rootsOf(fromRoots(-0.3, 0.125, 0.5, 0.75, 1.4));
    [0.125, 0.5, 0.75].forEach((root, i) => expect(Math.abs(found[i]! - root)).toBeLessThan(1e-15));
    expect(found).toHaveLength(3);
  });

  it('find all roots of the Chebyshev polynomial of degree 10 on (0, 1)', () => {
    // T₁₀(2s − 1) by its recurrence in s; roots (1 + cos((2k−1)π/20))/2. Coefficients reach 1e6·T, so the roots
    // are known to about 1e6 ulp near the middle.
    let before = [1];
    let c = [-1, 2];
    for (let n = 1; n < 10; n += 1) {
      const next = new Array<number>(c.length + 1).fill(0);
      c.forEach((entry, k) => {
        next[k]! -= 2 * entry;
        next[k + 1]! += 4 * entry;
      });
      before.forEach((entry, k) => (next[k]! -= entry));
      before = c;
      c = next;
    }
    const found = rootsOf(Float64Array.from(c));
    expect(found).toHaveLength(10);
    found.forEach((root, i) => {
      const exact = (1 + Math.cos(((2 * (10 - i) - 1) * Math.PI) / 20)) / 2;
      expect(Math.abs(root - exact)).toBeLessThan(1e-9);
    });
  });

  it.each([1e-2, 1e-4, 1e-6])('tell two roots %d apart', (gap) => {
    const found = rootsOf(fromRoots(0.3, 0.3 + gap));
    // The value near the double root is gap²/4 against rounding 1e-17: each root is known to about 1e-17 / gap.
    expect(found).toHaveLength(2);
    expect(Math.abs(found[0]! - 0.3)).toBeLessThan(1e-16 / gap);
    expect(Math.abs(found[1]! - found[0]! - gap)).toBeLessThan(2e-16 / gap);
  });

  it('call a triple root a tangency or a single crossing, never none', () => {
    const intervals = isolateRoots(fromRoots(0.4, 0.4, 0.4));
    expect(intervals.length % 2).toBe(1);
    expect(intervals[0]!.before).toBe(-1);
    expect(intervals.at(-1)!.after).toBe(1);
  });

  it('leave out a root exactly at an end', () => {
    expect(rootsOf(Float64Array.of(0, 1))).toEqual([]);
    expect(rootsOf(Float64Array.of(-1, 1))).toEqual([]);
    expect(rootsOf(fromRoots(0, 0.25, 1))).toEqual([0.25]);
  });

  it('find nothing in a constant, in zero and where the ends are far from zero', () => {
    expect(isolateRoots(Float64Array.of(2))).toEqual([]);
    expect(isolateRoots(Float64Array.of(0, 0, 0))).toEqual([]);
    expect(isolateRoots(Float64Array.of(3, -1, 1))).toEqual([]);
  });

  it('cut elsewhere when a root lies in the middle', () => {
    // Values near the middle root are rounded to 1e-17 and its slope is 1/16.
    const found = rootsOf(fromRoots(0.25, 0.5, 0.75));
    expect(found).toHaveLength(3);
    [0.25, 0.5, 0.75].forEach((root, i) => expect(Math.abs(found[i]! - root)).toBeLessThan(1e-15));
  });

  it('polish a root to one unit in the last place', () => {
    // s² = 1/2.
    const c = Float64Array.of(-0.5, 0, 1);
    expect(Math.abs(rootsOf(c)[0]! - Math.SQRT1_2)).toBeLessThanOrEqual(2 ** -53);
  });
});
