import { builtInSystems } from '@/server/systems/built-in-systems';
import { loadLorenzOrbits, loadRosslerOrbits } from '@/tests/reference/load-orbits';
import { StatedSystem } from '@/tests/systems/stated-system';

const TABLES = [
  { slug: 'lorenz', section: 'z-27', orbits: loadLorenzOrbits(), state: (a: number, b: number) => [a, b, 27] },
  { slug: 'rossler', section: 'y-down', orbits: loadRosslerOrbits(), state: (a: number, b: number) => [a, 0, b] },
];

describe('the letters of a section', () => {
  it.each(TABLES)('read the itinerary of every known $slug orbit, one letter a crossing', (table) => {
    const document = builtInSystems.find(({ slug }) => slug === table.slug)!;
    const system = new StatedSystem(document);
    const section = document.sections.find(({ name }) => name === table.section)!;
    for (const { code, points } of table.orbits) {
      const read = points.map(([a, b]) => {
        const x = table.state(Number(a), Number(b));
        expect(system.evaluate(section.formula, { x, direction: system.field(x) })).toMatchObject({
          v: expect.closeTo(0, 12),
        });
        expect(system.evaluate(section.formula, { x, direction: system.field(x) }).d).toBeGreaterThan(0);
        return section.letters!.filter(({ where }) => system.at(where, x) > 0).map(({ letter }) => letter);
      });
      expect(read.flat().join('')).toBe(code);
    }
  });
});
