import { type Client, escapeIdentifier } from 'pg';

/**
 * Give the servers' role what it needs and no more: rows of every table, and a schema of its own for the queue.
 *
 * It owns no table of the product, so it can neither drop one nor switch its triggers off. Nothing to do when the
 * owner and the servers share one role.
 */
export async function grantApplicationRole(db: Client, target: { url: string; ownerUrl: string }): Promise<void> {
  const role = roleOf(target.url);
  if (role === roleOf(target.ownerUrl)) return;
  const name = escapeIdentifier(role);
  const database = escapeIdentifier(databaseOf(target.url));
  await db.query(`
    grant connect, create, temporary on database ${database} to ${name};
    grant usage on schema public to ${name};
    grant select, insert, update, delete on all tables in schema public to ${name};
    grant usage, select, update on all sequences in schema public to ${name};
    grant execute on all functions in schema public to ${name};
    revoke insert, update, delete on table migration from ${name};
  `);
}

const roleOf = (url: string): string => decodeURIComponent(new URL(url).username);
const databaseOf = (url: string): string => decodeURIComponent(new URL(url).pathname.slice(1));
