import { parseFormula } from '@/server/formulas/parse-formula';
import { buildNode } from '@/server/numerics/expression/build-node';
import { deriveNode } from '@/server/numerics/expression/derive-node';
import { Graph } from '@/server/numerics/expression/graph';
import { staticValues } from '@/server/numerics/expression/static-values';
import { makeTape } from '@/server/numerics/expression/tape';
import { InterpretedKernel } from '@/server/numerics/taylor/interpreted-kernel';

const POINT = { x: 0.4, y: 1.7 };
const C = 2.5;

/** The derivative of a formula by x, made on the graph and evaluated at the point. */
function derivativeAt(formula: string): number {
  const graph = new Graph();
  const names = new Map([
    ['x', graph.state(0)],
    ['y', graph.state(1)],
    ['c', graph.parameter(0)],
  ]);
  const parsed = parseFormula(formula, new Set(names.keys()));
  if (!parsed.ok) throw new Error(parsed.error.message);
  const root = deriveNode(graph, buildNode(graph, parsed.expression, names), 0, new Map<number, number>());
  const zero = graph.constant(0);
  const tape = makeTape(graph, 2, [zero, zero, root], 0);
  const statics = staticValues(tape.statics, [C]);
  const operand = tape.roots[2]!;
  if (operand < 0) return statics[~operand]!;
  const kernel = new InterpretedKernel(tape, 0, 0);
  kernel.memory.set(statics, 0);
  kernel.memory[kernel.seriesStart] = POINT.x;
  kernel.memory[kernel.seriesStart + 1] = POINT.y;
  kernel.run(0);
  return kernel.memory[kernel.seriesStart + operand]!;
}

const { x, y } = POINT;

describe('deriveNode', () => {
  // Textbook derivatives, written out by hand.
  it.each<[string, number]>([
    ['y', 0],
    ['c', 0],
    ['3*x - y', 3],
    ['x*y', y],
    ['x^2*y', 2 * x * y],
    ['y/x', -y / x ** 2],
    ['(x - y)/(x + y)', (2 * y) / (x + y) ** 2],
    ['x^5', 5 * x ** 4],
    ['x^-2', -2 * x ** -3],
    ['x^c', C * x ** (C - 1)],
    ['c^x', Math.log(C) * C ** x],
    ['x^x', (1 + Math.log(x)) * x ** x],
    ['(x^2 + y^2)^(-3/2)', -3 * x * (x * x + y * y) ** -2.5],
    ['sqrt(x + y)', 0.5 / Math.sqrt(x + y)],
    ['exp(x*y)', y * Math.exp(x * y)],
    ['log(x)', 1 / x],
    ['sin(2*x)', 2 * Math.cos(2 * x)],
    ['cos(2*x)', -2 * Math.sin(2 * x)],
    ['tan(x)', 1 / Math.cos(x) ** 2],
    ['asin(x)', 1 / Math.sqrt(1 - x * x)],
    ['acos(x)', -1 / Math.sqrt(1 - x * x)],
    ['atan(x)', 1 / (1 + x * x)],
    ['sinh(x)', Math.cosh(x)],
    ['cosh(x)', Math.sinh(x)],
    ['tanh(x)', 1 / Math.cosh(x) ** 2],
    ['-sin(x)', -Math.cos(x)],
  ])('derives %s', (formula, exact) => {
    // A few operations, each right to an ulp.
    expect(Math.abs(derivativeAt(formula) - exact)).toBeLessThanOrEqual(1e-14 * Math.max(1, Math.abs(exact)));
  });
});
