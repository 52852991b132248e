/** Fraction of the estimated convergence radius that is optimal for a Taylor step: e⁻². */
const OPTIMAL_FRACTION = Math.exp(-2);

/**
 * The radius of convergence of a series as its last two coefficients let expect:
 *   ρ = min over k ∈ {p − 1, p} of (s / ‖x_k‖)^(1/k).
 * Two orders, because the last coefficient of an even or odd series may vanish.
 *
 * @param scale  s, the size against which the coefficients are measured.
 * @param before ‖x_{p−1}‖.
 * @param last   ‖x_p‖.
 * @param order  p ≥ 2.
 * @returns      ρ ≥ 0; Infinity when both coefficients vanish, NaN when one of them is NaN.
 *
 * Accuracy: a heuristic, not a bound.
 * Source: À. Jorba, M. Zou, Experimental Mathematics 14 (2005) 99–117, section 3.
 */
export const convergenceRadius = (scale: number, before: number, last: number, order: number): number =>
  Math.min((scale / before) ** (1 / (order - 1)), (scale / last) ** (1 / order));

/**
 * The step for a radius of convergence: h = ρ e⁻² e^(−0.7/(p − 1)).
 *
 * Source: Jorba and Zou, as above; the last factor is their safety factor.
 */
export const stepOfRadius = (radius: number, order: number): number =>
  radius * OPTIMAL_FRACTION * Math.exp(-0.7 / (order - 1));
