import { compareLetters } from '@/features/notation/compare-letters';

describe('compareLetters', () => {
  it('finds the rotation at which most letters agree', () => {
    expect(compareLetters('AABAB', 'ABAAB')).toEqual({ start: 2, differs: [] });
    expect(compareLetters('AAAB', 'BBAA')).toEqual({ start: 1, differs: [0] });
  });

  it('compares nothing of different lengths', () => {
    expect(compareLetters('AAB', 'AB')).toBeNull();
  });
});
