import type request from 'supertest';
import type { CheckReport as Report, Submission as Shown, SubmissionBody } from '@/schemas/generated/contract';
import { formErrors } from '@/server/http/form-errors';
import { Crossing } from '@/server/models/crossing';
import { Orbit } from '@/server/models/orbit';
import { OrbitRevision } from '@/server/models/orbit-revision';
import { Reference } from '@/server/models/reference';
import { Submission } from '@/server/models/submission';
import { System } from '@/server/models/system';
import { SystemVersion } from '@/server/models/system-version';
import { type JobRunner, startJobs } from '../support/job-runner';
import { lorenzOrbit } from '../support/orbits';
import { anAccount, signedIn, testApp, type TestApp } from '../support/test-app';

type Agent = ReturnType<typeof request.agent>;

let t: TestApp;
let jobs: JobRunner;
let mine: Agent;
let curator: Agent;
let other: Agent;
beforeAll(async () => {
  t = await testApp();
  jobs = await startJobs(t);
  mine = await signedIn(t.app, await anAccount('contributor', { name: 'Ada Owner', email: 'ada@orbits.example' }));
  curator = await signedIn(t.app, await anAccount('curator', { name: 'Cora Curator' }));
  other = await signedIn(t.app, await anAccount('curator', { name: 'Otto Other' }));
});
afterAll(async () => {
  await jobs.stop();
  await t.close();
});

const PATH = '/api/v1/submissions';

async function untilChecked(id: string): Promise<Shown> {
  for (let i = 0; i < 600; i += 1) {
    const shown: Shown = (await mine.get(`${PATH}/${id}`)).body;
    if (shown.checkState !== 'queued' && shown.checkState !== 'running') return shown;
    await new Promise((resolve) => setTimeout(resolve, 50));
  }
  throw new Error('the check did not end');
}

const sent = async (body: SubmissionBody): Promise<Shown> =>
  untilChecked(
    (
      await mine
        .post(PATH)
        .send({ ...body, send: true })
        .expect(201)
    ).body.id,
  );
const decide = (agent: Agent, id: string, decision: object, seen = '*'): request.Test =>
  agent.post(`${PATH}/${id}/decision`).set('If-Match', seen).send(decision);
const mailTo = async (recipient: string): Promise<{ subject: string; body: string }[]> =>
  (
    await t.dependencies.pool.query(
      'select subject, body from outgoing_mail where recipient = $1 order by created_at',
      [recipient],
    )
  ).rows;

describe('accepting', () => {
  it('makes an entry of exactly what was checked', async () => {
    const body = lorenzOrbit('AB', {
      references: [{ citation: 'A paper, 2003', doi: '10.1234/example' }],
      note: 'First.',
    });
    const checked = await sent(body);
    expect(checked).toMatchObject({ checkState: 'done', verdict: 'closes', reportIsCurrent: true, turn: 'curator' });
    expect(formErrors('submission', checked)).toEqual([]);
    const res = await decide(curator, checked.id, { decision: 'accept', comment: 'Welcome.' });
    expect(res.status).toBe(200);
    expect(res.body).toMatchObject({
      reviewState: 'accepted',
      turn: null,
      claim: null,
      decision: { decision: 'accept', by: 'Cora Curator', comment: 'Welcome.' },
    });
    expect(res.body.events.map(({ kind }: { kind: string }) => kind)).toEqual([
      'created',
      'sent',
      'checked',
      'claimed',
      'accepted',
    ]);

    const orbit = await Orbit.findOne({ where: { accession: res.body.accession }, rejectOnEmpty: true });
    const report = checked.report as Report & { orbit: NonNullable<Report['orbit']> };
    expect(orbit).toMatchObject({
      returns: 2,
      stability: 'saddle',
      itinerary: 'AB',
      periodDigits: report.orbit.period,
    });
    expect(orbit.parameters).toEqual({ sigma: '10', rho: '28', beta: '8/3' });
    expect(orbit.parameterValues['beta']).toBe(8 / 3);
    expect(orbit.incipit.length).toBeGreaterThan(90);
    expect(orbit.incipit.at(-1)![0]).toBeCloseTo(1.55865, 5);
    const revision = await OrbitRevision.findOne({ where: { orbitNumber: orbit.number }, rejectOnEmpty: true });
    expect(revision.content.submitted).toEqual(body);
    expect(revision.content.point).toEqual(report.orbit.point);
    expect(revision.checkId).toBe(checked.check);
    expect(await Reference.findAll({ raw: true })).toMatchObject([
      { citation: 'A paper, 2003', doi: '10.1234/example' },
    ]);
    const crossings = await Crossing.findAll({ where: { orbitNumber: orbit.number }, order: [['position', 'ASC']] });
    expect(crossings.map(({ point }) => point.map(String))).toEqual(report.orbit.crossings.map(({ point }) => point));
    const entry = await mine.get(`/api/v1/orbits/${res.body.accession}`);
    expect(formErrors('entry', entry.body)).toEqual([]);

    const [mail] = await mailTo('ada@orbits.example');
    expect(mail!.subject).toContain(res.body.accession);
    expect(mail!.body).toContain('Welcome.');
  });

  it('takes an orbit once: the second is a blocker, and keeps from the queue', async () => {
    const again = await sent(lorenzOrbit('AB'));
    expect(again.report!.findings).toMatchObject([{ code: 'already-known', severity: 'blocker' }]);
    expect(again).toMatchObject({ blocked: true, turn: 'contributor' });
    const queue = await curator.get(PATH).query({ queue: 'review' });
    expect(queue.body.items.map(({ id }: Shown) => id)).not.toContain(again.id);
    const res = await decide(curator, again.id, { decision: 'accept' });
    expect([res.status, res.body.code]).toEqual([409, 'blocked-by-finding']);
    expect(await Submission.findByPk(again.id)).toMatchObject({ reviewState: 'submitted', claimedBy: null });
  });

  it('takes one of two submissions of the same orbit that were checked before either was accepted', async () => {
    const body = lorenzOrbit('AAB');
    const [first, second] = [await sent(body), await sent({ ...body, note: 'the same once more' })];
    const before = await Orbit.count();
    const answers = await Promise.all([
      decide(curator, first.id, { decision: 'accept' }),
      decide(other, second.id, { decision: 'accept' }),
    ]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
    expect(answers.find(({ status }) => status === 409)!.body.code).toBe('already-known');
    expect(await Orbit.count()).toBe(before + 1);
    // Its mirror image has the same period and is another orbit.
    const image = await sent(lorenzOrbit('ABB'));
    expect(image.report!.matches).toMatchObject([{ relation: 'symmetric-image', symmetry: 'half-turn' }]);
    expect((await decide(curator, image.id, { decision: 'accept' })).status).toBe(200);
  });

  it('by two curators at once happens once', async () => {
    const { id } = await sent(lorenzOrbit('AAAB'));
    const seen = (await curator.get(`${PATH}/${id}`)).headers['etag']!;
    const before = await Orbit.count();
    const answers = await Promise.all([
      decide(curator, id, { decision: 'accept' }, seen),
      decide(other, id, { decision: 'decline', reason: 'out-of-scope', comment: 'No.' }, seen),
    ]);
    expect(answers.filter(({ status }) => status === 200)).toHaveLength(1);
    const lost = answers.find(({ status }) => status !== 200)!;
    expect([409, 412]).toContain(lost.status);
    if (lost.status === 412) expect(lost.body.meanwhile.events.length).toBeGreaterThan(0);
    expect((await Orbit.count()) - before).toBe(answers[0].status === 200 ? 1 : 0);
    const late = await decide(other, id, { decision: 'return', reason: 'out-of-scope', comment: 'No.' });
    expect([late.status, late.body.code]).toEqual([409, 'already-decided']);
  });

  it('needs a report of the current version of the system; one button checks again', async () => {
    const { id } = await sent(lorenzOrbit('AABB'));
    const system = await System.findOne({ where: { slug: 'lorenz' }, rejectOnEmpty: true });
    const { document } = await SystemVersion.findOne({
      where: { systemId: system.id, version: 1 },
      rejectOnEmpty: true,
    });
    await SystemVersion.create({ systemId: system.id, version: 2, document: { ...document, summary: 'Newer.' } });
    await system.update({ currentVersion: 2 });
    expect((await mine.get(`${PATH}/${id}`)).body).toMatchObject({ checkState: 'stale', reportIsCurrent: false });
    const res = await decide(curator, id, { decision: 'accept' });
    expect([res.status, res.body.code]).toEqual([409, 'stale-check']);
    await curator.post(`${PATH}/${id}/recheck`).expect(200);
    expect(await untilChecked(id)).toMatchObject({ checkState: 'done', reportIsCurrent: true });
    expect((await decide(curator, id, { decision: 'accept' })).status).toBe(200);
    expect(await Orbit.findOne({ where: { submissionId: id } })).toMatchObject({ systemVersion: 2 });
  });

  it('needs a check', async () => {
    const { id } = (await mine.post(PATH).send(lorenzOrbit('ABBB'))).body;
    expect((await decide(curator, id, { decision: 'accept' })).body.code).toBe('wrong-state');
  });
});

describe('returning', () => {
  it('needs a reason and words, is mailed, and is sent again as the next revision', async () => {
    const { id } = await sent(lorenzOrbit('AAAAB'));
    for (const decision of [{ decision: 'return' }, { decision: 'decline', reason: 'out-of-scope', comment: '  ' }]) {
      const res = await decide(curator, id, decision);
      expect([res.status, res.body.code]).toEqual([422, 'invalid-content']);
    }
    expect(await Submission.findByPk(id)).toMatchObject({ reviewState: 'submitted', claimedBy: null });
    const comment = 'Say where it comes from.';
    const returned = await decide(curator, id, { decision: 'return', reason: 'description-lacking', comment });
    expect(returned.body).toMatchObject({ reviewState: 'returned', turn: 'contributor', revision: 1 });
    expect((await mailTo('ada@orbits.example')).at(-1)!.body).toContain(comment);

    const changed = await mine
      .patch(`${PATH}/${id}`)
      .set('If-Match', '*')
      .send(lorenzOrbit('AAAAB', { note: 'From the table.' }));
    expect(changed.body).toMatchObject({ reviewState: 'returned', revision: 2, checkState: 'none' });
    await mine.post(`${PATH}/${id}/send`).expect(200);
    const again = await untilChecked(id);
    expect(again).toMatchObject({ reviewState: 'submitted', revision: 2, decision: null, verdict: 'closes' });
    expect(again.revisions).toHaveLength(2);
    expect(again.revisions[0]!.check).not.toBe(again.revisions[1]!.check);
    expect(again.events.map(({ kind }) => kind)).toEqual(
      expect.arrayContaining(['returned', 'edited', 'sent', 'checked']),
    );
    expect((await decide(curator, id, { decision: 'accept' })).status).toBe(200);
  });
});

describe('the rights', () => {
  it('are tested before the version', async () => {
    const { id } = await sent(lorenzOrbit('AAABB'));
    const decision = { decision: 'decline', reason: 'out-of-scope', comment: 'No.' };
    const stranger = await signedIn(t.app, await anAccount());
    const post = (agent: Agent): request.Test => agent.post(`${PATH}/${id}/decision`).send(decision);
    expect((await post(stranger)).status).toBe(404);
    expect((await post(mine)).body.code).toBe('own-submission');
    expect((await post(curator)).body.code).toBe('precondition-required');
    const old = await decide(curator, id, decision, '"v1"');
    expect([old.status, old.body.meanwhile.events.length]).toEqual([412, 2]);
    expect(await Submission.findByPk(id)).toMatchObject({ reviewState: 'submitted' });
  });

  it('let no curator decide on their own', async () => {
    const agent = await signedIn(t.app, await anAccount('curator'));
    const { id } = (await agent.post(PATH).send({ ...lorenzOrbit('AABAB'), send: true })).body;
    const res = await decide(agent, id, { decision: 'accept' });
    expect([res.status, res.body.code]).toEqual([403, 'own-submission']);
    expect(await Orbit.count({ where: { submissionId: id } })).toBe(0);
  });
});

describe('comments', () => {
  it('are mailed to the other side and stay with the submission', async () => {
    const { id } = await sent(lorenzOrbit('ABABB'));
    await curator.post(`${PATH}/${id}/comments`).send({ text: 'Nice one.' }).expect(200);
    expect((await mailTo('ada@orbits.example')).at(-1)).toMatchObject({
      subject: expect.stringContaining('Cora Curator commented'),
    });
    const res = await mine.post(`${PATH}/${id}/comments`).send({ text: 'Thank you.' });
    expect(res.body.comments).toMatchObject([
      { who: 'Cora Curator', text: 'Nice one.' },
      { who: 'Ada Owner', text: 'Thank you.' },
    ]);
    expect((await mine.post(`${PATH}/${id}/comments`).send({ text: '' })).status).toBe(400);
  });
});
