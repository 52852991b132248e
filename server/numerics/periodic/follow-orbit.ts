import { type FlowFailure } from '@/server/numerics/periodic/shoot';
import { type SectionWatch } from '@/server/numerics/section/create-section-watch';
import { type Flow } from '@/server/numerics/taylor/flow';

/** A run to be watched. */
export interface FollowOptions {
  flow: Flow;
  start: Float64Array;
  /** Time of the start since the orbit's start, and how long to go on. */
  from: number;
  duration: number;
  onSection: boolean;
  maxSteps: number;
  watch: SectionWatch;
  shouldStop?: (() => boolean) | undefined;
  /** Called after every step with the time reached. */
  onStep?: ((time: number) => void) | undefined;
}

/** Where a run ended. */
export interface FollowedRun {
  ok: true;
  end: Float64Array;
  /** Times at which steps ended since the run's start; the last is the duration. */
  stepEnds: number[];
  steps: number;
}

/** Integrate a trajectory without derivatives and let a watch see every step. */
export function followOrbit(options: FollowOptions): FollowedRun | FlowFailure {
  const { flow, start, from, duration, onSection, maxSteps, watch, shouldStop } = options;
  const stepEnds: number[] = [];
  watch.begin({ time: from, timeLow: 0, onSection });
  const result = flow.integrate({
    start,
    duration,
    variations: false,
    maxSteps,
    onStep: (step) => {
      watch.onStep(step);
      stepEnds.push(step.t + step.h);
      options.onStep?.(from + step.t + step.h);
    },
    ...(shouldStop === undefined ? {} : { shouldStop }),
  });
  if (!result.ok) return { ...result, t: from + result.t };
  return { ok: true, end: result.end, stepEnds, steps: result.steps };
}
