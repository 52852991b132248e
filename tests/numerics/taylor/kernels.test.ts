import { parseFormula } from '@/server/formulas/parse-formula';
import { buildNode } from '@/server/numerics/expression/build-node';
import { Graph } from '@/server/numerics/expression/graph';
import { makeTape } from '@/server/numerics/expression/tape';
import { staticValues } from '@/server/numerics/expression/static-values';
import { InterpretedKernel } from '@/server/numerics/taylor/interpreted-kernel';
import type { JetKernel } from '@/server/numerics/taylor/jet-kernel';
import { makeWasmKernel } from '@/server/numerics/taylor/wasm-kernel';

const ORDER = 12;

/** Series of g(s) with s' = 1 from s = start: Taylor coefficients of g, and those of dg/ds beside them. */
function seriesOf(formula: string, start: number, make: (tape: ReturnType<typeof makeTape>) => JetKernel) {
  const graph = new Graph();
  const names = new Map([['s', graph.state(0)]]);
  const parsed = parseFormula(formula, new Set(['s']));
  if (!parsed.ok) throw new Error(parsed.error.message);
  const root = buildNode(graph, parsed.expression, names);
  const tape = makeTape(graph, 1, [graph.constant(1), root], 2);
  const kernel = make(tape);
  kernel.memory.set(staticValues(tape.statics, []), 0);
  kernel.memory[kernel.seriesStart] = start;
  kernel.memory[kernel.variationsStart] = 1;
  kernel.run(ORDER);
  const slot = tape.roots[1]!;
  const at = (k: number) => kernel.seriesStart + slot * (ORDER + 1) + k;
  const varied = (k: number) => kernel.variationsStart + (slot * (ORDER + 1) + k) * kernel.stride;
  return {
    value: Array.from({ length: ORDER + 1 }, (_, k) => kernel.memory[at(k)]!),
    slope: Array.from({ length: ORDER + 1 }, (_, k) => kernel.memory[varied(k)]!),
  };
}

const factorial = (k: number): number => (k <= 1 ? 1 : k * factorial(k - 1));
/** Generalised binomial coefficient. */
const binomial = (a: number, k: number): number => (k === 0 ? 1 : (binomial(a, k - 1) * (a - k + 1)) / k);
const parity = (k: number, even: number, odd: number): number => (k % 2 === 0 ? even : odd);

/** Taylor coefficients in closed form: the calculus textbook's, no recurrence. */
const closedForms: [string, number, (k: number) => number][] = [
  ['exp(s)', 0.3, (k) => Math.exp(0.3) / factorial(k)],
  ['log(s)', 2, (k) => (k === 0 ? Math.log(2) : parity(k, -1, 1) / (k * 2 ** k))],
  ['1/s', 2, (k) => parity(k, 1, -1) / 2 ** (k + 1)],
  ['sqrt(s)', 4, (k) => binomial(0.5, k) * 4 ** (0.5 - k)],
  ['s^(-3/2)', 2, (k) => binomial(-1.5, k) * 2 ** (-1.5 - k)],
  ['s^17', 1, (k) => binomial(17, k)],
  ['s^5', 2, (k) => (k > 5 ? 0 : binomial(5, k) * 2 ** (5 - k))],
  ['s*s^2', 3, (k) => (k > 3 ? 0 : binomial(3, k) * 3 ** (3 - k))],
  ['sin(s)', 0.7, (k) => Math.sin(0.7 + (k * Math.PI) / 2) / factorial(k)],
  ['cos(s)', 0.7, (k) => Math.cos(0.7 + (k * Math.PI) / 2) / factorial(k)],
  ['sinh(s)', 0.4, (k) => parity(k, Math.sinh(0.4), Math.cosh(0.4)) / factorial(k)],
  ['cosh(s)', 0.4, (k) => parity(k, Math.cosh(0.4), Math.sinh(0.4)) / factorial(k)],
  ['atan(s)', 0, (k) => (k % 2 === 0 ? 0 : parity((k - 1) / 2, 1, -1) / k)],
  ['asin(s)', 0, (k) => (k % 2 === 0 ? 0 : (Math.abs(binomial(-0.5, (k - 1) / 2)) * 1) / k)],
  ['acos(s)', 0, (k) => (k === 0 ? Math.PI / 2 : k % 2 === 0 ? 0 : -Math.abs(binomial(-0.5, (k - 1) / 2)) / k)],
  ['(s + 1)/(2 - s)', 0, (k) => (k === 0 ? 0.5 : 3 / 2 ** (k + 1))],
  ['2^s', 1, (k) => (2 * Math.LN2 ** k) / factorial(k)],
];

/** tan and tanh at 0: coefficients from the Bernoulli numbers (DLMF 4.19.3, 4.33.3). */
const tangents: [string, number[]][] = [
  ['tan(s)', [0, 1, 0, 1 / 3, 0, 2 / 15, 0, 17 / 315, 0, 62 / 2835]],
  ['tanh(s)', [0, 1, 0, -1 / 3, 0, 2 / 15, 0, -17 / 315, 0, 62 / 2835]],
];

const kernels: [string, (tape: ReturnType<typeof makeTape>) => JetKernel][] = [
  ['interpreted', (tape) => new InterpretedKernel(tape, ORDER, 1)],
  ['wasm', (tape) => makeWasmKernel(tape, ORDER, 1)],
];

const close = (found: number, exact: number): void =>
  expect(Math.abs(found - exact)).toBeLessThanOrEqual(2e-13 * Math.max(Math.abs(exact), 1e-3));

describe.each(kernels)('the %s kernel', (_name, make) => {
  it.each(closedForms)('expands %s', (formula, start, exact) => {
    const { value, slope } = seriesOf(formula, start, make);
    value.forEach((coefficient, k) => close(coefficient, exact(k)));
    // d/ds of the whole series is the series of the derivative: coefficient (k + 1) g_{k+1}.
    slope.slice(0, -1).forEach((coefficient, k) => close(coefficient, (k + 1) * exact(k + 1)));
  });

  it.each(tangents)('expands %s', (formula, exact) => {
    seriesOf(formula, 0, make)
      .value.slice(0, exact.length)
      .forEach((coefficient, k) => close(coefficient, exact[k]!));
  });
});
