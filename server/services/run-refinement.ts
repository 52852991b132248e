import { QueryTypes, type Sequelize, type Transaction } from 'sequelize';
import type { RefinementObstacle } from '@/schemas/generated/contract';
import { ENGINE_VERSION } from '@/server/checks/engine-version';
import { Orbit } from '@/server/models/orbit';
import { OrbitRevision } from '@/server/models/orbit-revision';
import { Refinement } from '@/server/models/refinement';
import { systemVersion } from '@/server/services/known-system';
import { queueRefinementJob } from '@/server/services/queue-refinement';
import type { RefineOutcome, RefineTask } from '@/server/services/refiner';
import { reviseEntry } from '@/server/services/revise-entry';

/**
 * Mark a refinement as running.
 *
 * @returns null when it is over already.
 */
export async function beginRefinement(db: Sequelize, id: string): Promise<Refinement | null> {
  const [refinement] = await db.query(
    `update refinement set state = 'running', attempts = attempts + 1, started_at = coalesce(started_at, now())
     where id = $1 and state in ('queued', 'running') returning *`,
    { bind: [id], model: Refinement, mapToModel: true },
  );
  return refinement ?? null;
}

/**
 * What has to be computed: from the figures of the current revision, so that of a family the member is found that the
 * entry is about, in the version of the system that it is about.
 */
export async function refineTask(db: Sequelize, { orbitNumber, digits, seconds }: Refinement): Promise<RefineTask> {
  const orbit = await Orbit.findByPk(orbitNumber, { rejectOnEmpty: true });
  const where = { orbitNumber, revision: orbit.revision };
  const current = await OrbitRevision.findOne({ where, rejectOnEmpty: true });
  const { checked } = await systemVersion(db, orbit.systemId, orbit.systemVersion);
  const { submitted, point, period, crossings } = current.content;
  return {
    document: checked.document,
    claim: { ...submitted, parameters: orbit.parameters },
    orbit: { point, period, crossings: crossings.map((crossing) => ({ point: crossing.point })) },
    ...{ digits, seconds },
  };
}

/** Store how a refinement ended, once: of two workers that finish the same one, the first counts. */
export function finishRefinement(
  db: Sequelize,
  refinement: Refinement,
  { result, computeMs }: RefineOutcome,
): Promise<void> {
  return db.transaction(async (transaction) => {
    const { orbitNumber, digits } = refinement;
    const lock = transaction.LOCK.UPDATE;
    const orbit = await Orbit.findByPk(orbitNumber, { rejectOnEmpty: true, lock, transaction });
    if (!(await isUnderWay(refinement, transaction))) return;
    const end = result.ok ? await reviseEntry(db, { orbit, digits, result }, transaction) : result;
    const ending = typeof end === 'number' ? { revision: end } : { reason: end.reason, message: end.message };
    await refinement.update(
      { state: 'done', ...ending, computeMs, engineVersion: ENGINE_VERSION, finishedAt: new Date() },
      { transaction },
    );
    if (typeof end === 'number' || end.reason === 'withdrawn') return;
    const obstacle: RefinementObstacle = { digits, reason: end.reason, message: end.message };
    await orbit.update({ obstacle }, { transaction });
  });
}

async function isUnderWay({ id }: Refinement, transaction: Transaction): Promise<boolean> {
  const state = ['queued', 'running'];
  return (await Refinement.count({ where: { id, state }, transaction })) > 0;
}

/** Give a refinement up after a crash of the machinery, and say what happened. */
export async function failRefinement({ id }: Pick<Refinement, 'id'>, failure: string): Promise<void> {
  await Refinement.update(
    { state: 'failed', failure, finishedAt: new Date() },
    { where: { id, state: ['queued', 'running'] } },
  );
}

/** Put a refinement back into the queue as if it had not been begun: the process that ran it ends. */
export async function giveBackRefinement(db: Sequelize, refinement: Refinement): Promise<void> {
  await db.transaction(async (transaction) => {
    const [, count] = await db.query(
      `update refinement set state = 'queued', attempts = attempts - 1 where id = $1 and state = 'running'`,
      { bind: [refinement.id], type: QueryTypes.UPDATE, transaction },
    );
    if (count > 0) await queueRefinementJob(db, refinement, transaction);
  });
}
