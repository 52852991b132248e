import { createHash, randomBytes } from 'node:crypto';
import { QueryTypes, type Sequelize, type Transaction } from 'sequelize';
import { Problem } from '@/server/errors';

export type TokenPurpose = 'confirm' | 'reset';

const TOKEN_BYTES = 32;

/**
 * Make a token that works once and until it expires. Only its hash is stored, and older ones of the purpose end.
 *
 * @returns the token, to be mailed and forgotten.
 */
export async function issueToken(
  db: Sequelize,
  { userId, purpose, hours }: { userId: string; purpose: TokenPurpose; hours: number },
  transaction: Transaction,
): Promise<string> {
  const token = randomBytes(TOKEN_BYTES).toString('base64url');
  await db.query('delete from one_time_token where account_id = $1 and purpose = $2', {
    bind: [userId, purpose],
    transaction,
  });
  await db.query(
    `insert into one_time_token (token_hash, account_id, purpose, expires_at)
     values ($1, $2, $3, now() + make_interval(hours => $4))`,
    { bind: [hashOf(token), userId, purpose, hours], transaction },
  );
  return token;
}

/**
 * Use a token up.
 *
 * @returns the account it was made for.
 * @throws {Problem} `invalid-token` when it is unknown, used, or expired.
 */
export async function redeemToken(
  db: Sequelize,
  { token, purpose }: { token: string; purpose: TokenPurpose },
  transaction: Transaction,
): Promise<string> {
  const rows = await db.query<{ account_id: string }>(
    `delete from one_time_token where token_hash = $1 and purpose = $2 and expires_at > now() returning account_id`,
    { bind: [hashOf(token), purpose], type: QueryTypes.SELECT, transaction },
  );
  if (!rows[0]) {
    const message = 'The link was used already or has expired. Ask for a new one.';
    throw new Problem('invalid-token', message, { errors: [{ pointer: '/token', message }] });
  }
  return rows[0].account_id;
}

const hashOf = (token: string): string => createHash('sha256').update(token).digest('hex');
