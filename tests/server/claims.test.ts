import type request from 'supertest';
import type { Submission as Shown } from '@/schemas/generated/contract';
import { installSystems } from '@/server/demo/install-systems';
import { Submission } from '@/server/models/submission';
import { expireClaims } from '@/server/services/expire-claims';
import { lorenzOrbit } from '../support/orbits';
import { anAccount, signedIn, testApp, type TestApp } from '../support/test-app';

type Agent = ReturnType<typeof request.agent>;

let t: TestApp;
let mine: Agent;
let curator: Agent;
let other: Agent;
beforeAll(async () => {
  t = await testApp();
  await installSystems(t.dependencies.db);
  mine = await signedIn(t.app, await anAccount('contributor', { name: 'Ada Owner' }));
  curator = await signedIn(t.app, await anAccount('curator', { name: 'Cora Curator' }));
  other = await signedIn(t.app, await anAccount('curator', { name: 'Otto Other' }));
});
afterAll(() => t.close());

const PATH = '/api/v1/submissions';
const sent = async (): Promise<Shown> =>
  (
    await mine
      .post(PATH)
      .send({ ...lorenzOrbit(), send: true })
      .expect(201)
  ).body;
const kinds = (shown: Shown): string[] => shown.events.map(({ kind }) => kind);

describe('claims', () => {
  it('are leases of half an hour, renewed by activity, and reading claims nothing', async () => {
    const { id } = await sent();
    const before = (await curator.get(`${PATH}/${id}`)).headers['etag'];
    expect((await curator.get(`${PATH}/${id}`)).headers['etag']).toBe(before);
    const claimed = await curator.post(`${PATH}/${id}/claim`);
    expect(claimed.body).toMatchObject({ reviewState: 'in-review', claim: { by: 'Cora Curator', byMe: true } });
    const minutes = (Date.parse(claimed.body.claim.until) - Date.now()) / 60_000;
    expect(minutes).toBeGreaterThan(29);
    expect(minutes).toBeLessThanOrEqual(30);
    await Submission.update({ claimedUntil: new Date(Date.now() + 60_000) }, { where: { id } });
    const after = await curator.post(`${PATH}/${id}/comments`).send({ text: 'Looking at it.' });
    expect(Date.parse(after.body.claim.until) - Date.now()).toBeGreaterThan(29 * 60_000);
    expect((await mine.get(`${PATH}/${id}`)).body.claim).toMatchObject({ by: 'Cora Curator', byMe: false });
  });

  it('keep others off until they are taken over, which is logged, or given up', async () => {
    const { id } = await sent();
    await curator.post(`${PATH}/${id}/claim`).expect(200);
    for (const refused of [
      await other.post(`${PATH}/${id}/claim`),
      await other.delete(`${PATH}/${id}/claim`),
      await other
        .post(`${PATH}/${id}/decision`)
        .set('If-Match', '*')
        .send({ decision: 'return', reason: 'out-of-scope', comment: 'No.' }),
    ]) {
      expect([refused.status, refused.body.code]).toEqual([409, 'claimed-by-another']);
      expect(refused.body.detail).toContain('Cora Curator');
    }
    expect((await other.post(`${PATH}/${id}/claim`).send({ takeOver: true })).body.claim.by).toBe('Otto Other');
    const released = await other.delete(`${PATH}/${id}/claim`);
    expect(released.body).toMatchObject({ reviewState: 'submitted', claim: null });
    expect(kinds(released.body)).toEqual(['created', 'sent', 'claimed', 'taken-over', 'released']);
  });

  it('end by themselves', async () => {
    const { id } = await sent();
    await curator.post(`${PATH}/${id}/claim`).expect(200);
    await Submission.update({ claimedUntil: new Date(Date.now() - 1_000) }, { where: { id } });
    expect((await other.get(`${PATH}/${id}`)).body.claim).toBeNull();
    await expireClaims({ db: t.dependencies.db, publicUrl: 'https://orbits.example' });
    const shown: Shown = (await other.get(`${PATH}/${id}`)).body;
    expect(shown.reviewState).toBe('submitted');
    expect(shown.events.at(-1)).toMatchObject({ kind: 'claim-expired', who: null });
  });

  it('of an ended lease pass to the next curator who asks', async () => {
    const { id } = await sent();
    await curator.post(`${PATH}/${id}/claim`).expect(200);
    await Submission.update({ claimedUntil: new Date(Date.now() - 1_000) }, { where: { id } });
    const res = await other.post(`${PATH}/${id}/claim`);
    expect(res.body.claim.by).toBe('Otto Other');
    expect(kinds(res.body)).toEqual(['created', 'sent', 'claimed', 'claim-expired', 'claimed']);
  });

  it('are not for one’s own, whatever the role', async () => {
    const both = await anAccount('curator');
    const agent = await signedIn(t.app, both);
    const { body } = await agent.post(PATH).send({ ...lorenzOrbit(), send: true });
    const res = await agent.post(`${PATH}/${body.id}/claim`);
    expect([res.status, res.body.code]).toEqual([403, 'own-submission']);
  });
});
