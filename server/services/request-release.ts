import { QueryTypes, type Sequelize, type Transaction } from 'sequelize';
import { Problem } from '@/server/errors';
import { TRIES } from '@/server/services/check-limits';

/** Behind everything that somebody waits for. */
const PRIORITY = 50;

/**
 * Have a release cut; the work is a job.
 *
 * @returns its number.
 * @throws {Problem} `release-in-work` while another is being cut.
 */
export function requestRelease(
  db: Sequelize,
  { curatorId, note }: { curatorId: string; note: string },
): Promise<number> {
  return db.transaction(async (transaction) => {
    await giveUpLost(db, transaction);
    const [row] = await db.query<{ id: number }>(
      'insert into release (cut_by, note) values ($1, $2) on conflict do nothing returning id',
      { bind: [curatorId, note], type: QueryTypes.SELECT, transaction },
    );
    if (!row) throw new Problem('release-in-work', 'A release is being cut already. Wait until it is ready.');
    await db.query(
      `select graphile_worker.add_job('cut-release', $1::json, max_attempts => $2, job_key => $3, priority => $4)`,
      { bind: [JSON.stringify({ release: row.id }), TRIES, jobKey(row.id), PRIORITY], transaction },
    );
    return row.id;
  });
}

const jobKey = (id: number): string => `release-${id}`;

/** A release that no job will cut any more, since each try ended its worker. */
async function giveUpLost(db: Sequelize, transaction: Transaction): Promise<void> {
  await db.query(
    `update release r set state = 'failed', failure = $1
     where r.state = 'cutting' and not exists (select 1 from graphile_worker.jobs j
       where j.key = 'release-' || r.id and (j.locked_at is not null or j.attempts < j.max_attempts))`,
    { bind: [`The worker ended while it was cut, ${TRIES} times.`], transaction },
  );
}
