import { type Finding } from '@/schemas/generated/contract';
import { type Claim } from '@/server/checks/claim';
import { figure } from '@/server/checks/figure';
import { finding } from '@/server/checks/finding';
import { INVARIANT_DRIFT } from '@/server/checks/limits';
import { type Survey } from '@/server/checks/study';

/** Share of a coordinate's size over which an invariant's slope is taken. */
const SLOPE_STEP = 1e-6;

/** Value of each invariant at the start and its largest change over the crossings, the last of which is the start. */
export function invariantsAlong(
  { flow, invariants }: Claim,
  points: readonly Float64Array[],
  sizes: Float64Array,
): Survey['invariants'] {
  if (invariants.length === 0) return [];
  const start = points.at(-1)!;
  const atStart = flow.outputs(start);
  const values = points.map((point) => flow.outputs(point));
  return invariants.map(({ name, output }) => {
    const value = atStart[output]!;
    const drift = values.reduce((largest, at) => Math.max(largest, Math.abs(at[output]! - value)), 0);
    const scale = variation({ flow, output, start, sizes });
    return { name, value, drift, driftShare: drift === 0 ? 0 : drift / scale };
  });
}

/** By how much the invariant would change if each coordinate moved by its size: Σ |∂I/∂xᵢ| sᵢ, and at least |I|. */
function variation({
  flow,
  output,
  start,
  sizes,
}: {
  flow: Claim['flow'];
  output: number;
  start: Float64Array;
  sizes: Float64Array;
}): number {
  const value = flow.outputs(start)[output]!;
  let scale = Math.abs(value);
  for (let i = 0; i < sizes.length; i += 1) {
    const moved = Float64Array.from(start);
    moved[i]! += SLOPE_STEP * sizes[i]!;
    scale += Math.abs(flow.outputs(moved)[output]! - value) / SLOPE_STEP;
  }
  return scale;
}

/** Check that the declared invariants are constant along the orbit. */
export function invariantDrift(survey: Survey): Finding[] {
  return survey.invariants
    .filter(({ driftShare }) => !(driftShare <= INVARIANT_DRIFT))
    .map(({ name, value, drift, driftShare }) =>
      finding('invariant-drifts', {
        message: `${name} is ${figure(value)} at the start and changes by ${figure(drift)} along the orbit.`,
        value: driftShare,
        limit: INVARIANT_DRIFT,
      }),
    );
}
