/** Instructions of WebAssembly as byte lists; only what the kernels use. Source: WebAssembly Core Specification, ch. 5. */
export type Code = readonly number[];

/** Unsigned LEB128. */
function unsigned(value: number): number[] {
  const bytes: number[] = [];
  let rest = value;
  do {
    const low = rest % 128;
    rest = Math.floor(rest / 128);
    bytes.push(rest > 0 ? low + 128 : low);
  } while (rest > 0);
  return bytes;
}

/** Signed LEB128 of a 32-bit integer. */
function signed(value: number): number[] {
  const bytes: number[] = [];
  let rest = value;
  for (;;) {
    const low = rest & 0x7f;
    rest >>= 7;
    const isDone = (rest === 0 && (low & 0x40) === 0) || (rest === -1 && (low & 0x40) !== 0);
    bytes.push(isDone ? low : low | 0x80);
    if (isDone) return bytes;
  }
}

export const I32 = 0x7f;
export const F64 = 0x7c;
export const V128 = 0x7b;
/** A block that leaves nothing on the stack. */
const EMPTY = 0x40;

const simd = (opcode: number): Code => [0xfd, ...unsigned(opcode)];

export const get = (local: number): Code => [0x20, ...unsigned(local)];
export const set = (local: number): Code => [0x21, ...unsigned(local)];
export const i32 = (value: number): Code => [0x41, ...signed(value)];
export const f64 = (value: number): Code => [0x44, ...new Uint8Array(new Float64Array([value]).buffer)];
/** Load a double; the address on the stack plus a constant offset in bytes. */
export const load = (offset = 0): Code => [0x2b, 3, ...unsigned(offset)];
export const store = (offset = 0): Code => [0x39, 3, ...unsigned(offset)];
export const loadPair = (offset = 0): Code => [...simd(0x00), 4, ...unsigned(offset)];
export const storePair = (offset = 0): Code => [...simd(0x0b), 4, ...unsigned(offset)];
export const splat = simd(0x14);
export const addPairs = simd(0xf0);
export const multiplyPairs = simd(0xf2);
export const dividePairs = simd(0xf3);
export const add: Code = [0xa0];
export const subtract: Code = [0xa1];
export const multiply: Code = [0xa2];
export const divide: Code = [0xa3];
export const negate: Code = [0x9a];
export const squareRoot: Code = [0x9f];
export const addInt: Code = [0x6a];
export const subtractInt: Code = [0x6b];
export const multiplyInt: Code = [0x6c];
export const isZero: Code = [0x45];
export const isLess: Code = [0x48];
export const isEqual: Code = [0x46];
export const toDouble: Code = [0xb7];
export const select: Code = [0x1b];
export const leave: Code = [0x0f];
export const call = (index: number): Code => [0x10, ...unsigned(index)];

/** if (condition on the stack) then … else …, leaving one double. */
export const choose = (then: Code, otherwise: Code): Code => [0x04, F64, ...then, 0x05, ...otherwise, 0x0b];
export const when = (then: Code): Code => [0x04, EMPTY, ...then, 0x0b];
/** Repeat while the condition that the body leaves on the stack is not zero. */
export const repeat = (body: Code): Code => [0x03, EMPTY, ...body, 0x0d, 0, 0x0b];

export interface WasmFunction {
  parameters: readonly number[];
  results: readonly number[];
  locals: readonly number[];
  body: Code;
}

export interface WasmImport {
  name: string;
  parameters: readonly number[];
  results: readonly number[];
}

const vector = (items: readonly Code[]): number[] => [...unsigned(items.length), ...items.flat()];
const section = (id: number, content: Code): number[] => [id, ...unsigned(content.length), ...content];
const text = (value: string): number[] => vector(asciiBytes(value).map((byte) => [byte]));
const signature = ({ parameters, results }: { parameters: Code; results: Code }): Code => [
  0x60,
  ...unsigned(parameters.length),
  ...parameters,
  ...unsigned(results.length),
  ...results,
];

/** ASCII bytes of a short name. */
function asciiBytes(value: string): number[] {
  return Array.from({ length: value.length }, (_, index) => value.charCodeAt(index));
}

/**
 * A module with one memory, exported as `memory`, and its last function exported as `run`.
 *
 * @param pages size of the memory in pages of 64 kB.
 */
export function wasmModule(
  imports: readonly WasmImport[],
  functions: readonly WasmFunction[],
  pages: number,
): Uint8Array {
  const body = ({ locals, body: code }: WasmFunction): Code => {
    const content = [...vector(locals.map((type) => [1, type])), ...code, 0x0b];
    return [...unsigned(content.length), ...content];
  };
  const types = [...imports, ...functions].map(signature);
  return Uint8Array.from([
    ...[0x00, 0x61, 0x73, 0x6d, 0x01, 0x00, 0x00, 0x00],
    ...section(1, vector(types)),
    ...section(2, vector(imports.map(({ name }, index) => [...text('math'), ...text(name), 0x00, ...unsigned(index)]))),
    ...section(3, vector(functions.map((_, index) => unsigned(imports.length + index)))),
    ...section(5, vector([[0x00, ...unsigned(pages)]])),
    ...section(
      7,
      vector([
        [...text('memory'), 0x02, 0x00],
        [...text('run'), 0x00, ...unsigned(imports.length + functions.length - 1)],
      ]),
    ),
    ...section(10, vector(functions.map(body))),
  ]);
}
