import type request from 'supertest';
import { sendDigests } from '@/server/services/send-digests';
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
  jobs = await startJobs(t);
  contributor = await signedIn(t.app, await anAccount('contributor', { name: 'Ada' }));
  curator = await signedIn(t.app, await anAccount('curator', { name: 'Cora', email: 'cora@orbits.example' }));
});
afterAll(async () => {
  await jobs.stop();
  await t.close();
});

async function submit(agent: Agent, code: string): Promise<number> {
  const { body } = await agent
    .post('/api/v1/submissions')
    .send({ ...lorenzOrbit(code), send: true })
    .expect(201);
  for (let i = 0; i < 600; i += 1) {
    if ((await agent.get(`/api/v1/submissions/${body.id}`)).body.checkState === 'done') return body.number;
    await new Promise((resolve) => setTimeout(resolve, 50));
  }
  throw new Error('the check did not end');
}

const send = (now?: Date): Promise<number> =>
  sendDigests({ db: t.dependencies.db, publicUrl: 'https://orbits.example' }, now);
const mails = async (): Promise<{ recipient: string; subject: string; body: string }[]> =>
  (
    await t.dependencies.pool.query(
      `select recipient, subject, body from outgoing_mail where subject like '%for a curator' order by created_at`,
    )
  ).rows;
const HOUR = 3_600_000;
const later = (hours: number): Date => new Date(Date.now() + hours * HOUR);

describe('the daily mail to curators', () => {
  it('is not sent while nothing waits', async () => {
    expect(await send()).toBe(0);
  });

  it('names what is new, with how many wait, to curators alone', async () => {
    const first = await submit(contributor, 'AB');
    const second = await submit(contributor, 'AAB');
    expect(await send()).toBe(1);
    const [mail] = await mails();
    expect(mail).toMatchObject({ recipient: 'cora@orbits.example', subject: '2 new submissions wait for a curator' });
    expect(mail!.body).toContain(`  ${first}  lorenz\n  ${second}  lorenz`);
    expect(mail!.body).toContain('2 wait in all');
    expect(mail!.body).toContain('https://orbits.example/desk');
  });

  it('comes at most once a day, and then tells only what was not told before', async () => {
    const third = await submit(contributor, 'ABB');
    expect(await send(later(12))).toBe(0);
    expect(await send(later(24))).toBe(1);
    const mail = (await mails()).at(-1);
    expect(mail).toMatchObject({ subject: 'A new submission waits for a curator' });
    expect(mail!.body).toContain(`:\n\n  ${third}  lorenz\n\n`);
    expect(mail!.body).toContain('3 wait in all');
    expect(await send(later(48))).toBe(0);
  });

  it('leaves out what a curator sent', async () => {
    const otto = await signedIn(t.app, await anAccount('curator', { name: 'Otto', email: 'otto@orbits.example' }));
    const own = await submit(otto, 'AAAB');
    expect(await send(later(30))).toBe(1);
    const mail = (await mails()).at(-1);
    expect(mail).toMatchObject({ recipient: 'otto@orbits.example', subject: '3 new submissions wait for a curator' });
    expect(mail!.body).not.toContain(`  ${own}  `);
  });

  it('can be turned off, by curators for themselves', async () => {
    const quiet = await signedIn(t.app, await anAccount('curator', { name: 'Quinn', email: 'quinn@orbits.example' }));
    const { body } = await quiet.patch('/api/v1/session').send({ digest: false }).expect(200);
    expect(body).toMatchObject({ digest: false, user: { name: 'Quinn' } });
    expect((await quiet.get('/api/v1/session')).body.digest).toBe(false);
    expect(await send(later(30))).toBe(0);
    await quiet.patch('/api/v1/session').send({ digest: true }).expect(200);
    expect(await send(later(30))).toBe(1);
    expect((await mails()).at(-1)).toMatchObject({ recipient: 'quinn@orbits.example' });
  });

  it('is nobody else’s to choose', async () => {
    expect((await contributor.get('/api/v1/session')).body.digest).toBeNull();
    expect((await contributor.patch('/api/v1/session').send({ digest: true })).body.code).toBe('not-allowed');
    expect((await curator.patch('/api/v1/session').send({ digest: 'no' })).status).toBe(400);
  });
});
