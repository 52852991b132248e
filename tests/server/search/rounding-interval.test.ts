import { roundingInterval } from '@/server/search/rounding-interval';

describe('roundingInterval', () => {
  it.each([
    ['1.5587', '155865e-5', '155875e-5'],
    ['1.50', '1495e-3', '1505e-3'],
    ['1.5', '145e-2', '155e-2'],
    ['3', '25e-1', '35e-1'],
    ['15e1', '145e0', '155e0'],
    ['1.5e-3', '145e-5', '155e-5'],
    ['+2.0', '195e-2', '205e-2'],
    ['0.0', '-5e-2', '5e-2'],
  ])('reads the digits of %s', (text, from, to) => {
    expect(roundingInterval(text)).toEqual({ from, to });
  });

  it('is exact for more digits than a double has', () => {
    expect(roundingInterval('1.55865221071617472')).toEqual({
      from: '1558652210716174715e-18',
      to: '1558652210716174725e-18',
    });
  });

  it.each(['', '-1', '1.', '.5', '1e', '8/3', 'NaN', '1,5', '0x10', '1e1000'])('does not read %s', (text) => {
    expect(roundingInterval(text)).toBeNull();
  });
});
