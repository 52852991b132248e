import { createExtentWatch, type Extent, type ExtentWatch } from '@/server/numerics/section/create-extent-watch';
import { horner } from '@/server/numerics/section/horner';
import { isolateRoots, type RootInterval } from '@/server/numerics/section/isolate-roots';
import { polishRoot } from '@/server/numerics/section/polish-root';
import { type NearMiss, type SectionZero } from '@/server/numerics/section/section-zero';
import { type TaylorStep } from '@/server/numerics/taylor/flow';

/** An extremum of u further from zero than this share of the largest |u| so far cannot be a near-tangency. */
const NEAR = 1e-3;

/** Where a run begins that the watch is to follow. */
interface WatchStart {
  /** Time of its start since the orbit's start, as a sum of two doubles. */
  time: number;
  timeLow: number;
  /** Whether the start is itself a zero of u that is not to be reported. */
  onSection: boolean;
}

/** Follows u along the Taylor steps of one or more runs, one after the other. */
export interface SectionWatch {
  /** Call before each run. */
  begin(start: WatchStart): void;
  /** Call with each step of the run. */
  onStep(step: TaylorStep): void;
  /** All zeros of u so far, of either sign, in order of time. */
  zeros: SectionZero[];
  /** Local extrema of u that come near zero without reaching it. */
  nearMisses: NearMiss[];
  /** Number of zeros with direction 1. */
  counted(): number;
  /** Range of every coordinate so far. */
  extent(): Extent;
}

/**
 * Create a watch that finds every zero of the section's function along an orbit from its Taylor coefficients.
 *
 * The sign of u is carried from step to step, so that a zero on the seam of two steps is found once, and never missed
 * because the two polynomials round differently there. Where a run starts on the section, that root is divided out:
 * u(s)/s has the other roots and their directions.
 *
 * @param dimension  number of state variables.
 *
 * Accuracy: times to 1 ulp of the step fraction; see isolateRoots for what can be told apart.
 * Cost: 2·order additions for most steps, plus the extents.
 */
export function createSectionWatch(dimension: number): SectionWatch {
  return new StepWatch(dimension);
}

class StepWatch implements SectionWatch {
  readonly zeros: SectionZero[] = [];
  readonly nearMisses: NearMiss[] = [];
  private readonly extents: ExtentWatch;
  private start: WatchStart = { time: 0, timeLow: 0, onSection: false };
  private isFirst = true;
  /** Sign of u just before the present place. */
  private side: 1 | -1 | 0 = 0;
  /** Largest |u| at the start of a step so far. */
  private largest = 0;
  private rises = 0;
  private unit = new Float64Array(0);

  constructor(private readonly dimension: number) {
    this.extents = createExtentWatch(dimension);
  }

  begin(start: WatchStart): void {
    this.start = start;
    this.isFirst = true;
  }

  onStep(step: TaylorStep): void {
    this.extents.onStep(step);
    if (this.unit.length !== step.section.length) this.unit = new Float64Array(step.section.length);
    const c = unitCoefficients(step, this.unit);
    this.findZeros(step, c);
    this.findNearMisses(step, c);
    this.isFirst = false;
  }

  counted(): number {
    return this.rises;
  }

  extent(): Extent {
    return this.extents.extent();
  }

  private record(step: TaylorStep, s: number, direction: 1 | -1 | 0): void {
    this.zeros.push({ ...timeOf(step, s, this.start), state: stateAt(step, s, this.dimension), direction });
    if (direction === 1) this.rises += 1;
  }

  private findZeros(step: TaylorStep, c: Float64Array): void {
    const isDeflated = this.isFirst && this.start.onSection;
    const deflated = isDeflated ? c.subarray(1) : c;
    const first = firstSign(deflated);
    if (isDeflated) this.side = first;
    if (this.side !== 0 && first !== 0 && first !== this.side) this.record(step, 0, first);
    for (const interval of isolateRoots(deflated)) {
      const { s, direction } = zeroIn(deflated, interval);
      this.record(step, s, direction);
    }
    const end = horner(deflated, 1);
    if (end !== 0) this.side = end > 0 ? 1 : -1;
    else if (this.side === 0) this.side = first;
  }

  private findNearMisses(step: TaylorStep, c: Float64Array): void {
    let size = 0;
    for (let k = 0; k < c.length; k += 1) size += Math.abs(c[k]!);
    this.largest = Math.max(this.largest, Math.abs(c[0]!));
    const near = NEAR * Math.max(size, this.largest);
    if (2 * Math.abs(c[0]!) - size > near) return;
    const slope = new Float64Array(c.length - 1);
    for (let k = 1; k < c.length; k += 1) slope[k - 1] = k * c[k]!;
    for (const interval of isolateRoots(slope)) {
      const { s } = zeroIn(slope, interval);
      const value = horner(c, s);
      if (Math.abs(value) > near) continue;
      const { time } = timeOf(step, s, this.start);
      const state = stateAt(step, s, this.dimension);
      this.nearMisses.push({ time, state, value, curvature: curvatureAt(c, s, step.h) });
    }
  }
}

/** Coefficients of u in the step fraction s ∈ [0, 1], written to c. */
function unitCoefficients({ section, h }: TaylorStep, c: Float64Array): Float64Array {
  let power = 1;
  for (let k = 0; k < c.length; k += 1) {
    c[k] = section[k]! * power;
    power *= h;
  }
  return c;
}

/** Sign just after the start of the step: that of the first coefficient that is not zero. */
function firstSign(c: Float64Array): 1 | -1 | 0 {
  for (let k = 0; k < c.length; k += 1) if (c[k] !== 0) return c[k]! > 0 ? 1 : -1;
  return 0;
}

function zeroIn(c: Float64Array, interval: RootInterval): { s: number; direction: 1 | -1 | 0 } {
  if (interval.before === interval.after) return { s: (interval.low + interval.high) / 2, direction: 0 };
  return { s: polishRoot(c, interval), direction: interval.after };
}

/** start + t + s·h as a sum of two doubles: what the larger one loses stays in the smaller. */
function timeOf(step: TaylorStep, s: number, start: WatchStart): { time: number; timeLow: number } {
  const sum = start.time + step.t;
  const lost = step.t - (sum - start.time);
  const low = lost + start.timeLow + step.tLow + s * step.h;
  const time = sum + low;
  return { time, timeLow: low - (time - sum) };
}

function stateAt({ state, h }: TaylorStep, s: number, dimension: number): Float64Array {
  const length = state.length / dimension;
  const x = new Float64Array(dimension);
  for (let i = 0; i < dimension; i += 1) x[i] = horner(state, s * h, i * length, length);
  return x;
}

function curvatureAt(c: Float64Array, s: number, h: number): number {
  let value = 0;
  for (let k = c.length - 1; k >= 2; k -= 1) value = value * s + k * (k - 1) * c[k]!;
  return value / (h * h);
}
