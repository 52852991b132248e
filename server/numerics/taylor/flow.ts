import { staticValues } from '@/server/numerics/expression/static-values';
import type { FlowDefinition } from '@/server/numerics/taylor/flow-definition';
import { type FlowResult, type IntegrateOptions, integrate } from '@/server/numerics/taylor/integrate';
import type { JetKernel } from '@/server/numerics/taylor/jet-kernel';
import { type PreparedFlow, preparedFlow } from '@/server/numerics/taylor/prepared-flow';

export type { FlowDefinition } from '@/server/numerics/taylor/flow-definition';
export type { FlowResult, TaylorStep } from '@/server/numerics/taylor/integrate';

/** The flow of a system. Not re-entrant: a callback of `integrate` must not integrate with the same flow. */
export interface Flow {
  readonly dimension: number;
  readonly order: number;
  integrate(options: IntegrateOptions): FlowResult;
  /** f(x), shape n. */
  field(x: Float64Array): Float64Array;
  /** ∂f_i/∂x_j at i n + j. */
  jacobian(x: Float64Array): Float64Array;
  /** u(x). */
  section(x: Float64Array): number;
  /** ∇u(x), shape n. */
  sectionGradient(x: Float64Array): Float64Array;
  /** The outputs at x, in their order. */
  outputs(x: Float64Array): Float64Array;
}

/**
 * The flow of a definition. Code is built once per formula text and used again for other parameters.
 *
 * @throws {RangeError} when a formula holds an unknown name, or the graph exceeds its limit of nodes.
 */
export function createFlow(definition: FlowDefinition): Flow {
  return new TaylorFlow(definition, preparedFlow(definition));
}

/** Where each kernel was evaluated last, and for whom: field, section and gradients are mostly asked for at one point. */
const lastPoints = new WeakMap<JetKernel, { flow: Flow; x: Float64Array }>();

class TaylorFlow implements Flow {
  readonly dimension: number;
  readonly order: number;
  private readonly parameters: readonly number[];
  private readonly pointStatics: Float64Array;

  constructor(
    private readonly definition: FlowDefinition,
    private readonly prepared: PreparedFlow,
  ) {
    this.dimension = definition.variables.length;
    this.order = prepared.order;
    this.parameters = definition.parameters.map(({ value }) => value);
    this.pointStatics = staticValues(prepared.pointTape.statics, this.parameters);
  }

  integrate(options: IntegrateOptions): FlowResult {
    if (options.start.length !== this.dimension) {
      throw new RangeError(`the start has ${options.start.length} coordinates, not ${this.dimension}`);
    }
    const { prepared } = this;
    const program = options.variations ? prepared.varied() : prepared.plain;
    const statics = staticValues(program.tape.statics, this.parameters);
    const moduli = this.definition.variables.map(({ modulus }) => modulus);
    return integrate({ prepared, program, statics, moduli }, options);
  }

  field(x: Float64Array): Float64Array {
    this.evaluate(x);
    return Float64Array.from({ length: this.dimension }, (_, i) => this.valueOf(i));
  }

  jacobian(x: Float64Array): Float64Array {
    this.evaluate(x);
    const n = this.dimension;
    const jacobian = new Float64Array(n * n);
    for (let i = 0; i < n; i++) jacobian.set(this.gradientOf(i), i * n);
    return jacobian;
  }

  section(x: Float64Array): number {
    this.evaluate(x);
    return this.valueOf(this.dimension);
  }

  sectionGradient(x: Float64Array): Float64Array {
    this.evaluate(x);
    return this.gradientOf(this.dimension);
  }

  outputs(x: Float64Array): Float64Array {
    this.evaluate(x);
    return Float64Array.from(this.definition.outputs, (_, index) => this.valueOf(this.dimension + 1 + index));
  }

  /** Order 0 of everything at x, with the derivatives by x. */
  private evaluate(x: Float64Array): void {
    const { pointKernel: kernel } = this.prepared;
    if (x.length !== this.dimension) {
      throw new RangeError(`the point has ${x.length} coordinates, not ${this.dimension}`);
    }
    const last = lastPoints.get(kernel);
    if (last?.flow === this && last.x.every((value, i) => value === x[i])) return;
    lastPoints.set(kernel, { flow: this, x: Float64Array.from(x) });
    kernel.memory.set(this.pointStatics, 0);
    for (let i = 0; i < this.dimension; i++) {
      kernel.memory[kernel.seriesStart + i] = x[i]!;
      const row = kernel.variationsStart + i * kernel.stride;
      kernel.memory.fill(0, row, row + kernel.stride);
      kernel.memory[row + i] = 1;
    }
    kernel.run(0);
  }

  private valueOf(root: number): number {
    const { pointKernel: kernel, pointTape } = this.prepared;
    const operand = pointTape.roots[root]!;
    return operand >= 0 ? kernel.memory[kernel.seriesStart + operand]! : this.pointStatics[~operand]!;
  }

  private gradientOf(root: number): Float64Array {
    const { pointKernel: kernel, pointTape } = this.prepared;
    const operand = pointTape.roots[root]!;
    if (operand < 0) return new Float64Array(this.dimension);
    const from = kernel.variationsStart + operand * kernel.stride;
    return kernel.memory.slice(from, from + this.dimension);
  }
}
