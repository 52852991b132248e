import { createHash } from 'node:crypto';
import { createServer, get, type IncomingMessage, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { gunzipSync } from 'node:zlib';
import Papa from 'papaparse';
import request from 'supertest';
import type { Entry } from '@/schemas/generated/contract';
import { CAUTION } from '@/server/caution';
import { validatorOf } from '@/server/schema-registry';
import { loadLorenzOrbits } from '@/tests/reference/load-orbits';
import { addLorenzEntries, addSystem } from '../support/catalogue';
import { testApp, type TestApp } from '../support/test-app';

let t: TestApp;
let server: Server;
const orbits = loadLorenzOrbits().filter(({ n }) => Number(n) <= 9);

beforeAll(async () => {
  t = await testApp();
  const systemId = await addSystem(t.dependencies.pool, 'lorenz');
  await addLorenzEntries(t.dependencies.pool, {
    systemId,
    orbits,
    change: { note: '=HYPERLINK("http://evil.example")', references: [{ citation: 'A, "B"\nC', doi: '10.1000/x' }] },
  });
  server = createServer(t.app).listen(0, '127.0.0.1');
}, 120_000);
afterAll(async () => {
  server.closeAllConnections();
  server.close();
  await t.close();
});

const file = (format: string, query: Record<string, string> = {}): request.Test =>
  request(t.app)
    .get(`/api/v1/orbits.${format}`)
    .query(query)
    .set('Accept-Encoding', 'identity')
    .buffer(true)
    .parse((res, done) => {
      const chunks: Buffer[] = [];
      res.on('data', (chunk: Buffer) => chunks.push(chunk));
      res.on('end', () => done(null, Buffer.concat(chunks)));
    });

async function searched(query: Record<string, string>): Promise<Entry[]> {
  const items: Entry[] = [];
  for (let after = ''; ;) {
    const res = await request(t.app)
      .get('/api/v1/orbits')
      .query({ ...query, limit: '200', ...(after && { after }) });
    items.push(...res.body.items);
    if (res.body.next === null) return items;
    after = res.body.next;
  }
}

describe.each<Record<string, string>>([
  {},
  { system: 'lorenz' },
  { system: 'lorenz', returns: '5..8', sort: '-period' },
  { system: 'lorenz', period: '1.5587' },
  { system: 'lorenz', near: '13.76,19.57,27', returns: '2..6' },
  { text: 'nothing like it' },
])('an export of %j', (query) => {
  it('is exactly the search as NDJSON, with its count and checksum', async () => {
    const res = await file('ndjson', query);
    expect([res.status, res.type]).toEqual([200, 'application/x-ndjson']);
    const text = String(res.body);
    const lines = text.trimEnd().split('\n');
    const end = JSON.parse(lines.pop()!);
    expect(lines.map((line) => JSON.parse(line))).toEqual(await searched(query));
    expect(validatorOf('export-end')(end)).toBe(true);
    const before = lines.map((line) => `${line}\n`).join('');
    expect(end).toEqual({
      end: true,
      count: lines.length,
      sha256: createHash('sha256').update(before).digest('hex'),
    });
  });

  it('is exactly the search as JSON', async () => {
    const res = await file('json', query);
    const document = JSON.parse(String(res.body));
    expect(validatorOf('entry-export')(document)).toBe(true);
    const items = await searched(query);
    expect(document).toEqual({ caution: CAUTION, items, total: items.length });
  });

  it('is exactly the search as CSV', async () => {
    const res = await file('csv', query);
    expect(res.type).toBe('text/csv');
    const text = String(res.body);
    expect(text.endsWith('\r\n')).toBe(true);
    const { data, errors, meta } = Papa.parse<Record<string, string>>(text, { header: true, skipEmptyLines: true });
    expect(errors.filter(({ type }) => type !== 'Delimiter')).toEqual([]);
    const items = await searched(query);
    expect(meta.fields?.includes('point.3')).toBe(items.length > 0);
    expect(data.map(({ accession }) => accession)).toEqual(items.map(({ accession }) => accession));
    for (const [i, entry] of items.entries()) {
      expect(data[i]).toMatchObject({
        period: entry.period,
        'point.1': entry.point[0],
        'point.2': entry.point[1],
        'parameters.beta': '8/3',
        returnTimes: entry.returnTimes.join(' '),
        'multipliers.2.re': entry.multipliers[1]!.re,
        note: `'${entry.note}`,
        references: 'A, "B"\nC doi:10.1000/x',
        caution: CAUTION,
      });
    }
  });
});

describe('an export', () => {
  it('has a file name', async () => {
    const res = await file('csv', { system: 'lorenz' });
    expect(res.headers['content-disposition']).toMatch(/^attachment; filename="ritornel-lorenz-\d{4}-\d\d-\d\d\.csv"$/);
  });

  it('holds bodies that can be submitted again as they are', async () => {
    const { items } = JSON.parse(String((await file('json', { returns: '2' })).body));
    expect(validatorOf('submission-body')(items[0].submitted)).toBe(true);
    expect(validatorOf('entry')(items[0])).toBe(true);
  });

  it.each([{ period: 'x' }, { system: 'nowhere' }, { limit: '5' }, { sort: 'distance' }])(
    'refuses %j',
    async (query) => {
      const res = await request(t.app).get('/api/v1/orbits.ndjson').query(query);
      expect([res.status, res.type, res.body.code]).toEqual([400, 'application/problem+json', 'invalid-query']);
    },
  );

  it('is compressed, its checksum being of the uncompressed bytes', async () => {
    const { port } = server.address() as AddressInfo;
    const bytes = await new Promise<Buffer>((resolve, reject) => {
      const asked = { headers: { 'Accept-Encoding': 'gzip' } };
      get(`http://127.0.0.1:${port}/api/v1/orbits.ndjson`, asked, (res: IncomingMessage) => {
        expect(res.headers['content-encoding']).toBe('gzip');
        const chunks: Buffer[] = [];
        res.on('data', (chunk: Buffer) => chunks.push(chunk));
        res.on('end', () => resolve(Buffer.concat(chunks)));
      }).on('error', reject);
    });
    const text = gunzipSync(bytes).toString('utf8');
    const end = text.lastIndexOf('{"end"');
    expect(JSON.parse(text.slice(end)).sha256).toBe(createHash('sha256').update(text.slice(0, end)).digest('hex'));
  });

  it('gives its connection back when the reader leaves', async () => {
    const { port } = server.address() as AddressInfo;
    // More often than there are connections and exports at a time.
    for (let n = 0; n < 12; n += 1) {
      await new Promise<void>((resolve, reject) => {
        const asking = get(`http://127.0.0.1:${port}/api/v1/orbits.ndjson`, (res) => {
          res.once('data', () => {
            asking.destroy();
            resolve();
          });
        });
        asking.on('error', (error: NodeJS.ErrnoException) => (error.code === 'ECONNRESET' ? resolve() : reject(error)));
      });
    }
    await new Promise((done) => setTimeout(done, 300));
    expect((await file('ndjson', { returns: '2' })).status).toBe(200);
    const open = await t.dependencies.pool.query(
      `select count(*)::integer as open from pg_stat_activity where datname = current_database() and state = 'idle in transaction'`,
    );
    expect(open.rows[0].open).toBe(0);
  });
});
