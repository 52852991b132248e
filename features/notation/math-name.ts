const LETTERS: Record<string, string> = {
  alpha: 'α',
  beta: 'β',
  gamma: 'γ',
  delta: 'δ',
  epsilon: 'ε',
  zeta: 'ζ',
  eta: 'η',
  theta: 'θ',
  iota: 'ι',
  kappa: 'κ',
  lambda: 'λ',
  mu: 'μ',
  nu: 'ν',
  xi: 'ξ',
  rho: 'ρ',
  sigma: 'σ',
  tau: 'τ',
  phi: 'φ',
  chi: 'χ',
  psi: 'ψ',
  omega: 'ω',
  Gamma: 'Γ',
  Delta: 'Δ',
  Theta: 'Θ',
  Lambda: 'Λ',
  Xi: 'Ξ',
  Sigma: 'Σ',
  Phi: 'Φ',
  Psi: 'Ψ',
  Omega: 'Ω',
};
const SUBSCRIPTS = ['₀', '₁', '₂', '₃', '₄', '₅', '₆', '₇', '₈', '₉'];

/** A name as mathematics writes it: `sigma` is σ, `x1` and `x_1` are x₁; other names stay. */
export function mathName(name: string): string {
  const [, stem = name, index = ''] = /^([A-Za-z]+?)_?(\d*)$/.exec(name) ?? [];
  const letter = LETTERS[stem] ?? stem;
  return (
    letter +
    Array.from(index)
      .map((digit) => SUBSCRIPTS[parseInt(digit, 10)])
      .join('')
  );
}
