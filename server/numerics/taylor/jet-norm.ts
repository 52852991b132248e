import type { JetKernel } from '@/server/numerics/taylor/jet-kernel';

/** Largest |coefficient k| of a state variable, each in units of its scale. */
export function stateNorm(kernel: JetKernel, scales: Float64Array, k: number): number {
  const width = kernel.order + 1;
  let norm = 0;
  for (let i = 0; i < scales.length; i++) {
    const size = Math.abs(kernel.memory[kernel.seriesStart + i * width + k]!) / scales[i]!;
    if (!(size <= norm)) norm = size;
  }
  return norm;
}

/** Largest |coefficient k| of a variation of the state, the rows in units of the state's scales. */
export function variationNorm(kernel: JetKernel, scales: Float64Array, k: number): number {
  const width = kernel.order + 1;
  let norm = 0;
  for (let i = 0; i < scales.length; i++) {
    const from = kernel.variationsStart + (i * width + k) * kernel.stride;
    for (let d = 0; d < kernel.stride; d++) {
      const size = Math.abs(kernel.memory[from + d]!) / scales[i]!;
      if (!(size <= norm)) norm = size;
    }
  }
  return norm;
}
