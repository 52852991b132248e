import { slicesOf } from '@/features/catalogue/use-period-slices';

describe('slicesOf', () => {
  it('puts every period into one slice, the longest into the last', () => {
    const slices = slicesOf(['1', '1.01', '2', '9.99', '10']);
    expect(slices).toMatchObject({ shortest: '1', longest: '10' });
    expect(slices?.counts.reduce((sum, count) => sum + count, 0)).toBe(5);
    expect(slices?.counts.at(0)).toBe(2);
    expect(slices?.counts.at(-1)).toBe(2);
  });

  it.each([[[]], [['1', '2']], [['2', '2', '2']]])('draws nothing of %p', (periods) => {
    expect(slicesOf(periods)).toBeNull();
  });
});
