import { roundOutwards } from '@/features/catalogue/round-outwards';

describe('roundOutwards', () => {
  it.each([
    ['1.5586522107161747', 1, 'down', '1.5'],
    ['2.3059072639398477', 1, 'up', '2.4'],
    ['2.3', 1, 'up', '2.3'],
    ['9.96', 1, 'up', '10.0'],
    ['0.04', 1, 'down', '0.0'],
    ['7', 0, 'up', '7'],
  ] as const)('takes %s to %d decimals %s: %s', (value, decimals, direction, expected) => {
    expect(roundOutwards(value, decimals, direction)).toBe(expected);
  });
});
