import type { JetKernel } from '@/server/numerics/taylor/jet-kernel';

/** No coordinate's scale is below this part of the largest: errors there do not show. */
const SMALLEST_SCALE = 1e-8;

/** The size of each coordinate as far as the integration has seen it: what errors are measured against. */
export class StateScales {
  private readonly seen: Float64Array;
  private readonly current: Float64Array;
  private lastStep = 0;

  /** @param moduli of the coordinates that are angles, whose size is their modulus. */
  constructor(
    start: Float64Array,
    private readonly moduli: readonly (number | null)[],
  ) {
    this.seen = start.map((x, i) => moduli[i] ?? Math.abs(x));
    this.current = new Float64Array(start.length);
  }

  /** Take note of a state reached by a step. */
  see(state: Float64Array, h: number): void {
    for (let i = 0; i < state.length; i++) {
      if (this.moduli[i] === null) this.seen[i] = Math.max(this.seen[i]!, Math.abs(state[i]!));
    }
    this.lastStep = h;
  }

  /** Scales for the step that starts from the kernel's series; a coordinate that starts at 0 counts with its speed. */
  of(kernel: JetKernel): Float64Array {
    const width = kernel.order + 1;
    let largest = 0;
    for (let i = 0; i < this.seen.length; i++) {
      const speed = Math.abs(kernel.memory[kernel.seriesStart + i * width + 1]!);
      this.current[i] = Math.max(this.seen[i]!, speed * this.lastStep);
      largest = Math.max(largest, this.current[i]!);
    }
    const floor = largest > 0 ? SMALLEST_SCALE * largest : 1;
    for (let i = 0; i < this.seen.length; i++) this.current[i] = Math.max(this.current[i]!, floor);
    return this.current;
  }
}
