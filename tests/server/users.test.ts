import { Op } from 'sequelize';
import request from 'supertest';
import { User } from '@/server/models/user';
import { anAccount, signedIn, testApp, type TestApp } from '../support/test-app';

let t: TestApp;
beforeAll(async () => void (t = await testApp()));
afterAll(() => t.close());

const lowerAllBut = (...kept: User[]): Promise<unknown> =>
  User.update({ role: 'curator' }, { where: { role: 'administrator', id: { [Op.notIn]: kept.map(({ id }) => id) } } });

describe('administration', () => {
  it('lists accounts by name, page after page', async () => {
    const administrator = await anAccount('administrator', { name: ' the first' });
    const agent = await signedIn(t.app, administrator);
    await anAccount('reader', { name: 'Élise Ünal' });
    const seen: string[] = [];
    for (let address: string | null = '/api/v1/users?limit=3'; address;) {
      const res = await agent.get(address);
      expect(res.status).toBe(200);
      seen.push(...res.body.items.map(({ id }: { id: string }) => id));
      if (res.body.next) expect(res.headers['link']).toContain(`after=${res.body.next}`);
      address = res.body.next && `/api/v1/users?limit=3&after=${res.body.next}`;
    }
    expect(seen).toHaveLength(await User.count());
    expect(new Set(seen).size).toBe(seen.length);
    expect(seen[0]).toBe(administrator.id);
  });

  it('sets a role, which ends the sign-ins of that account and of no other', async () => {
    const agent = await signedIn(t.app, await anAccount('administrator'));
    const user = await anAccount();
    const theirs = await signedIn(t.app, user);
    const other = await signedIn(t.app, await anAccount());

    const res = await agent.patch(`/api/v1/users/${user.id}`).send({ role: 'curator' });
    expect([res.status, res.body.role]).toEqual([200, 'curator']);
    expect((await theirs.get('/api/v1/session')).body.user).toBeNull();
    expect((await theirs.get('/api/v1/users')).body.code).toBe('session-expired');
    expect((await other.get('/api/v1/session')).body.user).not.toBeNull();
  });

  it('keeps the last administrator', async () => {
    const last = await anAccount('administrator');
    await lowerAllBut(last);
    const agent = await signedIn(t.app, last);
    const res = await agent.patch(`/api/v1/users/${last.id}`).send({ role: 'reader' });
    expect([res.status, res.body.code]).toEqual([409, 'last-administrator']);
    await last.reload();
    expect(last.role).toBe('administrator');
  });

  it('does not let two administrators lower each other at once', async () => {
    const [a, b] = [await anAccount('administrator'), await anAccount('administrator')];
    await lowerAllBut(a, b);
    const [agentA, agentB] = [await signedIn(t.app, a), await signedIn(t.app, b)];
    const answers = await Promise.all([
      agentA.patch(`/api/v1/users/${b.id}`).send({ role: 'reader' }),
      agentB.patch(`/api/v1/users/${a.id}`).send({ role: 'reader' }),
    ]);
    expect(answers.filter(({ status }) => status === 200)).toHaveLength(1);
    expect(await User.count({ where: { role: 'administrator' } })).toBe(1);
  });

  it.each<[string, string, object, number]>([
    ['an id that is nobody’s', '00000000-0000-4000-8000-000000000000', { role: 'reader' }, 404],
    ['an id that is no id', 'abc', { role: 'reader' }, 404],
    ['a role nobody has', '00000000-0000-4000-8000-000000000000', { role: 'owner' }, 400],
  ])('refuses %s', async (_, id, body, status) => {
    await User.update({ role: 'administrator' }, { where: { role: 'administrator' } });
    const agent = await signedIn(t.app, await anAccount('administrator'));
    expect((await agent.patch(`/api/v1/users/${id}`).send(body)).status).toBe(status);
  });

  it('is for administrators only', async () => {
    const agent = await signedIn(t.app, await anAccount('curator'));
    expect((await agent.get('/api/v1/users')).status).toBe(403);
    expect((await request(t.app).get('/api/v1/users')).body.code).toBe('not-signed-in');
  });

  it('refuses a change that another site sends with the cookie', async () => {
    const administrator = await anAccount('administrator');
    const agent = await signedIn(t.app, administrator);
    const res = await agent
      .patch(`/api/v1/users/${administrator.id}`)
      .set('Origin', 'https://evil.example')
      .send({ role: 'reader' });
    expect([res.status, res.body.code]).toEqual([403, 'cross-site']);
  });
});
