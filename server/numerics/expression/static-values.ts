import type { StaticStep } from '@/server/numerics/expression/tape';

const operand = (values: Float64Array, index: number): number => values[index] ?? NaN;

/**
 * The static values of a tape for one set of parameters.
 *
 * @param parameters values in the order of the definition.
 * @returns one value a static step; NaN or an infinity where an operation is not defined there.
 */
export function staticValues(statics: readonly StaticStep[], parameters: readonly number[]): Float64Array {
  const values = new Float64Array(statics.length);
  statics.forEach((step, index) => {
    values[index] = staticValue(step, values, parameters);
  });
  return values;
}

function staticValue(step: StaticStep, values: Float64Array, parameters: readonly number[]): number {
  const a = operand(values, step.a);
  const b = operand(values, step.b);
  switch (step.operation) {
    case 'constant':
      return step.value;
    case 'parameter':
      return parameters[step.value] ?? NaN;
    case 'state':
      return NaN;
    case 'add':
      return a + b;
    case 'subtract':
      return a - b;
    case 'multiply':
      return a * b;
    case 'divide':
      return a / b;
    case 'negate':
      return -a;
    case 'square':
      return a * a;
    case 'power':
      return a ** b;
    default:
      return Math[step.operation](a);
  }
}
