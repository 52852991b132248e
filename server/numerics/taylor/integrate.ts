import { advance } from '@/server/numerics/taylor/advance';
import type { JetKernel } from '@/server/numerics/taylor/jet-kernel';
import { nameTrouble } from '@/server/numerics/taylor/name-trouble';
import type { JetProgram, PreparedFlow } from '@/server/numerics/taylor/prepared-flow';
import { chooseStep } from '@/server/numerics/taylor/choose-step';
import { StateScales } from '@/server/numerics/taylor/state-scales';

/** A step below this part of the time reached or asked for is a collapse: the solution leaves its domain. */
const COLLAPSE = 1e-14;
/** A coordinate beyond this many times 1 + |x0| has escaped. */
const ESCAPE_FACTOR = 1e6;

/** One Taylor step. The arrays are views into the kernel, valid only during the callback. */
export interface TaylorStep {
  readonly index: number;
  /** Start of the step: t + tLow, compensated. */
  readonly t: number;
  readonly tLow: number;
  readonly h: number;
  /** n × (p + 1): coefficient k of coordinate i at i (p + 1) + k, in state units per time^k. */
  readonly state: Float64Array;
  /** p + 1 coefficients of u along the solution. */
  readonly section: Float64Array;
}

export interface IntegrateOptions {
  start: Float64Array;
  /** T > 0. */
  duration: number;
  variations: boolean;
  maxSteps: number;
  /** Called for every step before it is taken; true, and nothing else, stops the integration there. */
  onStep?: (step: TaylorStep) => unknown;
  /** Asked before every step; true stops. */
  shouldStop?: () => boolean;
}

export type FlowResult =
  | {
      ok: true;
      end: Float64Array;
      /** ∂ end_i / ∂ x0_j at i n + j; null without variations. */
      monodromy: Float64Array | null;
      /** ∫ div f dt over the duration. */
      divergenceIntegral: number;
      steps: number;
    }
  | {
      ok: false;
      reason: 'singularity' | 'escape' | 'too-many-steps' | 'stopped';
      /** Time reached, and the state there. */
      t: number;
      state: Float64Array;
      steps: number;
      /** What left its domain, for a singularity. */
      node: string | null;
    };

export interface FlowParts {
  prepared: PreparedFlow;
  program: JetProgram;
  statics: Float64Array;
  /** Of the coordinates that are angles; null for the others. */
  moduli: readonly (number | null)[];
}

/**
 * Integrate x' = f(x) over a duration by Taylor series of fixed order with variable steps.
 *
 * Time is summed with compensation. Angles are kept within half a modulus of zero while they are integrated, so that their
 * rounding does not grow with the turns; steps and results show them running on.
 *
 * @returns the end with its derivatives, or why it ended early; a numerical failure is a value, not an exception.
 *
 * Accuracy: about one unit in the last place a step, times the growth of the flow from there on.
 * Source: Jorba and Zou, Experimental Mathematics 14 (2005) 99–117.
 */
export function integrate(parts: FlowParts, options: IntegrateOptions): FlowResult {
  return new Integration(parts, options).run();
}

class Integration {
  private readonly kernel: JetKernel;
  private readonly n: number;
  private readonly state: Float64Array;
  private readonly varied: Float64Array;
  private readonly scales: StateScales;
  /** Coordinates that are angles, and the whole moduli taken off each coordinate. */
  private readonly angles: readonly { index: number; modulus: number }[];
  private readonly turns: Float64Array;
  /** Views made once: making one costs as much as a small field. */
  private readonly series: { state: Float64Array; section: Float64Array; divergence: Float64Array };
  private readonly bound: number;
  private t = 0;
  private tLow = 0;
  private steps = 0;
  private divergence = 0;

  constructor(
    private readonly parts: FlowParts,
    private readonly options: IntegrateOptions,
  ) {
    const { program, statics, moduli } = parts;
    this.kernel = program.kernel;
    this.kernel.memory.set(statics, 0);
    this.n = options.start.length;
    this.state = Float64Array.from(options.start);
    this.varied = new Float64Array(this.n * this.kernel.stride);
    if (this.kernel.stride > 0) for (let i = 0; i < this.n; i++) this.varied[i * this.kernel.stride + i] = 1;
    this.scales = new StateScales(this.state, moduli);
    this.angles = moduli.flatMap((modulus, index) => (modulus === null ? [] : [{ index, modulus }]));
    this.turns = new Float64Array(this.n);
    const { memory, seriesStart, order } = this.kernel;
    this.series = {
      state: memory.subarray(seriesStart, seriesStart + this.n * (order + 1)),
      section: this.seriesOf(this.n),
      divergence: this.seriesOf(this.n + 1),
    };
    this.bound = ESCAPE_FACTOR * (1 + this.state.reduce((size, x) => Math.max(size, Math.abs(x)), 0));
  }

  run(): FlowResult {
    const { duration, maxSteps, onStep, shouldStop } = this.options;
    for (let left = duration; left > 0; left = duration - this.t - this.tLow) {
      if (this.steps >= maxSteps) return this.failure('too-many-steps');
      if (shouldStop?.()) return this.failure('stopped');
      this.expand();
      const wanted = chooseStep(this.parts.program, this.scales, this.parts.prepared.isCurved);
      if (Number.isNaN(wanted)) return this.failure('singularity');
      const isLast = wanted >= left;
      const h = isLast ? left : wanted;
      if (!isLast && h < COLLAPSE * Math.max(this.t, duration)) return this.failure('singularity');
      const stopped = onStep?.(this.view(h)) === true;
      this.steps += 1;
      if (stopped) return this.failure('stopped');
      this.take(h);
      if (isLast) return this.success();
      if (this.hasEscaped()) return this.failure('escape');
    }
    return this.success();
  }

  /** Taylor coefficients of everything at the present state. */
  private expand(): void {
    const { kernel, n } = this;
    const width = kernel.order + 1;
    this.setOrderZero(this.state);
    for (let i = 0; i < n; i++) {
      for (let d = 0; d < kernel.stride; d++) {
        kernel.memory[kernel.variationsStart + i * width * kernel.stride + d] = this.varied[i * kernel.stride + d]!;
      }
    }
    kernel.run(kernel.order);
  }

  private view(h: number): TaylorStep {
    if (this.angles.length > 0) this.setOrderZero(this.unwrapped());
    const { state, section } = this.series;
    return { index: this.steps, t: this.t, tLow: this.tLow, h, state, section };
  }

  /** Coefficients of a root; a static one is constant along the flow. */
  private seriesOf(root: number): Float64Array {
    const { memory, seriesStart, order } = this.kernel;
    const operand = this.parts.program.tape.roots[root]!;
    if (operand >= 0)
      return memory.subarray(seriesStart + operand * (order + 1), seriesStart + (operand + 1) * (order + 1));
    const constant = new Float64Array(order + 1);
    constant[0] = this.parts.statics[~operand]!;
    return constant;
  }

  private take(h: number): void {
    if (this.angles.length > 0) this.setOrderZero(this.state);
    advance(this.kernel, h, { state: this.state, varied: this.varied });
    const { divergence } = this.series;
    let integral = 0;
    for (let k = this.kernel.order; k >= 0; k--) integral = integral * h + divergence[k]! / (k + 1);
    this.divergence += integral * h;
    // Compensated sum: t + tLow is the time to about twice the precision.
    const low = this.tLow + h;
    const sum = this.t + low;
    this.tLow = low - (sum - this.t);
    this.t = sum;
    this.scales.see(this.state, h);
    this.wrapAngles();
  }

  private wrapAngles(): void {
    for (const { index, modulus } of this.angles) {
      const turns = Math.round(this.state[index]! / modulus);
      this.state[index]! -= turns * modulus;
      this.turns[index]! += turns;
    }
  }

  /** The state with its angles running on. */
  private unwrapped(): Float64Array {
    const state = this.state.slice();
    for (const { index, modulus } of this.angles) state[index]! += this.turns[index]! * modulus;
    return state;
  }

  private setOrderZero(state: Float64Array): void {
    const { memory, seriesStart, order } = this.kernel;
    for (let i = 0; i < this.n; i++) memory[seriesStart + i * (order + 1)] = state[i]!;
  }

  private hasEscaped(): boolean {
    for (let i = 0; i < this.n; i++) {
      if (!(Math.abs(this.state[i]!) <= this.bound) && this.parts.moduli[i] === null) return true;
    }
    return false;
  }

  private success(): FlowResult {
    if (this.state.some((x) => !Number.isFinite(x))) return this.failure('singularity');
    const { n, varied } = this;
    const { stride } = this.kernel;
    const monodromy =
      stride > 0
        ? Float64Array.from({ length: n * n }, (_, at) => varied[Math.floor(at / n) * stride + (at % n)]!)
        : null;
    return { ok: true, end: this.unwrapped(), monodromy, divergenceIntegral: this.divergence, steps: this.steps };
  }

  private failure(reason: 'singularity' | 'escape' | 'too-many-steps' | 'stopped'): FlowResult {
    const { prepared, program } = this.parts;
    const node = reason === 'singularity' ? nameTrouble(prepared.graph, program.tape, this.kernel) : null;
    return { ok: false, reason, t: this.t + this.tLow, state: this.unwrapped(), steps: this.steps, node };
  }
}
