import { array, assert, constantFrom, property } from 'fast-check';
import { smallestRotation } from '@/server/search/smallest-rotation';

/** The definition: the first of all rotations in order. */
const byDefinition = (letters: string): string =>
  Array.from({ length: letters.length }, (_, k) => letters.slice(k) + letters.slice(0, k)).sort((a, b) =>
    a < b ? -1 : a > b ? 1 : 0,
  )[0] ?? '';

describe('smallestRotation', () => {
  it.each([
    ['BA', 'AB'],
    ['BAAB', 'AABB'],
    ['ABAB', 'ABAB'],
    ['BABA', 'ABAB'],
    ['A', 'A'],
    ['', ''],
  ])('turns %s into %s', (letters, smallest) => {
    expect(smallestRotation(letters)).toBe(smallest);
  });

  it('is the first of all rotations', () => {
    const words = array(constantFrom('A', 'B', 'C'), { maxLength: 40 }).map((letters) => letters.join(''));
    assert(
      property(words, (letters) => {
        expect(smallestRotation(letters)).toBe(byDefinition(letters));
      }),
    );
  });
});
