import Decimal from 'decimal.js';
import fc from 'fast-check';
import { fixedOfRational, parseRational, rational, rationalOfDouble } from '@/server/numerics/precision/rational';

const Exact = Decimal.clone({ precision: 400, toExpNeg: -400, toExpPos: 400 });

const decimals = fc
  .tuple(
    fc.constantFrom('', '-', '+'),
    fc.stringMatching(/^[0-9]{1,40}$/),
    fc.stringMatching(/^[0-9]{0,40}$/),
    fc.integer({ min: -60, max: 60 }),
  )
  .map(([sign, whole, fraction, exponent]) => `${sign}${whole}${fraction && `.${fraction}`}e${exponent}`);

describe('an exact number', () => {
  it('is what a decimal says, to the last digit', () => {
    fc.assert(
      fc.property(decimals, (text) => {
        const { p, q } = parseRational(text);
        expect(new Exact(String(p)).equals(new Exact(text).times(String(q)))).toBe(true);
        expect(q > 0n).toBe(true);
      }),
    );
  });

  it.each([
    ['8/3', 8n, 3n],
    ['-10/4', -5n, 2n],
    ['0.1', 1n, 10n],
    ['1e3', 1000n, 1n],
    ['.5', 1n, 2n],
    ['7.', 7n, 1n],
    ['-0', 0n, 1n],
  ])('reads %s', (text, p, q) => {
    expect(parseRational(text)).toEqual({ p, q });
  });

  it.each(['', 'one', '1/0', '0x10', '1e', '--1', '1/2/3', 'Infinity'])('refuses “%s”', (text) => {
    expect(() => parseRational(text)).toThrow(RangeError);
  });

  it('is what a double holds', () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true, min: -1e30, max: 1e30 }), (x) => {
        const { p, q } = rationalOfDouble(x);
        expect(new Exact(String(p)).div(String(q)).toNumber() === x).toBe(true);
      }),
    );
  });

  it('is rounded to the nearest fixed-point number', () => {
    expect(fixedOfRational(rational(1n, 3n), 4)).toBe(5n);
    expect(fixedOfRational(rational(-1n, 3n), 4)).toBe(-5n);
    expect(fixedOfRational(rational(2n, 3n), 4)).toBe(11n);
  });
});
