import { checkSystem } from '@/server/formulas/check-system';
import { flowDefinition } from '@/server/formulas/flow-definition';
import { staticValues } from '@/server/numerics/expression/static-values';
import { InterpretedKernel } from '@/server/numerics/taylor/interpreted-kernel';
import type { JetKernel } from '@/server/numerics/taylor/jet-kernel';
import { preparedFlow } from '@/server/numerics/taylor/prepared-flow';
import { builtInSystems } from '@/server/systems/built-in-systems';

/** A state away from every singularity of the built-in systems: no two coordinates equal, none zero. */
const stateOf = (n: number): number[] => Array.from({ length: n }, (_, i) => 0.3 + 0.55 * Math.sin(2.3 * i + 1));

function fill(kernel: JetKernel, statics: Float64Array, state: readonly number[]): void {
  kernel.memory.set(statics, 0);
  state.forEach((x, i) => {
    kernel.memory[kernel.seriesStart + i * (kernel.order + 1)] = x;
    const row = kernel.variationsStart + i * (kernel.order + 1) * kernel.stride;
    if (kernel.stride > 0) kernel.memory[row + i] = 1;
  });
  kernel.run(kernel.order);
}

describe.each(builtInSystems.map((document) => [document.slug, document] as const))('%s', (_, document) => {
  const checked = checkSystem(document);
  if (!checked.ok) throw new Error(checked.errors[0]?.message);
  const definition = flowDefinition(checked.system, {
    parameters: new Map(),
    section: checked.system.sections[0]!.expression,
    outputs: [],
  });
  const parameters = definition.parameters.map(({ value }) => value);
  const prepared = preparedFlow(definition);

  it.each([
    ['the state', prepared.plain, 0],
    ['the variations', prepared.varied(), definition.variables.length],
  ])('has the same series of %s from both kernels', (_name, { tape, kernel }, directions) => {
    const slow = new InterpretedKernel(tape, kernel.order, directions);
    const statics = staticValues(tape.statics, parameters);
    fill(slow, statics, stateOf(tape.dimension));
    fill(kernel, statics, stateOf(tape.dimension));
    // Both sum the same terms, in another order or not: each coefficient agrees in units of the largest in its series.
    const { order, stride, seriesStart, variationsStart } = kernel;
    const blocks = [
      { from: seriesStart, to: variationsStart, step: 1 },
      { from: variationsStart, to: kernel.memory.length, step: Math.max(1, stride) },
    ];
    for (const { from, to, step } of blocks) {
      for (let at = from; at + (order + 1) * step <= to; at += (order + 1) * step) {
        const [one, other] = [slow.memory, kernel.memory].map((memory) => memory.subarray(at, at + (order + 1) * step));
        const size = one!.reduce((largest, value) => Math.max(largest, Math.abs(value)), 0);
        one!.forEach((value, k) => expect(Math.abs(value - other![k]!)).toBeLessThanOrEqual(1e-14 * size));
      }
    }
  });
});
