import { QueryTypes, type Sequelize } from 'sequelize';
import { migrations } from '@/migrations';
import { demoOrbits } from '@/server/demo/demo-orbits';
import { demoScenario } from '@/server/demo/demo-scenario';
import { DEAD_AFTER_SECONDS } from '@/server/services/worker-life';

interface DemoAsked {
  demo: boolean;
  demoEntries: boolean;
}

/**
 * What is missing before this server can do its whole job; nothing when it is ready.
 *
 * @param asked Whether demo accounts, and the demo's entries, are asked for.
 */
export async function readiness(db: Sequelize, asked: DemoAsked): Promise<string[]> {
  const waiting = await missingMigrations(db);
  // Nothing else can be asked of tables that are not there yet.
  if (waiting > 0) return [`${waiting} migrations have not run`];
  const missing = [];
  if (!(await hasLiveWorker(db))) missing.push('no worker is alive');
  if (asked.demo) missing.push(...(await missingDemo(db, asked)));
  return missing;
}

async function missingMigrations(db: Sequelize): Promise<number> {
  const [table] = await db.query<{ there: boolean }>(`select to_regclass('migration') is not null as there`, {
    type: QueryTypes.SELECT,
  });
  if (!table?.there) return migrations.length;
  const ran = await db.query<{ name: string }>('select name from migration', { type: QueryTypes.SELECT });
  const names = new Set(ran.map(({ name }) => name));
  return migrations.filter(({ name }) => !names.has(name)).length;
}

async function hasLiveWorker(db: Sequelize): Promise<boolean> {
  const [found] = await db.query<{ alive: boolean }>(
    'select exists (select 1 from worker where beat_at > now() - make_interval(secs => $1)) as alive',
    { bind: [DEAD_AFTER_SECONDS], type: QueryTypes.SELECT },
  );
  return found?.alive ?? false;
}

async function missingDemo(db: Sequelize, { demoEntries }: DemoAsked): Promise<string[]> {
  const emails = Object.values(demoScenario.people).map(({ email }) => email);
  const [found] = await db.query<{ accounts: number; entries: number }>(
    `select (select count(*)::integer from account where email = any($1::text[])) as accounts,
       (select count(*)::integer from orbit o join account a on a.id = o.contributor_id where a.email = $2) as entries`,
    { bind: [emails, demoScenario.people.contributor.email], type: QueryTypes.SELECT },
  );
  const { accounts, entries } = found ?? { accounts: 0, entries: 0 };
  const missing = [];
  if (accounts < emails.length) missing.push(`${accounts} of ${emails.length} demo accounts are there`);
  if (demoEntries && entries < demoOrbits.length)
    missing.push(`${entries} of ${demoOrbits.length} demo orbits are checked and accepted`);
  return missing;
}
