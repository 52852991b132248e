import { type SectionZero } from '@/server/numerics/section/section-zero';

/** Counted crossings nearer than this share of the period to its end are the closing one itself. */
const CLOSING_WINDOW = 1e-9;

/** A counted crossing of a periodic orbit with 0 < t ≤ T. */
export interface OrbitCrossing {
  time: number;
  returnTime: number;
  state: Float64Array;
}

/**
 * List the counted crossings of a closed orbit: those found with 0 < t < T, and the start itself at T.
 *
 * @param zeros   zeros of u along the orbit, in order of time.
 * @param period  T.
 * @param start   the start, on the section; the last crossing has exactly this state and time T.
 *
 * Accuracy: return times are differences of times kept in two doubles, right to rounding however long the orbit.
 */
export function orbitCrossings(zeros: readonly SectionZero[], period: number, start: Float64Array): OrbitCrossing[] {
  const crossings: OrbitCrossing[] = [];
  let time = 0;
  let timeLow = 0;
  for (const zero of zeros) {
    if (zero.direction !== 1 || zero.time > period * (1 - CLOSING_WINDOW)) continue;
    crossings.push({ time: zero.time, returnTime: zero.time - time + (zero.timeLow - timeLow), state: zero.state });
    time = zero.time;
    timeLow = zero.timeLow;
  }
  crossings.push({ time: period, returnTime: period - time - timeLow, state: start });
  return crossings;
}
