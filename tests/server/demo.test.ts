import { readFileSync, statSync } from 'node:fs';
import { join } from 'node:path';
import request from 'supertest';
import { demoOrbits } from '@/server/demo/demo-orbits';
import { demoScenario } from '@/server/demo/demo-scenario';
import type { InstallTools } from '@/server/demo/demo-tools';
import { installContent } from '@/server/demo/install-content';
import { installSystems } from '@/server/demo/install-systems';
import { Orbit } from '@/server/models/orbit';
import { OrbitCheck } from '@/server/models/orbit-check';
import { Submission } from '@/server/models/submission';
import { System } from '@/server/models/system';
import { SystemVersion } from '@/server/models/system-version';
import { User } from '@/server/models/user';
import { checkPassword } from '@/server/services/check-password';
import { builtInSystems } from '@/server/systems/built-in-systems';
import { caseRequest } from '@/tests/reference/case-request';
import { loadCases } from '@/tests/reference/load-cases';
import { type JobRunner, startJobs } from '../support/job-runner';
import { testApp, type TestApp } from '../support/test-app';

let t: TestApp;
let jobs: JobRunner;
beforeAll(async () => {
  t = await testApp({ demo: true, demoEntries: true });
  jobs = await startJobs(t);
});
afterAll(async () => {
  await jobs.stop();
  await t.close();
});

/** Eighty checks on a busy machine. */
jest.setTimeout(300_000);

const tools = (change: Partial<InstallTools> = {}): InstallTools => {
  const { config, db, tracer, checks, log } = t.dependencies;
  const desk = { db, publicUrl: config.publicUrl };
  return { config, desk, tracer, checks, log, signal: new AbortController().signal, ...change };
};

describe('the built-in systems', () => {
  it('are in place once, in the order of the list', async () => {
    await installSystems(t.dependencies.db);
    const systems = await System.findAll({ order: [['position', 'ASC']] });
    expect(systems.map(({ slug }) => slug)).toEqual(builtInSystems.map(({ slug }) => slug));
    expect(await SystemVersion.count()).toBe(builtInSystems.length);
  });

  it('get a next version when their document has changed, and the old one stays', async () => {
    const older = { ...builtInSystems.at(-1)!, summary: 'An older text.' };
    await System.update({ slug: 'kepler-old' }, { where: { slug: 'kepler' } });
    const id = await t.dependencies.db.transaction(async (transaction) => {
      const system = await System.create({ slug: 'kepler' }, { transaction });
      await SystemVersion.create({ systemId: system.id, version: 1, document: older }, { transaction });
      return system.id;
    });
    await installSystems(t.dependencies.db);
    const versions = await SystemVersion.findAll({ where: { systemId: id }, order: [['version', 'ASC']] });
    expect(versions.map(({ document }) => document.summary)).toEqual([older.summary, builtInSystems.at(-1)!.summary]);
    expect((await System.findByPk(id))!.currentVersion).toBe(2);
  });
});

describe('the demo', () => {
  it('goes on where an interrupted start left off, and is complete after the next', async () => {
    const stop = new AbortController();
    const first = installContent(tools({ signal: stop.signal }));
    while ((await Orbit.count()) < 3) await new Promise((resolve) => setTimeout(resolve, 50));
    stop.abort();
    await first;
    const half = await Orbit.count();
    expect(half).toBeLessThan(demoOrbits.length);
    await installContent(tools());
    expect(await Orbit.count()).toBe(demoOrbits.length);
    expect(await Submission.count({ where: { reviewState: 'accepted' } })).toBe(demoOrbits.length);
  });

  it('came in as everybody’s orbits do: checked, and accepted by somebody else', async () => {
    const contributor = await User.byEmail(demoScenario.people.contributor.email);
    const curator = await User.byEmail(demoScenario.people.curator.email);
    for (const orbit of await Orbit.findAll()) {
      expect([orbit.contributorId, orbit.curatorId]).toEqual([contributor!.id, curator!.id]);
      const checks = await OrbitCheck.findAll({ where: { submissionId: orbit.submissionId } });
      expect(checks.some(({ state }) => state === 'done')).toBe(true);
    }
  });

  it('leaves work on the desk', async () => {
    const states = (await Submission.findAll()).map(({ reviewState }) => reviewState);
    expect(states).toEqual(expect.arrayContaining(['draft', 'submitted', 'returned']));
  });

  it('is what the duplicates among the published cases are recognised against', async () => {
    const duplicates = loadCases().filter(({ expect: { reason } }) => reason === 'duplicate');
    expect(duplicates.length).toBeGreaterThan(0);
    for (const one of duplicates) {
      const res = await request(t.app).post('/api/v1/checks').set('Prefer', 'wait=60').send(caseRequest(one).body);
      expect(res.body.findings.map(({ code }: { code: string }) => code)).toEqual(['already-known']);
      const [match] = res.body.matches;
      const entry = await request(t.app).get(`/api/v1/orbits/${match.accession}`);
      // The case names the orbit that it repeats: lorenz-AAB, lorenz-AAAAB.
      expect(`lorenz-${entry.body.itinerary}`).toBe(one.duplicate_of);
    }
  });

  it('changes nothing when it is there', async () => {
    const before = [await Submission.count(), await OrbitCheck.count(), await Orbit.count()];
    await installContent(tools());
    expect([await Submission.count(), await OrbitCheck.count(), await Orbit.count()]).toEqual(before);
  });

  it('keeps its random passwords where only their owner reads', async () => {
    const file = join(t.dependencies.config.stateFolder, 'demo-accounts.json');
    expect(statSync(file).mode & 0o777).toBe(0o600);
    const accounts = JSON.parse(readFileSync(file, 'utf8'));
    expect(Object.keys(accounts)).toEqual(['contributor', 'curator', 'administrator']);
    for (const [role, { email, password }] of Object.entries<{ email: string; password: string }>(accounts)) {
      expect((await checkPassword(email, password)).role).toBe(role);
    }
  });

  it('has no place in production', async () => {
    const fresh = await testApp({ demo: true, demoEntries: true, production: true });
    const { config, db, tracer, checks, log } = fresh.dependencies;
    const desk = { db, publicUrl: config.publicUrl };
    await installContent({ config, desk, tracer, checks, log, signal: new AbortController().signal });
    const [found] = (await fresh.dependencies.pool.query('select count(*)::integer as n from account')).rows;
    expect(found.n).toBe(0);
    await fresh.close();
  });
});
