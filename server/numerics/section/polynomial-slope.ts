/**
 * Evaluate the derivative of a polynomial: c₁ + 2 c₂ s + … + d c_d sᵈ⁻¹.
 *
 * @param c       coefficients, lowest first.
 * @param s       argument.
 * @param from    index of c₀ in c; 0 unless given.
 * @param length  number of coefficients; to the end of c unless given.
 */
export function polynomialSlope(c: Float64Array, s: number, from = 0, length = c.length - from): number {
  let slope = 0;
  for (let k = length - 1; k >= 1; k -= 1) slope = slope * s + k * c[from + k]!;
  return slope;
}
