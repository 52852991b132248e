/** The n × n identity, row-major, newly allocated. */
export function identityMatrix(n: number): Float64Array {
  const identity = new Float64Array(n * n);
  for (let i = 0; i < n; i += 1) identity[i * n + i] = 1;
  return identity;
}
