import { QueryTypes, type Sequelize, type Transaction } from 'sequelize';
import { Refinement } from '@/server/models/refinement';
import { TRIES } from '@/server/services/check-limits';
import { REFINEMENT_PRIORITY, SECONDS_A_REFINEMENT } from '@/server/services/refinement-limits';

/** A refinement to be put into the queue. */
interface Wanted {
  orbitNumber: number;
  digits: number;
  /** Null: the archive itself. */
  askedBy: string | null;
}

/** Store a refinement and put its job into the queue; one that is under way for these digits already is answered instead. */
export async function queueRefinement(
  db: Sequelize,
  { orbitNumber, digits, askedBy }: Wanted,
  transaction: Transaction,
): Promise<Refinement> {
  const [row] = await db.query<{ id: string }>(
    `insert into refinement (orbit_number, digits, asked_by, seconds) values ($1, $2, $3, $4)
     on conflict (orbit_number, digits) where state in ('queued', 'running') do nothing returning id`,
    { bind: [orbitNumber, digits, askedBy, SECONDS_A_REFINEMENT], type: QueryTypes.SELECT, transaction },
  );
  if (!row) {
    const where = { orbitNumber, digits, state: ['queued', 'running'] };
    return Refinement.findOne({ where, rejectOnEmpty: true, transaction });
  }
  const refinement = await Refinement.findByPk(row.id, { rejectOnEmpty: true, transaction });
  await queueRefinementJob(db, refinement, transaction);
  return refinement;
}

/** Put the job of a stored refinement into the queue; while one waits there already it is not doubled. */
export async function queueRefinementJob(
  db: Sequelize,
  { id, askedBy }: Pick<Refinement, 'id' | 'askedBy'>,
  transaction: Transaction,
): Promise<void> {
  const priority = askedBy === null ? REFINEMENT_PRIORITY.background : REFINEMENT_PRIORITY.asked;
  await db.query(
    `select graphile_worker.add_job('refine-orbit', $1::json, max_attempts => $2, job_key => $3, priority => $4)`,
    { bind: [JSON.stringify({ refinement: id }), TRIES, id, priority], transaction },
  );
}
