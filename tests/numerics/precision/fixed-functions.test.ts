import Decimal from 'decimal.js';
import { decimalOfFixed } from '@/server/numerics/precision/decimal-of-fixed';
import { fixedPi, fixedPower } from '@/server/numerics/precision/fixed-functions';
import { bitLength, doubleOfFixed, fixedOfDouble, integerSquareRoot } from '@/server/numerics/precision/fixed-number';
import { fixedFunction } from '@/server/numerics/precision/precise-statics';
import { fixedOfRational, parseRational } from '@/server/numerics/precision/rational';

const Exact = Decimal.clone({ precision: 130, toExpNeg: -200, toExpPos: 200 });
const BITS = 400;
const PLACES = 110;
/** Units in the last place: the argument's own rounding, magnified by at most 1e3 here, and that of the result. */
const ULP = new Exact(2).pow(-BITS).times(2000);

const fixed = (text: string): bigint => fixedOfRational(parseRational(text), BITS);
const expectNear = (value: bigint, expected: Decimal): void => {
  const miss = new Exact(decimalOfFixed(value, BITS, PLACES + 15)).minus(expected).abs();
  expect(miss.lessThan(ULP) ? 'near' : miss.toExponential(2)).toBe('near');
};

type Name = Parameters<typeof fixedFunction>[0];
const reference: Record<Name, (x: Decimal) => Decimal> = {
  sqrt: (x) => x.sqrt(),
  exp: (x) => x.exp(),
  log: (x) => x.ln(),
  sin: (x) => x.sin(),
  cos: (x) => x.cos(),
  asin: (x) => x.asin(),
  acos: (x) => x.acos(),
  atan: (x) => x.atan(),
};
const anywhere = ['-7.25', '-0.7', '0', '0.001', '0.3', '1', '3.9'];
const inside = ['-0.9', '-0.3', '0', '0.001', '0.7'];
const positive = ['0.001', '0.3', '1', '3.9', '120.5'];
const cases: [Name, string[]][] = [
  ['sqrt', positive],
  ['exp', anywhere],
  ['log', positive],
  ['sin', [...anywhere, '40.5']],
  ['cos', [...anywhere, '40.5']],
  ['asin', inside],
  ['acos', inside],
  ['atan', [...anywhere, '-300']],
];

describe('functions in fixed point, against decimal.js', () => {
  it.each(cases.flatMap(([name, texts]) => texts.map((text) => [name, text] as const)))(
    '%s of %s has 110 digits',
    (name, text) => {
      expectNear(fixedFunction(name, fixed(text), BITS), reference[name](new Exact(text)));
    },
  );

  it('knows pi', () => {
    expectNear(fixedPi(BITS), Exact.acos(-1));
  });

  it.each([
    ['3.9', '-3/2'],
    ['0.3', '1/2'],
    ['2.5', '7'],
    ['1.75', '1/3'],
    ['1.75', '-100/7'],
  ])('raises %s to %s', (text, exponent) => {
    const ratio = parseRational(exponent);
    const expected = new Exact(text).pow(new Exact(String(ratio.p)).div(String(ratio.q)));
    expectNear(fixedPower(fixed(text), ratio, BITS), expected);
  });

  it.each<[Name, string]>([
    ['sqrt', '-1'],
    ['log', '0'],
    ['log', '-2'],
    ['asin', '1'],
    ['acos', '-1.5'],
  ])('refuses %s of %s', (name, text) => {
    expect(() => fixedFunction(name, fixed(text), BITS)).toThrow(RangeError);
  });
});

describe('a fixed-point number', () => {
  it.each([1.5, -0.1, 3e-300, 1e300, -7, 0, 5e-324])('goes to a double and back: %p', (x) => {
    const bits = 1100;
    expect(doubleOfFixed(fixedOfDouble(x, bits), bits)).toBe(x);
  });

  it('knows its length', () => {
    for (const n of [1n, 2n, 255n, 256n, 2n ** 100n - 1n, 2n ** 100n]) expect(bitLength(n)).toBe(n.toString(2).length);
  });

  it('has the largest root whose square does not exceed it', () => {
    for (const n of [0n, 1n, 2n, 15n, 16n, 17n, 10n ** 61n, 2n ** 200n - 1n, 2n ** 200n]) {
      const root = integerSquareRoot(n);
      expect(root * root <= n && (root + 1n) ** 2n > n).toBe(true);
    }
  });

  it('is written to the nearest place, without zeros that say nothing', () => {
    expect(decimalOfFixed(fixed('-1.25'), BITS, 1)).toBe('-1.3');
    expect(decimalOfFixed(fixed('27'), BITS, 30)).toBe('27');
    expect(decimalOfFixed(fixed('-0.0001'), BITS, 3)).toBe('0');
    expect(decimalOfFixed(fixed('0.999'), BITS, 2)).toBe('1');
  });
});
