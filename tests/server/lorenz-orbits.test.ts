import type request from 'supertest';
import { loadLorenzOrbits, type SectionOrbit } from '@/tests/reference/load-orbits';
import { lorenzBody } from '@/tests/reference/orbit-body';
import { type JobRunner, startJobs } from '../support/job-runner';
import { anAccount, signedIn, testApp, type TestApp } from '../support/test-app';

let t: TestApp;
let jobs: JobRunner;
beforeAll(async () => {
  t = await testApp();
  jobs = await startJobs(t);
});
afterAll(async () => {
  await jobs.stop();
  await t.close();
});

/** As many as an account may have under way. */
const AT_ONCE = 8;
/** Seven hundred checks on a busy machine. */
jest.setTimeout(600_000);

interface Miss {
  code: string;
  why: string;
}

/** What the report gets wrong about an orbit of the table; the limits are those that were promised. */
async function missOf(agent: ReturnType<typeof request.agent>, orbit: SectionOrbit): Promise<Miss[]> {
  const { code, n, period, logAbsMultipliers, signs } = orbit;
  const res = await agent.post('/api/v1/checks').set('Prefer', 'wait=60').send(lorenzBody(orbit));
  const found = res.body.orbit;
  if (res.status !== 200 || !found) return [{ code, why: `${res.status} ${JSON.stringify(res.body).slice(0, 300)}` }];
  const relative = (value: string, right: number): number => Math.abs(Number(value) / right - 1);
  // Twice the error of a logarithm near 30 in double precision is 1e-14: no limit here is near it.
  const multiplier = Number(signs[0]) * Math.exp(Number(logAbsMultipliers[0]));
  const wrong: [boolean, string][] = [
    [!['closes', 'closes-after-correction'].includes(res.body.verdict), `verdict ${res.body.verdict}`],
    [found.returns !== Number(n), `returns ${found.returns}`],
    [relative(found.period, Number(period)) > 1e-12, `period ${found.period}`],
    [relative(found.multipliers[0].re, multiplier) > 1e-8, `multiplier ${found.multipliers[0].re}, not ${multiplier}`],
    [found.itinerary !== code, `itinerary ${found.itinerary}`],
    [res.body.findings.some(({ severity }: { severity: string }) => severity === 'blocker'), 'a blocker'],
  ];
  return wrong.filter(([is]) => is).map(([, why]) => ({ code, why }));
}

describe('the 745 published Lorenz orbits of up to twelve returns', () => {
  it('all verify through POST /checks', async () => {
    const agent = await signedIn(t.app, await anAccount());
    const orbits = loadLorenzOrbits();
    expect(orbits).toHaveLength(745);
    const misses: Miss[] = [];
    let next = 0;
    const work = async (): Promise<void> => {
      for (let orbit = orbits[next++]; orbit; orbit = orbits[next++]) misses.push(...(await missOf(agent, orbit)));
    };
    await Promise.all(Array.from({ length: AT_ONCE }, work));
    expect(misses).toEqual([]);
  });
});
