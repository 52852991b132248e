import fc from 'fast-check';
import { countWord } from '@/features/notation/count-word';
import { cutDecimals } from '@/features/notation/cut-decimals';
import { digitGroups } from '@/features/notation/digit-groups';
import { formatCount } from '@/features/notation/format-count';
import { formatDifference } from '@/features/notation/format-difference';
import { formatLimit } from '@/features/notation/format-limit';
import { formatMultiplierSize } from '@/features/notation/format-multiplier';
import { formatSize } from '@/features/notation/format-size';
import { subtractDecimals } from '@/features/notation/subtract-decimals';

describe('formatSize', () => {
  it.each([
    [8.8e-12, '8.8·10⁻¹²'],
    [2e-13, '2.0·10⁻¹³'],
    [3.1e-24, '3.1·10⁻²⁴'],
    [0.045, '4.5·10⁻²'],
    [1.75e6, '1.8·10⁶'],
    [8.62, '8.6'],
    [-0.5, '−0.50'],
    [0, '0'],
  ])('sets %d with two significant digits', (value, text) => {
    expect(formatSize(value)).toBe(text);
  });
});

describe('formatLimit', () => {
  it.each([
    [1e-9, '10⁻⁹'],
    [1e-3, '10⁻³'],
    [4.7e-3, '4.7·10⁻³'],
    [1.1e-6, '1.1·10⁻⁶'],
    [13, '13'],
    [1, '1'],
  ])('writes %d as a bare power where it is one', (value, text) => {
    expect(formatLimit(value)).toBe(text);
  });
});

describe('formatMultiplierSize', () => {
  it.each([
    ['four significant digits from 10 up', '274.6981', '0', '274.7'],
    ['three decimals below 10', '4.7129472', '0', '4.713'],
    ['a power from a million up', '1751234', '0', '1.75·10⁶'],
    ['every digit of a whole part', '13574.31', '0', '13574'],
    ['the modulus of a complex one', '0.6', '-0.8', '1.000'],
    ['the modulus of a negative one', '-2.404', '0', '2.404'],
  ])('gives %s', (_, re, im, text) => {
    expect(formatMultiplierSize({ re, im })).toBe(text);
  });
});

describe('cutDecimals', () => {
  it('cuts, never rounds, after twelve decimals and says that more are known', () => {
    expect(cutDecimals('6.683940833205310065', 19)).toEqual({ text: '6.683940833205', more: true });
    expect(cutDecimals('0.9999999999999', 13)).toEqual({ text: '0.999999999999', more: true });
  });

  it('shows verified digits only', () => {
    expect(cutDecimals('9.96755996123', 9)).toEqual({ text: '9.96755996', more: false });
    expect(cutDecimals('-0.00123456', 3)).toEqual({ text: '−0.00123', more: false });
  });

  it('leaves a number alone that has nothing to cut', () => {
    expect(cutDecimals('27', 15)).toEqual({ text: '27', more: false });
  });
});

describe('digitGroups', () => {
  const drawn = (value: string, verified: number, max?: number) =>
    digitGroups(value, verified, max).runs.map((run) => `${run.gap ? ' ' : ''}${run.text}${run.verified ? '_' : ''}`);

  it('groups by three after the point and parts verified digits from the rest', () => {
    expect(drawn('6.6839408', 5)).toEqual(['6.683_', ' 9_', '40', ' 8']);
  });

  it('does not count leading zeros as digits', () => {
    expect(drawn('0.00123', 2)).toEqual(['0.001_', ' 2_', '3']);
  });

  it('stops after the most that are shown and knows how many there are', () => {
    const { shown, digits, runs } = digitGroups('1.23456789', 0, 5);
    expect([shown, digits]).toEqual([5, 9]);
    expect(runs.map((run) => run.text).join('')).toBe('1.2345');
  });

  it('never changes, drops or reorders a digit', () => {
    const decimal = fc.stringMatching(/^-?(0|[1-9]\d{0,12})(\.\d{1,40})?$/);
    fc.assert(
      fc.property(decimal, fc.nat(60), (value, verified) => {
        const joined = digitGroups(value, verified).runs.map((run) => run.text);
        expect(joined.join('').replace('−', '-')).toBe(value);
      }),
    );
  });
});

describe('formatDifference', () => {
  it.each([
    ['6.609244392145', '6.683940833205', '−0.074696'],
    ['6.685522440516', '6.683940833205', '+0.001582'],
    ['15.25597179067', '15.25597179084', '−1.7·10⁻¹⁰'],
    ['1.50', '1.5', '0'],
  ])('%s − %s is %s', (a, b, text) => {
    expect(formatDifference(a, b)).toBe(text);
  });

  it('is exact where doubles are not', () => {
    expect(subtractDecimals('1.00000000000000000000000000000001', '1')).toBe('0.00000000000000000000000000000001');
    expect(subtractDecimals('1e3', '0.5')).toBe('999.5');
  });
});

describe('counts', () => {
  it('are set with commas, and in words up to twelve', () => {
    expect([formatCount(8030), formatCount(745), formatCount(1234567)]).toEqual(['8,030', '745', '1,234,567']);
    expect([countWord(9), countWord(12), countWord(13)]).toEqual(['nine', 'twelve', '13']);
  });
});
