import { type CheckReport, type Finding } from '@/schemas/generated/contract';
import { type Claim } from '@/server/checks/claim';
import { type CorrectedOrbit, type FailedCorrection } from '@/server/numerics/periodic/correct-orbit';
import { type Multiplier } from '@/server/numerics/periodic/floquet-multipliers';
import { type StabilityWord } from '@/server/numerics/periodic/judge-stability';
import { type OrbitCrossing } from '@/server/numerics/periodic/orbit-crossings';
import { type SmallestTransversality } from '@/server/numerics/periodic/smallest-transversality';
import { type Extent } from '@/server/numerics/section/create-extent-watch';
import { type SectionWatch } from '@/server/numerics/section/create-section-watch';

export type Verdict = CheckReport['verdict'];

/** The orbit as typed, followed once over its period. */
export interface RawRun {
  ok: true;
  start: Float64Array;
  end: Float64Array;
  /** f at the start. */
  field: Float64Array;
  /** Range of each coordinate over the period. */
  extent: Extent;
  sizes: Float64Array;
  watch: SectionWatch;
  /** Number of counted crossings up to the period. */
  returnsInside: number;
  stepEnds: number[];
  /** Largest difference of a coordinate, and the difference in sizes. */
  absolute: number;
  relative: number;
  winding: (number | null)[];
}

/** A closed orbit with everything that is measured on it. */
export interface Survey {
  start: Float64Array;
  period: number;
  sizes: Float64Array;
  extent: number[][];
  crossings: OrbitCrossing[];
  /** All n, the trivial one among them. */
  multipliers: Multiplier[];
  unitMultipliers: number;
  stability: StabilityWord;
  unstableDirections: number;
  flowCheck: number;
  liouville: number | null;
  /** Largest |log|λ| + log|partner||; null where multipliers need not come in reciprocal pairs. */
  pairing: number | null;
  smallest: SmallestTransversality;
  transversalities: number[];
  itinerary: string | null;
  invariants: { name: string; value: number; drift: number; driftShare: number }[];
  primeReturns: number;
  winding: (number | null)[] | null;
}

/** How far the corrected orbit is from what was typed, in sizes. */
export interface Shifts {
  point: number;
  period: number;
}

/** Everything a check has found out so far. */
export interface Study {
  claim: Claim;
  raw: RawRun;
  correction: CorrectedOrbit | FailedCorrection;
  /** Null where the correction did not converge. */
  shifts: Shifts | null;
  verdict: Verdict;
  survey: Survey | null;
  expectedClosure: number | null;
}

export type FindingCode = Finding['code'];
