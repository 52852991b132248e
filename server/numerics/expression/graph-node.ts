/** What a node of the graph computes from its operands. */
export type Operation =
  | 'constant'
  | 'parameter'
  | 'state'
  | 'add'
  | 'subtract'
  | 'multiply'
  | 'divide'
  | 'negate'
  | 'square'
  | 'sqrt'
  | 'power'
  | 'exp'
  | 'log'
  | 'sin'
  | 'cos'
  | 'asin'
  | 'acos'
  | 'atan';

/** One value of the graph. Operands are ids of other nodes; -1 where there is none. */
export interface GraphNode {
  readonly operation: Operation;
  readonly a: number;
  readonly b: number;
  /** Value of a constant; index of a parameter or of a state variable; 0 otherwise. */
  readonly value: number;
  /** Depends on parameters and constants alone: one value for a whole run. */
  readonly isStatic: boolean;
  /**
   * The node g with d(this) = g da, for functions of one argument: cos for sin, 1/a for log, ... -1 for the others.
   * For cos it is the sine, and d(cos a) = -g da.
   */
  partner: number;
}
