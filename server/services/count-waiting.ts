import { QueryTypes, type Sequelize } from 'sequelize';
import type { User } from '@/server/models/user';
import { engineBind, submissionTables, turnOf } from '@/server/services/submission-rows';

const CURATORS: readonly User['role'][] = ['curator', 'administrator'];

/**
 * How many things wait for this person: their submissions that came back, and for curators those to decide that are
 * nobody's or their own claim. Drafts wait for nobody, and one's own submission is for another curator.
 */
export async function countWaiting(db: Sequelize, user: Pick<User, 'id' | 'role'>): Promise<number> {
  const [counted] = await db.query<{ waiting: number }>(
    `select count(*)::integer as waiting from (
       select s.owner_id, s.claimed_by, s.claimed_until, s.review_state, ${turnOf} as turn from ${submissionTables}
       where s.review_state in ('submitted', 'in-review', 'returned')) w
     where (w.owner_id = $2 and w.turn = 'contributor')
       or ($3 and w.owner_id <> $2 and w.turn = 'curator'
           and (w.claimed_by is null or w.claimed_by = $2 or w.claimed_until < now()))`,
    { bind: [engineBind, user.id, CURATORS.includes(user.role)], type: QueryTypes.SELECT },
  );
  return counted?.waiting ?? 0;
}
