import { QueryTypes, type Sequelize, type Transaction } from 'sequelize';
import type { ReasonCode, ReviewState, Role } from '@/schemas/generated/contract';
import { notFound } from '@/server/errors';
import { Submission } from '@/server/models/submission';
import { engineBind, type SubmissionRow, submissionColumns, submissionTables } from '@/server/services/submission-rows';

/** Who reads or acts. */
export interface Person {
  id: string;
  role: Role;
}

export interface EventRow {
  id: number;
  at: Date;
  who: string | null;
  kind: string;
  from_state: ReviewState | null;
  to_state: ReviewState | null;
  revision: number;
  check_id: string | null;
  reason: ReasonCode | null;
  comment: string | null;
}

/** A submission with its whole history. */
export interface SubmissionHistory {
  submission: SubmissionRow;
  revisions: { revision: number; at: Date; body: SubmissionRow['body']; check_id: string | null }[];
  events: EventRow[];
  comments: { id: string; at: Date; who: string; revision: number; text: string }[];
}

export const isCurator = ({ role }: Person): boolean => role === 'curator' || role === 'administrator';

/**
 * A submission as its owner or a curator sees it.
 *
 * @throws {Problem} 404 for everybody else, as if it did not exist.
 */
export async function findSubmission(db: Sequelize, id: string, person: Person): Promise<SubmissionHistory> {
  const [submission] = await db.query<SubmissionRow>(
    `select ${submissionColumns} from ${submissionTables} where s.id = $2`,
    { bind: [engineBind, id], type: QueryTypes.SELECT },
  );
  if (!submission || !maySee(person, submission.owner_id)) throw notFound('submission');
  const [revisions, events, comments] = await Promise.all([
    revisionsOf(db, id),
    eventsSince(db, id, 0),
    db.query<SubmissionHistory['comments'][number]>(
      `select c.id, c.at, a.name as who, c.revision, c.text from comment c join account a on a.id = c.author_id
       where c.submission_id = $1 order by c.at, c.id`,
      { bind: [id], type: QueryTypes.SELECT },
    ),
  ]);
  return { submission, revisions, events, comments };
}

/**
 * The submission's row, locked until the transaction ends.
 *
 * @throws {Problem} 404 for everybody but its owner and curators.
 */
export async function lockSubmission(id: string, person: Person, transaction: Transaction): Promise<Submission> {
  const submission = await Submission.findByPk(id, { lock: transaction.LOCK.UPDATE, transaction });
  if (!submission || !maySee(person, submission.ownerId)) throw notFound('submission');
  return submission;
}

/** What happened after a change; 0 for everything. */
export function eventsSince(
  db: Sequelize,
  id: string,
  change: number,
  transaction: Transaction | null = null,
): Promise<EventRow[]> {
  return db.query<EventRow>(
    `select e.id, e.at, a.name as who, e.kind, e.from_state, e.to_state, e.revision, e.check_id, e.reason, e.comment
     from event e left join account a on a.id = e.actor_id
     where e.submission_id = $1 and e.change > $2 order by e.id`,
    { bind: [id, change], type: QueryTypes.SELECT, transaction },
  );
}

const maySee = (person: Person, ownerId: string): boolean => person.id === ownerId || isCurator(person);

const revisionsOf = (db: Sequelize, id: string): Promise<SubmissionHistory['revisions']> =>
  db.query<SubmissionHistory['revisions'][number]>(
    `select r.revision, coalesce(r.sent_at, r.created_at) as at, r.body,
       (select c.id from orbit_check c where c.submission_id = r.submission_id and c.revision = r.revision
        order by c.created_at desc limit 1) as check_id
     from submission_revision r where r.submission_id = $1 order by r.revision`,
    { bind: [id], type: QueryTypes.SELECT },
  );
