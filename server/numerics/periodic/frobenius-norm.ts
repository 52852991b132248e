/** √Σ aᵢⱼ², an upper bound of the spectral norm and at most √n times it. */
export function frobeniusNorm(a: Float64Array): number {
  let largest = 0;
  for (const entry of a) largest = Math.max(largest, Math.abs(entry));
  if (largest === 0 || !Number.isFinite(largest)) return largest;
  let sum = 0;
  for (const entry of a) sum += (entry / largest) ** 2;
  return largest * Math.sqrt(sum);
}
