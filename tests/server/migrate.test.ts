import { Client } from 'pg';
import { inTransaction, migrateDown, migrateUp } from '@/server/migrate';
import { freshDatabase, type TestDatabase } from '../support/database';

const step = (name: string, up: string, down: string) => ({ name, up: inTransaction(up), down: inTransaction(down) });

let database: TestDatabase;
let db: Client;
beforeAll(async () => {
  database = await freshDatabase();
  db = new Client({ connectionString: database.ownerUrl });
  await db.connect();
  await db.query('delete from migration');
});
afterAll(async () => {
  await db.end();
  await database.drop();
});

const tables = async () => {
  const found = await db.query<{ name: string }>(
    "select table_name as name from information_schema.tables where table_name like 'probe%' order by 1",
  );
  return found.rows.map(({ name }) => name);
};

describe('migrateUp and migrateDown', () => {
  const first = step('probe-1', 'create table probe_one (id int)', 'drop table probe_one');
  const second = step('probe-2', 'create table probe_two (id int)', 'drop table probe_two');
  const broken = step('probe-3', 'create table probe_three (id int); select 1 / 0', 'drop table probe_three');

  it('runs what is missing, once, and undoes it, newest first', async () => {
    expect(await migrateUp(database, [first])).toEqual(['probe-1']);
    expect(await migrateUp(database, [first, second])).toEqual(['probe-2']);
    expect(await migrateUp(database, [first, second])).toEqual([]);
    expect(await tables()).toEqual(['probe_one', 'probe_two']);
    expect(await migrateDown(database, [first, second], 1)).toEqual(['probe-2']);
    expect(await tables()).toEqual(['probe_one']);
    expect(await migrateDown(database, [first, second])).toEqual(['probe-1']);
    expect(await tables()).toEqual([]);
  });

  it('leaves nothing of a step that fails', async () => {
    await expect(migrateUp(database, [broken])).rejects.toThrow(/probe-3/);
    expect(await tables()).toEqual([]);
    expect((await db.query("select 1 from migration where name = 'probe-3'")).rowCount).toBe(0);
  });

  it('runs each step once when two processes migrate together', async () => {
    const ran = await Promise.all([migrateUp(database, [first]), migrateUp(database, [first])]);
    expect(ran.flat()).toEqual(['probe-1']);
    await migrateDown(database, [first]);
  });

  it("gives the servers' role rows and no tables", async () => {
    await migrateUp(database, [first]);
    const servers = new Client({ connectionString: database.url });
    await servers.connect();
    try {
      await servers.query('insert into probe_one values (1)');
      await expect(servers.query('drop table probe_one')).rejects.toThrow(/must be owner/);
      await expect(servers.query('delete from migration')).rejects.toThrow(/permission denied/);
    } finally {
      await servers.end();
    }
    await migrateDown(database, [first]);
  });
});
