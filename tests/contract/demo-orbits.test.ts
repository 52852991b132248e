import type { SubmissionBody } from '@/schemas/generated/contract';
import { demoOrbits } from '@/server/demo/demo-orbits';
import { validatorOf } from '@/server/schema-registry';
import { builtInSystems } from '@/server/systems/built-in-systems';
import { loadLorenzOrbits } from '@/tests/reference/load-orbits';

const label = ({ system, period, itinerary }: SubmissionBody) => `${system} ${itinerary ?? ''} T = ${String(period)}`;
const named = demoOrbits.map((body) => ({ body, name: label(body) }));
const documentOf = (slug: string) => builtInSystems.find((system) => system.slug === slug);

/** The smallest rotation of an itinerary: two orbits with the same one are the same orbit. */
const smallestRotation = (word: string) => Array.from(word, (_, k) => word.slice(k) + word.slice(0, k)).sort()[0] ?? '';

describe('the demo orbits', () => {
  it('are sixty to eighty, of every built-in system', () => {
    expect(demoOrbits.length).toBeGreaterThanOrEqual(60);
    expect(demoOrbits.length).toBeLessThanOrEqual(80);
    expect(new Set(demoOrbits.map(({ system }) => system))).toEqual(new Set(builtInSystems.map(({ slug }) => slug)));
  });

  it('hold every Lorenz orbit of up to five returns', () => {
    const held = demoOrbits.filter(({ system }) => system === 'lorenz').map(({ itinerary }) => itinerary);
    const short = loadLorenzOrbits().filter(({ code }) => code.length <= 5);
    expect(short).toHaveLength(12);
    expect(held).toEqual(expect.arrayContaining(short.map(({ code }) => code)));
  });

  it.each(named)('are stated as anyone states one, with a note and a reference: $name', ({ body }) => {
    const validate = validatorOf('submission-body');
    expect(validate(body) ? [] : validate.errors).toEqual([]);
    expect(body.note).toMatch(/\.$/);
    expect(body.references?.length).toBeGreaterThan(0);
  });

  it.each(named)('name a section, all parameters and a full state of their system: $name', ({ body }) => {
    const document = documentOf(body.system)!;
    expect(document.sections.map(({ name }) => name)).toContain(body.section);
    expect(body.point).toHaveLength(document.variables.length);
    expect(body.returnTimes).toHaveLength(body.returns!);
    expect(Object.keys(body.parameters ?? {}).sort()).toEqual(document.parameters.map(({ name }) => name).sort());
  });

  it('hold no curve twice', () => {
    // Orbits of one system that are not told apart by their periods must be told apart by their itineraries.
    const seen = demoOrbits.map(({ system, parameters, period, itinerary }) =>
      JSON.stringify([system, parameters, itinerary ? smallestRotation(itinerary) : Number(period).toPrecision(8)]),
    );
    expect(new Set(seen).size).toBe(demoOrbits.length);
  });
});
