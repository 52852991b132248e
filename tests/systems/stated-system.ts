import type { SystemDocument, TypedNumber } from '@/schemas/generated/contract';
import { evaluateDual, type Dual } from '@/tests/systems/dual';

/** A typed number as a double; p/q is divided once. */
function doubleOf(typed: TypedNumber): number {
  const [p = '', q = '1'] = String(typed).split('/');
  return Number(p) / Number(q);
}

/** Values of a state, in the order of the variables, and of the derivative of each along one direction. */
export interface DualState {
  x: readonly number[];
  direction: readonly number[];
}

/** A system document made computable without the product's own parser: for tests only. */
export class StatedSystem {
  private readonly parameters: Map<string, Dual>;

  constructor(
    readonly document: SystemDocument,
    given: Record<string, TypedNumber> = {},
  ) {
    this.parameters = new Map(
      document.parameters.map(({ name, value }) => [name, { v: doubleOf(given[name] ?? value), d: 0 }]),
    );
    for (const name of Object.keys(given)) {
      if (!this.parameters.has(name)) throw new RangeError(`${name} is no parameter of ${document.name}`);
    }
  }

  /** Value and directional derivative of a formula of this system. */
  evaluate(formula: string, { x, direction }: DualState): Dual {
    const names = new Map(this.parameters);
    this.document.variables.forEach(({ name }, i) => names.set(name, { v: x[i]!, d: direction[i]! }));
    for (const { name, formula: text } of this.document.definitions ?? []) names.set(name, evaluateDual(text, names));
    return evaluateDual(formula, names);
  }

  /** Value of a formula at a state. */
  at(formula: string, x: readonly number[]): number {
    return this.evaluate(formula, { x, direction: x.map(() => 0) }).v;
  }

  /** The right-hand sides at a state, in the order of the variables. */
  field(x: readonly number[]): number[] {
    return this.document.variables.map(({ name }) => this.at(this.document.equations[name]!, x));
  }
}
