import { multiplierDecimals } from '@/server/checks/multiplier-decimals';

describe('multiplierDecimals', () => {
  it('writes one as one', () => {
    expect(multiplierDecimals({ re: 1, im: 0, logModulus: 0 })).toEqual({ re: '1', im: '0' });
  });

  it('writes a pair on the circle', () => {
    const { re, im } = multiplierDecimals({ re: Math.cos(1), im: -Math.sin(1), logModulus: 0 });
    expect([Number(re), Number(im)]).toEqual([Math.cos(1), -Math.sin(1)]);
  });

  it.each([
    [-1000 * Math.LN10, /^1e-1000$|^9\.9+\d*e-1001$/],
    [400 * Math.LN10, /^1(\.0+\d*)?e400$|^9\.9+\d*e399$/],
  ])('writes exp(%d), which no double holds', (logModulus, pattern) => {
    const { re, im } = multiplierDecimals({ re: 1, im: 0, logModulus });
    expect(re).toMatch(pattern);
    expect(im).toBe('0');
    expect(multiplierDecimals({ re: -1, im: 0, logModulus }).re).toBe(`-${re}`);
  });

  it('writes what vanished as zero', () => {
    expect(multiplierDecimals({ re: 1, im: 0, logModulus: -Infinity })).toEqual({ re: '0', im: '0' });
  });
});
