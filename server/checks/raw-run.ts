import { type Claim } from '@/server/checks/claim';
import { RETURN_WINDOW } from '@/server/checks/limits';
import { type RawRun } from '@/server/checks/study';
import { differenceSize } from '@/server/numerics/periodic/difference-size';
import { followOrbit } from '@/server/numerics/periodic/follow-orbit';
import { orbitSizes } from '@/server/numerics/periodic/orbit-sizes';
import { type FlowFailure } from '@/server/numerics/periodic/shoot';
import { stateDifference } from '@/server/numerics/periodic/state-difference';
import { createSectionWatch, type SectionWatch } from '@/server/numerics/section/create-section-watch';

/** How a run is limited and watched. */
export interface RunControl {
  maxSteps: number;
  shouldStop?: (() => boolean) | undefined;
  /** Called after every step with the time reached and the crossings so far. */
  onStep?: ((time: number, watch: SectionWatch) => void) | undefined;
}

/** Follow the orbit as typed once over its period and measure how far from the start it ends. */
export function rawRun(
  claim: Claim,
  at: { start: Float64Array; onSection: boolean; period: number },
  control: RunControl,
): RawRun | FlowFailure {
  const { flow, moduli } = claim;
  const { start, period } = at;
  const watch = createSectionWatch(flow.dimension);
  const run = followOrbit({
    flow,
    start,
    from: 0,
    duration: period,
    onSection: at.onSection,
    watch,
    maxSteps: control.maxSteps,
    shouldStop: control.shouldStop,
    onStep: (time) => control.onStep?.(time, watch),
  });
  if (!run.ok) return run;
  const extent = watch.extent();
  const sizes = orbitSizes(extent, moduli);
  const { difference, winding } = stateDifference(run.end, start, moduli);
  return {
    ok: true,
    start,
    end: run.end,
    field: flow.field(start),
    extent,
    sizes,
    watch,
    returnsInside: watch.counted(),
    stepEnds: run.stepEnds,
    absolute: difference.reduce((size, entry) => Math.max(size, Math.abs(entry)), 0),
    relative: differenceSize(difference, sizes),
    winding,
  };
}

/** Whether a counted crossing happens in 0 < t ≤ 1.01 T; the run goes on beyond the period where it has to. */
export function returnsToSection(claim: Claim, raw: RawRun, period: number, control: RunControl): boolean {
  if (raw.returnsInside > 0) return true;
  const counted = raw.watch.counted();
  const run = followOrbit({
    flow: claim.flow,
    start: raw.end,
    from: period,
    duration: (RETURN_WINDOW - 1) * period,
    onSection: false,
    watch: raw.watch,
    maxSteps: control.maxSteps,
    shouldStop: control.shouldStop,
  });
  return run.ok && raw.watch.counted() > counted;
}
