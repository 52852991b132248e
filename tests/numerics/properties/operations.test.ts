import Decimal from 'decimal.js';
import fc from 'fast-check';
import { preciseSystem } from '@/server/checks/precise-system';
import { parseSection } from '@/server/formulas/parse-section';
import { buildNode } from '@/server/numerics/expression/build-node';
import { Graph } from '@/server/numerics/expression/graph';
import { staticValues } from '@/server/numerics/expression/static-values';
import { makeTape } from '@/server/numerics/expression/tape';
import { decimalOfFixed } from '@/server/numerics/precision/decimal-of-fixed';
import { InterpretedKernel } from '@/server/numerics/taylor/interpreted-kernel';
import { makeWasmKernel } from '@/server/numerics/taylor/wasm-kernel';
import { soundSystem } from '@/tests/reference/check-body';

const ORDER = 12;
/** 60 digits after the point; the recurrences of these series lose a few. */
const BITS = 200;
const PRECISE_DIGITS = 60;

const Exact = Decimal.clone({ precision: 110, toExpNeg: -200, toExpPos: 200 });
/**
 * An interpolation through 29 values so near each other misses coefficient 12 by about (1e-3/r)^17 of its size, r being
 * the distance of the nearest singularity, and the 110 digits lose 4 an order: 1e-40 is safe for r above 0.25.
 */
const PLACES = 29;
const APART = new Exact('0.0001');
const PRECISE_MISS = 1e-38;
/** Each coefficient is a sum of as many products as its order, made of the earlier ones with their own roundings. */
const DOUBLE_MISS = (ORDER + 1) ** 2 * Number.EPSILON;

/** Taylor coefficients at 0 from values alone: no recurrence, no derivative. Newton's divided differences. */
function exactSeries(g: (s: Decimal) => Decimal): Decimal[] {
  const places = Array.from({ length: PLACES }, (_, j) => APART.times(j - (PLACES - 1) / 2));
  const table = places.map(g);
  for (let level = 1; level < PLACES; level++) {
    for (let j = PLACES - 1; j >= level; j--) {
      table[j] = table[j]!.minus(table[j - 1]!).div(places[j]!.minus(places[j - level]!));
    }
  }
  let series: Decimal[] = [];
  for (let j = PLACES - 1; j >= 0; j--) {
    // series · (s − place) + table[j]
    series = [new Exact(0), ...series].map((c, k) => c.minus((series[k] ?? new Exact(0)).times(places[j]!)));
    series[0] = series[0]!.plus(table[j]!);
  }
  return series.slice(0, ORDER + 2);
}

/** Series of g(s) and of its derivative by the start, along s' = 1 from 0. */
function doubleSeries(formula: string, isWasm: boolean): { value: number[]; slope: number[] } {
  const graph = new Graph();
  const parsed = parseSection(clock, { formula });
  if (!parsed.ok) throw new Error(parsed.errors[0]!.message);
  const root = buildNode(graph, parsed.section.expression, new Map([['s', graph.state(0)]]));
  const tape = makeTape(graph, 1, [graph.constant(1), root], 2);
  const kernel = isWasm ? makeWasmKernel(tape, ORDER, 1) : new InterpretedKernel(tape, ORDER, 1);
  const { memory, seriesStart, variationsStart, stride } = kernel;
  memory.set(staticValues(tape.statics, []), 0);
  memory[variationsStart] = 1;
  kernel.run(ORDER);
  const slot = tape.roots[1]! * (ORDER + 1);
  const orders = Array.from({ length: ORDER + 1 }, (_, k) => slot + k);
  return {
    value: orders.map((at) => memory[seriesStart + at]!),
    slope: orders.map((at) => memory[variationsStart + at * stride]!),
  };
}

/** The same series with many digits. */
function preciseSeries(formula: string): Decimal[] {
  const parsed = parseSection(clock, { formula });
  if (!parsed.ok) throw new Error(parsed.errors[0]!.message);
  const flow = preciseSystem(clock, { section: parsed.section, hold: null });
  const one = 1n << BigInt(BITS);
  let series: Decimal[] = [];
  flow.follow({
    ...{ start: [0n], duration: one, steps: [1], bits: BITS, order: ORDER },
    onStep: ({ kernel }) => {
      series = Array.from(
        { length: ORDER + 1 },
        (_, k) => new Exact(decimalOfFixed(kernel.value(flow.sectionRoot, k), BITS, PRECISE_DIGITS)),
      );
    },
  });
  return series;
}

const clock = soundSystem({ name: 'clock', variables: [{ name: 's' }], parameters: [], equations: { s: '1' } });

/** A range of the argument at s = 0, away from what is singular. */
type Range = readonly [low: number, high: number];
const ANY: Range = [-3, 3];
const POSITIVE: Range = [0.5, 3];
const NO_FLOOR = Number.MIN_VALUE;

interface OperationCase {
  formula: (p: string, q: string) => string;
  exact: (p: Decimal, q: Decimal) => Decimal;
  ranges: readonly [Range, Range];
  /** Size of what is subtracted inside: sinh and tanh are differences of exponentials. */
  floor: number;
}

type Named = 'sqrt' | 'exp' | 'sin' | 'cos' | 'tan' | 'asin' | 'acos' | 'atan' | 'sinh' | 'cosh' | 'tanh';

const named = (name: Named, range: Range): [string, OperationCase] => [
  name,
  {
    formula: (p) => `${name}(${p})`,
    exact: (p) => p[name](),
    ranges: [range, ANY],
    floor: name === 'sinh' || name === 'tanh' ? 1 : NO_FLOOR,
  },
];

const plain: [string, Omit<OperationCase, 'floor'>][] = [
  ['+', { formula: (p, q) => `(${p}) + (${q})`, exact: (p, q) => p.plus(q), ranges: [ANY, ANY] }],
  ['-', { formula: (p, q) => `(${p}) - (${q})`, exact: (p, q) => p.minus(q), ranges: [ANY, ANY] }],
  ['*', { formula: (p, q) => `(${p})*(${q})`, exact: (p, q) => p.times(q), ranges: [ANY, ANY] }],
  ['/', { formula: (p, q) => `(${p})/(${q})`, exact: (p, q) => p.div(q), ranges: [ANY, POSITIVE] }],
  ['^', { formula: (p, q) => `(${p})^(${q})`, exact: (p, q) => p.pow(q), ranges: [POSITIVE, ANY] }],
  ['-x', { formula: (p) => `-(${p})`, exact: (p) => p.negated(), ranges: [ANY, ANY] }],
  ['x^2', { formula: (p) => `(${p})^2`, exact: (p) => p.pow(2), ranges: [ANY, ANY] }],
  ['x^13', { formula: (p) => `(${p})^13`, exact: (p) => p.pow(13), ranges: [ANY, ANY] }],
  ['x^(-3)', { formula: (p) => `(${p})^(-3)`, exact: (p) => p.pow(-3), ranges: [POSITIVE, ANY] }],
  ['x^21', { formula: (p) => `(${p})^21`, exact: (p) => p.pow(21), ranges: [POSITIVE, ANY] }],
  ['x^(5/2)', { formula: (p) => `(${p})^(5/2)`, exact: (p) => p.pow(2.5), ranges: [POSITIVE, ANY] }],
  ['x^(-3/2)', { formula: (p) => `(${p})^(-3/2)`, exact: (p) => p.pow(-1.5), ranges: [POSITIVE, ANY] }],
  ['x^0.3', { formula: (p) => `(${p})^0.3`, exact: (p) => p.pow('0.3'), ranges: [POSITIVE, ANY] }],
  ['3^x', { formula: (p) => `3^(${p})`, exact: (p) => new Exact(3).pow(p), ranges: [ANY, ANY] }],
  ['log', { formula: (p) => `log(${p})`, exact: (p) => p.ln(), ranges: [POSITIVE, ANY] }],
];

const operations: [string, OperationCase][] = [
  ...plain.map(([name, one]): [string, OperationCase] => [name, { ...one, floor: NO_FLOOR }]),
  named('sqrt', POSITIVE),
  ...(['exp', 'sin', 'cos', 'atan', 'sinh', 'cosh', 'tanh'] as const).map((name) => named(name, ANY)),
  named('tan', [-1.2, 1.2]),
  named('asin', [-0.8, 0.8]),
  named('acos', [-0.8, 0.8]),
];

/** A random argument a + b s + c s², b not 0, as text and as a function. */
const argument = ([low, high]: Range) =>
  fc
    .tuple(
      fc.integer({ min: low * 1000, max: high * 1000 }),
      fc.integer({ min: 1, max: 1000 }),
      fc.integer({ min: -1000, max: 1000 }),
    )
    .map((thousandths) => {
      const [a, b, c] = thousandths.map((n) => new Exact(n).div(1000));
      return {
        text: `(${a!.toString()}) + (${b!.toString()})*s + (${c!.toString()})*s^2`,
        at: (s: Decimal) => a!.plus(s.times(b!.plus(s.times(c!)))),
      };
    });

/** Size of each term at the distance where terms stop falling. */
function weights(series: readonly Decimal[]): number[] {
  const reaches = series.map((c, k) => (k < 4 || c.isZero() ? 1 : c.abs().toNumber() ** (-1 / k)));
  return series.map((_, k) => Math.min(1, ...reaches) ** k);
}

/** Largest difference of two series, in units of their largest term. */
function missOf(found: readonly Decimal.Value[], exact: readonly Decimal[], floor: number): number {
  const weight = weights(exact);
  const largest = (list: readonly Decimal[]): number =>
    Math.max(...list.map((c, k) => c.abs().toNumber() * weight[k]!));
  return largest(exact.map((c, k) => c.minus(found[k]!))) / Math.max(floor, largest(exact));
}

describe('the series of an operation', () => {
  it.each(operations)(
    '%s is the same in WebAssembly, in the interpreter, in many digits and by interpolation',
    (_, { formula, exact, ranges, floor }) => {
      fc.assert(
        fc.property(argument(ranges[0]), argument(ranges[1]), (p, q) => {
          const text = formula(p.text, q.text);
          const known = exactSeries((s) => exact(p.at(s), q.at(s)));
          const series = known.slice(0, ORDER + 1);
          const slopes = known.slice(1).map((c, k) => c.times(k + 1));
          for (const isWasm of [true, false]) {
            const { value, slope } = doubleSeries(text, isWasm);
            expect(missOf(value, series, floor)).toBeLessThan(DOUBLE_MISS);
            expect(missOf(slope, slopes, floor)).toBeLessThan(DOUBLE_MISS);
          }
          // Fixed point: so many digits after the point, whatever the size.
          expect(missOf(preciseSeries(text), series, 1)).toBeLessThan(PRECISE_MISS);
        }),
        { numRuns: 5, seed: 51 },
      );
    },
  );
});
