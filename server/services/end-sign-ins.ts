import { QueryTypes, type Sequelize, type Transaction } from 'sequelize';

/** End every sign-in of an account: whoever uses one has to sign in again. */
export async function endSignIns(db: Sequelize, userId: string, transaction: Transaction): Promise<void> {
  await db.query(`delete from session where sess -> 'passport' ->> 'user' = $1`, {
    bind: [userId],
    type: QueryTypes.DELETE,
    transaction,
  });
}
