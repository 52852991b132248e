import { STEPS_DEFAULT } from '@/server/checks/limits';
import { followOrbit } from '@/server/numerics/periodic/follow-orbit';
import { createSectionWatch, type SectionWatch } from '@/server/numerics/section/create-section-watch';
import { type Flow } from '@/server/numerics/taylor/flow';

/** A part of an orbit: its start and how long it lasts. */
export interface Leg {
  start: Float64Array;
  duration: number;
}

/**
 * Share of the first leg at which the round begins and ends: legs begin on the section or its image, and often lie on it
 * half-way too, so the seam is put where nothing happens.
 */
const SEAM = 0.3719;

/**
 * Find the counted crossings of a closed orbit that is given in legs, each integrated from its own start, so that errors do
 * not grow from one leg to the next.
 *
 * @returns the points in order of time, from some crossing on, or null when a leg cannot be integrated.
 */
export function crossingsOfLegs(flow: Flow, legs: readonly Leg[]): Float64Array[] | null {
  const [first, ...others] = legs;
  if (first === undefined) return null;
  const early = first.duration * SEAM;
  const seam = follow(flow, createSectionWatch(flow.dimension), { ...first, duration: early }, 0);
  if (seam === null) return null;
  const watch = createSectionWatch(flow.dimension);
  const round = [{ start: seam, duration: first.duration - early }, ...others, { ...first, duration: early }];
  let time = 0;
  for (const leg of round) {
    if (follow(flow, watch, leg, time) === null) return null;
    time += leg.duration;
  }
  return watch.zeros.filter(({ direction }) => direction === 1).map(({ state }) => state);
}

function follow(flow: Flow, watch: SectionWatch, leg: Leg, from: number): Float64Array | null {
  const run = followOrbit({ flow, ...leg, from, onSection: false, maxSteps: STEPS_DEFAULT, watch });
  return run.ok ? run.end : null;
}
