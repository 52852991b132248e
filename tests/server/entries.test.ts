import Papa from 'papaparse';
import request from 'supertest';
import { validatorOf } from '@/server/schema-registry';
import { loadLorenzOrbits } from '@/tests/reference/load-orbits';
import { addLorenzEntries, addSystem } from '../support/catalogue';
import { testApp, type TestApp } from '../support/test-app';

let t: TestApp;
beforeAll(async () => {
  t = await testApp();
  const systemId = await addSystem(t.dependencies.pool, 'lorenz');
  await addLorenzEntries(t.dependencies.pool, { systemId, orbits: loadLorenzOrbits().slice(0, 17) });
});
afterAll(() => t.close());

const get = (path: string, headers: Record<string, string> = {}): request.Test =>
  request(t.app).get(`/api/v1/orbits/${path}`).set(headers);

describe('GET /orbits/:accession', () => {
  it('answers the entry with every digit', async () => {
    const res = await get('RTN-0000001X');
    expect(res.status).toBe(200);
    const validate = validatorOf('entry');
    expect(validate(res.body) || validate.errors).toBe(true);
    expect(res.body).toMatchObject({
      accession: 'RTN-0000001X',
      system: { slug: 'lorenz', version: 1, name: 'Lorenz' },
      parameters: { sigma: '10', rho: '28', beta: '8/3' },
      section: { name: 'z-27', formula: 'z - 27' },
      period: '1.5586522107161747',
      point: ['-13.763610682134201', '-19.578751942451796', '27'],
      itinerary: 'AB',
      licence: 'CC-BY-4.0',
      withdrawal: null,
    });
    expect(Object.keys(res.body.parameters)).toEqual(['sigma', 'rho', 'beta']);
  });

  it('answers 304 to whoever has it', async () => {
    const { etag } = (await get('RTN-0000001X')).headers;
    expect(etag).toMatch(/^"[\w-]{24}"$/);
    const res = await get('RTN-0000001X', { 'If-None-Match': `"other", W/${etag!}` });
    expect([res.status, res.text, res.headers['etag']]).toEqual([304, '', etag]);
    expect((await get('RTN-00000175', { 'If-None-Match': etag! })).status).toBe(200);
  });

  it.each([
    ['RTN-0000001X', { Accept: 'text/csv' }],
    ['RTN-0000001X.csv', { Accept: 'application/json' }],
    ['rtn-0000001x.CSV', {}],
  ])('answers CSV at %s with %j', async (path, headers) => {
    const res = await get(path, headers);
    expect([res.status, res.type]).toEqual([200, 'text/csv']);
    const { data } = Papa.parse<Record<string, string>>(res.text, { header: true, skipEmptyLines: true });
    expect(data).toHaveLength(1);
    expect(data[0]).toMatchObject({ accession: 'RTN-0000001X', 'point.3': '27', period: '1.5586522107161747' });
  });

  it('sends a browser on to the page', async () => {
    const res = await get('RTN-0000001X', { Accept: 'text/html,application/xhtml+xml,*/*;q=0.8' });
    expect([res.status, res.headers['location']]).toEqual([303, '/orbits/RTN-0000001X']);
    expect(res.headers['vary']).toContain('Accept');
  });

  it('refuses a form that it does not have', async () => {
    const res = await get('RTN-0000001X', { Accept: 'image/png' });
    expect([res.status, res.body.code]).toEqual([406, 'not-acceptable']);
  });

  it('names the right accession when the check character is wrong', async () => {
    const res = await get('RTN-00000171');
    expect([res.status, res.body.code]).toEqual([404, 'wrong-check-character']);
    expect(res.body.detail).toContain('RTN-00000175');
  });

  it.each(['RTN-00009997', 'RTN-00000183', 'nonsense', 'RTN-1', "RTN-' or 1=1"])('knows no entry %s', async (path) => {
    const res = await get(encodeURIComponent(path));
    expect(res.status).toBe(404);
    expect(['unknown-accession', 'wrong-check-character']).toContain(res.body.code);
  });

  it('still answers an entry that was withdrawn, and says why and what replaces it', async () => {
    await t.dependencies.pool.query(
      `update orbit set status = 'withdrawn', withdrawn_at = now(), withdrawal_reason = 'Another orbit', replacement = 2
       where number = 17`,
    );
    const res = await get('RTN-00000175');
    expect([res.status, res.body.status]).toEqual([200, 'withdrawn']);
    expect(res.body.withdrawal).toMatchObject({ reason: 'Another orbit', replacement: 'RTN-00000028' });
    expect(validatorOf('entry')(res.body)).toBe(true);
  });
});

it.each([
  ['revision=2', 404, 'not-found'],
  ['revision=0', 400, 'invalid-query'],
  ['revision=one', 400, 'invalid-query'],
])('knows no %s of an entry that has one', async (query, status, code) => {
  const res = await get(`RTN-0000001X?${query}`);
  expect([res.status, res.body.code]).toEqual([status, code]);
});

it('lists the revisions of an entry', async () => {
  const res = await get('RTN-0000001X/revisions');
  expect(res.body.items).toEqual([
    {
      ...{ revision: 1, at: expect.any(String), by: 'Curator Q', why: 'Accepted' },
      evidence: { level: 're-integrated', digits: 13 },
      links: { self: '/api/v1/orbits/RTN-0000001X?revision=1' },
    },
  ]);
  expect(validatorOf('entry-revision')(res.body.items[0])).toBe(true);
  expect((await get('RTN-00000171/revisions')).body.code).toBe('wrong-check-character');
});

describe('GET /orbits/:accession/trace', () => {
  it('follows the orbit from its start round to it, with its crossings', async () => {
    const res = await get('RTN-0000001X/trace?points=201');
    expect(res.status).toBe(200);
    const validate = validatorOf('trace');
    expect(validate(res.body) || validate.errors).toBe(true);
    const { variables, times, points, crossings } = res.body;
    expect(variables).toEqual(['x', 'y', 'z']);
    expect([times.length, points.length]).toEqual([201, 201]);
    expect(times.at(-1)).toBeCloseTo(1.5586522107161747, 7);
    // The orbit's multiplier of 4.7 and nine digits of drawing leave at least six.
    for (const [i, coordinate] of points[0].entries()) expect(points.at(-1)[i]).toBeCloseTo(coordinate, 6);
    expect(crossings).toHaveLength(2);
    expect(crossings[0].time).toBeCloseTo(0.7793261053580874, 6);
    expect(crossings[0].point[0]).toBeCloseTo(13.763610682134201, 5);
  });

  it.each(['points=1', 'points=5001', 'points=many', 'point=3'])('refuses %s', async (query) => {
    const res = await get(`RTN-0000001X/trace?${query}`);
    expect([res.status, res.body.code]).toEqual([400, 'invalid-query']);
  });

  it('knows no other entry', async () => {
    expect((await get('RTN-00009997/trace')).status).toBe(404);
  });
});
