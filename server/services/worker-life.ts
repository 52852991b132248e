import { hostname } from 'node:os';
import { QueryTypes, type Sequelize } from 'sequelize';
import { ENGINE_VERSION } from '@/server/checks/engine-version';
import { OrbitCheck } from '@/server/models/orbit-check';
import { TRIES } from '@/server/services/check-limits';
import type { Desk } from '@/server/services/desk';
import { failCheck } from '@/server/services/run-check';
import { failRefinement } from '@/server/services/run-refinement';

/** A worker tells this often that it lives. */
export const BEAT_EVERY_MS = 3_000;
/** A worker that has been silent for so long counts as dead. */
export const DEAD_AFTER_SECONDS = 12;

/** Tell that a worker lives, and under which names it takes jobs. */
export async function beat(db: Sequelize, worker: { id: string; queueIds: readonly string[] }): Promise<void> {
  await db.query(
    `insert into worker (id, queue_ids, host, process_id, engine_version) values ($1, $2, $3, $4, $5)
     on conflict (id) do update set beat_at = now(), queue_ids = excluded.queue_ids`,
    { bind: [worker.id, worker.queueIds, hostname(), process.pid, ENGINE_VERSION] },
  );
}

/** Forget a worker that ends in order: it holds no jobs any more. */
export async function leave(db: Sequelize, id: string): Promise<void> {
  await db.query('delete from worker where id = $1', { bind: [id] });
}

/**
 * Give the jobs of dead workers to the living, and give up checks and refinements whose tries are used up.
 *
 * A job locked under a name that no living worker goes by belonged to one that died.
 *
 * @returns how many names were freed.
 */
export async function takeOverJobs(desk: Desk): Promise<number> {
  const { db } = desk;
  await db.query('delete from worker where beat_at < now() - make_interval(secs => $1)', {
    bind: [DEAD_AFTER_SECONDS],
  });
  const [freed] = await db.query<{ names: string[] | null }>(
    `with dead as (
       select distinct j.locked_by as name from graphile_worker.jobs j
       where j.locked_by is not null and j.locked_at < now() - make_interval(secs => $1)
         and not exists (select 1 from worker w where j.locked_by = any(w.queue_ids)))
     select array_agg(name) as names from dead`,
    { bind: [DEAD_AFTER_SECONDS], type: QueryTypes.SELECT },
  );
  const names = freed?.names ?? [];
  if (names.length > 0) await db.query('select graphile_worker.force_unlock_workers($1)', { bind: [names] });
  await giveUpChecks(desk);
  await giveUpRefinements(db);
  return names.length;
}

/** Checks that nobody will try again: each try ended the process that made it. */
async function giveUpChecks(desk: Desk): Promise<void> {
  const lost = await desk.db.query(
    `select c.* from orbit_check c
     where c.state in ('queued', 'running') and not exists (
       select 1 from graphile_worker.jobs j
       where j.key = c.id and (j.locked_at is not null or j.attempts < j.max_attempts))`,
    { model: OrbitCheck, mapToModel: true },
  );
  for (const check of lost) {
    await failCheck(desk, check, `The worker ended during the check, ${TRIES} times in a row.`);
  }
}

/** Refinements that nobody will try again, for the same reason. */
async function giveUpRefinements(db: Sequelize): Promise<void> {
  const lost = await db.query<{ id: string }>(
    `select r.id from refinement r
     where r.state in ('queued', 'running') and not exists (
       select 1 from graphile_worker.jobs j
       where j.key = r.id::text and (j.locked_at is not null or j.attempts < j.max_attempts))`,
    { type: QueryTypes.SELECT },
  );
  for (const refinement of lost) {
    await failRefinement(refinement, `The worker ended during the computation, ${TRIES} times in a row.`);
  }
}
