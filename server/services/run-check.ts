import { QueryTypes, type Sequelize, type Transaction } from 'sequelize';
import type { Check, CheckReport } from '@/schemas/generated/contract';
import type { CheckProgress } from '@/server/checks/check-progress';
import { CheckReport as CheckReportRow } from '@/server/models/check-report';
import type { EventKind } from '@/server/models/event';
import { OrbitCheck } from '@/server/models/orbit-check';
import { Submission } from '@/server/models/submission';
import { changeReviewState } from '@/server/services/change-review-state';
import { CHECK_CHANNEL } from '@/server/services/check-watch';
import type { Desk } from '@/server/services/desk';
import { PRIORITY } from '@/server/services/check-limits';
import { queueCheck } from '@/server/services/enqueue-check';

/**
 * Mark a check as running.
 *
 * @returns null when it is over already, or gone.
 */
export async function beginCheck(db: Sequelize, id: string): Promise<OrbitCheck | null> {
  const [check] = await db.query(
    `update orbit_check set state = 'running', attempts = attempts + 1, progress = null,
       started_at = coalesce(started_at, now())
     where id = $1 and state in ('queued', 'running') returning *`,
    { bind: [id], model: OrbitCheck, mapToModel: true },
  );
  if (check) await tell(db, id);
  return check ?? null;
}

/** Note how far a running check has come, and tell those who watch. */
export async function noteProgress(db: Sequelize, id: string, progress: CheckProgress): Promise<void> {
  await db.query(`update orbit_check set progress = $2 where id = $1 and state = 'running'`, {
    bind: [id, JSON.stringify(shownProgress(progress))],
  });
  await tell(db, id);
}

/** Store a report, once: of two workers that finish the same check, the first counts. */
export function finishCheck(
  desk: Desk,
  check: OrbitCheck,
  { report, computeMs }: { report: CheckReport; computeMs: number },
): Promise<void> {
  return desk.db.transaction(async (transaction) => {
    const change = { state: 'done', computeMs, engineVersion: report.engine.version } as const;
    if (!(await endCheck(desk.db, check, change, transaction))) return;
    await CheckReportRow.create(
      {
        checkId: check.id,
        report,
        verdict: report.verdict,
        blocked: report.findings.some(({ severity }) => severity === 'blocker'),
        engineVersion: report.engine.version,
      },
      { transaction },
    );
    await noteOnSubmission(desk, check, 'checked', transaction);
  });
}

/** Give a check up after a crash of the machinery, and say what happened. */
export function failCheck(desk: Desk, check: OrbitCheck, failure: string): Promise<void> {
  return desk.db.transaction(async (transaction) => {
    const change = { state: 'failed', failure } as const;
    if (await endCheck(desk.db, check, change, transaction)) {
      await noteOnSubmission(desk, check, 'check-failed', transaction);
    }
  });
}

/** Put a check back into the queue as if it had not been begun: the process that ran it ends. */
export async function giveBackCheck(db: Sequelize, { id, submissionId, ownerId }: OrbitCheck): Promise<void> {
  await db.transaction(async (transaction) => {
    const [, count] = await db.query(
      `update orbit_check set state = 'queued', attempts = attempts - 1, progress = null
       where id = $1 and state = 'running'`,
      { bind: [id], type: QueryTypes.UPDATE, transaction },
    );
    if (count === 0) return;
    const ofSomebody = submissionId === null ? PRIORITY.check : PRIORITY.submission;
    await queueCheck(db, { id, priority: ownerId === null ? PRIORITY.withoutAccount : ofSomebody }, transaction);
  });
  await tell(db, id);
}

type Ending = { state: 'done'; computeMs: number; engineVersion: string } | { state: 'failed'; failure: string };

/** Whether this call ended the check; false when it was over before. */
async function endCheck(db: Sequelize, check: OrbitCheck, ending: Ending, transaction: Transaction): Promise<boolean> {
  const [ended] = await OrbitCheck.update(
    { ...ending, progress: null, finishedAt: new Date() },
    { where: { id: check.id, state: ['queued', 'running'] }, transaction },
  );
  if (ended > 0) await tell(db, check.id, transaction);
  return ended > 0;
}

async function noteOnSubmission(
  desk: Desk,
  check: OrbitCheck,
  kind: EventKind,
  transaction: Transaction,
): Promise<void> {
  if (check.submissionId === null) return;
  const submission = await Submission.findByPk(check.submissionId, {
    rejectOnEmpty: true,
    lock: transaction.LOCK.UPDATE,
    transaction,
  });
  await changeReviewState(desk, submission, { kind, actorId: null, checkId: check.id }, transaction);
}

/** Tell those who watch the check; within a transaction they hear it when that is through. */
async function tell(db: Sequelize, id: string, transaction: Transaction | null = null): Promise<void> {
  await db.query('select pg_notify($1, $2)', { bind: [CHECK_CHANNEL, id], transaction });
}

/** Progress in the words of the contract. */
const shownProgress = ({ phase, time, period, returns }: CheckProgress): Check['progress'] => ({
  phase: phase === 'measuring' ? 'multipliers' : phase,
  time,
  period,
  returns,
});
