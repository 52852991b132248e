/** The functions of the formula language; all are analytic where they are defined. */
export const functionNames = [
  'sqrt',
  'exp',
  'log',
  'sin',
  'cos',
  'tan',
  'asin',
  'acos',
  'atan',
  'sinh',
  'cosh',
  'tanh',
] as const;

export type FunctionName = (typeof functionNames)[number];
export type BinaryOperator = '+' | '-' | '*' | '/' | '^';

/** A formula as a tree. Numbers keep their text, so that no digit is lost to a double. */
export type Expression =
  | { kind: 'number'; text: string; value: number }
  | { kind: 'constant'; name: 'pi' }
  | { kind: 'name'; name: string }
  | { kind: 'negate'; argument: Expression }
  | { kind: 'binary'; operator: BinaryOperator; left: Expression; right: Expression }
  | { kind: 'call'; function: FunctionName; argument: Expression };
