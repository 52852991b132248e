import request from 'supertest';
import type { Submission as Shown } from '@/schemas/generated/contract';
import { formErrors } from '@/server/http/form-errors';
import { Event } from '@/server/models/event';
import { OrbitCheck } from '@/server/models/orbit-check';
import { Submission } from '@/server/models/submission';
import { SubmissionRevision } from '@/server/models/submission-revision';
import type { User } from '@/server/models/user';
import { installSystems } from '@/server/demo/install-systems';
import { lorenzOrbit } from '../support/orbits';
import { anAccount, signedIn, testApp, type TestApp } from '../support/test-app';

type Agent = ReturnType<typeof request.agent>;

let t: TestApp;
let owner: User;
let mine: Agent;
let stranger: Agent;
let curator: Agent;
beforeAll(async () => {
  t = await testApp();
  await installSystems(t.dependencies.db);
  owner = await anAccount('contributor', { name: 'Ada Owner' });
  mine = await signedIn(t.app, owner);
  stranger = await signedIn(t.app, await anAccount('contributor'));
  curator = await signedIn(t.app, await anAccount('curator', { name: 'Cora Curator' }));
});
afterAll(() => t.close());

const PATH = '/api/v1/submissions';
const draft = async (body: object = lorenzOrbit()): Promise<Shown> =>
  (await mine.post(PATH).send(body).expect(201)).body;
const sent = (body: object = lorenzOrbit()): Promise<Shown> => draft({ ...body, send: true });
const kinds = (shown: Shown): string[] => shown.events.map(({ kind }) => kind);

describe('a draft', () => {
  it('is kept exactly as typed, unfinished as it is', async () => {
    const typed = '{"system":"lorenz","point":[1.50,"", 27.0],"period":1.55865221071617472,"half":{"b":1,"a":2}}';
    const res = await mine.post(PATH).type('json').send(typed);
    expect(res.status).toBe(201);
    expect(res.headers['location']).toBe(`${PATH}/${res.body.id}`);
    expect(formErrors('submission', res.body)).toEqual([]);
    expect(res.body).toMatchObject({ reviewState: 'draft', checkState: 'none', turn: 'contributor', isMine: true });
    expect(JSON.stringify(res.body.body)).toBe(
      '{"system":"lorenz","point":["1.50","","27.0"],"period":"1.55865221071617472","half":{"b":1,"a":2}}',
    );
    const [row] = (
      await t.dependencies.pool.query('select body::text as text from submission_revision where submission_id = $1', [
        res.body.id,
      ])
    ).rows;
    expect(row.text).toBe(JSON.stringify(res.body.body));
  });

  it('is changed under its ETag, and a run of edits is one line of its history', async () => {
    const { id } = await draft();
    let { etag } = (await mine.get(`${PATH}/${id}`)).headers;
    for (const note of ['a', 'ab', 'abc']) {
      const res = await mine.patch(`${PATH}/${id}`).set('If-Match', etag!).send({ note });
      expect([res.status, res.body.body.note]).toEqual([200, note]);
      expect(res.headers['etag']).not.toBe(etag);
      etag = res.headers['etag'];
    }
    const shown: Shown = (await mine.get(`${PATH}/${id}`)).body;
    expect(kinds(shown)).toEqual(['created', 'edited']);
    expect(shown.revision).toBe(1);
  });

  it('asks for If-Match, and tells what happened meanwhile', async () => {
    const { id } = await sent();
    const before = (await mine.get(`${PATH}/${id}`)).headers['etag']!;
    expect((await mine.patch(`${PATH}/${id}`).send({ note: 'x' })).body.code).toBe('precondition-required');
    await curator.post(`${PATH}/${id}/comments`).send({ text: 'Where from?' }).expect(200);
    const res = await mine.patch(`${PATH}/${id}`).set('If-Match', before).send({ note: 'x' });
    expect([res.status, res.body.code]).toEqual([412, 'precondition-failed']);
    expect(res.body.meanwhile).toMatchObject({ reviewState: 'submitted', revision: 1 });
    expect(res.body.meanwhile.events).toMatchObject([
      { kind: 'commented', who: 'Cora Curator', comment: 'Where from?' },
    ]);
    const now = res.body.meanwhile.etag;
    expect((await mine.patch(`${PATH}/${id}`).set('If-Match', now).send(lorenzOrbit())).status).toBe(200);
  });

  it('answers 304 for what the client has', async () => {
    const { id } = await draft();
    const { etag } = (await mine.get(`${PATH}/${id}`)).headers;
    expect((await mine.get(`${PATH}/${id}`).set('If-None-Match', etag!)).status).toBe(304);
  });

  it('that cannot be sent says why and stays a draft', async () => {
    const { id } = await draft({ system: 'lorenz', section: 'z-27', point: ['1', ''], period: '-1' });
    const form = await mine.post(`${PATH}/${id}/send`);
    expect([form.status, form.body.code]).toEqual([422, 'invalid-content']);
    expect(form.body.errors[0].pointer).toBe('/point/1');
    expect(await Submission.findByPk(id)).toMatchObject({ reviewState: 'draft', sentAt: null });
    expect(await OrbitCheck.count({ where: { submissionId: id } })).toBe(0);
  });

  it('is created once under an Idempotency-Key', async () => {
    const post = (): request.Test => mine.post(PATH).set('Idempotency-Key', 'draft-1').send({ note: 'once' });
    const [first, second] = [await post(), await post()];
    expect(second.body.id).toBe(first.body.id);
    expect((await mine.post(PATH).set('Idempotency-Key', 'draft-1').send({ note: 'twice' })).status).toBe(422);
  });
});

describe('sending', () => {
  it.each<[string, object, [status: number, code: string, pointer: string]]>([
    ['a member of the wrong form', { point: 'no list' }, [400, 'invalid-body', '/point']],
    ['a member nobody knows', { colour: 'red' }, [400, 'invalid-body', '/colour']],
    ['a system nobody defined', { system: 'nowhere' }, [422, 'unknown-system', '/system']],
    ['a coordinate too few', { point: ['1', '2'] }, [422, 'invalid-content', '/point']],
    ['a period of zero', { period: '0' }, [422, 'invalid-content', '/period']],
  ])('%s is refused, and nothing is stored half', async (_, change, [status, code, pointer]) => {
    const count = async (): Promise<number[]> => [
      await Submission.count(),
      await SubmissionRevision.count(),
      await OrbitCheck.count(),
      await Event.count(),
    ];
    const before = await count();
    const res = await mine.post(PATH).send({ ...lorenzOrbit(), ...change, send: true });
    expect([res.status, res.body.code, res.body.errors[0].pointer]).toEqual([status, code, pointer]);
    expect(await count()).toEqual(before);
  });

  it('starts the check of exactly this revision, and is the machine’s turn', async () => {
    const shown = await sent();
    expect(shown).toMatchObject({ reviewState: 'submitted', checkState: 'queued', turn: 'machine', revision: 1 });
    expect(kinds(shown)).toEqual(['created', 'sent']);
    expect(await OrbitCheck.findByPk(shown.check!)).toMatchObject({ submissionId: shown.id, revision: 1 });
    expect('send' in shown.body).toBe(false);
  });

  it('twice at once sends once', async () => {
    const { id } = await draft();
    const answers = await Promise.all([1, 2].map(() => mine.post(`${PATH}/${id}/send`)));
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
    expect(await OrbitCheck.count({ where: { submissionId: id } })).toBe(1);
  });

  it('can be taken back to a draft while nobody has claimed it; what was sent stays', async () => {
    const { id } = await sent();
    const res = await mine
      .patch(`${PATH}/${id}`)
      .set('If-Match', '*')
      .send({ ...lorenzOrbit(), note: 'better' });
    expect(res.body).toMatchObject({ reviewState: 'draft', revision: 2, checkState: 'none' });
    expect(kinds(res.body)).toEqual(['created', 'sent', 'pulled-back']);
    expect(res.body.revisions.map((r: { body: { note?: string } }) => r.body.note)).toEqual([undefined, 'better']);
    await curator.post(`${PATH}/${(await sent()).id}/claim`).expect(200);
    const claimed = await sent();
    await curator.post(`${PATH}/${claimed.id}/claim`).expect(200);
    const refused = await mine.patch(`${PATH}/${claimed.id}`).set('If-Match', '*').send(lorenzOrbit());
    expect([refused.status, refused.body.code]).toEqual([409, 'wrong-state']);
  });
});

describe('who sees a submission', () => {
  it('its owner and curators; to others it does not exist, whatever they try', async () => {
    const { id, check } = await sent();
    expect((await mine.get(`${PATH}/${id}`)).status).toBe(200);
    expect((await curator.get(`${PATH}/${id}`)).body).toMatchObject({ isMine: false });
    expect((await request(t.app).get(`${PATH}/${id}`)).status).toBe(401);
    const tries = [
      stranger.get(`${PATH}/${id}`),
      stranger.patch(`${PATH}/${id}`).send({}),
      stranger.post(`${PATH}/${id}/send`),
      stranger.post(`${PATH}/${id}/claim`),
      stranger.post(`${PATH}/${id}/decision`).send({ decision: 'accept' }),
      stranger.post(`${PATH}/${id}/withdraw`),
      stranger.post(`${PATH}/${id}/recheck`),
      stranger.post(`${PATH}/${id}/comments`).send({ text: 'x' }),
      stranger.get(`/api/v1/checks/${check}`),
      request(t.app).get(`/api/v1/checks/${check}`),
      stranger.get(`${PATH}/00000000-0000-4000-8000-000000000000`),
      stranger.get(`${PATH}/abc`),
    ];
    for (const res of await Promise.all(tries)) expect([res.status, res.body.code]).toEqual([404, 'not-found']);
    expect((await mine.get(`/api/v1/checks/${check}`)).status).toBe(200);
    expect((await curator.get(`/api/v1/checks/${check}`)).status).toBe(200);
  });

  it('curators change nothing of what is another’s', async () => {
    const { id } = await draft();
    for (const res of [
      await curator.patch(`${PATH}/${id}`).set('If-Match', '*').send({}),
      await curator.post(`${PATH}/${id}/send`),
      await curator.post(`${PATH}/${id}/withdraw`),
    ]) {
      expect(res.status).toBe(404);
    }
  });

  it('an expired sign-in is told, and nothing is changed', async () => {
    const agent = await signedIn(t.app, owner);
    const { id } = await draft();
    await t.dependencies.pool.query(`update session set expire = now() - interval '1 hour'`);
    const res = await agent.post(`${PATH}/${id}/send`);
    expect([res.status, res.body.code]).toEqual([401, 'session-expired']);
    expect(await Submission.findByPk(id)).toMatchObject({ reviewState: 'draft' });
    await t.dependencies.pool.query(`update session set expire = now() + interval '1 hour'`);
  });
});

describe('withdrawing', () => {
  it('is for the owner, until it is decided, and for ever', async () => {
    const { id } = await sent();
    await curator.post(`${PATH}/${id}/claim`).expect(200);
    const res = await mine.post(`${PATH}/${id}/withdraw`).send({ comment: 'Found a slip.' });
    expect(res.body).toMatchObject({ reviewState: 'withdrawn', claim: null, turn: null });
    expect(res.body.events.at(-1)).toMatchObject({ kind: 'withdrawn', comment: 'Found a slip.', who: 'Ada Owner' });
    for (const again of [
      await mine.post(`${PATH}/${id}/withdraw`),
      await mine.post(`${PATH}/${id}/send`),
      await curator.post(`${PATH}/${id}/claim`),
      await mine.post(`${PATH}/${id}/recheck`),
    ]) {
      expect([again.status, again.body.code]).toEqual([409, 'wrong-state']);
    }
  });
});

describe('the lists', () => {
  it('give mine, newest change first, page by page', async () => {
    const person = await anAccount();
    const agent = await signedIn(t.app, person);
    const ids: string[] = [];
    for (let i = 0; i < 5; i += 1) ids.unshift((await agent.post(PATH).send({ note: `${i}` })).body.id);
    const pages = [];
    let next: string | null = '';
    while (next !== null) {
      const res: request.Response = await agent.get(PATH).query({ limit: 2, ...(next ? { after: next } : {}) });
      expect(formErrors('submission-page', res.body)).toEqual([]);
      expect(res.body.total).toEqual({ value: 5, relation: 'exact' });
      expect(res.body.turns).toEqual({ curator: 0, contributor: 5, machine: 0 });
      next = res.body.next;
      expect(res.headers['link'] === undefined).toBe(next === null);
      pages.push(res.body.items.map(({ id }: Shown) => id));
    }
    expect(pages).toEqual([ids.slice(0, 2), ids.slice(2, 4), ids.slice(4)]);
  });

  it('give curators what is to review, and nobody else', async () => {
    const { id } = await sent();
    const hidden = await draft();
    const ids: string[] = (await curator.get(PATH).query({ queue: 'review', limit: 200 })).body.items.map(
      (item: Shown) => item.id,
    );
    expect(ids).toContain(id);
    expect(ids).not.toContain(hidden.id);
    expect((await mine.get(PATH).query({ queue: 'review' })).status).toBe(403);
    expect((await request(t.app).get(PATH)).status).toBe(401);
  });

  it.each([{ queue: 'all' }, { limit: '0' }, { after: 'zzz' }, { colour: 'red' }])('refuse %j', async (query) => {
    expect((await mine.get(PATH).query(query)).body.code).toBe('invalid-query');
  });
});

it('readers submit nothing', async () => {
  const reader = await signedIn(t.app, await anAccount('reader'));
  expect((await reader.post(PATH).send(lorenzOrbit())).body.code).toBe('not-allowed');
});
