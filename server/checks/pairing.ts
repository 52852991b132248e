import { type Claim } from '@/server/checks/claim';
import { type ClosedOrbit } from '@/server/checks/closed-orbit';
import { SAME_ORBIT } from '@/server/checks/limits';
import { differenceSize } from '@/server/numerics/periodic/difference-size';
import { type Multiplier } from '@/server/numerics/periodic/floquet-multipliers';
import { type OrbitCrossing } from '@/server/numerics/periodic/orbit-crossings';
import { scaleMatrix } from '@/server/numerics/periodic/scale-matrix';
import { stateDifference } from '@/server/numerics/periodic/state-difference';
import { hasSymplecticForm } from '@/server/numerics/periodic/symplectic-form';

/** Points of the orbit at which a symplectic form is looked for. */
const FORM_POINTS = 5;

/** Volume is kept where the divergence adds up to less than this; without that there is no symplectic form. */
const VOLUME_PRESERVING = 1e-8;

/**
 * By how much the multipliers miss lying in reciprocal pairs, where they must: in a Hamiltonian flow, and on an orbit that a
 * symmetry which turns time round maps onto itself.
 *
 * @returns largest |log|λ| + log|partner||; null where they need not pair, or one vanished in rounding.
 */
export function pairing(
  claim: Claim,
  orbit: ClosedOrbit,
  found: { multipliers: readonly Multiplier[]; crossings: readonly OrbitCrossing[] },
): number | null {
  const logs = found.multipliers.map(({ logModulus }) => logModulus).sort((a, b) => b - a);
  if (!logs.every(Number.isFinite)) return null;
  if (!isHamiltonian(claim, orbit) && !isReversible(claim, orbit, found.crossings)) return null;
  return logs.reduce((largest, log, i) => Math.max(largest, Math.abs(log + logs[logs.length - 1 - i]!)), 0);
}

function isHamiltonian({ flow }: Claim, { segments, sizes, divergenceIntegral }: ClosedOrbit): boolean {
  if (flow.dimension % 2 !== 0 || Math.abs(divergenceIntegral) > VOLUME_PRESERVING) return false;
  const starts = segments.flatMap((segment) => segment.starts);
  const points = Array.from({ length: FORM_POINTS }, (_, k) => starts[Math.floor((k * starts.length) / FORM_POINTS)]!);
  const jacobians = [...new Set(points)].map((x) => scaleMatrix(flow.jacobian(x), sizes));
  return hasSymplecticForm(jacobians, flow.dimension);
}

/** Whether the image of a crossing under a reversing symmetry is a crossing again. */
function isReversible(
  { flow, moduli, symmetries }: Claim,
  { sizes }: ClosedOrbit,
  crossings: readonly OrbitCrossing[],
): boolean {
  const reversing = symmetries.filter(({ reversesTime }) => reversesTime);
  const first = crossings.at(-1);
  if (reversing.length === 0 || first === undefined) return false;
  const values = flow.outputs(first.state);
  return reversing.some(({ outputs }) => {
    const image = Float64Array.from(outputs, (output) => values[output]!);
    return crossings.some(({ state }) => {
      return differenceSize(stateDifference(image, state, moduli).difference, sizes) <= SAME_ORBIT;
    });
  });
}
