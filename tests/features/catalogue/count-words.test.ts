import { countWords, symmetryWords } from '@/features/catalogue/count-words';

describe('the count of a result', () => {
  it('is told in words, with commas', () => {
    expect(countWords({ value: 1, relation: 'exact' })).toBe('1 orbit');
    expect(countWords({ value: 10_000, relation: 'at-least' })).toBe('more than 10,000 orbits');
  });

  it('is told up to the symmetries by which results are each other’s images', () => {
    expect(symmetryWords({ value: 3, symmetries: ['half-turn'] })).toBe(', 3 up to the half-turn');
    expect(symmetryWords({ value: 1200, symmetries: ['mirror', 'turn'] })).toBe(
      ', 1,200 up to the mirror and the turn',
    );
    expect(symmetryWords(null)).toBe('');
  });
});
