import fc from 'fast-check';
import { evaluate } from '@/server/formulas/evaluate';
import { formatFormula } from '@/server/formulas/format-formula';
import { parseFormula } from '@/server/formulas/parse-formula';

const known = new Set(['x', 'y']);
const values = new Map([
  ['x', 3],
  ['y', 2],
]);

function treeOf(text: string) {
  const parsed = parseFormula(text, known);
  if (!parsed.ok) throw new Error(parsed.error.message);
  return parsed.expression;
}

describe('parseFormula', () => {
  it.each([
    ['-x^2', -9],
    ['x^y^y', 81],
    ['x - y - 1', 0],
    ['x/y/2', 0.75],
    ['2*-x', -6],
    ['x^-y', 1 / 9],
    ['--x', 3],
    ['8/3', 8 / 3],
    ['1.5e1 + sqrt(x + 1)', 17],
    ['sin(pi/2)', 1],
  ])('reads %s as mathematics does', (text, value) => {
    expect(evaluate(treeOf(text), values)).toBe(value);
  });

  it.each(['x - (y - 1)', 'x/(y*2)', '(x*y)^2', '-(x + y)', '(-x)^2', 'x^(y + 1)', 'sin(x)*cos(y)'])(
    'writes %s so that it reads the same again',
    (text) => {
      const tree = treeOf(text);
      expect(treeOf(formatFormula(tree))).toEqual(tree);
    },
  );

  it.each([
    ['an open end', 'x+', 3, /ends too early/],
    ['a product without a sign', '2x', 2, /Here stands “x”/],
    ['a stranger’s power', 'x**2', 3, /“\*”/],
    ['a typeset minus', 'x − y', 3, /minus sign is typed as -/],
    ['a typeset power', 'x²', 2, /power is typed as \^/],
    ['an open parenthesis', '(x + y', 7, /“\)” is missing/],
    ['a closing parenthesis too many', 'x + y)', 6, /Here stands “\)”/],
    ['a point without a digit before it', '.5*x', 1, /digit stands before/],
    ['a point without a digit after it', '5.*x', 2, /digit stands after/],
    ['a function without parentheses', 'sin x', 5, /function sin needs its argument in parentheses/],
    ['another language’s logarithm', 'y + ln(x)', 5, /no function ln. Write log/],
    ['Euler’s number', 'e^x', 1, /exp\(1\)/],
    ['a character outside the plane', 'x + 𝜃', 5, /Here stands “𝜃”/],
    ['the prototype of every object', '__proto__', 1, /Here stands “_”/],
    ['a remainder', 'x % y', 3, /smooth/],
    ['an unknown name', 'x + q', 5, /name q/],
    ['a property of every object', 'x*constructor', 3, /name constructor/],
    ['explicit time', 'cos(t)', 5, /phase a variable/],
    ['an absolute value', '1 + abs(x)', 5, /abs is refused.*smooth/],
    ['a minimum', 'min(x, y)', 1, /min is refused.*smooth/],
    ['a comparison', 'x > 0', 3, /smooth/],
    ['bars', '|x|', 1, /smooth/],
    ['an unknown function', 'x + foo(x)', 5, /no function foo/],
    ['a function without argument', 'sin + 1', 1, /parentheses/],
    ['two arguments', 'sin(x, y)', 1, /one argument/],
    ['a variable that is called', 'x(y)', 1, /not a function/],
    ['too large a number', '1 + 1e400', 5, /1e400/],
    ['deep parentheses', `${'('.repeat(101)}x${')'.repeat(101)}`, 101, /at most 100 deep/],
    ['a tower of powers', `${'x^'.repeat(150)}x`, 203, /at most 100 deep/],
    ['nothing', '  ', null, /empty/],
    ['8,001 characters', `x${' '.repeat(8000)}`, null, /at most 8000 characters; this one has 8001/],
    ['too many nodes', `x${'+x'.repeat(2600)}`, null, /at most 5000/],
    ['too long a name', `x + ${'a'.repeat(33)}`, 5, /at most 32 characters; this one has 33/],
  ])('refuses %s and says where', (_, text, position, message) => {
    const parsed = parseFormula(text, known);
    expect(parsed).toMatchObject({ ok: false, error: { position, message: expect.stringMatching(message) } });
  });

  it('answers anything that can be typed, with a position inside it where there is one', () => {
    const pieces = fc.array(
      fc.oneof(
        fc.constantFrom(...Array.from('xy0.e+-*/^(), \n'), 'sin', 'abs(', 'pi', 't', '1e5'),
        fc.string({ unit: 'binary' }),
      ),
      { maxLength: 30 },
    );
    fc.assert(
      fc.property(pieces, (parts) => {
        const text = parts.join('');
        const parsed = parseFormula(text, known);
        if (parsed.ok || parsed.error.position === null) return;
        expect(parsed.error.position).toBeGreaterThanOrEqual(1);
        expect(parsed.error.position).toBeLessThanOrEqual(text.length + 1);
        expect(parsed.error.message.isWellFormed()).toBe(true);
      }),
      { numRuns: 2000, seed: 29 },
    );
  });
});
