import fc from 'fast-check';
import { buildNode } from '@/server/numerics/expression/build-node';
import { type Expression, functionNames } from '@/server/numerics/expression/expression';
import { Graph } from '@/server/numerics/expression/graph';
import { staticValues } from '@/server/numerics/expression/static-values';
import { makeTape } from '@/server/numerics/expression/tape';
import { InterpretedKernel } from '@/server/numerics/taylor/interpreted-kernel';
import type { JetKernel } from '@/server/numerics/taylor/jet-kernel';
import { makeWasmKernel } from '@/server/numerics/taylor/wasm-kernel';

const ORDER = 8;
const PARAMETER = 1.3;

const { tree } = fc.letrec<{ tree: Expression }>((tie) => ({
  tree: fc.oneof(
    { depthSize: 'medium', withCrossShrink: true },
    fc.constantFrom('x', 'y', 'c').map((name) => ({ kind: 'name' as const, name })),
    fc.constantFrom('2', '3', '0.5').map((text) => ({ kind: 'number' as const, text, value: +text })),
    fc.record({ kind: fc.constant('negate' as const), argument: tie('tree') }),
    fc.record({
      kind: fc.constant('binary' as const),
      operator: fc.constantFrom('+' as const, '-' as const, '*' as const, '/' as const, '^' as const),
      left: tie('tree'),
      right: tie('tree'),
    }),
    fc.record({
      kind: fc.constant('call' as const),
      function: fc.constantFrom(...functionNames),
      argument: tie('tree'),
    }),
  ),
}));

/** Everything that a kernel computes for x' = first, y' = second from one state. */
function jets(field: readonly [Expression, Expression], isWasm: boolean): JetKernel {
  const graph = new Graph();
  const names = new Map([
    ['x', graph.state(0)],
    ['y', graph.state(1)],
    ['c', graph.parameter(0)],
  ]);
  const tape = makeTape(
    graph,
    2,
    field.map((expression) => buildNode(graph, expression, names)),
    2,
  );
  const kernel = isWasm ? makeWasmKernel(tape, ORDER, 2) : new InterpretedKernel(tape, ORDER, 2);
  kernel.memory.set(staticValues(tape.statics, [PARAMETER]), 0);
  [0.7, 0.4].forEach((value, i) => {
    kernel.memory[kernel.seriesStart + i * (ORDER + 1)] = value;
    kernel.memory[kernel.variationsStart + i * (ORDER + 1) * kernel.stride + i] = 1;
  });
  kernel.run(ORDER);
  return kernel;
}

/** Series of the two states: values, then variations by direction. */
function statesOf({ memory, seriesStart, variationsStart, stride }: JetKernel): number[] {
  const width = 2 * (ORDER + 1);
  return [
    ...memory.subarray(seriesStart, seriesStart + width),
    ...memory.subarray(variationsStart, variationsStart + width * stride),
  ];
}

describe('both kernels', () => {
  it('agree on whatever field, where it is defined and where it is not', () => {
    fc.assert(
      fc.property(tree, tree, (first, second) => {
        const slow = statesOf(jets([first, second], false));
        const quick = statesOf(jets([first, second], true));
        const size = slow.reduce((largest, value) => (Math.abs(value) > largest ? Math.abs(value) : largest), 1);
        slow.forEach((value, i) => {
          expect(Number.isFinite(quick[i])).toBe(Number.isFinite(value));
          // Equal sums in equal order: only a fused or reordered operation could tell them apart, a wrong one by far more.
          if (Number.isFinite(value)) expect(Math.abs(quick[i]! - value)).toBeLessThanOrEqual(1e-11 * size);
        });
      }),
      { numRuns: 300, seed: 41 },
    );
  });
});
