import { Client, escapeIdentifier, escapeLiteral } from 'pg';

export interface WantedDatabase {
  /** Address of the cluster as its owner, without a database. */
  ownerUrl: string;
  database: string;
  role: string;
  password: string;
}

/** See that the servers' role and the database exist. Harmless to repeat. */
export async function prepareDatabase({ ownerUrl, database, role, password }: WantedDatabase): Promise<void> {
  const db = new Client({ connectionString: `${ownerUrl}postgres` });
  await db.connect();
  try {
    const roles = await db.query('select 1 from pg_roles where rolname = $1', [role]);
    const verb = roles.rowCount ? 'alter' : 'create';
    await db.query(`${verb} role ${escapeIdentifier(role)} login password ${escapeLiteral(password)}`);
    const databases = await db.query('select 1 from pg_database where datname = $1', [database]);
    if (!databases.rowCount) await db.query(`create database ${escapeIdentifier(database)}`);
  } finally {
    await db.end();
  }
}
