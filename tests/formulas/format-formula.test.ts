import fc from 'fast-check';
import { formatFormula } from '@/server/formulas/format-formula';
import { parseFormula } from '@/server/formulas/parse-formula';
import { type Expression, functionNames } from '@/server/numerics/expression/expression';

/** Any tree that the parser can make: a sign never stands directly before a sign. */
const { tree } = fc.letrec<{ tree: Expression; unsigned: Expression }>((tie) => ({
  tree: fc.oneof(
    { depthSize: 'small' },
    tie('unsigned'),
    fc.record({ kind: fc.constant('negate' as const), argument: tie('unsigned') }),
  ),
  unsigned: fc.oneof(
    { depthSize: 'small' },
    fc.constantFrom('0', '27', '0.25', '1.5e-3').map((text) => ({ kind: 'number' as const, text, value: +text })),
    fc.constantFrom('x', 'y').map((name) => ({ kind: 'name' as const, name })),
    fc.constant({ kind: 'constant' as const, name: 'pi' as const }),
    fc.record({
      kind: fc.constant('binary' as const),
      operator: fc.constantFrom('+' as const, '-' as const, '*' as const, '/' as const, '^' as const),
      left: tie('tree'),
      right: tie('tree'),
    }),
    fc.record({
      kind: fc.constant('call' as const),
      function: fc.constantFrom(...functionNames),
      argument: tie('tree'),
    }),
  ),
}));

describe('formatFormula', () => {
  it('writes every tree so that it parses to the same tree', () => {
    fc.assert(
      fc.property(tree, (expression) => {
        const text = formatFormula(expression);
        expect(parseFormula(text, new Set(['x', 'y']))).toEqual({ ok: true, expression });
      }),
      { numRuns: 1000, seed: 17 },
    );
  });

  it.each([
    ['((z))-(27)', 'z - 27'],
    ['rho * x - ( y + ( x*z ) )', 'rho*x - (y + x*z)'],
    ['(x*y)*z', 'x*y*z'],
    ['x*(y*z)', 'x*(y*z)'],
    ['(x^y)^z', '(x^y)^z'],
    ['x^(y^z)', 'x^y^z'],
    ['8/3 + 2.50', '8/3 + 2.50'],
  ])('writes %s as %s', (typed, canonical) => {
    const parsed = parseFormula(typed, new Set(['x', 'y', 'z', 'rho']));
    expect(parsed.ok && formatFormula(parsed.expression)).toBe(canonical);
  });
});
