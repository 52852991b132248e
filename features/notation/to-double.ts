/** A decimal string (or `p/q`) as a double, for drawing only: pictures need no more digits than a screen has pixels. */
export function toDouble(value: string | number): number {
  if (typeof value === 'number') return value;
  const [numerator = '', denominator] = value.replace('−', '-').split('/');
  return denominator === undefined ? Number(numerator) : Number(numerator) / Number(denominator);
}
