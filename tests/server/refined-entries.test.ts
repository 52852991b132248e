import Decimal from 'decimal.js';
import request from 'supertest';
import type { Check, Entry, SubmissionBody } from '@/schemas/generated/contract';
import { demoOrbits } from '@/server/demo/demo-orbits';
import { validatorOf } from '@/server/schema-registry';
import { type JobRunner, startJobs } from '../support/job-runner';
import { lorenzOrbit } from '../support/orbits';
import { anAccount, signedIn, testApp, type TestApp } from '../support/test-app';

type Agent = ReturnType<typeof request.agent>;

let t: TestApp;
let jobs: JobRunner;
let contributor: Agent;
let curator: Agent;
beforeAll(async () => {
  t = await testApp();
  jobs = await startJobs(t, { refining: true });
  contributor = await signedIn(t.app, await anAccount('contributor'));
  curator = await signedIn(t.app, await anAccount('curator'));
});
afterAll(async () => {
  await jobs.stop();
  await t.close();
});

/** High precision on a busy machine. */
jest.setTimeout(120_000);

async function until<T>(read: () => Promise<T>, isThere: (found: T) => boolean): Promise<T> {
  for (;;) {
    const found = await read();
    if (isThere(found)) return found;
    await new Promise((resolve) => setTimeout(resolve, 50));
  }
}

async function accepted(body: SubmissionBody): Promise<string> {
  const { id } = (await contributor.post('/api/v1/submissions').send({ ...body, send: true })).body;
  const path = `/api/v1/submissions/${id}`;
  await until(
    async () => (await curator.get(path)).body.checkState,
    (state) => state === 'done',
  );
  const decision = { decision: 'accept', comment: 'Welcome.' };
  const res = await curator.post(`${path}/decision`).set('If-Match', '*').send(decision).expect(200);
  return res.body.accession;
}

const entryOf = async (accession: string): Promise<Entry> =>
  (await request(t.app).get(`/api/v1/orbits/${accession}`).expect(200)).body;
const refinedTo = (accession: string, digits: number): Promise<Entry> =>
  until(
    () => entryOf(accession),
    ({ evidence }) => evidence.digits === digits,
  );

const Exact = Decimal.clone({ precision: 80 });

/** The pendulum's period through the lowest point with speed v: 4 K(v/2) = 2π / agm(1, √(1 − v²/4)). */
function pendulumPeriod(v: number): Decimal {
  let a = new Exact(1);
  let b = new Exact(1).minus(new Exact(v).pow(2).div(4)).sqrt();
  for (let i = 0; i < 8; i += 1) [a, b] = [a.plus(b).div(2), a.times(b).sqrt()];
  return Exact.acos(-1).times(2).div(a);
}

describe('a check', () => {
  it('that is asked for 60 digits reports them', async () => {
    const res = await contributor
      .post('/api/v1/checks')
      .set('Prefer', 'wait=60')
      .send({ ...lorenzOrbit('AB'), digits: 60 });
    expect(res.status).toBe(200);
    const check: Check = res.body;
    expect(validatorOf('check')(check)).toBe(true);
    expect(check).toMatchObject({ verdict: 'closes', digits: { typed: expect.any(Number), confirmed: 60 } });
    const { period, crossings, point } = check.orbit!;
    // Computed elsewhere with 70 digits; agrees with D. Viswanath, Nonlinearity 16 (2003) 1035, in the 14 printed there.
    const exact = new Exact('1.558652210716174727567870209212696070528480548997243935889522');
    expect(new Exact(period).minus(exact).abs().toNumber()).toBeLessThan(0.51e-59);
    expect(crossings.at(-1)).toMatchObject({ time: period, point });
    expect(new Exact(crossings[0]!.returnTime).minus(exact.div(2)).abs().toNumber()).toBeLessThan(1.1e-59);
  });
});

describe('an accepted entry of a family', () => {
  it('is refined to 30 digits by itself, and stays the same member when more are asked for', async () => {
    const body = demoOrbits.find(({ system }) => system === 'pendulum')!;
    expect(body.point).toEqual(['0', '1']);
    const accession = await accepted({ ...body, references: [{ citation: 'A book' }] });
    const thirty = await refinedTo(accession, 30);
    expect(thirty).toMatchObject({ revision: 2, evidence: { level: 'refined', obstacle: null } });
    expect(thirty.evidence.held).toMatch(/point/);
    expect(thirty.references).toEqual([{ citation: 'A book' }]);
    const { items } = (await request(t.app).get(`/api/v1/orbits/${accession}/refinements`)).body;
    expect(items).toMatchObject([{ digits: 30, state: 'done', askedBySystem: true, revision: 2 }]);

    const exact = pendulumPeriod(1);
    expect(new Exact(thirty.period).minus(exact).abs().toNumber()).toBeLessThan(0.51e-29);
    await contributor.post(`/api/v1/orbits/${accession}/refinements`).send({ digits: 60 }).expect(202);
    const sixty = await refinedTo(accession, 60);
    expect([sixty.revision, sixty.evidence.held]).toEqual([3, thirty.evidence.held]);
    expect(new Exact(sixty.period).minus(exact).abs().toNumber()).toBeLessThan(0.51e-59);
    expect(sixty.point).toEqual(['0', '1']);
  });

  it('is what was submitted with digits already, and is then not refined again', async () => {
    const body = demoOrbits.find(({ system }) => system === 'van-der-pol')!;
    const accession = await accepted({ ...body, digits: 40 });
    const shown = await entryOf(accession);
    expect(shown).toMatchObject({ revision: 1, evidence: { level: 'refined', digits: 40 } });
    const { items } = (await request(t.app).get(`/api/v1/orbits/${accession}/refinements`)).body;
    expect(items).toEqual([]);
    const res = await contributor.post(`/api/v1/orbits/${accession}/refinements`).send({ digits: 35 });
    expect([res.status, res.body.revision]).toEqual([200, 1]);
  });
});
