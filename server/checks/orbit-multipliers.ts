import { type ClosedOrbit } from '@/server/checks/closed-orbit';
import { floquetMultipliers, type Multiplier } from '@/server/numerics/periodic/floquet-multipliers';
import { quotientPieces } from '@/server/numerics/periodic/quotient-pieces';
import { refineBases } from '@/server/numerics/periodic/refine-bases';
import { scaleMatrix } from '@/server/numerics/periodic/scale-matrix';
import { unitBases } from '@/server/numerics/periodic/unit-bases';
import { unitSpace, type UnitSpace } from '@/server/numerics/periodic/unit-space';
import { type Flow } from '@/server/numerics/taylor/flow';

const UNIT: Multiplier = { re: 1, im: 0, logModulus: 0 };

/**
 * Compute all multipliers of a closed orbit; those that equal 1 are counted by rank, given as exactly 1, and taken out
 * before the others are computed.
 *
 * @returns n multipliers, largest modulus first, or null when they cannot be computed.
 */
export function orbitMultipliers(flow: Flow, orbit: ClosedOrbit): Multiplier[] | null {
  const n = flow.dimension;
  const { segments, sizes } = orbit;
  const space = unitSpace(orbit.relation, orbit.rankCutOff);
  const bases = basesOf(flow, orbit, space);
  // The flow's own direction is always one, also where its rank is hidden by rounding.
  const units = Math.max(1, space.size);
  const framed = segments.map(({ pieces }, i) => ({
    pieces: pieces.map((piece) => scaleMatrix(piece, sizes)),
    basis: bases[i]!,
  }));
  const others = units === n ? [] : floquetMultipliers(quotientPieces(framed, n), n - units);
  if (others === null) return null;
  return [...others, ...Array<Multiplier>(units).fill(UNIT)].sort((a, b) => b.logModulus - a.logModulus);
}

/**
 * The subspace of the multipliers that equal 1 at every segment's start: the flow's own direction is known everywhere; that of
 * a family is carried on from the first node.
 */
function basesOf(flow: Flow, { segments, sizes }: ClosedOrbit, units: UnitSpace): readonly Float64Array[] {
  if (units.size <= 1) return segments.map(({ starts }) => flowDirection(flow, starts[0]!, sizes));
  const matrices = segments.map(({ monodromy }) => scaleMatrix(monodromy!, sizes));
  return matrices.length === 1 ? [units.basis] : refineBases(matrices, unitBases(matrices, units), sizes.length);
}

function flowDirection(flow: Flow, x: Float64Array, sizes: Float64Array): Float64Array {
  const direction = flow.field(x).map((entry, i) => entry / sizes[i]!);
  const length = Math.hypot(...direction);
  return direction.map((entry) => entry / length);
}
