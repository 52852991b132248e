import request from 'supertest';
import type { Entry } from '@/schemas/generated/contract';
import { validatorOf } from '@/server/schema-registry';
import { loadLorenzOrbits } from '@/tests/reference/load-orbits';
import { addLorenzEntries, addSystem } from '../support/catalogue';
import { testApp, type TestApp } from '../support/test-app';

let t: TestApp;
let lorenz: string;
const orbits = loadLorenzOrbits();
const short = orbits.filter(({ n }) => Number(n) <= 6);

beforeAll(async () => {
  t = await testApp();
  lorenz = await addSystem(t.dependencies.pool, 'lorenz');
  await addSystem(t.dependencies.pool, 'rossler');
  await addLorenzEntries(t.dependencies.pool, { systemId: lorenz, orbits: short });
});
afterAll(() => t.close());

const search = (query: Record<string, string>): request.Test => request(t.app).get('/api/v1/orbits').query(query);
const codes = (res: request.Response): (string | null)[] =>
  (res.body.items as Entry[]).map(({ itinerary }) => itinerary);

describe('GET /orbits', () => {
  it('answers entries of the contract’s form, newest first', async () => {
    const res = await search({});
    expect(res.status).toBe(200);
    const validate = validatorOf('orbit-page');
    expect(validate(res.body) || validate.errors).toBe(true);
    expect(codes(res)).toEqual(short.map(({ code }) => code).reverse());
    expect(res.body.total).toEqual({ value: short.length, relation: 'exact' });
    expect(res.body.next).toBeNull();
    expect(res.headers['link']).toBeUndefined();
    expect([res.body.incipits, res.body.distances]).toEqual([null, null]);
  });

  it('sorts by period within a system', async () => {
    const periods = (await search({ system: 'lorenz' })).body.items.map(({ period }: Entry) => Number(period));
    expect(periods).toEqual([...periods].sort((a, b) => a - b));
  });

  it.each([
    ['1.5587', ['AB']],
    ['1.558652', ['AB']],
    ['1.5586522107161747', ['AB']],
    ['1.56', ['AB']],
    ['1.5586', []],
    ['1.55860', []],
    ['2.306', ['AAB', 'ABB']],
    ['2', ['AB', 'AAB', 'ABB']],
  ])('finds every period that rounds to %s', async (period, expected) => {
    const res = await search({ system: 'lorenz', period });
    expect(codes(res).sort()).toEqual([...expected].sort());
  });

  it('counts the half that rounds up, exactly', async () => {
    await t.dependencies.pool.query(`update orbit set period_digits = 2.5, period = 2.5 where itinerary = 'AAAB'`);
    try {
      expect(codes(await search({ system: 'lorenz', period: '3' }))).toContain('AAAB');
      expect(codes(await search({ system: 'lorenz', period: '2' }))).not.toContain('AAAB');
    } finally {
      await t.dependencies.pool.query(
        `update orbit set period_digits = $1::numeric, period = $1::float8 where itinerary = 'AAAB'`,
        [short.find(({ code }) => code === 'AAAB')!.period],
      );
    }
  });

  it('takes bounds as exact and included', async () => {
    const { period } = orbits[0]!;
    expect(codes(await search({ periodMin: period, periodMax: period }))).toEqual(['AB']);
    expect(codes(await search({ periodMin: `${period}1`, periodMax: '2' }))).toEqual([]);
    expect(codes(await search({ periodMax: '1.5586522107161746' }))).toEqual([]);
  });

  it.each<[Record<string, string>, (code: string) => boolean]>([
    [{ returns: '4' }, (code) => code.length === 4],
    [{ returns: '3..5' }, (code) => code.length >= 3 && code.length <= 5],
    [{ itinerary: 'BAABA' }, (code) => code === 'AABAB'],
    [{ itineraryContains: 'BBA' }, (code) => (code + code + code).includes('BBA')],
    [{ itineraryContains: 'BABABABAB' }, (code) => code === 'AB'],
    [{ stability: 'saddle,stable' }, () => true],
    [{ stability: 'stable' }, () => false],
    [{ evidence: 'refined' }, () => false],
    [{ 'parameters[rho]': '28.0' }, () => true],
    [{ 'parameters[beta]': '8/3', 'parameters[sigma]': '1e1' }, () => true],
    [{ 'parameters[beta]': '2.667' }, () => false],
    [{ text: 'NOVAKOVA' }, () => true],
    [{ text: 'nováková jana' }, () => true],
    [{ text: '%' }, () => false],
    [{ text: 'novak_va' }, () => false],
    [{ returns: '5', itineraryContains: 'AAA' }, (code) => code.length === 5 && (code + code).includes('AAA')],
  ])('filters by %j', async (query, expected) => {
    const res = await search({ system: 'lorenz', ...query });
    expect(codes(res).sort()).toEqual(
      short
        .map(({ code }) => code)
        .filter(expected)
        .sort(),
    );
    expect(res.body.total.value).toBe(res.body.items.length);
  });

  it.each([
    ['period', (a: Entry, b: Entry) => Number(a.period) - Number(b.period)],
    ['-period', (a: Entry, b: Entry) => Number(b.period) - Number(a.period)],
    ['returns', (a: Entry, b: Entry) => a.returns - b.returns],
    ['-returns', (a: Entry, b: Entry) => b.returns - a.returns],
    ['multiplier', (a: Entry, b: Entry) => modulus(a) - modulus(b)],
    ['-multiplier', (a: Entry, b: Entry) => modulus(b) - modulus(a)],
    ['newest', (a: Entry, b: Entry) => Date.parse(b.acceptedAt) - Date.parse(a.acceptedAt)],
    ['oldest', (a: Entry, b: Entry) => Date.parse(a.acceptedAt) - Date.parse(b.acceptedAt)],
    ['accession', (a: Entry, b: Entry) => (a.accession < b.accession ? -1 : 1)],
  ])('sorts by %s, the same over pages as at once', async (sort, compare) => {
    const whole = (await search({ system: 'lorenz', sort })).body.items as Entry[];
    for (const [i, entry] of whole.slice(1).entries()) expect(compare(whole[i]!, entry)).toBeLessThanOrEqual(0);
    expect(await pages({ system: 'lorenz', sort, limit: '4' })).toEqual(whole.map(({ accession }) => accession));
  });

  it('gives incipits where asked', async () => {
    const res = await search({ system: 'lorenz', returns: '2', include: 'incipit' });
    const { accession, period } = res.body.items[0];
    expect(res.body.incipits[accession].at(-1)[0]).toBeCloseTo(Number(period), 12);
  });

  it('links to the next page', async () => {
    const res = await search({ system: 'lorenz', limit: '2' });
    const [, address] = /^<([^>]+)>; rel="next"$/.exec(res.headers['link'] ?? '') ?? [];
    const { pathname, searchParams } = new URL(address ?? '');
    expect(pathname).toBe('/api/v1/orbits');
    expect(Object.fromEntries(searchParams)).toEqual({ system: 'lorenz', limit: '2', after: res.body.next });
    const next = await request(t.app).get(pathname).query(Object.fromEntries(searchParams));
    expect(next.body.items[0].accession).not.toBe(res.body.items[0].accession);
  });

  it('neither repeats nor hides an entry when others are accepted between two pages', async () => {
    const query = { system: 'lorenz', sort: 'period', limit: '5' };
    const before = await search({ ...query, limit: '200' });
    const first = await search(query);
    // One with the shortest period and one in the middle come in meanwhile.
    await addLorenzEntries(t.dependencies.pool, {
      systemId: lorenz,
      orbits: [orbits[0]!, orbits.find(({ n }) => n === '7')!],
    });
    const rest = await pages({ ...query, after: first.body.next });
    const seen = [...first.body.items.map(({ accession }: Entry) => accession), ...rest];
    expect(new Set(seen).size).toBe(seen.length);
    for (const { accession } of before.body.items as Entry[]) expect(seen).toContain(accession);
    await t.dependencies.pool.query(
      `update orbit set status = 'withdrawn', withdrawn_at = now(), withdrawal_reason = 'test' where number > $1`,
      [short.length],
    );
  });

  it('leaves withdrawn entries out', async () => {
    expect((await search({})).body.total.value).toBe(short.length);
  });

  it('refuses the cursor of another search', async () => {
    const { next } = (await search({ system: 'lorenz', limit: '2' })).body;
    const res = await search({ system: 'lorenz', sort: 'returns', limit: '2', after: next });
    expect([res.status, res.body.errors[0].pointer]).toEqual([400, '#after']);
  });

  it.each([
    [{ system: 'nowhere' }, '#system'],
    [{ system: 'lorenz', 'parameters[mu]': '1' }, '#parameters[mu]'],
    [{ system: 'lorenz', near: '1,2' }, '#near'],
    [{ period: 'NaN' }, '#period'],
    [{ limit: '0' }, '#limit'],
    [{ limit: '201' }, '#limit'],
    [{ include: 'everything' }, '#include'],
    [{ colour: 'blue' }, '#colour'],
    [{ after: 'abc' }, '#after'],
  ])('refuses %j', async (query, pointer) => {
    const res = await search(query);
    expect([res.status, res.type, res.body.code]).toEqual([400, 'application/problem+json', 'invalid-query']);
    expect(res.body.errors[0].pointer).toBe(pointer);
  });

  it.each(['1e99', '9'.repeat(200), `0.${'0'.repeat(150)}1e-99`, '0'])('survives the period %s', async (period) => {
    expect((await search({ period })).status).toBe(200);
  });
});

describe('near a point', () => {
  const [x, y] = orbits[0]!.points[1]!;

  it('orders by the distance of the nearest crossing, and tells it', async () => {
    const res = await search({ system: 'lorenz', near: `${x},${y},27` });
    expect(codes(res)[0]).toBe('AB');
    const distances = res.body.items.map(({ accession }: Entry) => res.body.distances[accession]);
    expect(distances[0]).toBeLessThan(1e-12);
    expect(distances).toEqual([...distances].sort((a, b) => a - b));
    expect(res.body.items).toHaveLength(short.length);

    const expected = short.map(({ points }) =>
      Math.min(...points.map((p) => Math.hypot((Number(p[0]) - Number(x)) / 32, (Number(p[1]) - Number(y)) / 44))),
    );
    expected.sort((a, b) => a - b);
    for (const [i, distance] of distances.entries()) expect(distance).toBeCloseTo(expected[i]!, 12);
  });

  it('pages', async () => {
    const whole = await search({ system: 'lorenz', near: `${x},${y},27` });
    expect(await pages({ system: 'lorenz', near: `${x},${y},27`, limit: '4' })).toEqual(
      whole.body.items.map(({ accession }: Entry) => accession),
    );
  });

  it('keeps another order that is asked for', async () => {
    const res = await search({ system: 'lorenz', near: `${x},${y},27`, sort: 'period' });
    const periods = res.body.items.map(({ period }: Entry) => Number(period));
    expect(periods).toEqual([...periods].sort((a, b) => a - b));
    expect(Object.keys(res.body.distances)).toHaveLength(short.length);
  });

  it('finds nothing in a system without entries', async () => {
    const res = await search({ system: 'rossler', near: '1,2,3' });
    expect([res.status, res.body.items]).toEqual([200, []]);
  });
});

it('answers a search in under 50 ms on ten times the demo content', async () => {
  await addLorenzEntries(t.dependencies.pool, { systemId: lorenz, orbits });
  await t.dependencies.pool.query('analyze');
  const queries: Record<string, string>[] = [
    { system: 'lorenz', period: '1.5587' },
    { system: 'lorenz' },
    { text: 'novakova' },
    { system: 'lorenz', near: `${orbits[0]!.points[0]!.join(',')},27` },
  ];
  for (const query of queries) {
    await search(query);
    const times: number[] = [];
    for (let n = 0; n < 7; n += 1) {
      const begin = performance.now();
      await search({ ...query, limit: '20' }).expect(200);
      times.push(performance.now() - begin);
    }
    times.sort((a, b) => a - b);
    expect(times[3]).toBeLessThan(50);
  }
}, 120_000);

it('finds every entry by distance, also behind thousands of nearer crossings', async () => {
  const query = { system: 'lorenz', near: `${orbits[0]!.points[0]!.join(',')},27` };
  const all = await pages({ ...query, limit: '200' });
  expect(all).toHaveLength((await search({ system: 'lorenz' })).body.total.value);
  expect(new Set(all).size).toBe(all.length);
  // The nearest crossing of BBBBBBBBBBBA is far from A's side: a filter that leaves only it.
  expect(codes(await search({ ...query, itinerary: 'ABBBBBBBBBBB' }))).toEqual(['ABBBBBBBBBBB']);
}, 120_000);

/** Accessions of all pages, one after the other. */
async function pages(query: Record<string, string>): Promise<string[]> {
  const seen: string[] = [];
  for (let after: string | null = query['after'] ?? ''; after !== null;) {
    const res = await search(after ? { ...query, after } : query);
    expect(res.status).toBe(200);
    seen.push(...res.body.items.map(({ accession }: Entry) => accession));
    after = res.body.next;
  }
  return seen;
}

const modulus = ({ multipliers }: Entry): number => Math.hypot(Number(multipliers[0]?.re), Number(multipliers[0]?.im));
