import { closedOrbit } from '@/features/checking/closed-orbit';
import { crossingLetters } from '@/features/notation/crossing-letters';
import { sectionStaff } from '@/features/notation/entry-music';
import type { IncipitMusic } from '@/features/notation/incipit-props';
import { orbitMusic } from '@/features/notation/orbit-music';
import type { OrbitState } from '@/features/notation/orbit-state';
import type { CheckedOrbit, CheckReport, System, Trace } from '@/schemas/generated/contract';

interface Options {
  report: CheckReport;
  system: System | undefined;
  /** The section's name where it has one. */
  section: string;
  state: OrbitState;
  trace?: Trace | undefined;
}

/** The drawn coordinate along a trace. */
function flowOf(trace: Trace | undefined, index: number): number[][] | null {
  if (!trace) return null;
  return trace.times.map((time, at) => [time, trace.points[at]?.[index] ?? 0]);
}

/** The points of the crossings as an incipit draws them: the last, which is the start, first. */
function startFirst({ crossings }: CheckedOrbit): string[][] {
  const points = crossings.map(({ point }) => point);
  return [...points.slice(-1), ...points.slice(0, -1)];
}

/** What an incipit draws of a report: the orbit found, or the run that did not come back; null when neither is known. */
export function reportMusic({ report, system, section, state, trace }: Options): IncipitMusic | null {
  const incipit = sectionStaff(system, section);
  const variables = system?.document.variables.map(({ name }) => name) ?? [];
  const index = Math.max(0, variables.indexOf(incipit.coordinate));
  const flow = flowOf(trace, index);
  const orbit = closedOrbit(report);
  if (orbit) {
    const letters = system?.sections.find(({ name }) => name === section)?.letters ?? [];
    return {
      ...orbitMusic(orbit, { variables, incipit, state, flow }),
      letters: orbit.itinerary === null ? null : crossingLetters(letters, variables, startFirst(orbit)),
    };
  }
  const first = trace?.points[0]?.[index];
  if (!trace || first === undefined) return null;
  const last = trace.times.at(-1) ?? 0;
  const inside = trace.crossings.filter(({ time }) => time > 0 && time < last);
  const times = [0, ...inside.map(({ time }) => time), last];
  return {
    crossings: [first, ...inside.map(({ point }) => point[index] ?? first)],
    returnTimes: times.slice(1).map((time, at) => time - (times[at] ?? 0)),
    period: last,
    flow,
    levels: incipit.levels,
    multipliers: null,
    state,
    coordinate: incipit.coordinate,
    end: { time: last, value: trace.points.at(-1)?.[index] ?? first },
  };
}
