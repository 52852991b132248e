import { compareLetters } from '@/features/notation/compare-letters';
import { crossingDistances } from '@/features/notation/crossing-distances';

describe('compareLetters', () => {
  it('finds the rotation at which most letters agree', () => {
    expect(compareLetters('AABAB', 'ABAAB')).toEqual({ start: 2, differs: [] });
    expect(compareLetters('AAAB', 'BBAA')).toEqual({ start: 1, differs: [0] });
  });

  it('compares nothing of different lengths', () => {
    expect(compareLetters('AAB', 'AB')).toBeNull();
  });
});

describe('crossingDistances', () => {
  const own = [
    ['0', '0'],
    ['3', '4'],
  ];
  const other = [
    ['3', '2'],
    ['1', '0'],
  ];

  it('takes the largest difference of a coordinate, at the rotation asked for', () => {
    expect(crossingDistances({ own, other, start: 1 })).toEqual([1, 2]);
  });

  it('measures in sizes of the extent', () => {
    const extent = [
      [-5, 5],
      [0, 4],
    ];
    expect(crossingDistances({ own, other, start: 1, extent })).toEqual([0.1, 0.5]);
  });
});
