import type { Graph } from '@/server/numerics/expression/graph';
import type { Tape, TapeStep } from '@/server/numerics/expression/tape';
import type { JetKernel } from '@/server/numerics/taylor/jet-kernel';

/** Operations with an operand that must stay away from 0, and which operand that is. */
const guarded = (step: TapeStep): number | null => {
  switch (step.operation) {
    case 'divide':
      return step.b;
    case 'sqrt':
    case 'power':
    case 'log':
      return step.a;
    default:
      return null;
  }
};

/**
 * Which part of the field leaves its domain where a step collapses: "r1 = 0", "the argument of log = 0".
 *
 * @returns the operand nearest to 0 in words; null when the field has none, or when none is near.
 */
export function nameTrouble(graph: Graph, tape: Tape, kernel: JetKernel): string | null {
  let words: string | null = null;
  let smallest = Infinity;
  for (const step of tape.steps) {
    const operand = guarded(step);
    if (operand === null || operand < 0) continue;
    const value = Math.abs(kernel.memory[kernel.seriesStart + operand * (kernel.order + 1)]!);
    // An operand that is not a number is what came of the trouble, not where it began.
    if (value < smallest) {
      smallest = value;
      const node = tape.steps[operand]!.node;
      words = `${graph.labels.get(node) ?? rootOf(graph, node) ?? partOf(step)} = 0`;
    }
  }
  return words;
}

/** A name given to the square root of a node: it vanishes where the node does. */
function rootOf(graph: Graph, id: number): string | null {
  for (const [labelled, name] of graph.labels) {
    const { operation, a } = graph.node(labelled);
    if (operation === 'sqrt' && a === id) return name;
  }
  return null;
}

const partOf = (step: TapeStep): string => {
  switch (step.operation) {
    case 'divide':
      return 'a denominator';
    case 'power':
      return 'the base of a power';
    default:
      return `the argument of ${step.operation}`;
  }
};
