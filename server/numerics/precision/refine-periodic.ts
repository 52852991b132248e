import { closingCorrection } from '@/server/numerics/periodic/closing-correction';
import { condenseSegments } from '@/server/numerics/periodic/condense-segments';
import type { CorrectedOrbit } from '@/server/numerics/periodic/correct-orbit';
import { scaleMatrix } from '@/server/numerics/periodic/scale-matrix';
import { shoot, type ShotSegment } from '@/server/numerics/periodic/shoot';
import { changeBits, doubleOfFixed, fixedOfDouble } from '@/server/numerics/precision/fixed-number';
import {
  type PreciseFlow,
  type PreciseStep,
  type Precision,
  rescaleState,
} from '@/server/numerics/precision/precise-flow';
import type { Flow } from '@/server/numerics/taylor/flow';

/** Decimal digits that the double-precision orbit has at least, in sizes. */
const DIGITS_OF_DOUBLES = 12;
/** Digits that a step gains at least: the Jacobian of doubles is right to about so many (measured: 13 to 14). */
const GAIN = 13.4;
/** Digits beyond those asked for that the computation carries. */
const SPARE_DIGITS = 4;
/** A correction must fall at least by this factor from one step to the next. */
const LEAST_FALL = 0.03;
/** A correction may exceed what the digits known so far let expect by this factor: rounding, magnified. */
const NOISE = 1e3;
/** From 14 to 100 digits seven steps do; more mean that nothing converges. */
const MAX_STEPS = 24;
/** Cost of a flow grows like digits to this power; measured, see the benchmark. */
const COST_EXPONENT = 1.9;
/** Units that a step adds beside those of the field, and bits to spare: the analysis is one of first order. */
const UNITS_A_STEP = 4;
const SPARE_BITS = 8;
const BITS_A_DIGIT = Math.log2(10);

/** A periodic orbit in doubles, and what is to be made of it. */
export interface RefinementInput {
  flow: Flow;
  precise: PreciseFlow;
  orbit: Pick<CorrectedOrbit, 'nodes' | 'plan' | 'period' | 'rankCutOff'>;
  sizes: Float64Array;
  /** Gradient of what is held in a family, at the first node, and the value to be kept; null for nothing. */
  hold: { gradient: Float64Array; target: (precision: Precision) => bigint } | null;
  /** Of a family the member is found that is nearest to this point, in sizes. */
  anchor: (precision: Precision) => bigint[];
  digits: number;
  shouldStop?: (() => boolean) | undefined;
}

/** A refined orbit in fixed point. */
export interface RefinedOrbit {
  precision: Precision;
  nodes: bigint[][];
  period: bigint;
  /** Duration of each segment. */
  durations: bigint[];
  /** Lengths of the steps of each segment, in doubles. */
  steps: number[][];
  /** Largest miss of a segment at the end, in sizes. */
  residual: number;
  /** Size of each correction, in sizes. */
  corrections: number[];
  /** Integrations of the corrections, each weighed by its cost against one with all digits; the confirming run apart. */
  flows: number;
  freeDirections: number;
  isHeld: boolean;
}

/** Newton's corrections do not fall as they must. */
export class NoConvergence extends Error {}

/**
 * Refine a periodic orbit to many digits: residuals in fixed point, corrections by the Jacobian of doubles.
 *
 * Each step gains about 14 digits, and is computed with as many as it can gain; a last run with all digits confirms that
 * every segment meets the next node, and lets the caller see its steps.
 *
 * @param onStep called for every step of the confirming run, with its segment.
 * @throws {NoConvergence}, {@link StoppedRun}, {RangeError} where the field is not defined.
 *
 * Accuracy: nodes and period to 10^-(digits + 2), in sizes, as the last correction and the confirming run show.
 * Source: chord iteration with residuals in higher precision (iterative refinement, common practice); D. Viswanath,
 *         Physica D 190 (2004) 115–128, and A. Abad, R. Barrio, A. Dena, Phys. Rev. E 84 (2011) 016701, for orbits.
 */
export function refinePeriodic(
  input: RefinementInput,
  onStep?: (segment: number, step: PreciseStep) => void,
): RefinedOrbit {
  return new Refiner(input).run(onStep);
}

class Refiner {
  private precision: Precision;
  private nodes: bigint[][];
  private period: bigint;
  /** The orbit in doubles, with derivatives: taken anew, for each digit of theirs is a digit a step. */
  private readonly segments: readonly ShotSegment[];
  private readonly steps: number[][];
  private readonly corrections: number[] = [];
  private flows = 0;
  /** Largest growth of rounding in the field along the orbit. */
  private growth = 1;
  private family = { freeDirections: 0, isHeld: false };

  constructor(private readonly input: RefinementInput) {
    const { nodes, period } = input.orbit;
    this.segments = this.shootDoubles();
    this.steps = nodes.map((node, i) => this.stepsOf(node, i));
    this.precision = this.precisionFor(DIGITS_OF_DOUBLES);
    const { bits } = this.precision;
    this.nodes = nodes.map((node) => Array.from(node, (x) => fixedOfDouble(x, bits)));
    this.period = fixedOfDouble(period, bits);
  }

  run(onStep?: (segment: number, step: PreciseStep) => void): RefinedOrbit {
    const wanted = this.input.digits + SPARE_DIGITS;
    let known = DIGITS_OF_DOUBLES;
    let gain = GAIN;
    for (let step = 0; known < this.input.digits + 2; step += 1) {
      if (step >= MAX_STEPS) throw new NoConvergence();
      // As few digits as still let the steps that follow gain the rest: early steps are cheap.
      const following = Math.max(0, Math.ceil((this.input.digits + 2 - known) / GAIN) - 1);
      const target = wanted - following * GAIN;
      this.changePrecision(target);
      this.flows += (target / wanted) ** COST_EXPONENT;
      const size = this.correct();
      const before = this.corrections.at(-1) ?? Infinity;
      if (size > Math.max(before * LEAST_FALL, NOISE * 10 ** -known)) throw new NoConvergence();
      this.corrections.push(size);
      if (size < before) gain = Math.min(GAIN, -Math.log10(size / before));
      // What is left after a correction is smaller by the gain, and not below what this step could see.
      known = Math.min(target - 1, gain - Math.log10(Math.max(size, Number.MIN_VALUE)));
    }
    this.changePrecision(wanted);
    const residual = Math.max(0, ...this.shoot(onStep).flatMap((defect) => [...defect].map(Math.abs)));
    if (!(residual <= 10 ** -(this.input.digits + 2) * this.largestGrowth())) throw new NoConvergence();
    const { precision, nodes, period, steps, corrections, flows, family } = this;
    return { precision, nodes, period, durations: this.durations(), steps, corrections, flows, residual, ...family };
  }

  /** How much a segment may magnify what its node misses by. */
  private largestGrowth(): number {
    const { sizes } = this.input;
    return Math.max(1, ...this.segments.map(({ monodromy }) => Math.hypot(...scaleMatrix(monodromy!, sizes))));
  }

  private precisionFor(digits: number): Precision {
    const smallest = Math.min(...this.input.sizes);
    return {
      bits: Math.ceil(digits * BITS_A_DIGIT - Math.min(0, Math.log2(smallest))) + this.guardBits(),
      // e^-2 is the ratio of step and radius of convergence: e^-2p is 10^-digits.
      order: Math.ceil((Math.LN10 / 2) * digits) + 3,
    };
  }

  /** Bits for what a unit in the last place grows to over a segment. */
  private guardBits(): number {
    const { orbit } = this.input;
    const count = this.steps.reduce((sum, { length }) => sum + length, 0);
    const units = (orbit.period * this.growth + UNITS_A_STEP * count) * this.largestGrowth();
    return Math.ceil(Math.log2(units)) + SPARE_BITS;
  }

  private changePrecision(digits: number): void {
    const next = this.precisionFor(digits);
    const { bits } = this.precision;
    this.nodes = this.nodes.map((node) => rescaleState(node, bits, next.bits));
    this.period = changeBits(this.period, bits, next.bits);
    this.precision = next;
  }

  private shootDoubles(): readonly ShotSegment[] {
    const { flow, orbit, shouldStop } = this.input;
    const { plan, nodes, period } = orbit;
    const shot = shoot({ flow, plan, nodes, period, variations: true, maxSteps: Infinity, shouldStop });
    if (!shot.ok) throw new NoConvergence();
    return shot.segments;
  }

  /** Steps that doubles choose over one segment. */
  private stepsOf(node: Float64Array, segment: number): number[] {
    const { flow, precise, orbit } = this.input;
    const lengths: number[] = [];
    const { borders } = orbit.plan[segment]!;
    const result = flow.integrate({
      start: node,
      duration: (borders.at(-1)! - borders[0]!) * orbit.period,
      variations: false,
      maxSteps: Infinity,
      onStep: ({ h, state }) => {
        lengths.push(h);
        const here = Float64Array.from(node, (_, i) => state[i * (flow.order + 1)]!);
        this.growth = Math.max(this.growth, precise.roundingGrowth(here));
      },
    });
    if (!result.ok) throw new NoConvergence();
    return lengths;
  }

  private durations(): bigint[] {
    const { bits } = this.precision;
    const whole = this.input.orbit.plan.map(({ borders }) => borders);
    return whole.map((borders) => {
      const share = fixedOfDouble(borders.at(-1)!, bits) - fixedOfDouble(borders[0]!, bits);
      return (share * this.period) >> BigInt(bits);
    });
  }

  /** Misses of all segments, in sizes. */
  private shoot(onStep?: (segment: number, step: PreciseStep) => void): Float64Array[] {
    const { precise, sizes, shouldStop } = this.input;
    const durations = this.durations();
    return this.nodes.map((start, i) => {
      const end = precise.follow({
        ...{ ...this.precision, start, duration: durations[i]!, steps: this.steps[i]!, shouldStop },
        ...(onStep && { onStep: (step: PreciseStep) => onStep(i, step) }),
      });
      const next = this.nodes[i + 1] ?? this.nodes[0]!;
      return Float64Array.from(end, (x, j) => this.missed(x - next[j]!, j) / sizes[j]!);
    });
  }

  /** A difference of coordinates; of angles to the nearest multiple of the modulus. */
  private missed(difference: bigint, coordinate: number): number {
    const { precise } = this.input;
    const { bits } = this.precision;
    const modulus = precise.modulusOf(coordinate, this.precision);
    if (modulus === null) return doubleOfFixed(difference, bits);
    const turns = BigInt(Math.round(doubleOfFixed(difference, bits) / doubleOfFixed(modulus, bits)));
    return doubleOfFixed(difference - turns * modulus, bits);
  }

  /** One Newton step; its size in sizes. */
  private correct(): number {
    const { flow, orbit, sizes } = this.input;
    const { bits } = this.precision;
    const defects = this.shoot();
    const chain = condenseSegments(
      this.segments.map(({ end, monodromy }, i) => {
        const { borders } = orbit.plan[i]!;
        const duration = (borders.at(-1)! - borders[0]!) * orbit.period;
        const v = flow.field(end).map((entry, j) => (entry * duration) / sizes[j]!);
        return { m: scaleMatrix(monodromy!, sizes), v, defect: defects[i]! };
      }),
    );
    const { first, theta, freeDirections, isHeld } = this.closing(chain);
    this.family = { freeDirections, isHeld };
    const changes = chain.recover(first, first, theta);
    this.nodes = this.nodes.map((node, i) => node.map((x, j) => x + fixedOfDouble(changes[i]![j]! * sizes[j]!, bits)));
    this.period += (this.period * fixedOfDouble(theta, bits)) >> BigInt(bits);
    return Math.max(Math.abs(theta), ...changes.flatMap((change) => [...change].map(Math.abs)));
  }

  private closing({ relation }: ReturnType<typeof condenseSegments>): ReturnType<typeof closingCorrection> {
    const { flow, precise, orbit, sizes, hold } = this.input;
    const { bits } = this.precision;
    const values = precise.valuesAt(this.nodes[0]!, this.precision);
    const scaled = (gradient: Float64Array): Float64Array => gradient.map((entry, i) => entry * sizes[i]!);
    const section = {
      gradient: scaled(flow.sectionGradient(orbit.nodes[0]!)),
      value: doubleOfFixed(values.section, bits),
    };
    const held = hold && {
      gradient: scaled(hold.gradient),
      value: doubleOfFixed(values.hold! - hold.target(this.precision), bits),
    };
    return closingCorrection(relation, section, orbit.rankCutOff, {
      hold: held,
      driftIn: (open) => this.driftIn(open),
    });
  }

  /**
   * Components of the first node's way from the anchor along a family's directions, in sizes. Taken in fixed point of
   * weights that are the same doubles for any precision, so that any number of digits finds the same member.
   */
  private driftIn(open: Float64Array): Float64Array {
    const { sizes, anchor } = this.input;
    const { bits } = this.precision;
    const origin = anchor(this.precision);
    const way = this.nodes[0]!.map((x, i) => x - origin[i]!);
    const width = open.length / way.length;
    return Float64Array.from({ length: width }, (_, k) => {
      const weighed = way.map((x, i) => x * fixedOfDouble(open[i * width + k]! / sizes[i]!, bits));
      return doubleOfFixed(weighed.reduce((sum, term) => sum + term, 0n) >> BigInt(bits), bits);
    });
  }
}
