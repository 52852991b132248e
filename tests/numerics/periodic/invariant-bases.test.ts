import { factorQr } from '@/server/numerics/linear/factor-qr';
import { multiplyMatrices } from '@/server/numerics/linear/multiply-matrices';
import { refineBases } from '@/server/numerics/periodic/refine-bases';
import { unitBases } from '@/server/numerics/periodic/unit-bases';
import { scatteredMatrix } from '../scattered-matrix';

const N = 5;
const U = 2;
const COUNT = 12;

const transpose = (a: Float64Array) =>
  Float64Array.from({ length: N * N }, (_, k) => a[(k % N) * N + Math.floor(k / N)]!);

const frames = Array.from({ length: COUNT }, (_, i) => factorQr(scatteredMatrix(N, N, 17 * i + 3), N, N).q);

/** In each frame: a Jordan block at 1, growth by 30, decay by 1/30 and a turn of sign; the whole grows 5e17-fold. */
const matrices = frames.map((from, i) => {
  const t = Float64Array.of(
    ...[1, i === 4 ? 1 : 0, 0.3, 2, 1],
    ...[0, 1, 4, -1, 0.5],
    ...[0, 0, 30, 2, 3],
    ...[0, 0, 0, 1 / 30, 1],
    ...[0, 0, 0, 0, -0.9],
  );
  return multiplyMatrices(multiplyMatrices(frames[(i + 1) % COUNT]!, t, N, N), transpose(from), N, N);
});

const exact = frames.map((frame) =>
  Float64Array.from({ length: N * U }, (_, k) => frame[Math.floor(k / U) * N + (k % U)]!),
);

/** Largest part of the basis outside the subspace. */
function outside(basis: Float64Array, subspace: Float64Array): number {
  let largest = 0;
  for (let col = 0; col < U; col += 1) {
    const rest = Array.from({ length: N }, (_, i) => basis[i * U + col]!);
    for (let j = 0; j < U; j += 1) {
      const part = rest.reduce((sum, entry, i) => sum + entry * subspace[i * U + j]!, 0);
      rest.forEach((_, i) => (rest[i]! -= part * subspace[i * U + j]!));
    }
    largest = Math.max(largest, ...rest.map(Math.abs));
  }
  return largest;
}

describe('unitBases', () => {
  it('carries the subspace of the units along, against growth of 5e17 and decay of its inverse', () => {
    const bases = unitBases(matrices, { size: U, basis: exact[0]! });
    // One ulp of every entry, through a chain whose parts have norms of about 30.
    bases.forEach((basis, i) => expect(outside(basis, exact[i]!)).toBeLessThan(1e-13));
  });
});

describe('refineBases', () => {
  it('makes the bases invariant to rounding from a millionth', () => {
    const rough = exact.map(
      (basis, i) =>
        factorQr(
          basis.map((entry, k) => entry + 1e-6 * scatteredMatrix(N, U, 5 * i + 1)[k]!),
          N,
          U,
        ).q,
    );
    expect(outside(rough[0]!, exact[0]!)).toBeGreaterThan(1e-7);
    refineBases(matrices, rough, N).forEach((basis, i) => expect(outside(basis, exact[i]!)).toBeLessThan(1e-13));
  });

  it('leaves alone what is near no invariant subspace, and what is the whole space', () => {
    const far = exact.map((_, i) => factorQr(scatteredMatrix(N, U, 91 * i + 7), N, U).q);
    expect(refineBases(matrices, far, N)).toBe(far);
    const whole = frames.map((frame) => Float64Array.from(frame));
    expect(refineBases(matrices, whole, N)).toBe(whole);
  });
});
