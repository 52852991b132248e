import { createHash } from 'node:crypto';
import { gunzipSync } from 'node:zlib';
import { Logger, runOnce } from 'graphile-worker';
import Papa from 'papaparse';
import { Client } from 'pg';
import request from 'supertest';
import type { Release } from '@/schemas/generated/contract';
import { cutReleaseJob } from '@/server/jobs/cut-release';
import { validatorOf } from '@/server/schema-registry';
import { TRIES } from '@/server/services/check-limits';
import { loadLorenzOrbits } from '@/tests/reference/load-orbits';
import { addLorenzEntries, addSystem } from '../support/catalogue';
import { anAccount, signedIn, testApp, type TestApp } from '../support/test-app';

let t: TestApp;
let systemId: string;
let curator: Awaited<ReturnType<typeof signedIn>>;
const orbits = loadLorenzOrbits();
beforeAll(async () => {
  t = await testApp({ publicUrl: 'http://orbits.example' });
  systemId = await addSystem(t.dependencies.pool, 'lorenz');
  await addLorenzEntries(t.dependencies.pool, { systemId, orbits: orbits.slice(0, 3) });
  curator = await signedIn(t.app, await anAccount('curator'));
});
afterAll(() => t.close());

const RELEASES = '/api/v1/releases';
const sql = (text: string) => t.dependencies.pool.query(text);

/** Do what is queued, as a worker would. */
const work = (): Promise<void> =>
  runOnce({
    connectionString: t.database.url,
    logger: new Logger(() => () => undefined),
    taskList: {
      'cut-release': cutReleaseJob({
        pool: t.dependencies.pool,
        publicUrl: t.dependencies.config.publicUrl,
        log: t.dependencies.log,
      }),
    },
  });

async function cut(note = ''): Promise<Release> {
  const asked = await curator.post(RELEASES).send({ note });
  expect([asked.status, asked.body.state, asked.body.files]).toEqual([202, 'cutting', []]);
  await work();
  const res = await request(t.app).get(asked.headers['location']!);
  expect(validatorOf('release')(res.body) || validatorOf('release').errors).toBe(true);
  return res.body as Release;
}

async function file(release: Release, name: string): Promise<Buffer> {
  const { href, bytes, sha256 } = release.files.find((one) => one.name === name)!;
  const res = await request(t.app)
    .get(href)
    .buffer(true)
    .parse((message, done) => {
      const pieces: Buffer[] = [];
      message.on('data', (piece: Buffer) => pieces.push(piece));
      message.on('end', () => done(null, Buffer.concat(pieces)));
    });
  const content = res.body as Buffer;
  expect([res.status, content.length]).toEqual([200, bytes]);
  expect(createHash('sha256').update(content).digest('hex')).toBe(sha256);
  return content;
}

const table = (text: string): Record<string, string>[] =>
  Papa.parse<Record<string, string>>(text, { header: true, skipEmptyLines: true }).data;

describe('a release', () => {
  it('holds every accepted entry, byte for byte what its hashes say', async () => {
    const release = await cut('The first one.');
    expect(release).toMatchObject({
      id: 1,
      state: 'ready',
      note: 'The first one.',
      previous: null,
      entries: 3,
      changes: { added: 3, revised: 0, withdrawn: 0 },
    });
    const lines = gunzipSync(await file(release, 'orbits.ndjson.gz'))
      .toString()
      .trimEnd()
      .split('\n');
    const [end, ...entries] = lines.reverse().map((line) => JSON.parse(line) as Record<string, unknown>);
    expect(end).toMatchObject({ end: true, count: 3 });
    for (const entry of entries) expect(validatorOf('entry')(entry)).toBe(true);
    expect(table(gunzipSync(await file(release, 'orbits.csv.gz')).toString())).toHaveLength(3);
  });

  it('is described as a data package whose columns are those of the table', async () => {
    const release = (await request(t.app).get(`${RELEASES}/1`)).body as Release;
    const descriptor = JSON.parse((await file(release, 'datapackage.json')).toString()) as {
      licenses: object[];
      resources: { path: string; hash: string; bytes: number; schema?: { fields: { name: string; type: string }[] } }[];
    };
    expect(descriptor.licenses).toEqual([{ name: 'CC-BY-4.0', path: 'https://creativecommons.org/licenses/by/4.0/' }]);
    for (const { path, hash, bytes } of descriptor.resources) {
      const stored = release.files.find(({ name }) => name === path)!;
      expect([hash, bytes]).toEqual([`sha256:${stored.sha256}`, stored.bytes]);
    }
    const csv = gunzipSync(await file(release, 'orbits.csv.gz')).toString();
    const [record] = table(csv);
    const fields = descriptor.resources.find(({ path }) => path === 'orbits.csv.gz')!.schema!.fields;
    expect(fields.map(({ name }) => name)).toEqual(Object.keys(record!));
    for (const { name, type } of fields) {
      const value = record![name]!;
      if (type === 'integer') expect(value).toMatch(/^-?\d+$/);
      if (type === 'number') expect(Number.isFinite(Number(value))).toBe(true);
      if (type === 'datetime') expect(new Date(value).toISOString()).toBe(value);
    }
  });

  it('lists what was added, revised and withdrawn since the one before', async () => {
    await addLorenzEntries(t.dependencies.pool, { systemId, orbits: orbits.slice(3, 4) });
    await sql(`update orbit set status = 'withdrawn', withdrawn_at = now(), withdrawal_reason = 'x' where number = 1`);
    await sql(`insert into orbit_revision (orbit_number, revision, content, check_id, why, evidence, digits)
      select orbit_number, 2, content, check_id, 'Mended', evidence, digits from orbit_revision where orbit_number = 2`);
    await sql('update orbit set revision = 2 where number = 2');
    const release = await cut();
    expect(release).toMatchObject({
      previous: 1,
      entries: 3,
      changes: { added: 1, revised: 1, withdrawn: 1 },
    });
    expect(table((await file(release, 'changes.csv')).toString())).toEqual([
      { accession: 'RTN-0000001X', change: 'withdrawn', revision: '', previousRevision: '1' },
      { accession: 'RTN-00000028', change: 'revised', revision: '2', previousRevision: '1' },
      { accession: 'RTN-00000044', change: 'added', revision: '1', previousRevision: '' },
    ]);
  });

  it('leaves the ones before as they were', async () => {
    const first = (await request(t.app).get(`${RELEASES}/1`)).body as Release;
    const entries = gunzipSync(await file(first, 'orbits.ndjson.gz')).toString();
    expect(entries).toContain('"accession":"RTN-0000001X","revision":1,"status":"accepted"');
    const list = (await request(t.app).get(RELEASES)).body as { items: Release[] };
    expect(validatorOf('release-list')(list)).toBe(true);
    expect(list.items.map(({ id }) => id)).toEqual([2, 1]);
  });

  it.each([
    'update release set note = $$better$$ where id = 1',
    'delete from release where id = 1',
    'update release_part set content = $$x$$ where release_id = 1',
    'delete from release_file where release_id = 1',
    'delete from release_entry where release_id = 1',
  ])('is refused by the database: %s', async (statement) => {
    await expect(sql(statement)).rejects.toThrow(/never change/);
  });

  it('says how to cite it, with the hash of the whole', async () => {
    const { citation, files } = (await request(t.app).get(`${RELEASES}/1`)).body as Release;
    const whole = files.find(({ name }) => name === 'orbits.ndjson.gz')!;
    expect(citation).toMatch(/^Ritornel: Ritornel, a checked archive of periodic orbits: release 1\. /);
    expect(citation).toContain(whole.sha256);
    expect(citation).toContain('http://orbits.example/releases/1');
  });

  it('is sent once to whoever has it', async () => {
    const { sha256 } = ((await request(t.app).get(`${RELEASES}/1`)).body as Release).files[0]!;
    const path = `${RELEASES}/1/files/changes.csv`;
    expect((await request(t.app).get(path).set('If-None-Match', `"${sha256}"`)).status).toBe(304);
    expect((await request(t.app).get(path)).headers['cache-control']).toContain('immutable');
  });
});

describe('cutting a release', () => {
  it('is for curators', async () => {
    expect((await request(t.app).post(RELEASES).send({})).status).toBe(401);
    const contributor = await signedIn(t.app, await anAccount('contributor'));
    expect((await contributor.post(RELEASES).send({})).status).toBe(403);
  });

  it('refuses a second one while the first is at work, and a note that is too long', async () => {
    expect((await curator.post(RELEASES).send({ note: 'x'.repeat(2001) })).status).toBe(400);
    const [one, two] = [await curator.post(RELEASES).send({}), await curator.post(RELEASES).send({})];
    expect([one.status, two.status, two.body.code]).toEqual([202, 409, 'release-in-work']);
    await work();
  });

  it('says why when it cannot be cut, keeps nothing half, and lets the next one be asked for', async () => {
    const owner = new Client({ connectionString: t.database.ownerUrl });
    await owner.connect();
    await owner.query('alter table release_part add constraint release_part_never check (false) not valid');
    await curator.post(RELEASES).send({}).expect(202);
    for (let attempt = 1; attempt <= TRIES; attempt += 1) {
      await sql(`select graphile_worker.reschedule_jobs(array(select id from graphile_worker.jobs), run_at => now())`);
      await work();
    }
    await owner.query('alter table release_part drop constraint release_part_never');
    await owner.end();
    const { items } = (await request(t.app).get(RELEASES)).body as { items: Release[] };
    expect(items[0]).toMatchObject({
      state: 'failed',
      failure: expect.stringContaining('release_part_never'),
      files: [],
    });
    expect((await sql(`select 1 from release_part where release_id = ${items[0]!.id}`)).rowCount).toBe(0);
    expect((await cut()).state).toBe('ready');
  });

  it.each(['/0', '/99', '/one', '/1/files/nothing.csv', '/99/files/changes.csv'])(
    'knows nothing at %s',
    async (path) => {
      const res = await request(t.app).get(RELEASES + path);
      expect([res.status, res.body.code]).toEqual([404, 'not-found']);
    },
  );
});

it('describes the export of a search as a data package beside it', async () => {
  const res = await request(t.app).get('/api/v1/orbits.datapackage.json?system=lorenz&returns=2..3');
  expect(res.status).toBe(200);
  const [csv] = res.body.resources;
  expect(csv.path).toBe('http://orbits.example/api/v1/orbits.csv?system=lorenz&returns=2..3');
  const text = (await request(t.app).get('/api/v1/orbits.csv?system=lorenz&returns=2..3')).text;
  const [record] = table(text);
  expect(csv.schema.fields.map(({ name }: { name: string }) => name)).toEqual(Object.keys(record!));
});
