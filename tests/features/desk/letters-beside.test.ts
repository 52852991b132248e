import { besideEntry } from '@/features/desk/letters-beside';
import type { CheckedOrbit, Entry } from '@/schemas/generated/contract';

/** Crossings along one coordinate; the last is the start. */
const crossings = (...heights: number[]) =>
  heights.map((height, i) => ({ time: String(i + 1), point: [String(height)], returnTime: '1', transversality: 1 }));

const orbit = (...heights: number[]) =>
  ({ crossings: crossings(...heights), extent: [[0, 10]], period: String(heights.length) }) as unknown as CheckedOrbit;
const entry = (...heights: number[]) => ({ crossings: crossings(...heights) }) as unknown as Entry;

describe('an entry beside a submission', () => {
  it('begins where most letters agree, and names the places where they differ', () => {
    // As drawn the submission reads AABB; the entry, drawn from another start and with one letter changed, BBAB.
    const { start, differs } = besideEntry(orbit(2, 7, 8, 1), 'AABB', entry(8, 1, 7, 7), 'BBAB');
    expect(start).toBe(2);
    expect(differs).toEqual([1]);
  });

  it('lets the distance choose where the letters leave a choice', () => {
    // ABAB agrees with itself at two starts; only at the second the heights meet too.
    const { start, distances } = besideEntry(orbit(8, 3, 9, 1), 'ABAB', entry(9, 1, 8, 3), 'ABAB');
    expect(start).toBe(2);
    expect(distances).toEqual([0, 0, 0, 0]);
  });

  it('marks nothing and measures nothing where the numbers of returns differ', () => {
    expect(besideEntry(orbit(2, 7, 1), 'AAB', entry(8, 1), 'AB')).toMatchObject({ differs: [], distances: null });
  });

  it('goes by distance alone where there are no letters', () => {
    expect(besideEntry(orbit(2, 7, 1), null, entry(7, 1, 2), null)).toMatchObject({ start: 2, differs: [] });
  });
});
