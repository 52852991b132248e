import { builtInSystems } from '@/server/systems/built-in-systems';
import { loadLorenzOrbits, loadRosslerOrbits, type SectionOrbit } from '@/tests/reference/load-orbits';

const tableOf = (slug: string) => {
  const system = builtInSystems.find((candidate) => candidate.slug === slug)!;
  const [table] = system.counts ?? [];
  return { system, table: table! };
};

const countByReturns = (orbits: SectionOrbit[], code: (orbit: SectionOrbit) => string) => {
  const codes = new Map<string, Set<string>>();
  for (const orbit of orbits) codes.set(orbit.n, (codes.get(orbit.n) ?? new Set()).add(code(orbit)));
  return Object.fromEntries([...codes].map(([n, found]) => [n, found.size]));
};

/** Classes of words of n letters A and B up to rotation that are no repetition of a shorter word, counted one by one. */
function countNecklaces(n: number): number {
  let count = 0;
  for (let word = 0; word < 2 ** n; word++) {
    const letters = word.toString(2).padStart(n, '0');
    let smallest = true;
    for (let k = 1; k < n && smallest; k++) smallest = letters < letters.slice(k) + letters.slice(0, k);
    if (smallest) count++;
  }
  return count;
}

describe('the number of orbits that an itinerary allows', () => {
  it('is that of the binary necklaces for Lorenz, counted one by one up to 16 letters', () => {
    const { allowedByReturns } = tableOf('lorenz').table;
    for (let n = 2; n <= 16; n++) expect(allowedByReturns[n]).toBe(countNecklaces(n));
  });

  it('adds up to the published number of Lorenz orbits of up to 20 letters', () => {
    // 111011: abstract of D. Viswanath, Nonlinearity 16 (2003) 1035–1056.
    const counts = Object.values(tableOf('lorenz').table.allowedByReturns);
    expect(counts.reduce((sum, count) => sum + count)).toBe(111_011);
    expect(counts).toHaveLength(19);
  });

  it('is what the table of Lorenz orbits holds, complete to 12 returns', () => {
    const found = countByReturns(loadLorenzOrbits(), ({ code }) => code);
    expect(tableOf('lorenz').table.allowedByReturns).toMatchObject(found);
  });

  it('is what the table of Rössler orbits holds', () => {
    const found = countByReturns(loadRosslerOrbits(), ({ code }) => code);
    expect(tableOf('rossler').table.allowedByReturns).toEqual(found);
  });

  it.each(['lorenz', 'rossler'])('stands for a section with letters and for the default parameters of %s', (slug) => {
    const { system, table } = tableOf(slug);
    const section = system.sections.find(({ name }) => name === table.section);
    expect(section?.letters).toHaveLength(2);
    expect(table.parameters).toEqual(Object.fromEntries(system.parameters.map(({ name, value }) => [name, value])));
  });
});
