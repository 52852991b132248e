/**
 * Computes Taylor coefficients of everything on a tape.
 *
 * Memory is one block of doubles:
 *   statics     one value a static step;
 *   series      slot × (order + 1): coefficient k of slot i at seriesStart + i (order + 1) + k;
 *   variations  slot × (order + 1) × stride: direction d of coefficient k of slot i at
 *               variationsStart + (i (order + 1) + k) stride + d. Directions are padded to an even stride.
 * The caller writes the static values, coefficient 0 of the state slots and of their variations, then calls `run`.
 */
export interface JetKernel {
  readonly memory: Float64Array;
  readonly order: number;
  readonly seriesStart: number;
  readonly variationsStart: number;
  /** Doubles from one coefficient of the variations to the next; 0 without variations. */
  readonly stride: number;
  /** Fill the coefficients 0 … upTo of every slot, and those of the state up to upTo + 1 as far as they exist. */
  run(upTo: number): void;
}

export interface JetLayout {
  order: number;
  seriesStart: number;
  variationsStart: number;
  stride: number;
  /** Doubles in all. */
  size: number;
}

/** Where things stand in a kernel's memory. */
export function jetLayout(sizes: { statics: number; slots: number; order: number; directions: number }): JetLayout {
  const { statics, slots, order, directions } = sizes;
  const stride = directions + (directions % 2);
  // Vectors of two doubles begin at even places.
  const seriesStart = statics + (statics % 2);
  const series = slots * (order + 1);
  const variationsStart = seriesStart + series + (series % 2);
  return { order, seriesStart, variationsStart, stride, size: variationsStart + series * stride };
}
