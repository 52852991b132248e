import { FormulaTrouble } from '@/server/formulas/formula-trouble';
import { parse, SyntaxError as FormulaSyntaxError } from '@/server/formulas/generated/parser';
import { FORMULA_CHARACTERS_LIMIT, FORMULA_NODES_LIMIT, NESTING_LIMIT } from '@/server/formulas/limits';
import type { ParsedNode } from '@/server/formulas/parsed-node';
import { syntaxTrouble } from '@/server/formulas/syntax-trouble';
import { toExpression } from '@/server/formulas/to-expression';
import type { Expression } from '@/server/numerics/expression/expression';

/** What is wrong with a formula; `position` counts characters from 1, null where the whole formula is meant. */
interface FormulaError {
  message: string;
  position: number | null;
}

export type ParsedFormula = { ok: true; expression: Expression } | { ok: false; error: FormulaError };

/**
 * Parse a formula and look up its names.
 *
 * @param known names that the formula may use besides the functions and pi.
 * @returns the tree, or the first error with its position.
 */
export function parseFormula(text: string, known: ReadonlySet<string>): ParsedFormula {
  try {
    const parsed = parseText(text);
    const expression = toExpression(parsed, known);
    return { ok: true, expression };
  } catch (error) {
    if (error instanceof FormulaTrouble) return refuse(error.message, error.at);
    throw error;
  }
}

function parseText(text: string): ParsedNode {
  if (text.trim() === '') throw new FormulaTrouble('The formula is empty.', null);
  if (text.length > FORMULA_CHARACTERS_LIMIT) {
    throw new FormulaTrouble(
      `A formula has at most ${FORMULA_CHARACTERS_LIMIT} characters; this one has ${text.length}.`,
      null,
    );
  }
  refuseDeepParentheses(text);
  let parsed: ParsedNode;
  try {
    parsed = parse(text);
  } catch (error) {
    if (error instanceof FormulaSyntaxError) throw syntaxTrouble(error, text);
    // The parser recurs: a tower of powers beyond the limit ends its stack first.
    if (error instanceof RangeError) throw new FormulaTrouble(`A formula nests at most ${NESTING_LIMIT} deep.`, null);
    throw error;
  }
  refuseLarge(parsed);
  return parsed;
}

function refuseDeepParentheses(text: string): void {
  let depth = 0;
  for (let at = 0; at < text.length; at++) {
    if (text[at] === '(') depth += 1;
    if (text[at] === ')') depth -= 1;
    if (depth > NESTING_LIMIT) throw new FormulaTrouble(`A formula nests at most ${NESTING_LIMIT} deep.`, at);
  }
}

/** Count nodes and the depth of powers; sums and products lean to the left and do not count as nesting. */
function refuseLarge(root: ParsedNode): void {
  let nodes = 0;
  const waiting = [{ node: root, depth: 0 }];
  for (let next = waiting.pop(); next !== undefined; next = waiting.pop()) {
    const { node, depth } = next;
    nodes += 1;
    if (nodes > FORMULA_NODES_LIMIT) {
      throw new FormulaTrouble(`A formula has at most ${FORMULA_NODES_LIMIT} numbers, names and operations.`, null);
    }
    if (depth > NESTING_LIMIT) throw new FormulaTrouble(`A formula nests at most ${NESTING_LIMIT} deep.`, node.at);
    waiting.push(...childrenOf(node).map(({ child, deeper }) => ({ node: child, depth: depth + deeper })));
  }
}

function childrenOf(node: ParsedNode): { child: ParsedNode; deeper: number }[] {
  switch (node.kind) {
    case 'number':
    case 'name':
      return [];
    case 'negate':
      return [{ child: node.argument, deeper: 0 }];
    case 'call':
      return node.arguments.map((child) => ({ child, deeper: 1 }));
    case 'binary':
      return [
        { child: node.left, deeper: 0 },
        { child: node.right, deeper: node.operator === '^' ? 1 : 0 },
      ];
  }
}

const refuse = (message: string, at: number | null): ParsedFormula => ({
  ok: false,
  error: { message, position: at === null ? null : at + 1 },
});
