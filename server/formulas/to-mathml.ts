import { bindingOf } from '@/server/formulas/format-formula';
import { greekLetters } from '@/server/formulas/greek-letters';
import type { Expression } from '@/server/numerics/expression/expression';

/** Combining dot above: a derivative by time. */
const DOT = '\u0307';
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
      return `${enclosed(left, 2)}<mo>${between(left, right)}</mo>${enclosed(right, 3)}`;
    case '/':
      return `<mfrac>${row(left)}${row(right)}</mfrac>`;
    case '^':
      return `<msup><mrow>${enclosed(left, 5)}</mrow>${row(right)}</msup>`;
  }
}

/** Between two numbers a dot is needed; elsewhere a product is set without a sign. */
const between = (left: Expression, right: Expression): string =>
  endsInNumber(left) && startsWithNumber(right) ? '·' : TIMES;

const endsInNumber = (expression: Expression): boolean =>
  expression.kind === 'number' ||
  (expression.kind === 'binary' && expression.operator === '*' && endsInNumber(expression.right));

const startsWithNumber = (expression: Expression): boolean =>
  expression.kind === 'number' ||
  (expression.kind === 'binary' && expression.operator !== '/' && startsWithNumber(expression.left));

function call(name: string, argument: Expression): string {
  if (name === 'sqrt') return `<msqrt>${row(argument)}</msqrt>`;
  const word = name === 'log' ? 'ln' : name;
  return `<mi mathvariant="normal">${word}</mi><mo>\u2061</mo><mo>(</mo>${inner(argument)}<mo>)</mo>`;
}

const enclosed = (expression: Expression, least: number): string =>
  bindingOf(expression) >= least || isFraction(expression)
    ? inner(expression)
    : `<mo>(</mo>${inner(expression)}<mo>)</mo>`;

/** A fraction's bar encloses it, except under a power. */
const isFraction = (expression: Expression): boolean => expression.kind === 'binary' && expression.operator === '/';

/** A name: Greek where it is a Greek letter's, digits at its end as an index. */
export function identifier(name: string, accent = ''): string {
  const [, letters = name, digits = ''] = /^([A-Za-z]+?)_?([0-9]*)$/.exec(name) ?? [];
  const symbol = `${greekLetters.get(letters) ?? letters}${accent}`;
  const word = letters.length > 1 && !greekLetters.has(letters) && accent === '' ? ' mathvariant="italic"' : '';
  return digits ? `<msub><mi${word}>${symbol}</mi><mn>${digits}</mn></msub>` : `<mi${word}>${symbol}</mi>`;
}
