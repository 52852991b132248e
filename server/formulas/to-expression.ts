import { FormulaTrouble } from '@/server/formulas/formula-trouble';
import { NAME_CHARACTERS_LIMIT } from '@/server/formulas/limits';
import type { ParsedNode } from '@/server/formulas/parsed-node';
import { type Expression, type FunctionName, functionNames } from '@/server/numerics/expression/expression';

/** Functions that people know and that a smooth field cannot hold. */
const unsmooth = new Set(
  'abs sign sgn min max floor ceil ceiling round trunc mod fmod rem frac int heaviside step if ite piecewise where'.split(
    ' ',
  ),
);

/** Spellings of other languages, and what to write here. */
const spellings = new Map([
  ['ln', 'log(…), the natural logarithm'],
  ['log10', 'log(…)/log(10)'],
  ['log2', 'log(…)/log(2)'],
  ['pow', 'x^y'],
  ['power', 'x^y'],
  ['cbrt', 'x^(1/3)'],
  ['cot', '1/tan(…)'],
  ['sec', '1/cos(…)'],
  ['csc', '1/sin(…)'],
  ['arcsin', 'asin(…)'],
  ['arccos', 'acos(…)'],
  ['arctan', 'atan(…)'],
]);
const functions = new Map<string, FunctionName>(functionNames.map((name) => [name, name]));

/** Names that nobody may give to a variable, parameter or definition. */
export const isReservedName = (name: string): boolean => name === 'pi' || functions.has(name);

/**
 * Look up the names of a parsed formula.
 *
 * @throws {FormulaTrouble} at the first name or function that is not known, not smooth, or too long.
 */
export function toExpression(node: ParsedNode, known: ReadonlySet<string>): Expression {
  switch (node.kind) {
    case 'number':
      return numberOf(node.text, node.at);
    case 'name':
      return nameOf(node.name, node.at, known);
    case 'negate':
      return { kind: 'negate', argument: toExpression(node.argument, known) };
    case 'binary':
      return {
        kind: 'binary',
        operator: node.operator,
        left: toExpression(node.left, known),
        right: toExpression(node.right, known),
      };
    case 'call':
      return callOf(node, known);
  }
}

function numberOf(text: string, at: number): Expression {
  const value = Number(text);
  if (!Number.isFinite(value)) throw new FormulaTrouble(`The number ${text} is too large for a double.`, at);
  return { kind: 'number', text, value };
}

function nameOf(name: string, at: number, known: ReadonlySet<string>): Expression {
  if (name === 'pi') return { kind: 'constant', name };
  if (known.has(name)) return { kind: 'name', name };
  if (name.length > NAME_CHARACTERS_LIMIT) {
    throw new FormulaTrouble(
      `A name has at most ${NAME_CHARACTERS_LIMIT} characters; this one has ${name.length}.`,
      at,
    );
  }
  if (functions.has(name)) throw new FormulaTrouble(`The function ${name} needs its argument in parentheses.`, at);
  if (name === 't' || name === 'time') {
    throw new FormulaTrouble(
      `The field must not depend on ${name}: make the phase a variable with a modulus, such as theta with theta' = omega.`,
      at,
    );
  }
  if (name === 'e') throw new FormulaTrouble('There is no constant e; write exp(1), and exp(x) for its powers.', at);
  throw new FormulaTrouble(`The name ${name} is neither a variable nor a parameter nor an earlier definition.`, at);
}

function callOf(node: Extract<ParsedNode, { kind: 'call' }>, known: ReadonlySet<string>): Expression {
  const name = functions.get(node.function);
  if (!name) {
    if (unsmooth.has(node.function.toLowerCase())) {
      throw new FormulaTrouble(`${node.function} is refused: the check's order needs a smooth field.`, node.at);
    }
    if (known.has(node.function)) {
      throw new FormulaTrouble(
        `${node.function} is not a function; write ${node.function}*(…) for a product.`,
        node.at,
      );
    }
    const spelling = spellings.get(node.function);
    const advice = spelling ? `Write ${spelling}.` : `There are ${functionNames.join(', ')}.`;
    throw new FormulaTrouble(`There is no function ${node.function}. ${advice}`, node.at);
  }
  const [argument, second] = node.arguments;
  if (!argument || second) throw new FormulaTrouble(`${name} takes one argument.`, node.at);
  return { kind: 'call', function: name, argument: toExpression(argument, known) };
}
