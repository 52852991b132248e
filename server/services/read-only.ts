import type { Pool, PoolClient } from 'pg';

/** Longest that one statement of a search may take: for people without an account, and signed in. */
export const STATEMENT_MS = { anonymous: 5_000, signedIn: 20_000 } as const;

/**
 * Do something on one connection that sees one state of the database and can change nothing.
 *
 * @param statementMs  Time limit of each statement; PostgreSQL ends a longer one with error 57014.
 */
export async function readOnly<T>(
  pool: Pool,
  statementMs: number,
  work: (client: PoolClient) => Promise<T>,
): Promise<T> {
  const client = await pool.connect();
  let broken = true;
  try {
    await client.query('begin isolation level repeatable read read only');
    await client.query(`set local statement_timeout = ${statementMs}`);
    const result = await work(client);
    await client.query('commit');
    broken = false;
    return result;
  } finally {
    // A connection in the middle of a transaction is not given to anybody else.
    client.release(broken);
  }
}
