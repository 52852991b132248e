import type { Sequelize } from 'sequelize';
import { ENGINE_VERSION } from '@/server/checks/engine-version';
import { TRIES } from '@/server/services/check-limits';
import { DIGITS_OF_EVERY_ENTRY, REFINEMENT_PRIORITY, SECONDS_A_REFINEMENT } from '@/server/services/refinement-limits';

/** Refinements that are queued at a time; what is left is queued the next time. */
const MOST_AT_A_TIME = 500;

/**
 * Queue the refinement of entries that have none: those accepted before the archive refined by itself, and those that
 * an older engine could not refine. What this engine could not refine is left alone.
 */
export async function refineMissing(db: Sequelize): Promise<void> {
  await db.query(
    `with wanted as (
       insert into refinement (orbit_number, digits, seconds)
       select o.number, $1, $2 from orbit o
       where o.evidence = 're-integrated' and o.status = 'accepted' and not exists (
         select 1 from refinement r where r.orbit_number = o.number and r.digits >= $1
           and (r.state <> 'done' or r.engine_version = $3))
       order by o.number limit $4
       on conflict (orbit_number, digits) where state in ('queued', 'running') do nothing returning id)
     select graphile_worker.add_job('refine-orbit', json_build_object('refinement', id), max_attempts => $5,
       job_key => id::text, priority => $6) from wanted`,
    {
      bind: [
        ...[DIGITS_OF_EVERY_ENTRY, SECONDS_A_REFINEMENT, ENGINE_VERSION],
        ...[MOST_AT_A_TIME, TRIES, REFINEMENT_PRIORITY.background],
      ],
    },
  );
}
