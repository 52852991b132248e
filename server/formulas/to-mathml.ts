import { bindingOf } from '@/server/formulas/format-formula';
import { greekLetters } from '@/server/formulas/greek-letters';
import type { Expression } from '@/server/numerics/expression/expression';

/** Combining dot above: a derivative by time. */
const DOT = '\u0307';
/** The same as a sign of its own. */
const OVER = '\u02d9';
const TIMES = '\u2062';
const MINUS = '\u2212';

/** One formula as a MathML element. */
export const toMathML = (expression: Expression): string => `<math>${row(expression)}</math>`;

/**
 * Equations aligned on their equals signs, one to a row; definitions come after the equations that use them.
 *
 * @returns one `math` element with a table.
 */
export function equationsToMathML(
  equations: readonly { variable: string; expression: Expression }[],
  definitions: readonly { name: string; expression: Expression }[],
): string {
  const rows = [
    ...equations.map(({ variable, expression }) => tableRow(identifier(variable, DOT), expression)),
    ...definitions.map(({ name, expression }) => tableRow(identifier(name), expression)),
  ];
  return `<math display="block"><mtable columnalign="right center left" displaystyle="true">${rows.join('')}</mtable></math>`;
}

const tableRow = (left: string, right: Expression): string =>
  `<mtr><mtd>${left}</mtd><mtd><mo>=</mo></mtd><mtd>${row(right)}</mtd></mtr>`;

const row = (expression: Expression): string => `<mrow>${inner(expression)}</mrow>`;

function inner(expression: Expression): string {
  switch (expression.kind) {
    case 'number':
      return `<mn>${expression.text}</mn>`;
    case 'constant':
      return '<mi>π</mi>';
    case 'name':
      return identifier(expression.name);
    case 'negate':
      return `<mo>${MINUS}</mo>${enclosed(expression.argument, 2)}`;
    case 'call':
      return call(expression.function, expression.argument);
    case 'binary':
      return binary(expression);
  }
}

function binary({ operator, left, right }: Extract<Expression, { kind: 'binary' }>): string {
  switch (operator) {
    case '+':
      return `${inner(left)}<mo>+</mo>${enclosed(right, 1)}`;
    case '-':
      return `${inner(left)}<mo>${MINUS}</mo>${enclosed(right, 2)}`;
    case '*':
      return `${enclosed(left, 2)}<mo>${between(left, right)}</mo>${enclosed(right, 4)}`;
    case '/':
      return `<mfrac>${row(left)}${row(right)}</mfrac>`;
    case '^':
      return `<msup>${base(left)}${row(right)}</msup>`;
  }
}

/** A product is set without a sign, unless two numbers or words would run into one another. */
const between = (left: Expression, right: Expression): string => {
  const next = firstOf(right);
  return next.kind === 'number' || (isWord(next) && isWord(lastOf(left))) ? '·' : TIMES;
};

/** What stands at the right end of an expression as it is set; a fraction is one thing. */
const lastOf = (expression: Expression): Expression =>
  expression.kind === 'binary' && expression.operator === '*' ? lastOf(expression.right) : expression;

const firstOf = (expression: Expression): Expression =>
  expression.kind === 'binary' && (expression.operator === '*' || expression.operator === '^')
    ? firstOf(expression.left)
    : expression;

/** A name of several letters. */
const isWord = (expression: Expression): boolean =>
  expression.kind === 'name' && expression.name.length > 1 && !greekLetters.has(expression.name);

function call(name: string, argument: Expression): string {
  if (name === 'sqrt') return `<msqrt>${row(argument)}</msqrt>`;
  const word = name === 'log' ? 'ln' : name;
  return `<mi mathvariant="normal">${word}</mi><mo>\u2061</mo><mo>(</mo>${inner(argument)}<mo>)</mo>`;
}

const enclosed = (expression: Expression, least: number): string =>
  bindingOf(expression) >= least || isFraction(expression) ? inner(expression) : parenthesised(expression);

const parenthesised = (expression: Expression): string => `<mo>(</mo>${inner(expression)}<mo>)</mo>`;

/** What a power is raised from: anything but a number or a name stands in parentheses. */
const base = (expression: Expression): string => {
  const isAtom = ['number', 'constant', 'name'].includes(expression.kind);
  return `<mrow>${isAtom ? inner(expression) : parenthesised(expression)}</mrow>`;
};

/** A fraction's bar encloses it. */
const isFraction = (expression: Expression): boolean => expression.kind === 'binary' && expression.operator === '/';

/**
 * A name: Greek where it is a Greek letter's; digits at its end, or what follows its first underscore, as an index.
 * The dot of a derivative stands after a single letter, and over the whole of a longer name.
 */
export function identifier(name: string, accent = ''): string {
  const [, letters = name, index = ''] = /^([A-Za-z]+)_?([0-9]+|(?<=_).+)?$/.exec(name) ?? [];
  const symbol = greekLetters.get(letters) ?? letters;
  const letter = symbolOf(symbol, accent);
  return index ? `<msub>${letter}${indexOf(index)}</msub>` : letter;
}

function symbolOf(symbol: string, accent: string): string {
  if (symbol.length === 1) return `<mi>${symbol}${accent}</mi>`;
  const word = `<mi mathvariant="italic">${symbol}</mi>`;
  return accent === '' ? word : `<mover accent="true">${word}<mo>${OVER}</mo></mover>`;
}

const indexOf = (index: string): string =>
  /^[0-9]+$/.test(index) ? `<mn>${index}</mn>` : `<mi mathvariant="italic">${greekLetters.get(index) ?? index}</mi>`;
