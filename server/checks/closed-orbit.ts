import { type Claim } from '@/server/checks/claim';
import { type RunControl } from '@/server/checks/raw-run';
import { type RawRun } from '@/server/checks/study';
import { condenseSegments, type EndRelation } from '@/server/numerics/periodic/condense-segments';
import { type CorrectedOrbit } from '@/server/numerics/periodic/correct-orbit';
import { orbitSizes } from '@/server/numerics/periodic/orbit-sizes';
import { planSingleShot } from '@/server/numerics/periodic/plan-single-shot';
import { scaleMatrix } from '@/server/numerics/periodic/scale-matrix';
import { shoot, type ShotSegment } from '@/server/numerics/periodic/shoot';
import { stateDifference } from '@/server/numerics/periodic/state-difference';
import { type SectionWatch } from '@/server/numerics/section/create-section-watch';

/** A closed orbit as integrated, ready to be measured. */
export interface ClosedOrbit {
  start: Float64Array;
  period: number;
  sizes: Float64Array;
  watch: SectionWatch;
  segments: readonly ShotSegment[];
  relation: EndRelation;
  rankCutOff: number;
  divergenceIntegral: number;
  winding: (number | null)[] | null;
}

/** Singular values below this mean a family. */
const RANK_CUT_OFF = 1e-9;

/** The corrected orbit, ready to be measured; its sizes are those of the orbit as typed. */
export function correctedAsClosed(claim: Claim, raw: RawRun, corrected: CorrectedOrbit): ClosedOrbit {
  const { segments, relation, rankCutOff, divergenceIntegral, watch, period, nodes } = corrected;
  const whole = segments.at(-1)!.end;
  const { winding } = stateDifference(whole, nodes[0]!, claim.moduli);
  return {
    ...{ start: nodes[0]!, period, sizes: raw.sizes, watch, segments, relation, rankCutOff, divergenceIntegral },
    winding: claim.moduli.every((modulus) => modulus === null) ? null : winding,
  };
}

/** The orbit as typed, for one that closes although no correction converges; null where it cannot be integrated. */
export function typedAsClosed(claim: Claim, raw: RawRun, control: RunControl): ClosedOrbit | null {
  const period = claim.period.value;
  const shot = shoot({
    flow: claim.flow,
    plan: planSingleShot(raw.stepEnds, period),
    nodes: [raw.start],
    period,
    variations: true,
    maxSteps: control.maxSteps,
    shouldStop: control.shouldStop,
  });
  if (!shot.ok) return null;
  const sizes = orbitSizes(raw.extent, claim.moduli);
  const { monodromy, end } = shot.segments[0]!;
  const defect = stateDifference(end, raw.start, claim.moduli).difference.map((entry, i) => entry / sizes[i]!);
  const v = raw.field.map((entry, i) => (entry * period) / sizes[i]!);
  const { relation } = condenseSegments([{ m: scaleMatrix(monodromy!, sizes), v, defect }]);
  return {
    ...{ start: raw.start, period, sizes, watch: raw.watch, segments: shot.segments, relation },
    ...{ rankCutOff: RANK_CUT_OFF, divergenceIntegral: shot.divergenceIntegral },
    winding: claim.moduli.every((modulus) => modulus === null) ? null : raw.winding,
  };
}
