import request from 'supertest';
import type { Entry, EntryRevision, Refinement as Shown } from '@/schemas/generated/contract';
import { installSystems } from '@/server/demo/install-systems';
import { OrbitRevision } from '@/server/models/orbit-revision';
import { Refinement } from '@/server/models/refinement';
import { validatorOf } from '@/server/schema-registry';
import { CHECKS_AT_ONCE, TRIES } from '@/server/services/check-limits';
import { refineMissing } from '@/server/services/refine-missing';
import { beginRefinement, finishRefinement } from '@/server/services/run-refinement';
import { takeOverJobs } from '@/server/services/worker-life';
import { loadLorenzOrbits } from '@/tests/reference/load-orbits';
import { addLorenzEntries } from '../support/catalogue';
import { type JobRunner, startJobs } from '../support/job-runner';
import { anAccount, signedIn, testApp, type TestApp } from '../support/test-app';

type Agent = ReturnType<typeof request.agent>;

let t: TestApp;
let reader: Agent;
let jobs: JobRunner | null = null;
let systemId: string;
beforeAll(async () => {
  t = await testApp();
  await installSystems(t.dependencies.db);
  systemId = (await sql<{ id: string }>(`select id from system where slug = 'lorenz'`))[0]!.id;
  reader = await signedIn(t.app, await anAccount('reader'));
});
afterEach(async () => {
  await jobs?.stop();
  jobs = null;
});
afterAll(() => t.close());

/** High precision on a busy machine. */
jest.setTimeout(120_000);

const sql = async <T extends object>(text: string, binds: unknown[] = []): Promise<T[]> =>
  (await t.dependencies.pool.query<T>(text, binds)).rows;
const orbits = loadLorenzOrbits();
/** An entry of the published table. */
const anEntry = async (code: string): Promise<string> => {
  const chosen = orbits.filter((orbit) => orbit.code === code);
  return (await addLorenzEntries(t.dependencies.pool, { systemId, orbits: chosen }))[0]!;
};
const ask = (accession: string, digits: unknown, agent: Agent = reader): request.Test =>
  agent.post(`/api/v1/orbits/${accession}/refinements`).send({ digits });
const entry = async (accession: string, query = ''): Promise<Entry> =>
  (await request(t.app).get(`/api/v1/orbits/${accession}${query}`).expect(200)).body;

async function until(location: string, ...states: Shown['state'][]): Promise<Shown> {
  for (;;) {
    const { body } = await request(t.app).get(location).expect(200);
    if (states.includes(body.state)) return body;
    await new Promise((resolve) => setTimeout(resolve, 50));
  }
}

const refined = async (accession: string, digits: number): Promise<Shown> => {
  jobs ??= await startJobs(t, { refining: true });
  return until((await ask(accession, digits)).headers['location']!, 'done', 'failed');
};

/** T of Lorenz AB at 10, 28, 8/3: D. Viswanath, Nonlinearity 16 (2003) 1035, has the first 14 digits. */
const PERIOD_AB = '1.5586522107161747275678702092';

describe('POST /orbits/:accession/refinements', () => {
  it('makes a revision with the digits asked for, and the one before stays readable', async () => {
    const accession = await anEntry('AB');
    const before = await request(t.app).get(`/api/v1/orbits/${accession}`);
    const res = await ask(accession, 30);
    expect(res.status).toBe(202);
    expect(res.body).toMatchObject({ accession, digits: 30, state: 'queued', revision: null, askedBySystem: false });
    expect(res.headers['location']).toBe(res.body.links.self);
    const done = await refined(accession, 30);
    expect(done).toMatchObject({ id: res.body.id, state: 'done', revision: 2, obstacle: null, failure: null });
    expect(validatorOf('refinement')(done)).toBe(true);
    expect(done.computeMs).toBeGreaterThan(0);

    const after = await request(t.app).get(`/api/v1/orbits/${accession}`);
    expect(after.headers['etag']).not.toBe(before.headers['etag']);
    const now: Entry = after.body;
    expect(validatorOf('entry')(now)).toBe(true);
    expect(now.evidence).toMatchObject({ level: 'refined', digits: 30, held: null, obstacle: null });
    expect(now.period.slice(0, 30)).toBe(PERIOD_AB);
    expect(now.crossings.map(({ transversality }) => transversality)).toEqual([0.98, 0.98]);
    expect(now.crossings.at(-1)!.point).toEqual(now.point);
    // The two returns are each other's image: x, y → −x, −y.
    expect(now.crossings[0]!.point[0]).toBe(now.point[0]!.slice(1));
    expect(now.submitted).toEqual(before.body.submitted);

    const first = await entry(accession, '?revision=1');
    expect(first).toEqual({
      ...before.body,
      links: { ...before.body.links, self: `/api/v1/orbits/${accession}?revision=1` },
    });
  });

  it('lists both revisions, and who made them', async () => {
    const { items } = (await request(t.app).get('/api/v1/orbits/RTN-0000001X/revisions')).body;
    expect(items.map((item: EntryRevision) => [item.revision, item.by, item.why, item.evidence])).toEqual([
      [2, null, 'Refined to 30 digits by the archive.', { level: 'refined', digits: 30 }],
      [1, 'Curator Q', 'Accepted', { level: 're-integrated', digits: 13 }],
    ]);
    expect(validatorOf('entry-revision')(items[0])).toBe(true);
    expect((await request(t.app).get(items[1].links.self)).body.revision).toBe(1);
  });

  it('leaves searches and exports with the doubles and the digits of the current revision', async () => {
    const [row] = await sql<{ period: number; digits: string }>(
      `select period, period_digits::text as digits from orbit where number = 1`,
    );
    expect(row).toEqual({ period: Number(PERIOD_AB), digits: expect.stringContaining(PERIOD_AB) });
    const crossings = await sql<{ point: number[] }>(
      'select point, cube_ll_coord(place, 1) as x from crossing where orbit_number = 1 order by position',
    );
    const { crossings: shown } = await entry('RTN-0000001X');
    expect(crossings.map(({ point }) => point)).toEqual(shown.map(({ point }) => point.map(Number)));
    const found = await request(t.app).get('/api/v1/orbits?system=lorenz&period=1.5586522107&evidence=refined');
    expect(found.body.items).toHaveLength(1);
    const csv = await request(t.app).get('/api/v1/orbits.csv?system=lorenz');
    expect(csv.text).toContain(PERIOD_AB);
  });

  it('answers at once what is known already, and computes more digits from the same orbit', async () => {
    const again = await ask('RTN-0000001X', 25);
    expect([again.status, again.body.digits, again.body.revision]).toEqual([200, 30, 2]);
    expect(await refined('RTN-0000001X', 60)).toMatchObject({ revision: 3 });
    const { period, point, evidence } = await entry('RTN-0000001X');
    const before = await entry('RTN-0000001X', '?revision=2');
    expect(evidence.digits).toBe(60);
    expect(period.slice(0, 30)).toBe(PERIOD_AB);
    expect(period.length).toBeGreaterThanOrEqual(60);
    expect(point[0]!.slice(0, 29)).toBe(before.point[0]!.slice(0, 29));
    const { items } = (await request(t.app).get('/api/v1/orbits/RTN-0000001X/refinements')).body;
    expect(items.map(({ digits }: Shown) => digits)).toEqual([60, 30]);
  });

  it.each([
    ['101 digits', 101],
    ['14 digits', 14],
    ['digits as text', '30'],
  ])('refuses %s', async (_, digits) => {
    const before = await Refinement.count();
    const res = await ask('RTN-0000001X', digits);
    expect([res.status, res.body.code, res.body.errors[0].pointer]).toEqual([400, 'invalid-body', '/digits']);
    expect(await Refinement.count()).toBe(before);
  });

  it('refuses visitors, unknown entries and withdrawn ones, and stores nothing', async () => {
    const accession = await anEntry('AAB');
    const before = await Refinement.count();
    const visitor = await request(t.app).post(`/api/v1/orbits/${accession}/refinements`).send({ digits: 30 });
    expect([visitor.status, visitor.body.code]).toEqual([401, 'not-signed-in']);
    expect((await ask('RTN-00009997', 30)).body.code).toBe('unknown-accession');
    await sql(
      `update orbit set status = 'withdrawn', withdrawn_at = now(), withdrawal_reason = 'x' where accession = $1`,
      [accession],
    );
    const withdrawn = await ask(accession, 30);
    expect([withdrawn.status, withdrawn.body.code]).toEqual([409, 'entry-withdrawn']);
    expect(await Refinement.count()).toBe(before);
  });

  it('counts towards what a person may have computed at once', async () => {
    const busy = await signedIn(t.app, await anAccount('reader'));
    const accession = await anEntry('ABB');
    for (let digits = 31; digits < 31 + CHECKS_AT_ONCE; digits += 1) {
      expect((await ask(accession, digits, busy)).status).toBe(202);
    }
    const res = await ask(accession, 90, busy);
    expect([res.status, res.body.code]).toEqual([429, 'too-many-checks']);
    // Whoever asks for less than what is under way waits for that.
    expect((await ask(accession, 20, busy)).body.digits).toBe(31);
    await sql(
      `update refinement set state = 'failed', failure = 'x', finished_at = now(), compute_ms = 601e3 where state = 'queued'`,
    );
    expect((await ask(accession, 90, busy)).body.code).toBe('computing-time-used');
  });
});

describe('an entry that cannot be refined', () => {
  it('says why, keeps its figures, and is not tried again by this engine', async () => {
    const [orbit] = orbits.filter(({ code }) => code === 'AAABB');
    const points = orbit!.points.map(([x, y]): [string, string] => [x, `${Number(y) + 1}`]);
    const [accession] = await addLorenzEntries(t.dependencies.pool, { systemId, orbits: [{ ...orbit!, points }] });
    const done = await refined(accession!, 30);
    expect(done).toMatchObject({
      state: 'done',
      revision: null,
      obstacle: { digits: 30, message: expect.any(String) },
    });
    const shown = await entry(accession!);
    expect(shown).toMatchObject({
      revision: 1,
      evidence: { level: 're-integrated', digits: 13, obstacle: done.obstacle },
    });
    expect(validatorOf('entry')(shown)).toBe(true);
    const { orbitNumber } = await Refinement.findByPk(done.id, { rejectOnEmpty: true });
    const tried = async (): Promise<number> => {
      await refineMissing(t.dependencies.db);
      return Refinement.count({ where: { orbitNumber } });
    };
    expect(await tried()).toBe(1);
    await sql(`update refinement set engine_version = '0.0.1' where id = $1`, [done.id]);
    expect(await tried()).toBe(2);
    expect(await tried()).toBe(2);
  });
});

describe('a refinement whose worker', () => {
  it('is stopped goes back into the queue as if it had not begun', async () => {
    const accession = await anEntry('AAAAABABBBBB');
    jobs = await startJobs(t, { refining: true });
    const { headers } = await ask(accession, 100);
    const { id } = await until(headers['location']!, 'running');
    await jobs.stop();
    jobs = null;
    expect(await Refinement.findByPk(id)).toMatchObject({ state: 'queued', attempts: 0 });
  });

  it('is killed is done by the next, once', async () => {
    const accession = await anEntry('AABB');
    const { body } = await ask(accession, 30);
    expect(await beginRefinement(t.dependencies.db, body.id)).toMatchObject({ state: 'running', attempts: 1 });
    await sql(
      `update graphile_worker._private_jobs set attempts = 1, locked_by = 'dead', locked_at = now() - interval '1 minute'
       where key = $1`,
      [body.id],
    );
    await takeOverJobs({ db: t.dependencies.db, publicUrl: '' });
    const done = await refined(accession, 30);
    expect(done).toMatchObject({ id: body.id, revision: 2 });
    const row = await Refinement.findByPk(body.id, { rejectOnEmpty: true });
    expect(row.attempts).toBe(2);
    const result = { ok: false, reason: 'too-long', message: 'x' } as const;
    await finishRefinement(t.dependencies.db, row, { result, computeMs: 1 });
    expect(await entry(accession)).toMatchObject({ revision: 2, evidence: { obstacle: null } });
    expect(await OrbitRevision.count({ where: { orbitNumber: row.orbitNumber } })).toBe(2);
  });

  it('is ended by it every time has failed, and says what happened', async () => {
    const accession = await anEntry('AAAB');
    const { body } = await ask(accession, 30);
    await sql(
      `update graphile_worker._private_jobs set attempts = max_attempts, locked_by = 'dead', locked_at = now() - interval '1 minute'
       where key = $1`,
      [body.id],
    );
    await takeOverJobs({ db: t.dependencies.db, publicUrl: '' });
    expect(await until(body.links.self, 'failed')).toMatchObject({
      failure: expect.stringContaining(`${TRIES} times`),
    });
  });
});
