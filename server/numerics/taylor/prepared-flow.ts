import { buildNode } from '@/server/numerics/expression/build-node';
import { deriveNode } from '@/server/numerics/expression/derive-node';
import { Graph } from '@/server/numerics/expression/graph';
import { isAffine } from '@/server/numerics/expression/is-affine';
import { makeTape, type Tape } from '@/server/numerics/expression/tape';
import type { FlowDefinition } from '@/server/numerics/taylor/flow-definition';
import { InterpretedKernel } from '@/server/numerics/taylor/interpreted-kernel';
import type { JetKernel } from '@/server/numerics/taylor/jet-kernel';
import { makeWasmKernel } from '@/server/numerics/taylor/wasm-kernel';

/**
 * Order of the Taylor series: ⌈−½ ln ε⌉ + 1 for ε = 10⁻¹⁶.
 * Source: Jorba and Zou (2005), section 3; measured here to be the knee of cost against error.
 */
const TAYLOR_ORDER = 20;
/** Nodes of field and section together, after equal subexpressions have become one. */
export const SHARED_NODES_LIMIT = 2000;
/** Flows whose code is kept. */
const KEPT_FLOWS = 64;

/** A tape with the kernel that runs it. */
export interface JetProgram {
  /** Roots: the field, u, div f. */
  tape: Tape;
  kernel: JetKernel;
}

/** What is built once per formula text. */
export interface PreparedFlow {
  order: number;
  graph: Graph;
  /** The state alone. */
  plain: JetProgram;
  /** With the derivatives by the initial state; built when first asked for. */
  varied: () => JetProgram;
  /** Roots: the field, u, the outputs; order 0 with derivatives. */
  pointTape: Tape;
  pointKernel: JetKernel;
  /** u is not affine in the state: its series has a say in the step size. */
  isCurved: boolean;
}

const kept = new Map<string, PreparedFlow>();

/** The prepared flow of a definition; parameters' values play no part in it. */
export function preparedFlow(definition: FlowDefinition): PreparedFlow {
  const { variables, parameters, definitions, equations, section, outputs } = definition;
  const names = [variables, parameters].map((named) => named.map(({ name }) => name).join(' '));
  const parts = [definitions, equations, section, ...outputs].map(textOf);
  const key = [...names, ...parts].join('\n');
  const prepared = kept.get(key) ?? prepare(definition);
  // Last used stands last.
  kept.delete(key);
  kept.set(key, prepared);
  for (const oldest of kept.keys()) {
    if (kept.size <= KEPT_FLOWS) break;
    kept.delete(oldest);
  }
  return prepared;
}

/** The text of a part of a definition; the same objects come again and again. */
const texts = new WeakMap<object, string>();

function textOf(part: object): string {
  const text = texts.get(part) ?? JSON.stringify(part);
  texts.set(part, text);
  return text;
}

function prepare(definition: FlowDefinition): PreparedFlow {
  const { variables, equations, section, outputs } = definition;
  const dimension = variables.length;
  const graph = new Graph();
  const names = namesOf(graph, definition);
  const field = equations.map((equation) => buildNode(graph, equation, names));
  const u = buildNode(graph, section, names);
  if (graph.nodes.length > SHARED_NODES_LIMIT) {
    throw new RangeError(`the field and the section have more than ${SHARED_NODES_LIMIT} nodes`);
  }
  const values = outputs.map((output) => buildNode(graph, output, names));
  const divergence = field
    .map((id, i) => deriveNode(graph, id, i, new Map<number, number>()))
    .reduce((sum, term) => graph.sum(sum, term), graph.constant(0));
  const program = (isVaried: boolean): JetProgram => {
    const tape = makeTape(graph, dimension, [...field, u, divergence], isVaried ? dimension : 0);
    return { tape, kernel: makeWasmKernel(tape, TAYLOR_ORDER, isVaried ? dimension : 0) };
  };
  const pointTape = makeTape(graph, dimension, [...field, u, ...values], dimension + 1);
  let varied: JetProgram | null = null;
  return {
    order: TAYLOR_ORDER,
    graph,
    plain: program(false),
    varied: () => (varied ??= program(true)),
    pointTape,
    pointKernel: new InterpretedKernel(pointTape, 0, dimension),
    isCurved: !isAffine(graph, u),
  };
}

/** What the graph of a field is built from; of parameters only their names count. */
interface FieldDefinition {
  variables: readonly { name: string }[];
  parameters: readonly { name: string }[];
  definitions: FlowDefinition['definitions'];
  equations: FlowDefinition['equations'];
  section?: FlowDefinition['section'];
}

/** Nodes of a field, with its section if there is one, after equal subexpressions have become one. */
export function countSharedNodes(definition: FieldDefinition): number {
  const graph = new Graph();
  const names = namesOf(graph, definition);
  for (const equation of definition.equations) buildNode(graph, equation, names);
  if (definition.section) buildNode(graph, definition.section, names);
  return graph.nodes.length;
}

function namesOf(graph: Graph, { variables, parameters, definitions }: FieldDefinition): Map<string, number> {
  const names = new Map<string, number>();
  variables.forEach(({ name }, index) => names.set(name, graph.state(index)));
  parameters.forEach(({ name }, index) => names.set(name, graph.parameter(index)));
  for (const { name, expression } of definitions) names.set(name, buildNode(graph, expression, names));
  names.forEach((id, name) => graph.labels.set(id, name));
  return names;
}
