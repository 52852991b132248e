import { readTypedNumber } from '@/server/formulas/typed-number';

describe('readTypedNumber', () => {
  it.each([
    ['-13.7636', -13.7636, 5e-5, 6],
    ['27', 27, 0, 2],
    ['8/3', 8 / 3, 0, 1],
    ['1.50e-3', 0.0015, 5e-6, 3],
    ['+2', 2, 0, 1],
    ['2e5', 2e5, 0, 1],
    ['0.0012', 0.0012, 5e-5, 2],
  ])('reads %s', (text, value, halfUnit, digits) => {
    const read = readTypedNumber(text);
    expect(read).toMatchObject({ ok: true, number: { text, value, digits } });
    if (read.ok) expect(Math.abs(read.number.halfUnit - halfUnit)).toBeLessThanOrEqual(1e-12 * halfUnit);
  });

  it('rounds a fraction of long integers once', () => {
    // 10^40/3 and 1/(2^60 + 1): numerator and denominator are no doubles, their quotients' nearest doubles are these.
    expect(readTypedNumber(`1${'0'.repeat(40)}/3`)).toMatchObject({ number: { value: 3.3333333333333333e39 } });
    expect(readTypedNumber('1/1152921504606846977')).toMatchObject({ number: { value: 2 ** -60 } });
    expect(readTypedNumber('-2/6')).toMatchObject({ number: { value: -1 / 3 } });
  });

  it.each([
    '',
    'NaN',
    'Infinity',
    '-Infinity',
    'six',
    '0x10',
    '1,5',
    '1e',
    '--1',
    '.5',
    '1.',
    '1/0',
    '1/2/3',
    ' 1',
    '1e400',
    '1e100',
    '٣',
  ])('refuses %j', (text) => {
    expect(readTypedNumber(text).ok).toBe(false);
  });

  it.each(['1e-400', '0.5e-999999', '-2e-330'])('refuses %s, which a double cannot tell from zero', (text) => {
    expect(readTypedNumber(text)).toMatchObject({ ok: false, message: expect.stringMatching(/too small/) });
  });

  it.each(['0', '-0.00', '0e-999', '0/7'])('reads %s as zero', (text) => {
    const read = readTypedNumber(text);
    expect(read.ok && Math.abs(read.number.value)).toBe(0);
  });

  it('names the limit of characters', () => {
    expect(readTypedNumber('1'.repeat(201))).toMatchObject({ message: expect.stringMatching(/at most 200.*201/) });
  });
});
