import type { Graph } from '@/server/numerics/expression/graph';
import type { Operation } from '@/server/numerics/expression/graph-node';

/** Marks an operand that is not there. */
export const NO_OPERAND = -0x8000_0000;

/** One value that varies along the flow. */
export interface TapeStep {
  operation: Operation;
  /** Operands: a slot when ≥ 0, the static value ~operand when negative, NO_OPERAND when there is none. */
  a: number;
  b: number;
  partner: number;
  /** Whether its derivatives by the initial state are needed. */
  isVaried: boolean;
  /** Node of the graph, for messages. */
  node: number;
}

/** One static value: computed once a run, from parameters and earlier static values. */
export interface StaticStep {
  operation: Operation;
  /** Indices of earlier static values, -1 where there is none. */
  a: number;
  b: number;
  /** A constant's value, a parameter's index. */
  value: number;
}

/**
 * A graph as two straight lists: what is computed once, and what is computed at every order of a Taylor series.
 * Slots 0 … dimension − 1 are the state variables.
 */
export interface Tape {
  dimension: number;
  steps: TapeStep[];
  statics: StaticStep[];
  /** Where each requested root stands: operands as in a step. */
  roots: number[];
}

/**
 * Flatten the part of a graph that the given roots need.
 *
 * @param dimension number of state variables; they always have a slot.
 * @param roots     ids of the nodes asked for.
 * @param varied    how many of the roots, from the first on, need derivatives.
 */
export function makeTape(graph: Graph, dimension: number, roots: readonly number[], varied: number): Tape {
  const isVaried = reachable(graph, roots.slice(0, varied), () => false);
  // The derivative of a function needs its partner's series, though not the partner's derivative.
  const partners = [...isVaried].map((id) => graph.node(id).partner);
  const needed = reachable(graph, [...roots, ...partners], recursOnPartner);
  const states = Array.from({ length: dimension }, (_, index) => graph.state(index));
  const ids = [...needed].filter((id) => graph.node(id).operation !== 'state').sort((x, y) => x - y);
  const slots = new Map<number, number>();
  [...states, ...ids.filter((id) => !graph.node(id).isStatic)].forEach((id, slot) => slots.set(id, slot));
  const statics = new Map<number, number>();
  ids.filter((id) => graph.node(id).isStatic).forEach((id, index) => statics.set(id, index));

  const operandOf = (id: number): number => {
    if (id < 0) return NO_OPERAND;
    const slot = slots.get(id);
    if (slot !== undefined) return slot;
    const index = statics.get(id);
    return index === undefined ? NO_OPERAND : ~index;
  };
  return {
    dimension,
    steps: [...slots.keys()].map((id) => {
      const { operation, a, b, partner } = graph.node(id);
      return {
        operation,
        a: operandOf(a),
        b: operandOf(b),
        partner: operandOf(partner),
        isVaried: isVaried.has(id),
        node: id,
      };
    }),
    statics: [...statics.keys()].map((id) => {
      const { operation, a, b, value } = graph.node(id);
      return { operation, a: statics.get(a) ?? -1, b: statics.get(b) ?? -1, value };
    }),
    roots: roots.map(operandOf),
  };
}

/** Every node that the roots need, by way of operands and of those partners that the given operations ask for. */
function reachable(
  graph: Graph,
  roots: readonly number[],
  needsPartner: (operation: Operation) => boolean,
): Set<number> {
  const seen = new Set<number>();
  const waiting = [...roots];
  for (let id = waiting.pop(); id !== undefined; id = waiting.pop()) {
    if (id < 0 || seen.has(id)) continue;
    seen.add(id);
    const { operation, a, b, partner, isStatic } = graph.node(id);
    waiting.push(a, b);
    if (!isStatic && needsPartner(operation)) waiting.push(partner);
  }
  return seen;
}

/** Functions whose own series is an integral of their partner's; sqrt and power have recurrences without it. */
const recursOnPartner = (operation: Operation): boolean => operation !== 'sqrt' && operation !== 'power';
