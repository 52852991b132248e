import type { Trace } from '@/schemas/generated/contract';

export interface TraceCrossing {
  time: number;
  point: readonly number[];
}

/** Two times closer than this part of the period are the same. */
const SAME_TIME = 1e-6;

/** A trace's crossings with the start first at time 0: of an orbit that closes, the crossing at T is the start. */
export function traceCrossings(trace: Trace): TraceCrossing[] {
  const { crossings, times, closes } = trace;
  const last = crossings.at(-1);
  const period = times.at(-1) ?? 0;
  const hasStart = (crossings[0]?.time ?? 0) <= SAME_TIME * period;
  if (!closes || hasStart || !last || Math.abs(last.time - period) > SAME_TIME * Math.max(period, 1)) return crossings;
  return [{ time: 0, point: last.point }, ...crossings.slice(0, -1)];
}
