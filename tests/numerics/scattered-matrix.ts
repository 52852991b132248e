/** A full matrix with entries in (−1, 1) from a fixed linear congruence: the same in every run. */
export function scatteredMatrix(rows: number, cols: number, seed: number): Float64Array {
  let state = seed;
  return Float64Array.from({ length: rows * cols }, () => {
    state = (state * 1103515245 + 12345) % 2 ** 31;
    return (2 * state) / 2 ** 31 - 1;
  });
}
