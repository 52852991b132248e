import type request from 'supertest';
import { installSystems } from '@/server/demo/install-systems';
import { CheckReport } from '@/server/models/check-report';
import { OrbitCheck } from '@/server/models/orbit-check';
import { TRIES } from '@/server/services/check-limits';
import { readiness } from '@/server/services/readiness';
import { takeOverJobs } from '@/server/services/worker-life';
import { lorenzOrbit, slowOrbit } from '../support/orbits';
import { anAccount, signedIn, testApp, type TestApp } from '../support/test-app';
import { startWorker, type WorkerProcess } from '../support/worker-process';

let t: TestApp;
let member: ReturnType<typeof request.agent>;
const workers: WorkerProcess[] = [];
beforeEach(async () => {
  t = await testApp();
  await installSystems(t.dependencies.db);
  member = await signedIn(t.app, await anAccount());
});
afterEach(async () => {
  await Promise.all(workers.splice(0).map((worker) => worker.kill()));
  await t.close();
});

const start = (): WorkerProcess => {
  const worker = startWorker(t.database.url);
  workers.push(worker);
  return worker;
};
const ask = async (body: object): Promise<string> =>
  (await member.post('/api/v1/checks').send(body).expect(202)).body.id;

/** The check, as soon as it is in that state; the wait is reported when it takes too long. */
async function until(id: string, state: string, seconds: number): Promise<{ check: OrbitCheck; waited: number }> {
  const begun = Date.now();
  for (;;) {
    const check = await OrbitCheck.findByPk(id, { rejectOnEmpty: true });
    const waited = (Date.now() - begun) / 1000;
    if (check.state === state) return { check, waited };
    if (waited > seconds)
      throw new Error(`${check.state} after ${waited} s. ${workers.map((w) => w.log()).join('\n')}`);
    await new Promise((resolve) => setTimeout(resolve, 100));
  }
}

const jobs = async (): Promise<{ attempts: number; locked_by: string | null }[]> =>
  (
    await t.dependencies.pool.query(
      `select attempts, locked_by from graphile_worker.jobs where task_identifier = 'check-orbit'`,
    )
  ).rows;

// A second of computing on a quiet machine is several on a busy one: this one always outlasts what happens to it.
const long = slowOrbit({ period: '300' });

/** Workers start slowly on a busy machine, and a dead one is noticed only after a while. */
jest.setTimeout(180_000);

describe('a worker', () => {
  it('is what readiness waits for, and leaves nothing behind when it is stopped', async () => {
    expect(await readiness(t.dependencies.db, { demo: false, demoEntries: false })).toEqual(['no worker is alive']);
    const worker = start();
    await until(await ask(lorenzOrbit()), 'done', 60);
    expect(await readiness(t.dependencies.db, { demo: false, demoEntries: false })).toEqual([]);
    expect(await worker.stop()).toBe(0);
    expect(await readiness(t.dependencies.db, { demo: false, demoEntries: false })).toEqual(['no worker is alive']);
    expect(await jobs()).toEqual([]);
  });

  it('gives a running check back within seconds when it is stopped, and the next one does it', async () => {
    const worker = start();
    const id = await ask(slowOrbit());
    await until(id, 'running', 60);
    const begun = Date.now();
    expect(await worker.stop()).toBe(0);
    expect(Date.now() - begun).toBeLessThan(12_000);
    expect(await OrbitCheck.findByPk(id)).toMatchObject({ state: 'queued', attempts: 0 });
    expect(await jobs()).toMatchObject([{ attempts: 0, locked_by: null }]);
    // What is computed next is short, so that the test need not wait for the limit of time.
    await OrbitCheck.update({ body: long }, { where: { id } });
    start();
    const { check } = await until(id, 'done', 60);
    expect(check.attempts).toBe(1);
    expect(await CheckReport.count({ where: { checkId: id } })).toBe(1);
  });

  it('that is killed in mid-check has its job done by the next within a minute', async () => {
    const first = start();
    const id = await ask(long);
    await until(id, 'running', 60);
    await first.kill();
    expect(await OrbitCheck.findByPk(id)).toMatchObject({ state: 'running', attempts: 1 });
    start();
    const { check, waited } = await until(id, 'done', 60);
    expect(check.attempts).toBe(2);
    expect(waited).toBeLessThan(60);
    expect(await CheckReport.count({ where: { checkId: id } })).toBe(1);
  });
});

describe('a check that ends every worker', () => {
  it('has failed after three tries, and says what happened', async () => {
    const { db, pool } = t.dependencies;
    const id = await ask(lorenzOrbit());
    await OrbitCheck.update({ state: 'running', attempts: TRIES }, { where: { id } });
    await pool.query(
      `update graphile_worker._private_jobs set attempts = max_attempts, locked_by = 'dead', locked_at = now() - interval '1 minute'`,
    );
    await takeOverJobs({ db, publicUrl: 'https://orbits.example' });
    const res = await member.get(`/api/v1/checks/${id}`);
    expect(res.body).toMatchObject({ checkState: 'failed', failure: { attempts: TRIES }, verdict: null });
    expect(res.body.failure.message).toContain('worker');
  });
});
