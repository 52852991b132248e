import request from 'supertest';
import type { System } from '@/schemas/generated/contract';
import { validatorOf } from '@/server/schema-registry';
import { builtInSystems } from '@/server/systems/built-in-systems';
import { loadLorenzOrbits } from '@/tests/reference/load-orbits';
import { addLorenzEntries, addSystem } from '../support/catalogue';
import { testApp, type TestApp } from '../support/test-app';

let t: TestApp;
const orbits = loadLorenzOrbits().filter(({ n }) => Number(n) <= 5);

beforeAll(async () => {
  t = await testApp();
  const ids: Record<string, string> = {};
  for (const { slug } of builtInSystems) ids[slug] = await addSystem(t.dependencies.pool, slug);
  await addLorenzEntries(t.dependencies.pool, { systemId: ids['lorenz']!, orbits });
});
afterAll(() => t.close());

const get = (path: string, headers: Record<string, string> = {}): request.Test =>
  request(t.app).get(`/api/v1${path}`).set(headers);

describe('GET /systems', () => {
  it('answers every system in the contract’s form', async () => {
    const res = await get('/systems');
    expect(res.status).toBe(200);
    const validate = validatorOf('system-list');
    expect(validate(res.body) || validate.errors).toBe(true);
    expect(res.body.items).toHaveLength(builtInSystems.length);
    const names = res.body.items.map(({ name }: System) => name);
    expect(names).toEqual([...names].sort());
  });

  it('answers 304 until an entry is accepted', async () => {
    const { etag } = (await get('/systems')).headers;
    expect((await get('/systems', { 'If-None-Match': etag! })).status).toBe(304);
  });
});

describe('GET /systems/:slug', () => {
  let lorenz: System;
  beforeAll(async () => void (lorenz = (await get('/systems/lorenz')).body));

  it('gives the document as it was proposed, member for member', () => {
    const proposed = builtInSystems.find(({ slug }) => slug === 'lorenz');
    expect(JSON.stringify(lorenz.document)).toBe(JSON.stringify(proposed));
  });

  it('typesets the equations', () => {
    expect(lorenz.mathml).toMatch(/^<math display="block">.*<\/math>$/);
    expect(lorenz.mathml).toContain('<mi>σ</mi>');
    expect(lorenz.text).toBe("x' = sigma*(y - x)\ny' = rho*x - y - x*z\nz' = x*y - beta*z");
  });

  it('counts entries by section, and names the shortest', () => {
    expect(lorenz.entries).toBe(orbits.length);
    expect(lorenz.shortest).toBe('RTN-0000001X');
    const section = lorenz.sections.find(({ name }) => name === 'z-27')!;
    expect(section.entries).toBe(orbits.length);
    expect(section.letters).toEqual([
      { letter: 'A', where: '-x' },
      { letter: 'B', where: 'x' },
    ]);
    expect(section.incipit).toEqual({ coordinate: 'x', levels: [16, 8, 0, -8, -16] });
    expect(section.mathml).toContain('27');
  });

  it('holds what is known by returns against what the symbolic dynamics allows', () => {
    const [first, ...others] = lorenz.knownByReturns;
    expect(others).toEqual([]);
    expect(first).toMatchObject({
      section: 'z-27',
      parameters: { sigma: '10', rho: '28', beta: '8/3' },
      known: orbits.length,
    });
    expect(first!.source).toContain('Viswanath');
    expect(first!.rows.slice(0, 5)).toEqual([
      { returns: 2, known: 1, allowed: 1 },
      { returns: 3, known: 2, allowed: 2 },
      { returns: 4, known: 3, allowed: 3 },
      { returns: 5, known: 6, allowed: 6 },
      { returns: 6, known: 0, allowed: 9 },
    ]);
  });

  it('gives each section of each built-in system a staff of its own coordinate', async () => {
    for (const { slug } of builtInSystems) {
      const system = (await get(`/systems/${slug}`)).body as System;
      for (const { incipit } of system.sections) {
        expect(system.document.variables.map(({ name }) => name)).toContain(incipit.coordinate);
        expect(incipit.levels).toHaveLength(5);
      }
    }
  });

  it('changes its ETag with its entries', async () => {
    const { etag } = (await get('/systems/lorenz')).headers;
    expect((await get('/systems/lorenz', { 'If-None-Match': etag! })).status).toBe(304);
    await t.dependencies.pool.query(
      `update orbit set status = 'withdrawn', withdrawn_at = now(), withdrawal_reason = 'test' where number = 1`,
    );
    const res = await get('/systems/lorenz', { 'If-None-Match': etag! });
    expect([res.status, res.body.entries]).toEqual([200, orbits.length - 1]);
  });

  it.each(['nowhere', '%00', '%27%20or%201=1', 'LORENZ'])('knows no %s', async (slug) => {
    expect((await get(`/systems/${slug}`)).status).toBe(404);
  });
});
