import { exchangedDigits } from '@/server/checks/suggestion';

describe('exchangedDigits', () => {
  it('exchanges neighbours across the decimal point, equal ones left out', () => {
    expect(exchangedDigits('1.558')).toEqual(['5.158', '1.585']);
  });

  it('leaves an exponent and a denominator alone', () => {
    expect(exchangedDigits('12e34')).toEqual(['21e34']);
    expect(exchangedDigits('12/34')).toEqual(['21/34']);
    expect(exchangedDigits('7')).toEqual([]);
  });
});
