import { type Trace } from '@/schemas/generated/contract';
import { type Claim } from '@/server/checks/claim';
import { type Leg } from '@/server/checks/crossings-of-legs';
import { STEPS_LARGEST } from '@/server/checks/limits';
import { readClaim, type ClaimBody } from '@/server/checks/read-claim';
import { type CheckedSystem } from '@/server/formulas/checked-system';
import { horner } from '@/server/numerics/section/horner';
import { type TaylorStep } from '@/server/numerics/taylor/flow';

/** Fewest and most points of a polyline. */
const TRACE_POINTS_SMALLEST = 2;
const TRACE_POINTS_LARGEST = 20_000;

/** A polyline whose ends are nearer than this share of its extent is drawn closed. */
const DRAWN_CLOSED = 1e-6;

/** The orbit to be drawn. */
export interface TracedOrbit extends Omit<ClaimBody, 'points' | 'hold'> {
  /** Its crossings as a report or an entry lists them; the line is begun anew at each, so that it stays on the orbit. */
  crossings?: readonly { time: string; point: readonly string[] }[];
}

/**
 * Sample an orbit for drawing: the same number of points in every Taylor step, which is short where the orbit is quick.
 *
 * @param system  the orbit's system.
 * @param orbit   section, point and period, with the crossings where they are known.
 * @param points  number of points wanted, from 2 to 20,000.
 * @returns       the polyline from t = 0 to the period; shorter where the solution leaves its domain. Null when the orbit
 *                cannot be read.
 * @throws {RangeError} when the number of points is out of range.
 *
 * Accuracy: every point lies on the Taylor polynomials, so on the orbit to rounding.
 * Cost: two integrations without derivatives.
 */
export function traceOrbit(system: CheckedSystem, orbit: TracedOrbit, points: number): Trace | null {
  if (!Number.isInteger(points) || points < TRACE_POINTS_SMALLEST || points > TRACE_POINTS_LARGEST) {
    throw new RangeError(`a trace has ${TRACE_POINTS_SMALLEST} to ${TRACE_POINTS_LARGEST} points, not ${points}`);
  }
  const read = readClaim(system, orbit);
  if (!read.ok) return null;
  const { claim } = read;
  const crossings = (orbit.crossings ?? []).map(({ time, point }) => ({
    time: Number(time),
    point: point.map(Number),
  }));
  const legs = legsOf(claim, crossings);
  let steps = 0;
  walk(claim, legs, () => {
    steps += 1;
  });
  const line = sample(claim, legs, { steps, points });
  return { variables: claim.variables, ...line, crossings, closes: isClosed(claim, line.points) };
}

/** The orbit from crossing to crossing; in one piece where none are known. */
function legsOf(claim: Claim, crossings: readonly { time: number; point: number[] }[]): Leg[] {
  const start = Float64Array.from(claim.point, ({ value }) => value);
  if (crossings.length === 0) return [{ start, duration: claim.period.value }];
  return crossings.map(({ time }, i) => ({
    start: i === 0 ? start : Float64Array.from(crossings[i - 1]!.point),
    duration: time - (i === 0 ? 0 : crossings[i - 1]!.time),
  }));
}

function walk({ flow }: Claim, legs: readonly Leg[], onStep: (step: TaylorStep, from: number) => void): void {
  let from = 0;
  for (const { start, duration } of legs) {
    const begun = from;
    flow.integrate({
      start,
      duration,
      variations: false,
      maxSteps: STEPS_LARGEST,
      onStep: (step) => onStep(step, begun),
    });
    from += duration;
  }
}

function sample(
  claim: Claim,
  legs: readonly Leg[],
  { steps, points }: { steps: number; points: number },
): Pick<Trace, 'times' | 'points'> {
  const n = claim.flow.dimension;
  const times: number[] = [];
  const states: number[][] = [];
  let index = 0;
  const placeOf = (k: number): number => (k * steps) / (points - 1);
  walk(claim, legs, ({ t, tLow, h, state }, from) => {
    const isLast = index === steps - 1;
    const length = state.length / n;
    while (times.length < points) {
      const share = placeOf(times.length) - index;
      if (share >= 1 && !isLast) break;
      const s = Math.min(1, share) * h;
      times.push(from + t + tLow + s);
      states.push(Array.from({ length: n }, (_, i) => horner(state, s, i * length, length)));
    }
    index += 1;
  });
  return { times, points: states };
}

function isClosed({ moduli }: Claim, points: readonly number[][]): boolean {
  const first = points[0];
  const last = points.at(-1);
  if (first === undefined || last === undefined) return false;
  return first.every((value, i) => {
    const column = points.map((point) => point[i]!);
    const modulus = moduli[i] ?? null;
    const extent = modulus ?? column.reduce((a, b) => Math.max(a, b)) - column.reduce((a, b) => Math.min(a, b));
    const difference = last[i]! - value;
    const turns = modulus === null ? 0 : Math.round(difference / modulus) * modulus;
    return Math.abs(difference - turns) <= DRAWN_CLOSED * (extent > 0 ? extent : 1);
  });
}
