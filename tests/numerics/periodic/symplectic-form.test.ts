import { multiplyMatrices } from '@/server/numerics/linear/multiply-matrices';
import { hasSymplecticForm } from '@/server/numerics/periodic/symplectic-form';
import { scatteredMatrix } from '../scattered-matrix';

const N = 4;

/** J S for a symmetric S: the general matrix that leaves the form of J alone. */
function hamiltonian(seed: number): Float64Array {
  const s = scatteredMatrix(N, N, seed);
  const symmetric = s.map((entry, k) => entry + s[(k % N) * N + Math.floor(k / N)]!);
  const j = Float64Array.of(0, 0, 1, 0, 0, 0, 0, 1, -1, 0, 0, 0, 0, -1, 0, 0);
  return multiplyMatrices(j, symmetric, N, N);
}

/** T A T⁻¹ for the shear T = I + c e₀ e₃ᵀ, which is none of the form's. */
function sheared(a: Float64Array, c: number): Float64Array {
  const shear = (sign: number) =>
    Float64Array.from({ length: N * N }, (_, k) => (k % 5 === 0 ? 1 : k === 3 ? sign * c : 0));
  return multiplyMatrices(multiplyMatrices(shear(1), a, N, N), shear(-1), N, N);
}

describe('hasSymplecticForm', () => {
  it('finds the form of Hamiltonian matrices, in any coordinates', () => {
    const matrices = [1, 2, 3].map(hamiltonian);
    expect(hasSymplecticForm(matrices, N)).toBe(true);
    expect(
      hasSymplecticForm(
        matrices.map((a) => sheared(a, 2.5)),
        N,
      ),
    ).toBe(true);
  });

  it('finds none where they have none in common', () => {
    expect(hasSymplecticForm([hamiltonian(1), sheared(hamiltonian(2), 2.5), hamiltonian(3)], N)).toBe(false);
    expect(
      hasSymplecticForm(
        [4, 5, 6].map((seed) => scatteredMatrix(N, N, seed)),
        N,
      ),
    ).toBe(false);
  });

  it('is not misled by a degenerate form, an odd dimension or no matrix at all', () => {
    // x' = y, y' = −x keeps dx∧dy; z' = w, w' = 2 z + w does not keep dz∧dw.
    const half = Float64Array.of(0, 1, 0, 0, -1, 0, 0, 0, 0, 0, 0, 1, 0, 0, 2, 1);
    expect(hasSymplecticForm([half], N)).toBe(false);
    expect(hasSymplecticForm([scatteredMatrix(3, 3, 1)], 3)).toBe(false);
    expect(hasSymplecticForm([], 2)).toBe(false);
  });
});
