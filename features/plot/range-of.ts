/** Smallest and largest of some numbers; a width is made up where there is none, so that a scale exists. */
export function rangeOf(values: Iterable<number>): [number, number] {
  let low = Infinity;
  let high = -Infinity;
  for (const value of values) {
    if (value < low) low = value;
    if (value > high) high = value;
  }
  if (low > high) return [0, 1];
  if (low === high) {
    const half = Math.max(Math.abs(low) * 0.05, 0.5);
    return [low - half, high + half];
  }
  return [low, high];
}
