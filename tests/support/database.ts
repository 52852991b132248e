import { randomUUID } from 'node:crypto';
import { Client, escapeIdentifier } from 'pg';

/** A database for one test file: migrated, empty, shared with nobody. */
export interface TestDatabase {
  /** As the servers' role. */
  url: string;
  /** As the role that owns the tables. */
  ownerUrl: string;
  /** Close your own connections first: whatever is left open is cut. */
  drop(): Promise<void>;
}

/** Copy the template database of this test run. */
export async function freshDatabase(): Promise<TestDatabase> {
  const template = addressOf('TEST_DATABASE_URL');
  const ownerTemplate = addressOf('TEST_DATABASE_OWNER_URL');
  const name = `test_${randomUUID().replaceAll('-', '')}`;
  const quoted = escapeIdentifier(name);
  await asOwner(ownerTemplate, `create database ${quoted} template ${escapeIdentifier(template.pathname.slice(1))}`);
  await asOwner(ownerTemplate, `grant create on database ${quoted} to ${escapeIdentifier(template.username)}`);
  return {
    url: withDatabase(template, name),
    ownerUrl: withDatabase(ownerTemplate, name),
    drop: () => asOwner(ownerTemplate, `drop database if exists ${quoted} with (force)`),
  };
}

function addressOf(variable: string): URL {
  const value = process.env[variable];
  if (!value) throw new Error(`${variable} is not set: run this test in the jest project "server"`);
  return new URL(value);
}

function withDatabase(address: URL, name: string): string {
  const copy = new URL(address);
  copy.pathname = `/${name}`;
  return copy.href;
}

/** Outside of any transaction, from a database that nobody copies. */
async function asOwner(address: URL, sql: string): Promise<void> {
  const db = new Client({ connectionString: withDatabase(address, 'postgres') });
  await db.connect();
  try {
    await db.query(sql);
  } finally {
    await db.end();
  }
}
