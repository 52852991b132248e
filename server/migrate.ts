import { Client } from 'pg';
import { runMigrations as migrateQueue } from 'graphile-worker';
import { Umzug, type UmzugStorage } from 'umzug';
import { grantApplicationRole } from '@/server/grant-application-role';

/** One step of the schema, forwards or backwards, on an open connection of the owner. */
export type Migration = (db: Client) => Promise<void>;

export interface NamedMigration {
  /** File name without its extension: what the database remembers. */
  name: string;
  up: Migration;
  down: Migration;
}

export interface MigrationTarget {
  /** The role that the servers use. */
  url: string;
  /** The role that owns the tables; the same address when there is only one role. */
  ownerUrl: string;
}

/** Any number: it only has to be the same in every process that migrates. */
const MIGRATION_LOCK = 41_700_001;

/** A migration that runs one piece of SQL, all of it or nothing. */
export function inTransaction(sql: string): Migration {
  return async (db) => {
    await db.query('begin');
    try {
      await db.query(sql);
      await db.query('commit');
    } catch (error) {
      await db.query('rollback');
      throw error;
    }
  };
}

/**
 * Bring a database up to date: the tables, the rights of the application's role, the queue.
 *
 * Safe to call from several processes at once: they wait for each other.
 *
 * @returns the names of the migrations that ran.
 */
export async function migrateUp(target: MigrationTarget, list: readonly NamedMigration[]): Promise<string[]> {
  const done = await asOwner(target, async (db) => {
    const ran = await umzugOf(db, list).up();
    await grantApplicationRole(db, target);
    return ran.map(({ name }) => name);
  });
  await migrateQueue({ connectionString: target.url, noHandleSignals: true });
  return done;
}

/**
 * Undo migrations, the newest first.
 *
 * @param steps  How many; all when left out.
 */
export async function migrateDown(
  target: MigrationTarget,
  list: readonly NamedMigration[],
  steps?: number,
): Promise<string[]> {
  return asOwner(target, async (db) => {
    const ran = await umzugOf(db, list).down(steps === undefined ? { to: 0 } : { step: steps });
    return ran.map(({ name }) => name);
  });
}

function umzugOf(db: Client, list: readonly NamedMigration[]): Umzug<Client> {
  return new Umzug({
    migrations: list.map(({ name, up, down }) => ({ name, up: () => up(db), down: () => down(db) })),
    context: db,
    storage: new MigrationTable(db),
    logger: undefined,
  });
}

/** The names of the migrations that ran, in a table of the same database. */
class MigrationTable implements UmzugStorage {
  constructor(private readonly db: Client) {}

  async executed(): Promise<string[]> {
    await this.db.query(`
      create table if not exists migration (
        name       text        primary key,
        applied_at timestamptz not null default now()
      )`);
    const found = await this.db.query<{ name: string }>('select name from migration order by name');
    return found.rows.map(({ name }) => name);
  }

  async logMigration({ name }: { name: string }): Promise<void> {
    await this.db.query('insert into migration (name) values ($1)', [name]);
  }

  async unlogMigration({ name }: { name: string }): Promise<void> {
    await this.db.query('delete from migration where name = $1', [name]);
  }
}

async function asOwner<T>(target: MigrationTarget, work: (db: Client) => Promise<T>): Promise<T> {
  const db = new Client({ connectionString: target.ownerUrl });
  await db.connect();
  try {
    await db.query('select pg_advisory_lock($1)', [MIGRATION_LOCK]);
    return await work(db);
  } finally {
    await db.end();
  }
}
