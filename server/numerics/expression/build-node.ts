import type { BinaryOperator, Expression, FunctionName } from '@/server/numerics/expression/expression';
import type { Graph } from '@/server/numerics/expression/graph';

/** What a name stands for: the node of a variable, a parameter or a definition. */
export type Names = ReadonlyMap<string, number>;

/**
 * Add an expression to a graph.
 *
 * @param names what each name stands for.
 * @returns     id of the node of the whole expression.
 * @throws {RangeError} when the expression holds a name that `names` does not know.
 */
export function buildNode(graph: Graph, expression: Expression, names: Names): number {
  switch (expression.kind) {
    case 'number':
      return graph.constant(expression.value);
    case 'constant':
      return graph.constant(Math.PI);
    case 'name': {
      const id = names.get(expression.name);
      if (id === undefined) throw new RangeError(`the name ${expression.name} is not known`);
      return id;
    }
    case 'negate':
      return graph.negative(buildNode(graph, expression.argument, names));
    case 'binary':
      return combine(graph, expression.operator, [
        buildNode(graph, expression.left, names),
        buildNode(graph, expression.right, names),
      ]);
    case 'call':
      return apply(graph, expression.function, buildNode(graph, expression.argument, names));
  }
}

function combine(graph: Graph, operator: BinaryOperator, [a, b]: readonly [number, number]): number {
  switch (operator) {
    case '+':
      return graph.sum(a, b);
    case '-':
      return graph.difference(a, b);
    case '*':
      return graph.product(a, b);
    case '/':
      return graph.quotient(a, b);
    case '^':
      return graph.power(a, b);
  }
}

/** tan, sinh, cosh and tanh are written with sin, cos and exp; every other function has a recurrence of its own. */
function apply(graph: Graph, name: FunctionName, a: number): number {
  switch (name) {
    case 'tan':
      return graph.quotient(graph.unary('sin', a), graph.unary('cos', a));
    case 'sinh':
      return graph.product(graph.constant(0.5), graph.difference(growing(graph, a), falling(graph, a)));
    case 'cosh':
      return graph.product(graph.constant(0.5), graph.sum(growing(graph, a), falling(graph, a)));
    case 'tanh':
      return tanh(graph, a);
    default:
      return graph.unary(name, a);
  }
}

const growing = (graph: Graph, a: number): number => graph.unary('exp', a);
const falling = (graph: Graph, a: number): number => graph.unary('exp', graph.negative(a));

/** tanh a = (e^a - e^-a) / (e^a + e^-a). */
const tanh = (graph: Graph, a: number): number =>
  graph.quotient(
    graph.difference(growing(graph, a), falling(graph, a)),
    graph.sum(growing(graph, a), falling(graph, a)),
  );
