import {
  add,
  addInt,
  addPairs,
  type Code,
  dividePairs,
  F64,
  get,
  I32,
  i32,
  isLess,
  load,
  loadPair,
  multiply,
  multiplyInt,
  multiplyPairs,
  repeat,
  set,
  splat,
  storePair,
  subtractInt,
  V128,
  type WasmFunction,
  when,
} from '@/server/numerics/taylor/wasm-code';

const DOUBLE = 8;
const PAIR = 16;
const advance = (local: number, by: Code, how: Code = addInt): Code => [...get(local), ...by, ...how, ...set(local)];

/** convolve(a, b, n) = Σ_{j<n} a[j] b[−j]; a and b are addresses. */
const convolve: WasmFunction = {
  parameters: [I32, I32, I32],
  results: [F64],
  locals: [F64, I32],
  body: [
    ...[...get(0), ...get(2), ...i32(DOUBLE), ...multiplyInt, ...addInt, ...set(4)],
    ...[...get(0), ...get(4), ...isLess],
    ...when(
      repeat([
        ...[...get(3), ...get(0), ...load(), ...get(1), ...load(), ...multiply, ...add, ...set(3)],
        ...advance(0, i32(DOUBLE)),
        ...advance(1, i32(DOUBLE), subtractInt),
        ...[...get(0), ...get(4), ...isLess],
      ]),
    ),
    ...get(3),
  ],
};

/** weigh(a, b, n, w, dw) = Σ_{j<n} (w + j dw) a[j] b[−j]. */
const weigh: WasmFunction = {
  parameters: [I32, I32, I32, F64, F64],
  results: [F64],
  locals: [F64, I32],
  body: [
    ...[...get(0), ...get(2), ...i32(DOUBLE), ...multiplyInt, ...addInt, ...set(6)],
    ...[...get(0), ...get(6), ...isLess],
    ...when(
      repeat([
        ...[...get(5), ...get(3), ...get(0), ...load(), ...multiply, ...get(1), ...load(), ...multiply],
        ...[...add, ...set(5), ...advance(3, get(4), add)],
        ...advance(0, i32(DOUBLE)),
        ...advance(1, i32(DOUBLE), subtractInt),
        ...[...get(0), ...get(6), ...isLess],
      ]),
    ),
    ...get(5),
  ],
};

/** Walk over one vector of directions: the body sees the offset in local `at` and the end in local `end`. */
const overPairs = (at: number, end: number, stride: number, body: Code): Code => [
  ...[...i32(0), ...set(at), ...i32(stride * DOUBLE), ...set(end)],
  ...repeat([...body, ...advance(at, i32(PAIR)), ...get(at), ...get(end), ...isLess]),
];

const address = (base: number, at: number): Code => [...get(base), ...get(at), ...addInt];

/** gather(to, a, v, n, c): to[d] += c Σ_{j<n} a[j] v[−j][d] for every direction d. */
const gather = (stride: number): WasmFunction => ({
  parameters: [I32, I32, I32, I32, F64],
  results: [],
  locals: [V128, I32, I32, I32, I32, I32],
  body: overPairs(6, 7, stride, [
    ...[...i32(0), ...toPair, ...set(5)],
    ...[...get(1), ...set(8), ...address(2, 6), ...set(9)],
    ...[...get(1), ...get(3), ...i32(DOUBLE), ...multiplyInt, ...addInt, ...set(10)],
    ...[...get(8), ...get(10), ...isLess],
    ...when(
      repeat([
        ...[...get(5), ...get(8), ...load(), ...splat, ...get(9), ...loadPair(), ...multiplyPairs, ...addPairs],
        ...set(5),
        ...advance(8, i32(DOUBLE)),
        ...advance(9, i32(stride * DOUBLE), subtractInt),
        ...[...get(8), ...get(10), ...isLess],
      ]),
    ),
    ...[...address(0, 6), ...address(0, 6), ...loadPair()],
    ...[...get(5), ...get(4), ...splat, ...multiplyPairs, ...addPairs, ...storePair()],
  ]),
});

/** A pair of zeros from the integer 0. */
const toPair: Code = [0xb7, ...splat];

/** clear(to): to[d] = 0. */
const clear = (stride: number): WasmFunction => ({
  parameters: [I32],
  results: [],
  locals: [I32, I32],
  body: overPairs(1, 2, stride, [...address(0, 1), ...i32(0), ...toPair, ...storePair()]),
});

/** accumulate(to, v, c): to[d] += c v[d]. */
const accumulate = (stride: number): WasmFunction => ({
  parameters: [I32, I32, F64],
  results: [],
  locals: [I32, I32],
  body: overPairs(3, 4, stride, [
    ...[...address(0, 3), ...address(0, 3), ...loadPair()],
    ...[...address(1, 3), ...loadPair(), ...get(2), ...splat, ...multiplyPairs, ...addPairs, ...storePair()],
  ]),
});

/** divideAll(to, c): to[d] /= c. */
const divideAll = (stride: number): WasmFunction => ({
  parameters: [I32, F64],
  results: [],
  locals: [I32, I32],
  body: overPairs(2, 3, stride, [
    ...[...address(0, 2), ...address(0, 2), ...loadPair(), ...get(1), ...splat, ...dividePairs, ...storePair()],
  ]),
});

/** The sums that every kernel calls, in the order of `sumNames`. Without directions the last four have nothing to walk over. */
export const sumFunctions = (stride: number): WasmFunction[] => [
  convolve,
  weigh,
  ...(stride > 0 ? [gather(stride), clear(stride), accumulate(stride), divideAll(stride)] : []),
];

export const sumNames = ['convolve', 'weigh', 'gather', 'clear', 'accumulate', 'divideAll'] as const;
