const letters =
  'alpha α beta β gamma γ delta δ epsilon ε zeta ζ eta η theta θ iota ι kappa κ lambda λ mu μ nu ν xi ξ rho ρ sigma σ ' +
  'tau τ upsilon υ phi φ chi χ psi ψ omega ω Gamma Γ Delta Δ Theta Θ Lambda Λ Xi Ξ Pi Π Sigma Σ Phi Φ Psi Ψ Omega Ω';

const words = letters.split(' ');

/** Names that are shown as Greek letters. */
export const greekLetters: ReadonlyMap<string, string> = new Map(
  words.flatMap((word, index) => (index % 2 === 0 ? [[word, words[index + 1] ?? word] as const] : [])),
);
