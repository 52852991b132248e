/**
 * Evaluate a polynomial: c₀ + c₁ s + … + c_d sᵈ.
 *
 * @param c       coefficients, lowest first.
 * @param s       argument.
 * @param from    index of c₀ in c; 0 unless given.
 * @param length  number of coefficients; to the end of c unless given.
 *
 * Accuracy: within 2d·ulp of Σ |cₖ sᵏ|.
 * Cost: d products.
 */
export function horner(c: Float64Array, s: number, from = 0, length = c.length - from): number {
  let value = 0;
  for (let k = from + length - 1; k >= from; k -= 1) value = value * s + c[k]!;
  return value;
}
