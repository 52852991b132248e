import { doubleOfFixed } from '@/server/numerics/precision/fixed-number';
import { locateCrossing, type PreciseCrossing } from '@/server/numerics/precision/locate-crossing';
import type { PreciseFlow, PreciseStep } from '@/server/numerics/precision/precise-flow';

/** What doubles know of an orbit's crossings. */
interface KnownCrossings {
  /** Times of the counted crossings before the last, ascending. */
  times: readonly number[];
  /** When each segment begins. */
  begins: readonly number[];
}

/** Finds the counted crossings of a precise run again, near where doubles saw them. */
export class CrossingFinder {
  private readonly located: (PreciseCrossing & { segment: number })[] = [];
  private isLost = false;

  constructor(
    private readonly flow: PreciseFlow,
    private readonly known: KnownCrossings,
  ) {}

  /** Look at one step; segments and steps in order of time. */
  see(segment: number, step: PreciseStep): void {
    const { times, begins } = this.known;
    const begin = begins[segment]! + doubleOfFixed(step.time, step.bits);
    const length = doubleOfFixed(step.h, step.bits);
    for (;;) {
      const time = times[this.located.length];
      if (time === undefined || time >= begin + length || this.isLost) return;
      const crossing = locateCrossing(this.flow, step, (time - begin) / length);
      if (crossing === null) this.isLost = true;
      else this.located.push({ ...crossing, segment });
    }
  }

  /**
   * The crossings since the start of the orbit.
   *
   * @param durations of the segments.
   * @returns null where one was not found.
   */
  found(durations: readonly bigint[]): PreciseCrossing[] | null {
    if (this.located.length !== this.known.times.length) return null;
    const begins: bigint[] = [];
    let begin = 0n;
    for (const duration of durations) {
      begins.push(begin);
      begin += duration;
    }
    return this.located.map(({ segment, time, point }) => ({ time: begins[segment]! + time, point }));
  }
}
