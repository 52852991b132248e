import { NO_OPERAND, type Tape, type TapeStep } from '@/server/numerics/expression/tape';

interface Estimate {
  value: number;
  /** In units of the last place of the fixed-point numbers. */
  error: number;
}

/**
 * How many units in the last place the right-hand side may be off by, at one state: a running error analysis to first
 * order, every operation adding one unit to what its operands bring.
 *
 * @param tape    its first roots are the field.
 * @param statics static values as doubles.
 * @param state   shape n.
 *
 * Accuracy: first order; an estimate for the choice of guard bits, not a bound.
 * Source: running error analysis, J. H. Wilkinson, Rounding Errors in Algebraic Processes (1963), from memory.
 */
export function roundingGrowth(tape: Tape, statics: ArrayLike<number>, state: ArrayLike<number>): number {
  const slots: Estimate[] = [];
  const at = (operand: number): Estimate => {
    if (operand >= 0) return slots[operand]!;
    return { value: operand === NO_OPERAND ? NaN : statics[~operand]!, error: 1 };
  };
  tape.steps.forEach((step, slot) => {
    slots.push(slot < tape.dimension ? { value: state[slot]!, error: 1 } : estimate(step, at(step.a), at(step.b)));
  });
  return Math.max(...tape.roots.slice(0, tape.dimension).map((root) => at(root).error));
}

function estimate({ operation }: TapeStep, a: Estimate, b: Estimate): Estimate {
  switch (operation) {
    case 'add':
      return { value: a.value + b.value, error: a.error + b.error };
    case 'subtract':
      return { value: a.value - b.value, error: a.error + b.error };
    case 'negate':
      return { value: -a.value, error: a.error };
    case 'multiply':
      return {
        value: a.value * b.value,
        error: Math.abs(a.value) * b.error + Math.abs(b.value) * a.error + 1,
      };
    case 'square':
      return { value: a.value ** 2, error: 2 * Math.abs(a.value) * a.error + 1 };
    case 'divide': {
      const value = a.value / b.value;
      return { value, error: (a.error + Math.abs(value) * b.error) / Math.abs(b.value) + 1 };
    }
    case 'power': {
      const value = a.value ** b.value;
      return {
        value,
        error: Math.abs((b.value * value) / a.value) * a.error + Math.abs(value) * Math.abs(Math.log(a.value)) + 1,
      };
    }
    case 'constant':
    case 'parameter':
    case 'state':
      return { value: NaN, error: NaN };
    default: {
      const value = Math[operation](a.value);
      return { value, error: steepness(operation, a.value, value) * a.error + 1 };
    }
  }
}

/** |d value / d a| of a function of one argument. */
function steepness(
  operation: 'sqrt' | 'exp' | 'log' | 'sin' | 'cos' | 'asin' | 'acos' | 'atan',
  a: number,
  value: number,
): number {
  switch (operation) {
    case 'sqrt':
      return 1 / (2 * value);
    case 'exp':
      return value;
    case 'log':
      return 1 / Math.abs(a);
    case 'sin':
    case 'cos':
      return 1;
    case 'asin':
    case 'acos':
      return 1 / Math.sqrt(1 - a * a);
    case 'atan':
      return 1 / (1 + a * a);
  }
}
