/** A figure in a sentence: three significant digits, a power of ten where it is small or large. */
export function figure(value: number): string {
  if (!Number.isFinite(value)) return 'beyond measure';
  return String(Number(value.toPrecision(3)));
}
