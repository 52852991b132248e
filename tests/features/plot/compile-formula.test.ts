import { compileFormula } from '@/features/plot/compile-formula';

const value = (text: string, scope: Record<string, number> = {}) => compileFormula(text)?.(scope);

describe('compileFormula', () => {
  it.each([
    ['1 + 2*3', 7],
    ['(1 + 2)*3', 9],
    ['2 - 3 - 4', -5],
    ['12/3/2', 2],
    ['2^3^2', 512],
    ['-2^2', -4],
    ['2^-1', 0.5],
    ['8/3', 8 / 3],
    ['1.5e2', 150],
    ['sqrt(9) + exp(0)', 4],
    ['cos(pi)', -1],
  ])('reads %s as %d', (text, expected) => {
    expect(value(text)).toBe(expected);
  });

  it('takes names from the scope and knows no others', () => {
    expect(value('x*y - beta*z', { x: 2, y: 3, beta: 0.5, z: 4 })).toBe(4);
    expect(value('x + nobody', { x: 1 })).toBeNaN();
  });

  it.each(['', '1 +', '(1', '1)', '2 x', 'sin x', 'x $ y', '*2'])('cannot read %p', (text) => {
    expect(compileFormula(text)).toBeNull();
  });
});
