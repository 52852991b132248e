import { installSystems } from '@/server/demo/install-systems';
import { CheckReport } from '@/server/models/check-report';
import { Event } from '@/server/models/event';
import { OrbitCheck } from '@/server/models/orbit-check';
import { Submission } from '@/server/models/submission';
import { SubmissionRevision } from '@/server/models/submission-revision';
import { createSubmission } from '@/server/services/create-submission';
import { enqueueCheck } from '@/server/services/enqueue-check';
import { finishCheck } from '@/server/services/run-check';
import { type JobRunner, startJobs } from '../../support/job-runner';
import { lorenzOrbit, pendulumDocument } from '../../support/orbits';
import { anAccount, testApp, type TestApp } from '../../support/test-app';

let t: TestApp;
let jobs: JobRunner | null = null;
beforeEach(async () => {
  t = await testApp();
  await installSystems(t.dependencies.db);
});
afterEach(async () => {
  await jobs?.stop();
  jobs = null;
  await t.close();
});

const desk = () => ({ db: t.dependencies.db, publicUrl: 'https://orbits.example' });

async function until(id: string, state: string): Promise<OrbitCheck> {
  for (;;) {
    const check = await OrbitCheck.findByPk(id, { rejectOnEmpty: true });
    if (check.state === state) return check;
    await new Promise((resolve) => setTimeout(resolve, 100));
  }
}

describe('the check job', () => {
  it('gives up after three tries when the machinery breaks, and says what happened', async () => {
    const { id: accountId } = await anAccount();
    // Nobody can ask for this: a section of another system, which the validation before the queue refuses.
    const body = { system: pendulumDocument, section: 'z-27', point: ['0', '1'], period: '6' };
    const check = await t.dependencies.db.transaction((transaction) =>
      enqueueCheck(t.dependencies.db, { requester: { accountId }, body, system: null }, transaction),
    );
    jobs = await startJobs(t);
    expect(await until(check.id, 'failed')).toMatchObject({
      attempts: 3,
      failure: expect.stringContaining('The system has no section z-27'),
    });
    expect(await CheckReport.count()).toBe(0);
  });

  it('takes what people wait for before what curators wait for, and visitors last', async () => {
    const owner = await anAccount();
    const requesters = [{ addressHash: 'visitor' }, { accountId: owner.id }] as const;
    await createSubmission(desk(), owner, { body: { ...lorenzOrbit() }, send: { formErrors: () => [] } });
    for (const requester of requesters) {
      await t.dependencies.db.transaction((transaction) =>
        enqueueCheck(
          t.dependencies.db,
          {
            requester,
            body: { ...lorenzOrbit(), system: pendulumDocument, section: { formula: 'x' }, point: ['0', '1'] },
            system: null,
          },
          transaction,
        ),
      );
    }
    const order = await t.dependencies.pool.query<{ kind: string }>(
      `select case when c.submission_id is not null then 'submission' when c.owner_id is null then 'visitor' else 'check' end as kind
       from graphile_worker.jobs j join orbit_check c on c.id = j.key order by j.priority, j.run_at, j.id`,
    );
    expect(order.rows.map(({ kind }) => kind)).toEqual(['check', 'submission', 'visitor']);
  });

  it('stores one report when two workers finish the same check', async () => {
    const owner = await anAccount();
    const id = await createSubmission(desk(), owner, {
      body: { ...lorenzOrbit() },
      send: { formErrors: () => [] },
    });
    jobs = await startJobs(t);
    const queued = await OrbitCheck.findOne({ where: { submissionId: id }, rejectOnEmpty: true });
    const check = await until(queued.id, 'done');
    const { report } = await CheckReport.findByPk(check.id, { rejectOnEmpty: true });
    await finishCheck(desk(), check, { report, computeMs: 1 });
    expect(await CheckReport.count()).toBe(1);
    expect(await Event.count({ where: { kind: 'checked' } })).toBe(1);
    expect(await Submission.count()).toBe(1);
    expect(await SubmissionRevision.count()).toBe(1);
  });
});
