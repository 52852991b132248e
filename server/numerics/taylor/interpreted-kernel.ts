import { NO_OPERAND, type Tape, type TapeStep } from '@/server/numerics/expression/tape';
import { type JetKernel, type JetLayout, jetLayout } from '@/server/numerics/taylor/jet-kernel';

/**
 * The recurrences of Taylor series, executed step by step from the tape.
 *
 * It defines what every faster kernel has to compute, and serves for single points, where building code does not pay.
 *
 * Source: R. E. Moore, Interval Analysis (1966); A. Griewank, A. Walther, Evaluating Derivatives, ch. 13 (from memory).
 */
export class InterpretedKernel implements JetKernel {
  readonly memory: Float64Array;
  readonly order: number;
  readonly seriesStart: number;
  readonly variationsStart: number;
  readonly stride: number;
  private readonly width: number;

  constructor(
    private readonly tape: Tape,
    order: number,
    directions: number,
  ) {
    const layout: JetLayout = jetLayout({
      statics: tape.statics.length,
      slots: tape.steps.length,
      order,
      directions,
    });
    this.memory = new Float64Array(layout.size);
    this.order = order;
    this.width = order + 1;
    this.seriesStart = layout.seriesStart;
    this.variationsStart = layout.variationsStart;
    this.stride = layout.stride;
  }

  run(upTo: number): void {
    const { dimension, steps, roots } = this.tape;
    for (let k = 0; k <= upTo; k++) {
      for (let slot = dimension; slot < steps.length; slot++) {
        this.memory[this.at(slot, k)] = this.coefficient(steps[slot]!, slot, k);
      }
      if (this.stride > 0) {
        for (let slot = dimension; slot < steps.length; slot++) {
          if (steps[slot]!.isVaried) this.vary(steps[slot]!, slot, k);
        }
      }
      if (k === this.order) return;
      for (let i = 0; i < dimension; i++) {
        const field = roots[i]!;
        this.memory[this.at(i, k + 1)] = this.value(field, k) / (k + 1);
        for (let d = 0; d < this.stride; d++) {
          this.memory[this.variationAt(i, k + 1, d)] = this.variation(field, k, d) / (k + 1);
        }
      }
    }
  }

  private at(slot: number, k: number): number {
    return this.seriesStart + slot * this.width + k;
  }

  private variationAt(slot: number, k: number, d: number): number {
    return this.variationsStart + (slot * this.width + k) * this.stride + d;
  }

  /** Coefficient k of an operand; a static value has only coefficient 0. */
  private value(operand: number, k: number): number {
    if (operand >= 0) return this.memory[this.at(operand, k)]!;
    if (operand === NO_OPERAND) return NaN;
    return k === 0 ? this.memory[~operand]! : 0;
  }

  private variation(operand: number, k: number, d: number): number {
    return operand >= 0 ? this.memory[this.variationAt(operand, k, d)]! : 0;
  }

  /** Σ a_j b_{k−j} for j = from … to. */
  private convolve(a: number, b: number, k: number, [from, to]: readonly [number, number]): number {
    let sum = 0;
    for (let j = from; j <= to; j++) sum += this.value(a, j) * this.value(b, k - j);
    return sum;
  }

  private coefficient({ operation, a, b, partner }: TapeStep, slot: number, k: number): number {
    switch (operation) {
      case 'add':
        return this.value(a, k) + this.value(b, k);
      case 'subtract':
        return this.value(a, k) - this.value(b, k);
      case 'negate':
        return -this.value(a, k);
      case 'multiply':
        if (a < 0) return this.value(a, 0) * this.value(b, k);
        return b < 0 ? this.value(a, k) * this.value(b, 0) : this.convolve(a, b, k, [0, k]);
      case 'square':
        return this.convolve(a, a, k, [0, k]);
      case 'divide':
        if (b < 0) return this.value(a, k) / this.value(b, 0);
        return (this.value(a, k) - this.convolve(b, slot, k, [1, k])) / this.value(b, 0);
      case 'sqrt':
        if (k === 0) return Math.sqrt(this.value(a, 0));
        return (this.value(a, k) - this.convolve(slot, slot, k, [1, k - 1])) / (2 * this.value(slot, 0));
      case 'power':
        return k === 0 ? this.value(a, 0) ** this.value(b, 0) : this.powerCoefficient(a, this.value(b, 0), slot, k);
      case 'cos':
        return k === 0 ? Math.cos(this.value(a, 0)) : -this.integralCoefficient(a, partner, k);
      case 'exp':
      case 'log':
      case 'sin':
      case 'asin':
      case 'acos':
      case 'atan':
        return k === 0 ? Math[operation](this.value(a, 0)) : this.integralCoefficient(a, partner, k);
      case 'constant':
      case 'parameter':
      case 'state':
        return NaN;
    }
  }

  /** c' = g a': c_k = (1/k) Σ_{j=1..k} j a_j g_{k−j}. */
  private integralCoefficient(a: number, partner: number, k: number): number {
    let sum = 0;
    for (let j = 1; j <= k; j++) sum += j * this.value(a, j) * this.value(partner, k - j);
    return sum / k;
  }

  /** c = a^α: c_k = (1/(k a_0)) Σ_{j=1..k} ((α + 1) j − k) a_j c_{k−j}. */
  private powerCoefficient(a: number, exponent: number, slot: number, k: number): number {
    let sum = 0;
    for (let j = 1; j <= k; j++) sum += ((exponent + 1) * j - k) * this.value(a, j) * this.value(slot, k - j);
    return sum / (k * this.value(a, 0));
  }

  private vary(step: TapeStep, slot: number, k: number): void {
    for (let d = 0; d < this.stride; d++) {
      this.memory[this.variationAt(slot, k, d)] = this.variedCoefficient(step, slot, [k, d]);
    }
  }

  /** Σ_{j=from..k} a_j db_{k−j}. */
  private convolveVaried(a: number, b: number, [k, d]: readonly [number, number], from: number): number {
    if (b < 0) return 0;
    if (a < 0) return from === 0 ? this.value(a, 0) * this.variation(b, k, d) : 0;
    let sum = 0;
    for (let j = from; j <= k; j++) sum += this.value(a, j) * this.variation(b, k - j, d);
    return sum;
  }

  private variedCoefficient(
    { operation, a, b, partner }: TapeStep,
    slot: number,
    at: readonly [number, number],
  ): number {
    const [k, d] = at;
    switch (operation) {
      case 'add':
        return this.variation(a, k, d) + this.variation(b, k, d);
      case 'subtract':
        return this.variation(a, k, d) - this.variation(b, k, d);
      case 'negate':
        return -this.variation(a, k, d);
      case 'multiply':
        return this.convolveVaried(a, b, at, 0) + this.convolveVaried(b, a, at, 0);
      case 'square':
        return 2 * this.convolveVaried(a, a, at, 0);
      case 'divide':
        if (b < 0) return this.variation(a, k, d) / this.value(b, 0);
        return (
          (this.variation(a, k, d) - this.convolveVaried(slot, b, at, 0) - this.convolveVaried(b, slot, at, 1)) /
          this.value(b, 0)
        );
      case 'cos':
        return -this.convolveVaried(partner, a, at, 0);
      default:
        return this.convolveVaried(partner, a, at, 0);
    }
  }
}
