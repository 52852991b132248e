import request from 'supertest';
import { createMailer, type Mailer } from '@/server/mail/mailer';
import { User } from '@/server/models/user';
import { outboxKey } from '@/server/routes/outbox';
import { newestMail, sendWaitingMail } from '../support/mail';
import { anAccount, PASSWORD, testApp, type TestApp } from '../support/test-app';

let t: TestApp;
let mailer: Mailer;

beforeAll(async () => {
  t = await testApp();
  mailer = createMailer(t.dependencies.config);
});
afterAll(async () => {
  await mailer.close();
  await t.close();
});

const post = (path: string, body: object): request.Test => request(t.app).post(`/api/v1${path}`).send(body);

describe('the outbox', () => {
  it('shows mails to whoever holds the key, as text', async () => {
    const key = outboxKey(t.dependencies.config.stateFolder);
    await post('/users', { name: '<b>Bold</b> & "quoted"', email: 'bold@orbits.example', password: PASSWORD });
    await sendWaitingMail(t, mailer);
    const page = await request(t.app).get(`/outbox?key=${key}`);
    expect(page.status).toBe(200);
    expect(page.type).toBe('text/html');
    expect(page.text).toContain('&lt;b&gt;Bold&lt;/b&gt; &amp; &quot;quoted&quot;');
    expect(page.text).not.toContain('<b>');
    const list = await request(t.app).get(`/outbox.json?key=${key}`);
    expect(list.body.items[0].to).toBe('bold@orbits.example');
  });

  it.each(['', '?key=', '?key=wrong', '?key=a&key=b'])('is not there with "%s"', async (query) => {
    expect((await request(t.app).get(`/outbox${query}`)).status).toBe(404);
    expect((await request(t.app).get(`/outbox.json${query}`)).status).toBe(404);
  });

  it('is not there in production', async () => {
    const production = await testApp({ production: true });
    try {
      const key = outboxKey(production.dependencies.config.stateFolder);
      expect((await request(production.app).get(`/outbox?key=${key}`)).status).toBe(404);
    } finally {
      await production.close();
      User.define(t.dependencies.db);
    }
  });
});

it('sends a mail again when the mail server was away', async () => {
  const away = createMailer({ ...t.dependencies.config, smtpUrl: 'smtp://127.0.0.1:9' });
  const user = await anAccount();
  await post('/password/forgot', { email: user.email });
  await sendWaitingMail(t, away);
  await away.close();
  const waiting = `select sent_at from outgoing_mail where recipient = $1`;
  expect((await t.dependencies.pool.query(waiting, [user.email])).rows).toEqual([{ sent_at: null }]);

  await t.dependencies.pool.query('update graphile_worker._private_jobs set run_at = now()');
  expect((await newestMail(t, mailer, user.email))?.subject).toBe('Set a new password');
  expect((await t.dependencies.pool.query(waiting, [user.email])).rows[0].sent_at).not.toBeNull();
});
