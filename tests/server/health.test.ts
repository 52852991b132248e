import { randomUUID } from 'node:crypto';
import request from 'supertest';
import { migrateDown } from '@/server/migrate';
import { migrations } from '@/migrations';
import { testApp, type TestApp } from '../support/test-app';

let t: TestApp;
beforeEach(async () => void (t = await testApp()));
afterEach(() => t.close());

const ready = (): request.Test => request(t.app).get('/readyz');
const aWorker = (age: string): Promise<unknown> =>
  t.dependencies.pool.query(
    `insert into worker (id, host, process_id, engine_version, beat_at) values ($1, 'h', 1, 'e', now() - $2::interval)`,
    [randomUUID(), age],
  );

describe('/readyz', () => {
  it('is ready with a live worker', async () => {
    await aWorker('1 second');
    const res = await ready();
    expect([res.status, res.body]).toEqual([200, { status: 'ready' }]);
  });

  it.each([['1 hour'], [null]])('is not ready with a worker last heard of %s ago', async (age) => {
    if (age) await aWorker(age);
    const res = await ready();
    expect([res.status, res.body.code]).toEqual([503, 'not-ready']);
    expect(res.body.detail).toContain('no worker is alive');
  });

  it('is not ready before the migrations ran', async () => {
    await migrateDown({ url: t.database.url, ownerUrl: t.database.ownerUrl }, migrations, 1);
    expect((await ready()).body.detail).toContain('1 migrations have not run');
    await migrateDown({ url: t.database.url, ownerUrl: t.database.ownerUrl }, migrations);
    expect((await ready()).status).toBe(503);
  });

  it('waits for demo content where it is asked for', async () => {
    await t.close();
    t = await testApp({ demo: true, demoEntries: true });
    await aWorker('1 second');
    const { detail } = (await ready()).body;
    expect(detail).toContain('0 of 3 demo accounts');
    expect(detail).toMatch(/0 of \d+ demo orbits/);
  });
});

it('/healthz answers while the database is away', async () => {
  await t.dependencies.pool.end();
  t.dependencies.pool.end = () => Promise.resolve();
  expect((await request(t.app).get('/healthz')).status).toBe(200);
});

it('/metrics counts requests and work', async () => {
  await request(t.app).get('/healthz');
  await request(t.app).get('/api/v1/nothing');
  const { text } = await request(t.app).get('/metrics');
  expect(text).toContain('ritornel_http_requests_total{status="2xx"} 1\n');
  expect(text).toContain('ritornel_http_requests_total{status="4xx"} 1\n');
  expect(text).toContain('ritornel_workers_alive 0\n');
  expect(text).toMatch(/process_resident_memory_bytes \d+\n/);
});
