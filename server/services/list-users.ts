import { QueryTypes, type Sequelize } from 'sequelize';
import { User } from '@/server/models/user';

/** Where the page before ended: name and id of its last account. */
export type UserPlace = readonly [name: string, id: string];

/** Accounts by name, one page; `last` is the place to go on from. */
export async function listUsers(
  db: Sequelize,
  { limit, after }: { limit: number; after: UserPlace | null },
): Promise<{ items: User[]; last: UserPlace | null; total: number }> {
  const items = await db.query(
    `select account.*, lower(name) as sort_name from account
     where $1::text is null or (lower(name), id) > ($1, $2::uuid)
     order by lower(name), id
     limit $3`,
    { bind: [after?.[0] ?? null, after?.[1] ?? null, limit + 1], model: User, mapToModel: true },
  );
  const [count] = await db.query<{ count: string }>('select count(*) from account', { type: QueryTypes.SELECT });
  const page = items.slice(0, limit);
  const final = page.at(-1);
  return {
    items: page,
    last: items.length > limit && final ? [String(final.get('sort_name')), final.id] : null,
    total: parseInt(count?.count ?? '0', 10),
  };
}
