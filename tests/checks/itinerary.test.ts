import { smallestRotation } from '@/server/checks/itinerary';

describe('smallestRotation', () => {
  it.each([
    ['BA', 'AB'],
    ['BBABA', 'ABABB'],
    ['AAAA', 'AAAA'],
    ['A', 'A'],
    ['BAABAA', 'AABAAB'],
    ['120012', '001212'],
  ])('turns %s into %s', (word, expected) => {
    expect(smallestRotation(word)).toBe(expected);
  });

  it('agrees with trying all rotations, for every word of eight letters', () => {
    for (let bits = 0; bits < 256; bits += 1) {
      const word = bits.toString(2).padStart(8, '0');
      const rotations = Array.from({ length: 8 }, (_, k) => word.slice(k) + word.slice(0, k));
      expect(smallestRotation(word)).toBe(rotations.sort()[0]);
    }
  });
});
