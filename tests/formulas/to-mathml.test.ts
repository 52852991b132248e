import { parseFormula } from '@/server/formulas/parse-formula';
import { equationsToMathML, identifier, toMathML } from '@/server/formulas/to-mathml';
import type { Expression } from '@/server/numerics/expression/expression';

const DOT = '\u0307';

function treeOf(text: string): Expression {
  const parsed = parseFormula(text, new Set(['a', 'b', 'x', 'vx', 'vy', 'omega']));
  if (!parsed.ok) throw new Error(parsed.error.message);
  return parsed.expression;
}

/** What is read aloud or copied: the text without elements; a fraction's bar becomes a slash, a raised row ^{…}. */
const asText = (mathml: string): string =>
  mathml
    .replace(/<mfrac><mrow>(.*?)<\/mrow><mrow>(.*?)<\/mrow><\/mfrac>/g, '[$1/$2]')
    .replace(/<\/mrow><mrow>/g, '^')
    .replace(/<msqrt>/g, '√')
    .replace(/<[^>]*>/g, '')
    .replace(/[\u2061\u2062]/g, '');

describe('toMathML', () => {
  it.each([
    ['a + b*x', 'a+bx'],
    ['a - (b - x)', 'a−(b−x)'],
    ['-(a + b)*x', '−(a+b)x'],
    ['a*-b', 'a(−b)'],
    ['a/(b + x)', '[a/b+x]'],
    ['(a/b)^2', '([a/b])^2'],
    ['(a + b)^-2', '(a+b)^−2'],
    ['-x^2', '−x^2'],
    ['(-x)^2', '(−x)^2'],
    ['2*3*x', '2·3x'],
    ['x*2', 'x·2'],
    ['vx*vy', 'vx·vy'],
    ['2*omega*x', '2ωx'],
    ['sqrt(a + b)', '√a+b'],
    ['log(x)*sin(x)', 'ln(x)sin(x)'],
    ['2*pi', '2π'],
  ])('sets %s', (formula, text) => {
    expect(asText(toMathML(treeOf(formula)))).toBe(text);
  });

  it('closes what it opens', () => {
    const open: string[] = [];
    const source = toMathML(treeOf('sqrt((a - b)^2/(1 + x^2))*exp(-a*(b + 1)/2)^omega'));
    for (const [, slash, name] of source.matchAll(/<(\/?)([a-z]+)[^>]*>/g)) {
      if (slash) expect(open.pop()).toBe(name);
      else open.push(name!);
    }
    expect(open).toEqual([]);
  });
});

describe('identifier', () => {
  it.each([
    ['x', '<mi>x</mi>'],
    ['theta', '<mi>θ</mi>'],
    ['x1', '<msub><mi>x</mi><mn>1</mn></msub>'],
    ['omega_0', '<msub><mi>ω</mi><mn>0</mn></msub>'],
    ['r_max', '<msub><mi>r</mi><mi mathvariant="italic">max</mi></msub>'],
    ['vx', '<mi mathvariant="italic">vx</mi>'],
    ['a1b', '<mi mathvariant="italic">a1b</mi>'],
  ])('sets %s', (name, mathml) => expect(identifier(name)).toBe(mathml));

  it('puts the dot of a derivative over its letter, and over the whole of a longer name', () => {
    expect(identifier('x1', DOT)).toBe(`<msub><mi>x${DOT}</mi><mn>1</mn></msub>`);
    expect(identifier('theta', DOT)).toBe(`<mi>θ${DOT}</mi>`);
    expect(identifier('vx', DOT)).toBe('<mover accent="true"><mi mathvariant="italic">vx</mi><mo>\u02d9</mo></mover>');
  });
});

describe('equationsToMathML', () => {
  it('gives every equation and definition a row of three cells', () => {
    const source = equationsToMathML(
      [
        { variable: 'x', expression: treeOf('a') },
        { variable: 'vx', expression: treeOf('-x') },
      ],
      [{ name: 'a', expression: treeOf('2*x') }],
    );
    const rows = [...source.matchAll(/<mtr>(.*?)<\/mtr>/g)].map(([, row]) => row!);
    expect(rows.map(asText)).toEqual([`x${DOT}=a`, 'vx\u02d9=−x', 'a=2x']);
    rows.forEach((row) => expect(row.match(/<mtd>/g)).toHaveLength(3));
  });
});
