import { checkSystem } from '@/server/formulas/check-system';
import type { CheckedSystem } from '@/server/formulas/checked-system';
import { flowDefinition } from '@/server/formulas/flow-definition';
import { parseSection } from '@/server/formulas/parse-section';
import { createFlow } from '@/server/numerics/taylor/flow';
import { builtInSystems, type BuiltInSystem } from '@/server/systems/built-in-systems';
import { randomStates } from '@/tests/systems/random-states';
import { StatedSystem } from '@/tests/systems/stated-system';

const STATES = 6;
/** Two evaluations that differ in the order of a few dozen roundings. */
const ROUNDING = 1e-12;

const named = builtInSystems.map((document) => ({ document, slug: document.slug }));

function checked(document: BuiltInSystem): CheckedSystem {
  const result = checkSystem(document);
  if (!result.ok) throw new Error(JSON.stringify(result.errors));
  return result.system;
}

function expectNear(values: ArrayLike<number>, expected: readonly number[]): void {
  const size = Math.max(1, ...expected.map(Math.abs));
  Array.from(values).forEach((value, i) => expect(Math.abs(value - expected[i]!) / size).toBeLessThan(ROUNDING));
}

describe('a built-in system as the server reads it', () => {
  it.each(named)('$slug passes the check of its formulas', ({ document }) => {
    expect(checkSystem(document)).toMatchObject({ ok: true });
  });

  it.each(named)('$slug has the field that its text means', ({ document }) => {
    const system = checked(document);
    const stated = new StatedSystem(document);
    const { expression: section } = system.sections[0]!;
    const flow = createFlow(flowDefinition(system, { parameters: new Map(), section, outputs: [] }));
    for (const x of randomStates(document.variables.length, STATES)) {
      expectNear(flow.field(Float64Array.from(x)), stated.field(x));
    }
  });

  it.each(named)('$slug has the sections, letters and invariants that their texts mean', ({ document }) => {
    const system = checked(document);
    const stated = new StatedSystem(document);
    for (const { name, formula, letters = [] } of document.sections) {
      const result = parseSection(system, name);
      if (!result.ok) throw new Error(JSON.stringify(result.errors));
      const { expression: section, letters: read } = result.section;
      const outputs = [...read, ...system.invariants].map(({ expression }) => expression);
      const texts = [
        ...letters.map(({ where }) => where),
        ...document.invariants.map((invariant) => invariant.formula),
      ];
      expect(read.map(({ letter }) => letter)).toEqual(letters.map(({ letter }) => letter));
      const flow = createFlow(flowDefinition(system, { parameters: new Map(), section, outputs }));
      for (const x of randomStates(document.variables.length, STATES)) {
        const state = Float64Array.from(x);
        expectNear([flow.section(state)], [stated.at(formula, x)]);
        expectNear(
          flow.outputs(state),
          texts.map((text) => stated.at(text, x)),
        );
      }
    }
  });

  it.each(named)('$slug knows a named section by its formula', ({ document }) => {
    const system = checked(document);
    for (const { name, formula } of document.sections) {
      expect(parseSection(system, { formula })).toMatchObject({ ok: true, section: { name } });
    }
  });
});
