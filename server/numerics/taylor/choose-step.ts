import type { JetKernel } from '@/server/numerics/taylor/jet-kernel';
import { stateNorm, variationNorm } from '@/server/numerics/taylor/jet-norm';
import type { JetProgram } from '@/server/numerics/taylor/prepared-flow';
import type { StateScales } from '@/server/numerics/taylor/state-scales';
import { convergenceRadius, stepOfRadius } from '@/server/numerics/taylor/taylor-step-size';

/**
 * The step that the series at hand allow: of the state; of its variations, which can vary faster than the state does;
 * and of u where the section is curved, since the state's series knows nothing of how fast u varies.
 *
 * @returns h > 0, Infinity for a constant flow, NaN where a series is not finite.
 */
export function chooseStep({ tape, kernel }: JetProgram, known: StateScales, isCurved: boolean): number {
  const { order } = kernel;
  const scales = known.of(kernel);
  // Against 1 in units of the scales: a state passing near the origin does not ask for smaller steps.
  const state = convergenceRadius(1, stateNorm(kernel, scales, order - 1), stateNorm(kernel, scales, order), order);
  let step = stepOfRadius(state, order);
  if (kernel.stride > 0) {
    const [first, before, last] = [0, order - 1, order].map((k) => variationNorm(kernel, scales, k));
    step = smaller(step, stepOfRadius(convergenceRadius(first!, before!, last!, order), order));
  }
  return isCurved ? smaller(step, curvedStep(kernel, tape.roots[tape.dimension]!, step)) : step;
}

/** Math.min would do, but it must keep NaN. */
const smaller = (a: number, b: number): number => (b < a || Number.isNaN(b) ? b : a);

function curvedStep(kernel: JetKernel, operand: number, step: number): number {
  const { order, memory, seriesStart } = kernel;
  const at = (k: number): number => Math.abs(memory[seriesStart + operand * (order + 1) + k]!);
  const scale = at(0) + at(1) * (Number.isFinite(step) ? step : 0);
  return scale > 0 ? stepOfRadius(convergenceRadius(scale, at(order - 1), at(order), order), order) : step;
}
