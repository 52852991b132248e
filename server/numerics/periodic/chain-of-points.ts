import { type ShootingChain } from '@/server/numerics/periodic/correct-orbit';
import { type ShootingPlan } from '@/server/numerics/periodic/shooting-plan';
import { createSectionWatch, type SectionWatch } from '@/server/numerics/section/create-section-watch';
import { type Flow } from '@/server/numerics/taylor/flow';

/** Share of a leg after which its node stands: off the section, so that no crossing falls on the seam of two segments. */
const SEAM = 0.3719;

/** Steps in a piece, see planSingleShot. */
const STEPS_PER_PIECE = 8;

/** Section points of an orbit, as stated. */
export interface StatedPoints {
  flow: Flow;
  /** The start, then the point of each return but the last, n coordinates each. */
  points: readonly Float64Array[];
  /** A leg that takes longer than this, the period, leads nowhere. */
  longest: number;
  maxSteps: number;
  shouldStop?: (() => boolean) | undefined;
}

/** One leg, from a stated point to the next return. */
interface PointLeg {
  duration: number;
  stepEnds: number[];
  /** The state at the seam. */
  node: Float64Array;
}

/** Nodes made of stated points. */
export interface PointChain extends ShootingChain {
  /** What the legs last together. */
  period: number;
  /** What was seen along the legs; the times of its zeros are those since the leg's start. */
  watch: SectionWatch;
  /** Times at which steps ended, since the start. */
  stepEnds: number[];
}

/**
 * Make shooting nodes from the section points of an orbit, each of which is followed to its next return only, so that
 * nothing grows from one to the next.
 *
 * @returns the chain, its shares of the period those of the legs' durations; null where a leg does not return.
 *
 * Cost: about one and a half integrations over the period, without variations.
 */
export function chainOfPoints(stated: StatedPoints): PointChain | null {
  const watch = createSectionWatch(stated.flow.dimension);
  const legs: PointLeg[] = [];
  let left = stated.maxSteps;
  for (const point of stated.points) {
    const leg = legFrom(point, watch, { ...stated, maxSteps: left });
    if (leg === null) return null;
    left -= leg.stepEnds.length;
    legs.push(leg);
  }
  const nodes = legs.map(({ node }, i) => (i === 0 ? stated.points[0]! : node));
  const begins = beginsOf(legs);
  const stepEnds = legs.flatMap((leg, i) => leg.stepEnds.map((end) => begins[i]! + end));
  return { plan: planOf(legs, stepEnds), nodes, period: begins.at(-1)!, watch, stepEnds };
}

function legFrom(
  start: Float64Array,
  watch: SectionWatch,
  { flow, longest, maxSteps, shouldStop }: StatedPoints,
): PointLeg | null {
  if (maxSteps <= 0) return null;
  const limits = { variations: false, maxSteps, ...(shouldStop === undefined ? {} : { shouldStop }) };
  watch.begin({ time: 0, timeLow: 0, onSection: true });
  const earlier = watch.zeros.length;
  const before = watch.counted();
  const stepEnds: number[] = [];
  flow.integrate({
    ...{ start, duration: longest, ...limits },
    onStep: (step) => {
      watch.onStep(step);
      stepEnds.push(step.t + step.h);
      return watch.counted() > before;
    },
  });
  const duration = watch.zeros.slice(earlier).find(({ direction }) => direction === 1)?.time;
  if (duration === undefined) return null;
  const seam = flow.integrate({ start, duration: SEAM * duration, ...limits });
  return seam.ok ? { duration, stepEnds: stepEnds.filter((end) => end < duration), node: seam.end } : null;
}

/** Times at which the legs begin, and at which the last one ends. */
function beginsOf(legs: readonly PointLeg[]): number[] {
  const begins = [0];
  for (const { duration } of legs) begins.push(begins.at(-1)! + duration);
  return begins;
}

/** Segments from seam to seam, the first from the start and the last to the end, in shares of the whole. */
function planOf(legs: readonly PointLeg[], ends: readonly number[]): ShootingPlan {
  const begins = beginsOf(legs);
  const whole = begins.at(-1)!;
  const seams = legs.map(({ duration }, i) => (i === 0 ? 0 : begins[i]! + SEAM * duration));
  let next = 0;
  return legs.map((_, i) => {
    const [from, to] = [seams[i]!, seams[i + 1] ?? whole];
    const borders = [from];
    let steps = 0;
    for (; next < ends.length && ends[next]! < to; next += 1) {
      if (ends[next]! <= from) continue;
      steps += 1;
      if (steps % STEPS_PER_PIECE === 0) borders.push(ends[next]!);
    }
    return { borders: [...borders, to].map((time) => time / whole) };
  });
}
