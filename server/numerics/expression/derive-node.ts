import type { Graph } from '@/server/numerics/expression/graph';

/**
 * The partial derivative of a node by one state variable, as a node of the same graph.
 *
 * Every operation is differentiated by the chain rule; functions of one argument use their partner g, d c = g da.
 *
 * @param variable index of the state variable.
 * @param known    derivatives already made by this variable, by node; filled on the way.
 */
export function deriveNode(graph: Graph, id: number, variable: number, known: Map<number, number>): number {
  const found = known.get(id);
  if (found !== undefined) return found;
  const made = derive(graph, id, variable, known);
  known.set(id, made);
  return made;
}

function derive(graph: Graph, id: number, variable: number, known: Map<number, number>): number {
  const { operation, a, b, value, isStatic, partner } = graph.node(id);
  if (isStatic) return graph.constant(0);
  const of = (operand: number): number => deriveNode(graph, operand, variable, known);
  switch (operation) {
    case 'constant':
    case 'parameter':
      return graph.constant(0);
    case 'state':
      return graph.constant(value === variable ? 1 : 0);
    case 'add':
      return graph.sum(of(a), of(b));
    case 'subtract':
      return graph.difference(of(a), of(b));
    case 'negate':
      return graph.negative(of(a));
    case 'multiply':
      return graph.sum(graph.product(of(a), b), graph.product(a, of(b)));
    case 'divide':
      return graph.quotient(graph.difference(of(a), graph.product(id, of(b))), b);
    case 'square':
      return graph.product(graph.product(graph.constant(2), a), of(a));
    case 'cos':
      return graph.negative(graph.product(partner, of(a)));
    case 'sqrt':
    case 'power':
    case 'exp':
    case 'log':
    case 'sin':
    case 'asin':
    case 'acos':
    case 'atan':
      return graph.product(partner, of(a));
  }
}
