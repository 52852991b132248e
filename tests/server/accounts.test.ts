import request from 'supertest';
import { createMailer, type Mailer } from '@/server/mail/mailer';
import type { ReadableMail } from '@/server/mail/read-mail';
import { User } from '@/server/models/user';
import { newestMail } from '../support/mail';
import { anAccount, PASSWORD, signedIn, testApp, type TestApp } from '../support/test-app';

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

const mailTo = (address: string): Promise<ReadableMail | undefined> => newestMail(t, mailer, address);
const tokenOf = (mail: ReadableMail | undefined): string => /token=([\w-]+)/.exec(mail?.text ?? '')?.[1] ?? 'none';
const post = (path: string, body: object): request.Test => request(t.app).post(`/api/v1${path}`).send(body);

describe('registering', () => {
  it('mails a link that makes the account a contributor', async () => {
    const email = 'Ilse.Novák@orbits.example'.replace('á', 'a');
    const res = await post('/users', { name: 'Ilse Novák', email, password: PASSWORD });
    expect(res.status).toBe(202);

    const early = await post('/session', { email, password: PASSWORD });
    expect([early.status, early.body.code]).toEqual([403, 'not-confirmed']);

    const mail = await mailTo(email.toLowerCase());
    expect(mail?.subject).toBe('Confirm your address');
    expect(mail?.text).toContain('Hello Ilse Novák');
    const token = tokenOf(mail);
    expect((await post('/users/confirm', { token })).status).toBe(200);
    expect((await post('/users/confirm', { token })).body.code).toBe('invalid-token');

    const session = await post('/session', { email, password: PASSWORD });
    expect(session.status).toBe(200);
    expect(session.body.user).toMatchObject({ name: 'Ilse Novák', role: 'contributor', confirmed: true });
  });

  it('answers the same for an address that has an account, and tells its owner by mail', async () => {
    const known = await anAccount('contributor', { email: 'known@orbits.example' });
    const free = await post('/users', { name: 'X', email: 'free@orbits.example', password: PASSWORD });
    const taken = await post('/users', {
      name: 'Somebody else',
      email: 'known@orbits.example',
      password: 'another password',
    });
    expect([taken.status, taken.body]).toEqual([free.status, free.body]);

    const mail = await mailTo(known.email);
    expect(mail?.subject).toBe('You have an account already');
    expect(mail?.text).not.toContain('Somebody else');
    await known.reload();
    expect(known.name).toBe('A contributor');
    expect((await post('/session', { email: known.email, password: PASSWORD })).status).toBe(200);
  });

  it('makes one account of two registrations at once', async () => {
    const body = { name: 'Twice', email: 'twice@orbits.example', password: PASSWORD };
    const answers = await Promise.all([post('/users', body), post('/users', body)]);
    expect(answers.map(({ status }) => status)).toEqual([202, 202]);
    expect(await User.count({ where: { email: body.email } })).toBe(1);
  });

  it('repeats the answer for the same Idempotency-Key, and refuses another body under it', async () => {
    const body = { name: 'Once', email: 'once@orbits.example', password: PASSWORD };
    const send = (more: object): request.Test => post('/users', { ...body, ...more }).set('Idempotency-Key', 'key-1');
    const first = await send({});
    const again = await send({});
    const other = await send({ name: 'Other' });
    expect([again.status, again.body]).toEqual([first.status, first.body]);
    expect(again.headers['idempotency-replayed']).toBe('true');
    expect([other.status, other.body.code]).toEqual([422, 'idempotency-key-reused']);
  });

  it.each<[string, object, [number, string, string], string]>([
    ['a password over 72 bytes', { password: 'é'.repeat(40) }, [422, 'password-too-long', '/password'], '72 bytes'],
    ['a password over 72 characters', { password: 'x'.repeat(100) }, [400, 'invalid-body', '/password'], '72'],
    ['a short password', { password: 'short' }, [400, 'invalid-body', '/password'], 'at least 12'],
    ['no e-mail address', { email: 'nobody' }, [400, 'invalid-body', '/email'], 'not an e-mail address'],
    ['an empty name', { name: '' }, [400, 'invalid-body', '/name'], 'is empty'],
    ['a role', { role: 'administrator' }, [400, 'invalid-body', '/role'], 'is not known here'],
  ])('refuses %s and stores nothing', async (_, change, expected, reason) => {
    const before = await User.count();
    const res = await post('/users', { name: 'N', email: 'n@orbits.example', password: PASSWORD, ...change });
    expect([res.status, res.body.code, res.body.errors[0].pointer]).toEqual(expected);
    expect(res.body.detail).toContain(reason);
    expect(await User.count()).toBe(before);
  });
});

describe('signing in', () => {
  it('sets a cookie that scripts cannot read and other sites do not send', async () => {
    const user = await anAccount();
    const res = await post('/session', { email: user.email.toUpperCase(), password: PASSWORD });
    const cookie = String(res.headers['set-cookie']);
    expect(cookie).toMatch(/^ritornel\.sign-in=/);
    expect(cookie).toContain('HttpOnly');
    expect(cookie).toContain('SameSite=Lax');
    expect(cookie).not.toContain('Secure');
    expect(res.body.user.email).toBe(user.email);
    expect(JSON.stringify(res.body)).not.toContain('$2');
  });

  it('begins a new session, so that one planted before is worth nothing', async () => {
    const user = await anAccount();
    const agent = await signedIn(t.app, user);
    const before = (await agent.get('/api/v1/session')).body.user.id;
    const again = await agent.post('/api/v1/session').send({ email: user.email, password: PASSWORD });
    const { rows } = await t.dependencies.pool.query(
      `select sid from session where sess -> 'passport' ->> 'user' = $1`,
      [before],
    );
    expect(rows).toHaveLength(1);
    expect(decodeURIComponent(String(again.headers['set-cookie']))).toContain(rows[0].sid);
  });

  it('does not tell an unknown address from a wrong password', async () => {
    const user = await anAccount();
    const wrong = await post('/session', { email: user.email, password: 'not the password' });
    const unknown = await post('/session', { email: 'nobody@orbits.example', password: 'not the password' });
    expect(wrong.status).toBe(401);
    expect({ ...unknown.body, instance: '' }).toEqual({ ...wrong.body, instance: '' });
  });

  it('refuses a password that matches in its first 72 bytes only', async () => {
    const user = await anAccount();
    const res = await post('/session', { email: user.email, password: PASSWORD + 'x'.repeat(72) });
    expect([res.status, res.body.code]).toEqual([422, 'password-too-long']);
  });

  it('counts failures, not successes, and says how long to wait', async () => {
    const user = await anAccount();
    const attempt = (password: string): request.Test => post('/session', { email: user.email, password });
    for (let n = 0; n < 12; n += 1) expect((await attempt(PASSWORD)).status).toBe(200);
    for (let n = 0; n < 10; n += 1) expect((await attempt('not the password')).status).toBe(401);
    const res = await attempt(PASSWORD);
    expect([res.status, res.body.code]).toEqual([429, 'too-many-sign-ins']);
    expect(Number(res.headers['retry-after'])).toBeGreaterThan(0);
    expect(res.body.detail).toContain('10 in 15 minutes');
  });

  it('answers who am I, and after signing out that nobody is', async () => {
    const user = await anAccount('curator');
    const agent = await signedIn(t.app, user);
    expect((await agent.get('/api/v1/session')).body).toEqual({
      user: expect.objectContaining({ id: user.id, role: 'curator' }),
      waiting: 0,
      digest: true,
      development: true,
    });
    expect((await agent.delete('/api/v1/session')).status).toBe(204);
    expect((await agent.get('/api/v1/session')).body.user).toBeNull();
    expect((await agent.get('/api/v1/users')).body.code).toBe('not-signed-in');
  });

  it('says that a sign-in has expired', async () => {
    const user = await anAccount('administrator');
    const agent = await signedIn(t.app, user);
    await t.dependencies.pool.query(
      `update session set expire = now() - interval '1 minute' where sess -> 'passport' ->> 'user' = $1`,
      [user.id],
    );
    const res = await agent.get('/api/v1/users');
    expect([res.status, res.body.code]).toEqual([401, 'session-expired']);
    expect((await agent.get('/api/v1/session')).body.user).toBeNull();
  });

  it('marks the cookie Secure where people come through https', async () => {
    const secure = await testApp({ publicUrl: 'https://orbits.example' });
    try {
      const user = await anAccount();
      const res = await request(secure.app).post('/api/v1/session').send({ email: user.email, password: PASSWORD });
      expect(String(res.headers['set-cookie'])).toContain('Secure');
    } finally {
      await secure.close();
      User.define(t.dependencies.db);
    }
  });
});

describe('a forgotten password', () => {
  it('is replaced through a link that works once, and ends every sign-in', async () => {
    const user = await anAccount();
    const agent = await signedIn(t.app, user);
    const asked = await post('/password/forgot', { email: user.email });
    const unknown = await post('/password/forgot', { email: 'nobody@orbits.example' });
    expect([asked.status, asked.body]).toEqual([unknown.status, unknown.body]);
    expect(asked.status).toBe(202);

    const token = tokenOf(await mailTo(user.email));
    const tooLong = await post('/password/reset', { token, password: 'é'.repeat(40) });
    expect(tooLong.body.code).toBe('password-too-long');
    expect((await post('/password/reset', { token, password: 'quite another password' })).status).toBe(200);
    expect((await post('/password/reset', { token, password: 'a third password' })).body.code).toBe('invalid-token');

    expect((await agent.get('/api/v1/session')).body.user).toBeNull();
    expect((await post('/session', { email: user.email, password: PASSWORD })).status).toBe(401);
    expect((await post('/session', { email: user.email, password: 'quite another password' })).status).toBe(200);
    expect((await mailTo(user.email))?.subject).toBe('Your password was changed');
  });

  it('keeps only a hash of the token, and refuses it when it has expired', async () => {
    const user = await anAccount();
    await post('/password/forgot', { email: user.email });
    const token = tokenOf(await mailTo(user.email));
    const { rows } = await t.dependencies.pool.query('select * from one_time_token');
    expect(JSON.stringify(rows)).not.toContain(token);
    await t.dependencies.pool.query(`update one_time_token set expires_at = now() - interval '1 second'`);
    const res = await post('/password/reset', { token, password: 'quite another password' });
    expect([res.status, res.body.code]).toEqual([422, 'invalid-token']);
  });

  it('takes about as long for an unknown address as for a known one', async () => {
    const user = await anAccount();
    const timeOf = async (email: string): Promise<number> => {
      const begin = performance.now();
      await post('/password/forgot', { email });
      return performance.now() - begin;
    };
    const known = await timeOf(user.email);
    const unknown = await timeOf('nobody@orbits.example');
    // Both wait for the same floor; without it the unknown address answers several times as fast.
    expect(Math.max(known, unknown) / Math.min(known, unknown)).toBeLessThan(3);
  });
});
