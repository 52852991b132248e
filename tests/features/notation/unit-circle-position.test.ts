import { drawnDistance, unitCirclePosition } from '@/features/notation/unit-circle-position';

describe('drawnDistance', () => {
  it.each([
    ['the centre for zero', 0, 0],
    ['the centre from a millionth down', 1e-43, 0],
    ['half-way for a thousandth', 1e-3, 0.5],
    ['the circle for one', 1, 1],
    ['six decades outside at the rim', 1e6, 1 + 0.28 + 1.25],
    ['no further for more', 1e30, 1 + 0.28 + 1.25],
    ['three decades outside half-way', 1e3, 1 + 0.28 + 0.625],
  ])('is %s', (_, size, distance) => {
    expect(drawnDistance(size)).toBeCloseTo(distance, 12);
  });
});

describe('unitCirclePosition', () => {
  it('keeps the argument: a negative multiplier lies left, a pair above and below', () => {
    const negative = unitCirclePosition({ re: '-10', im: '0' });
    expect(negative.x).toBeCloseTo(-(1 + 0.28 + 1.25 / 6), 12);
    expect(negative.y).toBeCloseTo(0, 12);
    const upper = unitCirclePosition({ re: '0.6', im: '0.8' });
    expect([upper.x, upper.y].map((c) => c.toFixed(6))).toEqual(['0.600000', '0.800000']);
  });
});
