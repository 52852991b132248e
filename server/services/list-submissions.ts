import { QueryTypes, type Sequelize } from 'sequelize';
import type { SubmissionPage } from '@/schemas/generated/contract';
import type { Person } from '@/server/services/find-submission';
import {
  engineBind,
  isBlocked,
  type SubmissionRow,
  submissionColumns,
  submissionTables,
  turnOf,
} from '@/server/services/submission-rows';

export type SubmissionQueue = 'mine' | 'review' | 'returned';

/** Where the page before ended. */
export type SubmissionPlace = readonly [time: string, id: string];

export interface SubmissionList {
  items: SubmissionRow[];
  /** The place to go on from; null at the end. */
  last: SubmissionPlace | null;
  total: number;
  turns: SubmissionPage['turns'];
}

interface Request {
  queue: SubmissionQueue;
  limit: number;
  after: SubmissionPlace | null;
}

/** Mine, latest change first; to review and returned, longest waiting first. */
const orders: Readonly<Record<SubmissionQueue, { where: string; column: string; goesOn: string; order: string }>> = {
  mine: { where: 's.owner_id = $2', column: 's.updated_at', goesOn: '<', order: 'desc' },
  review: {
    where: `s.review_state in ('submitted', 'in-review') and (s.review_state = 'in-review' or not ${isBlocked})
      and $2::uuid is not null`,
    column: 's.sent_at',
    goesOn: '>',
    order: 'asc',
  },
  returned: {
    where: `s.review_state = 'returned' and $2::uuid is not null`,
    column: 's.updated_at',
    goesOn: '>',
    order: 'asc',
  },
};

/** One page of a person's submissions, of those to review, or of those returned, with how many wait for whom. */
export async function listSubmissions(db: Sequelize, person: Person, request: Request): Promise<SubmissionList> {
  const { where, column, goesOn, order } = orders[request.queue];
  const rows = await db.query<SubmissionRow & { place: string }>(
    `select ${submissionColumns}, ${column}::text as place from ${submissionTables}
     where ${where} and ($3::timestamptz is null or (${column}, s.id) ${goesOn} ($3, $4::uuid))
     order by ${column} ${order}, s.id ${order} limit $5`,
    {
      bind: [engineBind, person.id, request.after?.[0] ?? null, request.after?.[1] ?? null, request.limit + 1],
      type: QueryTypes.SELECT,
    },
  );
  const items = rows.slice(0, request.limit);
  const final = items.at(-1);
  return {
    items,
    last: rows.length > request.limit && final ? [final.place, final.id] : null,
    ...(await countTurns(db, person, where)),
  };
}

async function countTurns(
  db: Sequelize,
  person: Person,
  where: string,
): Promise<Pick<SubmissionList, 'total' | 'turns'>> {
  const [counts] = await db.query<{ total: number; curator: number; contributor: number; machine: number }>(
    `select count(*)::integer as total, count(*) filter (where turn = 'curator')::integer as curator,
       count(*) filter (where turn = 'contributor')::integer as contributor,
       count(*) filter (where turn = 'machine')::integer as machine
     from (select ${turnOf} as turn from ${submissionTables} where ${where}) t`,
    { bind: [engineBind, person.id], type: QueryTypes.SELECT },
  );
  const { total, ...turns } = counts!;
  return { total, turns };
}
