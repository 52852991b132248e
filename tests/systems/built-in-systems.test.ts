import { validatorOf } from '@/server/schema-registry';
import { builtInSystems } from '@/server/systems/built-in-systems';
import { randomStates } from '@/tests/systems/random-states';
import { StatedSystem } from '@/tests/systems/stated-system';

/** Rounding of a few dozen operations on numbers of size 1 to 100. */
const ROUNDING = 1e-11;
const STATES = 8;

const named = builtInSystems.map((document) => ({ document, slug: document.slug }));

describe('a built-in system', () => {
  it('is one of fourteen, each with its own slug', () => {
    expect(new Set(builtInSystems.map(({ slug }) => slug)).size).toBe(14);
  });

  it.each(named)('$slug is a valid document', ({ document }) => {
    const validate = validatorOf('system-document');
    expect(validate(document) ? [] : validate.errors).toEqual([]);
  });

  it.each(named)('$slug has an equation for each variable, and no other', ({ document }) => {
    expect(Object.keys(document.equations).sort()).toEqual(document.variables.map(({ name }) => name).sort());
  });

  it.each(named)('$slug keeps its invariants along the flow', ({ document }) => {
    const system = new StatedSystem(document);
    for (const x of randomStates(document.variables.length, STATES)) {
      const direction = system.field(x);
      const speed = Math.hypot(...direction);
      for (const { formula } of document.invariants) {
        expect(Math.abs(system.evaluate(formula, { x, direction }).d) / speed).toBeLessThan(ROUNDING);
      }
    }
  });

  it.each(named)('$slug has a field that its symmetries carry onto itself', ({ document }) => {
    const system = new StatedSystem(document);
    for (const x of randomStates(document.variables.length, STATES)) {
      const direction = system.field(x);
      for (const { map, reversesTime } of document.symmetries) {
        const image = document.variables.map(({ name }) => system.evaluate(map[name]!, { x, direction }));
        const field = system.field(image.map(({ v }) => v));
        image.forEach(({ d }, i) => expect(reversesTime ? -d : d).toBeCloseTo(field[i]!, 9));
      }
    }
  });

  it.each(named)('$slug does not change when an angle grows by its modulus', ({ document }) => {
    const system = new StatedSystem(document);
    document.variables.forEach(({ modulus }, angle) => {
      if (modulus === undefined) return;
      for (const x of randomStates(document.variables.length, STATES)) {
        const turned = x.map((value, i) => (i === angle ? value + system.at(modulus, x) : value));
        system.field(turned).forEach((value, i) => expect(value).toBeCloseTo(system.field(x)[i]!, 12));
        for (const { formula } of document.sections) {
          expect(system.at(formula, turned)).toBeCloseTo(system.at(formula, x), 12);
        }
      }
    });
  });

  it.each(named)('$slug draws each section over five level lines of one of its coordinates', ({ document }) => {
    for (const { incipit } of document.sections) {
      expect(document.variables.map(({ name }) => name)).toContain(incipit?.coordinate);
      const [first = 0, second = 0, ...rest] = incipit?.levels ?? [];
      rest.forEach((level, i) => expect(level).toBeCloseTo(first - (i + 2) * (first - second), 12));
      expect(first).toBeGreaterThan(second);
    }
  });
});
