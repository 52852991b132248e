import type { JetKernel } from '@/server/numerics/taylor/jet-kernel';

/**
 * Sum a kernel's series at h by Horner's rule: the state after a step, and its variations.
 *
 * @param to state of shape n and variations of shape n × stride; both are overwritten.
 */
export function advance(kernel: JetKernel, h: number, to: { state: Float64Array; varied: Float64Array }): void {
  const { memory, order, seriesStart, variationsStart, stride } = kernel;
  const width = order + 1;
  for (let i = 0; i < to.state.length; i++) {
    const from = seriesStart + i * width;
    let x = memory[from + order]!;
    for (let k = order - 1; k >= 0; k--) x = x * h + memory[from + k]!;
    to.state[i] = x;
    for (let d = 0; d < stride; d++) {
      const column = variationsStart + i * width * stride + d;
      let v = memory[column + order * stride]!;
      for (let k = order - 1; k >= 0; k--) v = v * h + memory[column + k * stride]!;
      to.varied[i * stride + d] = v;
    }
  }
}
