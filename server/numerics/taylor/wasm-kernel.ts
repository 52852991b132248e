import { NO_OPERAND, type Tape, type TapeStep } from '@/server/numerics/expression/tape';
import { type JetKernel, type JetLayout, jetLayout } from '@/server/numerics/taylor/jet-kernel';
import * as w from '@/server/numerics/taylor/wasm-code';
import { sumFunctions, sumNames } from '@/server/numerics/taylor/wasm-sums';

const DOUBLE = 8;
const PAGE = 65_536;
/** Functions of one argument taken from the host, at order 0 only. */
const hostNames = ['exp', 'log', 'sin', 'cos', 'asin', 'acos', 'atan'] as const;
const imports: w.WasmImport[] = [
  ...hostNames.map((name) => ({ name, parameters: [w.F64], results: [w.F64] })),
  { name: 'pow', parameters: [w.F64, w.F64], results: [w.F64] },
];
const host = (name: (typeof hostNames)[number] | 'pow'): w.Code =>
  w.call(imports.findIndex((one) => one.name === name));
const sum = (name: (typeof sumNames)[number]): w.Code => w.call(imports.length + sumNames.indexOf(name));

/** Locals of `run`: the last order, the order k, k in bytes, k in bytes of variations. */
const UP_TO = 0;
const K = 1;
const K_BYTES = 2;
const K_VARIED = 3;

/** Writes the code of one tape. Only slots, orders and doubles reach it; no text of a formula does. */
class KernelWriter {
  constructor(
    private readonly tape: Tape,
    private readonly layout: JetLayout,
  ) {}

  run(): w.WasmFunction {
    const { dimension, steps, roots } = this.tape;
    const inner = steps.map((step, slot) => ({ step, slot })).slice(dimension);
    const varied = this.layout.stride > 0 ? inner.filter(({ step }) => step.isVaried) : [];
    const isLast = [...w.get(K), ...w.i32(this.layout.order), ...w.isEqual];
    const body = [
      ...inner.flatMap(({ step, slot }) => [
        ...w.get(K_BYTES),
        ...this.coefficient(step, slot),
        ...w.store(this.series(slot)),
      ]),
      ...varied.flatMap(({ step, slot }) => this.variation(step, slot)),
      ...isLast,
      ...w.when(w.leave),
      ...Array.from({ length: dimension }, (_, i) => this.nextState(i, roots[i] ?? NO_OPERAND)).flat(),
      ...[...w.get(K), ...w.i32(1), ...w.addInt, ...w.set(K)],
      ...[...w.get(K_BYTES), ...w.i32(DOUBLE), ...w.addInt, ...w.set(K_BYTES)],
      ...[...w.get(K_VARIED), ...w.i32(this.layout.stride * DOUBLE), ...w.addInt, ...w.set(K_VARIED)],
      ...[...w.get(K), ...w.get(UP_TO), ...w.i32(1), ...w.addInt, ...w.isLess],
    ];
    return { parameters: [w.I32], results: [], locals: [w.I32, w.I32, w.I32], body: w.repeat(body) };
  }

  private series(slot: number): number {
    return (this.layout.seriesStart + slot * (this.layout.order + 1)) * DOUBLE;
  }

  private varied(slot: number): number {
    return (this.layout.variationsStart + slot * (this.layout.order + 1) * this.layout.stride) * DOUBLE;
  }

  /** Coefficient 0 of an operand. */
  private first(operand: number): w.Code {
    return [...w.i32(0), ...w.load(operand >= 0 ? this.series(operand) : ~operand * DOUBLE)];
  }

  /** Coefficient k of an operand; a static value has only coefficient 0. */
  private value(operand: number): w.Code {
    if (operand >= 0) return [...w.get(K_BYTES), ...w.load(this.series(operand))];
    return [...this.first(operand), ...w.f64(0), ...w.get(K), ...w.isZero, ...w.select];
  }

  /** Address of coefficient k − less of a slot's series. */
  private seriesAt(slot: number, less = 0): w.Code {
    return [...w.get(K_BYTES), ...w.i32(this.series(slot) - less * DOUBLE), ...w.addInt];
  }

  private variedAt(slot: number): w.Code {
    return [...w.get(K_VARIED), ...w.i32(this.varied(slot)), ...w.addInt];
  }

  /** Σ a_j b_{k−j} for j = from … k − skip. */
  private convolve(a: number, b: number, from: 0 | 1, skip = 0): w.Code {
    return [
      ...w.i32(this.series(a) + from * DOUBLE),
      ...this.seriesAt(b, from),
      ...[...w.get(K), ...w.i32(1 - from - skip), ...w.addInt],
      ...sum('convolve'),
    ];
  }

  private coefficient({ operation, a, b, partner }: TapeStep, slot: number): w.Code {
    switch (operation) {
      case 'add':
        return [...this.value(a), ...this.value(b), ...w.add];
      case 'subtract':
        return [...this.value(a), ...this.value(b), ...w.subtract];
      case 'negate':
        return [...this.value(a), ...w.negate];
      case 'multiply':
        if (a < 0) return [...this.first(a), ...this.value(b), ...w.multiply];
        return b < 0 ? [...this.value(a), ...this.first(b), ...w.multiply] : this.convolve(a, b, 0);
      case 'square':
        return this.convolve(a, a, 0);
      case 'divide':
        if (b < 0) return [...this.value(a), ...this.first(b), ...w.divide];
        return [...this.value(a), ...this.convolve(b, slot, 1), ...w.subtract, ...this.first(b), ...w.divide];
      case 'sqrt':
        return this.atOrderZero(
          [...this.first(a), ...w.squareRoot],
          [
            ...[...this.value(a), ...this.convolve(slot, slot, 1, 1), ...w.subtract],
            ...[...w.f64(2), ...this.first(slot), ...w.multiply, ...w.divide],
          ],
        );
      case 'power':
        return this.atOrderZero([...this.first(a), ...this.first(b), ...host('pow')], this.power(a, b, slot));
      case 'cos':
        return this.atOrderZero([...this.first(a), ...host('cos')], [...this.integral(a, partner), ...w.negate]);
      case 'constant':
      case 'parameter':
      case 'state':
        return w.f64(NaN);
      default:
        return this.atOrderZero([...this.first(a), ...host(operation)], this.integral(a, partner));
    }
  }

  private atOrderZero(then: w.Code, otherwise: w.Code): w.Code {
    return [...w.get(K), ...w.isZero, ...w.choose(then, otherwise)];
  }

  /** (1/k) Σ_{j=1..k} j a_j g_{k−j}. */
  private integral(a: number, partner: number): w.Code {
    return [
      ...[...w.i32(this.series(a) + DOUBLE), ...this.seriesAt(partner, 1), ...w.get(K)],
      ...[...w.f64(1), ...w.f64(1), ...sum('weigh'), ...w.get(K), ...w.toDouble, ...w.divide],
    ];
  }

  /** (1/(k a_0)) Σ_{j=1..k} ((α + 1) j − k) a_j c_{k−j}. */
  private power(a: number, exponent: number, slot: number): w.Code {
    const weight = [...this.first(exponent), ...w.f64(1), ...w.add];
    const order = [...w.get(K), ...w.toDouble];
    return [
      ...[...w.i32(this.series(a) + DOUBLE), ...this.seriesAt(slot, 1), ...w.get(K)],
      ...[...weight, ...order, ...w.subtract, ...weight, ...sum('weigh')],
      ...[...order, ...this.first(a), ...w.multiply, ...w.divide],
    ];
  }

  /** to += c Σ_{j=from..k} a_j db_{k−j}; nothing when b is static. */
  private gather(slot: number, pair: { a: number; b: number; c: number }, from: 0 | 1 = 0): w.Code {
    const { a, b, c } = pair;
    if (b < 0) return [];
    if (a < 0) return this.accumulate(slot, b, [...w.f64(c), ...this.first(a), ...w.multiply]);
    const back = from * this.layout.stride * DOUBLE;
    return [
      ...[...this.variedAt(slot), ...w.i32(this.series(a) + from * DOUBLE)],
      ...[...w.get(K_VARIED), ...w.i32(this.varied(b) - back), ...w.addInt],
      ...[...w.get(K), ...w.i32(1 - from), ...w.addInt, ...w.f64(c), ...sum('gather')],
    ];
  }

  private accumulate(slot: number, operand: number, factor: w.Code): w.Code {
    if (operand < 0) return [];
    return [...this.variedAt(slot), ...this.variedAt(operand), ...factor, ...sum('accumulate')];
  }

  private variation(step: TapeStep, slot: number): w.Code {
    return [...this.variedAt(slot), ...sum('clear'), ...this.variedTerms(step, slot)];
  }

  private variedTerms({ operation, a, b, partner }: TapeStep, slot: number): w.Code {
    switch (operation) {
      case 'add':
        return [...this.accumulate(slot, a, w.f64(1)), ...this.accumulate(slot, b, w.f64(1))];
      case 'subtract':
        return [...this.accumulate(slot, a, w.f64(1)), ...this.accumulate(slot, b, w.f64(-1))];
      case 'negate':
        return this.accumulate(slot, a, w.f64(-1));
      case 'multiply':
        return [...this.gather(slot, { a, b, c: 1 }), ...this.gather(slot, { a: b, b: a, c: 1 })];
      case 'square':
        return this.gather(slot, { a, b: a, c: 2 });
      case 'divide':
        return [
          ...this.accumulate(slot, a, w.f64(1)),
          ...this.gather(slot, { a: slot, b, c: -1 }),
          ...(b < 0 ? [] : this.gather(slot, { a: b, b: slot, c: -1 }, 1)),
          ...[...this.variedAt(slot), ...this.first(b), ...sum('divideAll')],
        ];
      case 'cos':
        return this.gather(slot, { a: partner, b: a, c: -1 });
      default:
        return this.gather(slot, { a: partner, b: a, c: 1 });
    }
  }

  /** x_{k+1} = f_k / (k + 1), and its variations. */
  private nextState(i: number, field: number): w.Code {
    const next = [...w.get(K), ...w.i32(1), ...w.addInt, ...w.toDouble];
    const { stride } = this.layout;
    const target = [...w.get(K_VARIED), ...w.i32(this.varied(i) + stride * DOUBLE), ...w.addInt];
    const variations = [
      ...[...target, ...sum('clear')],
      ...(field < 0 ? [] : [...target, ...this.variedAt(field), ...w.f64(1), ...sum('accumulate')]),
      ...[...target, ...next, ...sum('divideAll')],
    ];
    return [
      ...[...w.get(K_BYTES), ...this.value(field), ...next, ...w.divide, ...w.store(this.series(i) + DOUBLE)],
      ...(stride > 0 ? variations : []),
    ];
  }
}

interface Exports {
  memory: { buffer: ArrayBuffer };
  run: (upTo: number) => void;
}

/**
 * A tape's recurrences as WebAssembly, emitted directly.
 *
 * Loops stay rolled: unrolling them was measured to lose on all but the smallest fields.
 *
 * Cost: building takes well below a millisecond for a small field; the code is some hundred bytes a step.
 */
export function makeWasmKernel(tape: Tape, order: number, directions: number): JetKernel {
  const layout = jetLayout({ statics: tape.statics.length, slots: tape.steps.length, order, directions });
  const writer = new KernelWriter(tape, layout);
  const pages = Math.ceil((layout.size * DOUBLE) / PAGE);
  const bytes = wasmModule(layout, writer, pages);
  const instance = new WebAssembly.Instance(new WebAssembly.Module(bytes as BufferSource), {
    math: {
      exp: Math.exp,
      log: Math.log,
      sin: Math.sin,
      cos: Math.cos,
      asin: Math.asin,
      acos: Math.acos,
      atan: Math.atan,
      pow: Math.pow,
    },
  });
  const { memory, run } = instance.exports as unknown as Exports;
  return { ...layout, memory: new Float64Array(memory.buffer, 0, layout.size), run };
}

const wasmModule = (layout: JetLayout, writer: KernelWriter, pages: number): Uint8Array =>
  w.wasmModule(imports, [...sumFunctions(layout.stride), writer.run()], pages);
