import type { BinaryOperator } from '@/server/numerics/expression/expression';

/** A node as the generated parser makes it: names are not looked up yet. `at` is the offset of its first character. */
export type ParsedNode =
  | { kind: 'number'; text: string; at: number }
  | { kind: 'name'; name: string; at: number }
  | { kind: 'negate'; argument: ParsedNode; at: number }
  | { kind: 'binary'; operator: BinaryOperator; left: ParsedNode; right: ParsedNode; at: number }
  | { kind: 'call'; function: string; arguments: ParsedNode[]; at: number };
