/** A correction of point and period below this leaves only rounding. */
const SMALL_CORRECTION = 1e-10;

/** A run of Newton steps that did not halve the smallest correction so far leads nowhere. */
const PATIENCE = 6;

/** Newton must gain at least this factor in the last step before its corrections are small, or in that one. */
const LEAST_GAIN = 10;

/** One Newton step. */
export interface NewtonStep {
  /** Change of point and period, in sizes. */
  size: number;
  /** Change of all nodes and the period, in sizes. */
  inside: number;
  /** Whether the step only follows rounding: every segment fitted before it. */
  isRounding: boolean;
}

/** The steps that Newton took, and what their sizes say. Rates are judged on corrections above 1e-10 alone. */
export class NewtonLog {
  private readonly steps: NewtonStep[] = [];

  get length(): number {
    return this.steps.length;
  }

  add(step: NewtonStep): void {
    this.steps.push(step);
  }

  /** Whether the last correction left point and period where they are, up to rounding. */
  isSettled(): boolean {
    const last = this.steps.at(-1);
    return last !== undefined && isSmall(last);
  }

  /** Whether the corrections stopped getting smaller long ago. */
  wandersOff(): boolean {
    const sizes = this.steps.map(({ inside }) => inside);
    const earlier = sizes.slice(0, -PATIENCE);
    return earlier.length > 0 && Math.min(...sizes.slice(-PATIENCE)) > Math.min(...earlier) / 2;
  }

  /** Whether the last correction that was not small, or the one after it, fell at least tenfold or to rounding. */
  fellFast(): boolean {
    const last = this.steps.findLastIndex((step) => !isSmall(step));
    if (last === -1) return true;
    const { size } = this.steps[last]!;
    const into = this.steps[last + 1];
    if (into !== undefined && (into.isRounding || into.size * LEAST_GAIN <= size)) return true;
    return last > 0 && size * LEAST_GAIN <= this.steps[last - 1]!.size;
  }

  /**
   * ‖δ₂‖ / ‖δ₁‖: how well inside the basin of its orbit Newton started (below 1/4: well inside).
   *
   * @returns null where the first correction was rounding or no second was taken.
   *
   * Source: the quotient that the Newton–Kantorovich theorem bounds (common practice; heuristic, no proof).
   */
  basinRatio(): number | null {
    const [first, second] = this.steps;
    if (first === undefined || second === undefined || isSmall(first) || first.inside === 0) return null;
    return second.inside / first.inside;
  }
}

function isSmall({ size, isRounding }: NewtonStep): boolean {
  return size <= SMALL_CORRECTION || isRounding;
}
