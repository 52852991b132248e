import { buildNode } from '@/server/numerics/expression/build-node';
import { makeTape, type Tape } from '@/server/numerics/expression/tape';
import { ExactGraph } from '@/server/numerics/precision/exact-graph';
import { changeBits, doubleOfFixed, fixedOfDouble } from '@/server/numerics/precision/fixed-number';
import { ExactNumbers, type PreciseDefinition } from '@/server/numerics/precision/precise-definition';
import { PreciseKernel } from '@/server/numerics/precision/precise-kernel';
import { type ExactValue, type PreciseStatic, preciseStatics } from '@/server/numerics/precision/precise-statics';
import { roundingGrowth } from '@/server/numerics/precision/rounding-growth';

/** How precisely to compute. */
export interface Precision {
  /** Bits after the point. */
  bits: number;
  /** Order of the Taylor series. */
  order: number;
}

/** One step of a precise run, before it is taken. */
export interface PreciseStep {
  index: number;
  /** Time at its start, since the start of the run, and its length; fixed point. */
  time: bigint;
  h: bigint;
  bits: number;
  kernel: PreciseKernel;
}

interface PreciseRun extends Precision {
  start: readonly bigint[];
  duration: bigint;
  /** Lengths of the steps; the last is replaced by what is left of the duration. */
  steps: readonly number[];
  onStep?: ((step: PreciseStep) => void) | undefined;
  shouldStop?: (() => boolean) | undefined;
}

/** A precise run was stopped from outside. */
export class StoppedRun extends Error {}

/** Enough for static values in doubles. */
const DOUBLE_BITS = 128;

/** The flow of a system to any number of digits; every number of its formulas is exact. */
export class PreciseFlow {
  readonly dimension: number;
  readonly tape: Tape;
  private readonly values: ExactValue[];
  /** Moduli of the variables, as operands of the tape; null for those that are no angles. */
  private readonly moduli: (number | null)[];
  private doubles: number[] | null = null;
  private ready: { precision: Precision; statics: PreciseStatic[]; kernel: PreciseKernel } | null = null;

  constructor(definition: PreciseDefinition) {
    const { variables, parameters, definitions, equations, section, hold } = definition;
    const graph = new ExactGraph();
    const numbers = new ExactNumbers();
    const exact = {
      definitions: definitions.map(({ name, expression }) => ({ name, expression: numbers.exact(expression) })),
      roots: [...equations, section, ...(hold === null ? [] : [hold])].map((root) => numbers.exact(root)),
      moduli: variables.map(({ modulus }) => modulus && numbers.exact(modulus)),
    };
    const names = new Map<string, number>();
    variables.forEach(({ name }, i) => names.set(name, graph.state(i)));
    const named = [...parameters.map(({ name, exact: value }) => [name, value] as const), ...numbers.values];
    named.forEach(([name], i) => names.set(name, graph.parameter(i)));
    for (const { name, expression } of exact.definitions) names.set(name, buildNode(graph, expression, names));
    const roots = exact.roots.map((root) => buildNode(graph, root, names));
    const moduli = exact.moduli.map((modulus) => modulus && buildNode(graph, modulus, names));
    this.dimension = variables.length;
    this.tape = makeTape(graph, variables.length, [...roots, ...moduli.filter((id) => id !== null)], 0);
    this.values = named.map(([, value]) => value);
    let next = roots.length;
    this.moduli = moduli.map((id) => (id === null ? null : this.tape.roots[next++]!));
  }

  /** Operand of u. */
  get sectionRoot(): number {
    return this.tape.roots[this.dimension]!;
  }

  /** Operand of the held quantity; only where the definition has one. */
  get holdRoot(): number {
    return this.tape.roots[this.dimension + 1]!;
  }

  /** Moduli in fixed point; null for coordinates that are no angles. */
  modulusOf(coordinate: number, precision: Precision): bigint | null {
    const operand = this.moduli[coordinate] ?? null;
    return operand === null ? null : this.prepared(precision).statics[~operand]!.fixed;
  }

  /** u and the held quantity at a point. */
  valuesAt(point: readonly bigint[], precision: Precision): { section: bigint; hold: bigint | null } {
    const kernel = this.prepared(precision).kernel;
    kernel.expand(point, 0n);
    const hasHold = this.tape.roots.length > this.dimension + 1 + this.moduli.filter((id) => id !== null).length;
    return {
      section: kernel.value(this.sectionRoot, 0),
      hold: hasHold ? kernel.value(this.holdRoot, 0) : null,
    };
  }

  /** See roundingGrowth. */
  roundingGrowth(state: ArrayLike<number>): number {
    this.doubles ??= preciseStatics(this.tape.statics, this.values, DOUBLE_BITS).map(({ fixed, ratio }) =>
      ratio ? Number(ratio.p) / Number(ratio.q) : doubleOfFixed(fixed, DOUBLE_BITS),
    );
    return roundingGrowth(this.tape, this.doubles, state);
  }

  /**
   * Follow the flow by steps that a double-precision run has chosen: with the ratio of step and radius of convergence
   * fixed, more digits take a higher order and no smaller steps.
   *
   * @returns the end, n fixed-point numbers.
   * @throws {RangeError} where the field is not defined; {@link StoppedRun}.
   */
  follow({ start, duration, steps, bits, order, onStep, shouldStop }: PreciseRun): bigint[] {
    const { kernel } = this.prepared({ bits, order });
    const one = 1n << BigInt(bits);
    let state = [...start];
    let time = 0n;
    for (let index = 0; index < steps.length; index++) {
      if (shouldStop?.()) throw new StoppedRun();
      const isLast = index === steps.length - 1;
      const h = isLast ? duration - time : fixedOfDouble(steps[index]!, bits);
      kernel.expand(state, h);
      onStep?.({ index, time, h, bits, kernel });
      state = state.map((_, i) => kernel.evaluate(i, one));
      time += h;
    }
    return state;
  }

  private prepared(precision: Precision): { statics: PreciseStatic[]; kernel: PreciseKernel } {
    const { bits, order } = precision;
    if (this.ready?.precision.bits !== bits || this.ready.precision.order !== order) {
      const statics = preciseStatics(this.tape.statics, this.values, bits);
      this.ready = { precision: { bits, order }, statics, kernel: new PreciseKernel(this.tape, statics, precision) };
    }
    return this.ready;
  }
}

/** A state with another number of bits. */
export const rescaleState = (state: readonly bigint[], from: number, to: number): bigint[] =>
  state.map((x) => changeBits(x, from, to));
