import type { Expression } from '@/server/numerics/expression/expression';
import { parseRational, rationalOfDouble, type Rational } from '@/server/numerics/precision/rational';
import type { ExactValue } from '@/server/numerics/precision/precise-statics';

/** A system with one section and exact parameters. */
export interface PreciseDefinition {
  /** A modulus is a formula of constants and parameters; null for a coordinate that is no angle. */
  variables: readonly { name: string; modulus: Expression | null }[];
  parameters: readonly { name: string; exact: Rational }[];
  /** In order: each may use the ones before it. */
  definitions: readonly { name: string; expression: Expression }[];
  /** In the order of the variables. */
  equations: readonly Expression[];
  section: Expression;
  /** What stays at its value where the orbit belongs to a family; null for nothing. */
  hold: Expression | null;
}

/** Names that no formula can hold, for numbers that no double holds. */
const nameOf = (text: string): string => `number ${text}`;
const PI = 'number pi';

/** Turns numbers that no double holds, and π, into names of further parameters. */
export class ExactNumbers {
  /** Names and values of the further parameters, in the order of their first use. */
  readonly values = new Map<string, ExactValue>();

  /** The same expression with exact numbers only. */
  exact(expression: Expression): Expression {
    switch (expression.kind) {
      case 'number':
        return this.number(expression);
      case 'constant':
        return this.named(PI, 'pi');
      case 'name':
        return expression;
      case 'negate':
      case 'call':
        return { ...expression, argument: this.exact(expression.argument) };
      case 'binary':
        return { ...expression, left: this.exact(expression.left), right: this.exact(expression.right) };
    }
  }

  private number(expression: Extract<Expression, { kind: 'number' }>): Expression {
    const typed = parseRational(expression.text);
    const double = rationalOfDouble(expression.value);
    if (typed.p === double.p && typed.q === double.q) return expression;
    return this.named(nameOf(expression.text), typed);
  }

  private named(name: string, value: ExactValue): Expression {
    this.values.set(name, value);
    return { kind: 'name', name };
  }
}
