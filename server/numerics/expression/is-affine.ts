import type { Graph } from '@/server/numerics/expression/graph';

/** Whether a node is an affine function of the state: its derivatives are static. */
export function isAffine(graph: Graph, id: number): boolean {
  const { operation, a, b, isStatic } = graph.node(id);
  if (isStatic) return true;
  switch (operation) {
    case 'state':
      return true;
    case 'add':
    case 'subtract':
      return isAffine(graph, a) && isAffine(graph, b);
    case 'negate':
      return isAffine(graph, a);
    case 'multiply':
      return graph.node(a).isStatic ? isAffine(graph, b) : graph.node(b).isStatic && isAffine(graph, a);
    case 'divide':
      return graph.node(b).isStatic && isAffine(graph, a);
    default:
      return false;
  }
}
