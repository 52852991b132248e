import { NO_OPERAND, type Tape, type TapeStep } from '@/server/numerics/expression/tape';
import { fixedExp, fixedLog, fixedPower } from '@/server/numerics/precision/fixed-functions';
import { fixedFunction, type PreciseStatic } from '@/server/numerics/precision/precise-statics';
import { rational } from '@/server/numerics/precision/rational';

/**
 * The recurrences of Taylor series in fixed point, coefficients scaled by the step: w_k h^k.
 *
 * With that scaling a product of series is still a convolution, one shift serves a whole sum, and high coefficients are
 * short numbers, which makes them cheap.
 *
 * Accuracy: a few units of 2^-bits an operation, times what later operations make of them; see the caller's guard bits.
 * Cost: order² / 2 products a product node.
 * Source: the recurrences of InterpretedKernel; fixed point with scaled coefficients is ours.
 */
export class PreciseKernel {
  /** Series of each slot of the tape. */
  readonly series: bigint[][];
  private readonly shift: bigint;

  constructor(
    private readonly tape: Tape,
    private readonly statics: readonly PreciseStatic[],
    private readonly format: { bits: number; order: number },
  ) {
    this.shift = BigInt(format.bits);
    this.series = tape.steps.map(() => []);
  }

  /**
   * Expand everything at a state.
   *
   * @param state n fixed-point numbers.
   * @param h     the step, fixed point.
   * @throws {RangeError} where an operation is not defined.
   */
  expand(state: readonly bigint[], h: bigint): void {
    const { dimension, steps, roots } = this.tape;
    const { order } = this.format;
    state.forEach((x, i) => (this.series[i]![0] = x));
    for (let k = 0; k <= order; k++) {
      for (let slot = dimension; slot < steps.length; slot++) {
        this.series[slot]![k] = this.coefficient(steps[slot]!, slot, k);
      }
      if (k === order) return;
      for (let i = 0; i < dimension; i++) {
        this.series[i]![k + 1] = ((h * this.value(roots[i]!, k)) >> this.shift) / BigInt(k + 1);
      }
    }
  }

  /** Σ w_k s^k for the series of a root, s between 0 and 1 in fixed point. */
  evaluate(operand: number, s: bigint): bigint {
    if (operand < 0) return this.value(operand, 0);
    const series = this.series[operand]!;
    let value = 0n;
    for (let k = this.format.order; k >= 0; k--) value = ((value * s) >> this.shift) + series[k]!;
    return value;
  }

  /** The slope of `evaluate` by s. */
  slope(operand: number, s: bigint): bigint {
    if (operand < 0) return 0n;
    const series = this.series[operand]!;
    let value = 0n;
    for (let k = this.format.order; k >= 1; k--) value = ((value * s) >> this.shift) + BigInt(k) * series[k]!;
    return value;
  }

  /** Coefficient k of an operand; a static value has only coefficient 0. */
  value(operand: number, k: number): bigint {
    if (operand >= 0) return this.series[operand]![k]!;
    if (operand === NO_OPERAND) throw new RangeError('an operation lacks an operand');
    return k === 0 ? this.statics[~operand]!.fixed : 0n;
  }

  private coefficient({ operation, a, b, partner }: TapeStep, slot: number, k: number): bigint {
    switch (operation) {
      case 'add':
        return this.value(a, k) + this.value(b, k);
      case 'subtract':
        return this.value(a, k) - this.value(b, k);
      case 'negate':
        return -this.value(a, k);
      case 'multiply':
        if (a < 0) return this.timesStatic(this.statics[~a]!, this.value(b, k));
        return b < 0 ? this.timesStatic(this.statics[~b]!, this.value(a, k)) : this.convolve(a, b, [0, k, k]);
      case 'square':
        return this.squared(a, k);
      case 'divide':
        return this.quotient({ a, b }, slot, k);
      case 'sqrt':
        if (k === 0) return fixedFunction('sqrt', this.value(a, 0), this.format.bits);
        return this.divided(this.value(a, k) - this.convolve(slot, slot, [1, k - 1, k]), 2n * this.value(slot, 0));
      case 'power':
        return k === 0 ? this.powerOf(this.value(a, 0), b) : this.powerCoefficient(a, b, slot, k);
      case 'cos':
        return k === 0 ? fixedFunction('cos', this.value(a, 0), this.format.bits) : -this.integral(a, partner, k);
      case 'exp':
      case 'log':
      case 'sin':
      case 'asin':
      case 'acos':
      case 'atan':
        return k === 0 ? fixedFunction(operation, this.value(a, 0), this.format.bits) : this.integral(a, partner, k);
      case 'constant':
      case 'parameter':
      case 'state':
        throw new RangeError(`${operation} does not vary along the flow`);
    }
  }

  private timesStatic({ fixed, ratio }: PreciseStatic, x: bigint): bigint {
    return ratio === null ? (fixed * x) >> this.shift : (ratio.p * x) / ratio.q;
  }

  private divided(above: bigint, below: bigint): bigint {
    if (below === 0n) throw new RangeError('a division by zero');
    return (above << this.shift) / below;
  }

  /** Σ a_j b_{k−j} for j = from … to. */
  private convolve(a: number, b: number, [from, to, k]: readonly [number, number, number]): bigint {
    const [x, y] = [this.series[a]!, this.series[b]!];
    let sum = 0n;
    for (let j = from; j <= to; j++) sum += x[j]! * y[k - j]!;
    return sum >> this.shift;
  }

  private squared(a: number, k: number): bigint {
    const x = this.series[a]!;
    let sum = 0n;
    for (let j = 0; 2 * j < k; j++) sum += x[j]! * x[k - j]!;
    sum *= 2n;
    if (k % 2 === 0) sum += x[k / 2]! ** 2n;
    return sum >> this.shift;
  }

  private quotient({ a, b }: { a: number; b: number }, slot: number, k: number): bigint {
    if (b < 0) {
      const { fixed, ratio } = this.statics[~b]!;
      if (ratio === null || ratio.p === 0n) return this.divided(this.value(a, k), fixed);
      return (this.value(a, k) * ratio.q) / ratio.p;
    }
    return this.divided(this.value(a, k) - this.convolve(b, slot, [1, k, k]), this.value(b, 0));
  }

  /** c' = g a': c_k = (1/k) Σ_{j=1..k} j a_j g_{k−j}. */
  private integral(a: number, partner: number, k: number): bigint {
    const x = this.series[a]!;
    let sum = 0n;
    if (partner < 0) sum = BigInt(k) * x[k]! * this.value(partner, 0);
    else {
      const g = this.series[partner]!;
      for (let j = 1; j <= k; j++) sum += BigInt(j) * x[j]! * g[k - j]!;
    }
    return (sum >> this.shift) / BigInt(k);
  }

  private powerOf(x: bigint, exponent: number): bigint {
    const { fixed, ratio } = this.statics[~exponent]!;
    const { bits } = this.format;
    return ratio ? fixedPower(x, ratio, bits) : fixedExp((fixed * fixedLog(x, bits)) >> this.shift, bits);
  }

  /** c = a^α: k a_0 c_k = (α + 1) Σ j a_j c_{k−j} − k Σ a_j c_{k−j}, j = 1 … k. */
  private powerCoefficient(a: number, exponent: number, slot: number, k: number): bigint {
    const [x, c] = [this.series[a]!, this.series[slot]!];
    let weighted = 0n;
    let plain = 0n;
    for (let j = 1; j <= k; j++) {
      const product = x[j]! * c[k - j]!;
      weighted += BigInt(j) * product;
      plain += product;
    }
    const { fixed, ratio } = this.statics[~exponent]!;
    const grown = ratio
      ? { fixed: 0n, ratio: rational(ratio.p + ratio.q, ratio.q) }
      : { fixed: fixed + (1n << this.shift), ratio: null };
    const above = this.timesStatic(grown, weighted >> this.shift) - ((BigInt(k) * plain) >> this.shift);
    return this.divided(above, BigInt(k) * x[0]!);
  }
}
