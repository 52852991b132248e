import request from 'supertest';
import { formErrors } from '@/server/http/form-errors';
import { type JobRunner, startJobs } from '../support/job-runner';
import { lorenzOrbit } from '../support/orbits';
import { anAccount, signedIn, testApp, type TestApp } from '../support/test-app';

type Agent = ReturnType<typeof request.agent>;

let t: TestApp;
let jobs: JobRunner;
/** Accessions by letters: x to -x, y to -y exchanges A and B, so AAB and ABB are images, and AB is its own. */
const accessions: Record<string, string> = {};

beforeAll(async () => {
  t = await testApp();
  jobs = await startJobs(t);
  const contributor = await signedIn(t.app, await anAccount('contributor'));
  const curator = await signedIn(t.app, await anAccount('curator'));
  // All are checked before one is accepted, so that no report knows of another.
  const ids: [code: string, id: string][] = [];
  for (const code of ['AB', 'AAB', 'ABB', 'AAAB']) ids.push([code, await checked(contributor, code)]);
  for (const [code, id] of ids) {
    const res = await curator
      .post(`/api/v1/submissions/${id}/decision`)
      .set('If-Match', '*')
      .send({ decision: 'accept' })
      .expect(200);
    accessions[code] = res.body.accession;
  }
});
afterAll(async () => {
  await jobs.stop();
  await t.close();
});

async function checked(agent: Agent, code: string): Promise<string> {
  const { body } = await agent
    .post('/api/v1/submissions')
    .send({ ...lorenzOrbit(code), send: true })
    .expect(201);
  for (let i = 0; i < 600; i += 1) {
    const shown = (await agent.get(`/api/v1/submissions/${body.id}`)).body;
    if (shown.checkState === 'done') return body.id;
    await new Promise((resolve) => setTimeout(resolve, 50));
  }
  throw new Error('the check did not end');
}

const imagesOf = async (code: string): Promise<unknown> =>
  (await request(t.app).get(`/api/v1/orbits/${accessions[code]}/images`).expect(200)).body.items;
const search = async (query: string): Promise<{ total: { value: number }; upToSymmetry: unknown }> => {
  const { body } = await request(t.app).get(`/api/v1/orbits?${query}`).expect(200);
  expect(formErrors('orbit-page', body)).toEqual([]);
  return body;
};

describe('images under a symmetry', () => {
  it('are named on both entries, whichever was accepted first', async () => {
    expect(await imagesOf('AAB')).toEqual([{ accession: accessions['ABB'], symmetry: 'half-turn' }]);
    expect(await imagesOf('ABB')).toEqual([{ accession: accessions['AAB'], symmetry: 'half-turn' }]);
  });

  it('are not seen in an orbit that is its own image, nor in one whose image is not in the catalogue', async () => {
    expect(await imagesOf('AB')).toEqual([]);
    expect(await imagesOf('AAAB')).toEqual([]);
  });

  it('count once beside the count of a search', async () => {
    expect(await search('system=lorenz')).toMatchObject({
      total: { value: 4 },
      upToSymmetry: { value: 3, symmetries: ['half-turn'] },
    });
  });

  it('count only where both are in the result', async () => {
    expect((await search('system=lorenz&itinerary=AAB')).upToSymmetry).toBeNull();
    expect((await search('system=lorenz&returns=2')).upToSymmetry).toBeNull();
    expect((await search('returns=3')).upToSymmetry).toBeNull();
  });
});
