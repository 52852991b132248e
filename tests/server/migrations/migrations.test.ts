import { Client } from 'pg';
import { migrations } from '@/migrations';
import { migrateDown, migrateUp } from '@/server/migrate';
import { freshDatabase, type TestDatabase } from '../../support/database';

let database: TestDatabase;
let db: Client;
beforeAll(async () => {
  database = await freshDatabase();
  db = new Client({ connectionString: database.ownerUrl });
  await db.connect();
});
afterAll(async () => {
  await db.end();
  await database.drop();
});

/** Everything of ours in the public schema: tables with their columns, constraints, indexes, functions, triggers. */
const shape = async (): Promise<string[]> => {
  const found = await db.query<{ line: string }>(`
    select 'column ' || table_name || '.' || column_name || ' ' || data_type || ' ' || is_nullable as line
      from information_schema.columns where table_schema = 'public'
    union all select 'constraint ' || conrelid::regclass || ' ' || conname || ' ' || pg_get_constraintdef(oid)
      from pg_constraint where connamespace = 'public'::regnamespace and conrelid <> 0
    union all select 'index ' || indexdef from pg_indexes where schemaname = 'public'
    union all select 'trigger ' || tgrelid::regclass || ' ' || tgname from pg_trigger where not tgisinternal
      and tgrelid::regclass::text not like 'graphile_worker.%'
    union all select 'function ' || proname from pg_proc p where pronamespace = 'public'::regnamespace
      and not exists (select 1 from pg_depend d where d.objid = p.oid and d.deptype = 'e')
    order by 1`);
  return found.rows.map(({ line }) => line);
};

describe('the migrations', () => {
  it('go down to nothing but their own list, and up again to the same', async () => {
    const before = await shape();
    expect(before.filter((line) => line.startsWith('trigger ')).length).toBeGreaterThan(10);

    expect(await migrateDown(database, migrations)).toHaveLength(migrations.length);
    expect((await shape()).filter((line) => !/\bmigration(\b|_)/.test(line))).toEqual([]);

    expect(await migrateUp(database, migrations)).toEqual(migrations.map(({ name }) => name));
    expect(await shape()).toEqual(before);
  });

  it('each go down alone and up again', async () => {
    const before = await shape();
    for (let steps = 1; steps <= migrations.length; steps += 1) {
      await migrateDown(database, migrations, steps);
      await migrateUp(database, migrations);
    }
    expect(await shape()).toEqual(before);
  });

  it('find the queue ready for its first job', async () => {
    const servers = new Client({ connectionString: database.url });
    await servers.connect();
    try {
      await servers.query(`select graphile_worker.add_job('probe', '{}'::json)`);
    } finally {
      await servers.end();
    }
  });
});
