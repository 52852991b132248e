import { Client } from 'pg';
import { requireDatabaseUrl } from '@/server/config';
import { installDemoAccounts } from '@/server/demo/demo-accounts';
import type { InstallTools } from '@/server/demo/demo-tools';
import { installSystems } from '@/server/demo/install-systems';
import { loadDemo } from '@/server/demo/load-demo';

/** Any number, the same in every worker: one of them at a time loads the demo. */
const DEMO_LOCK = 41_700_002;

/** Put the built-in systems in place, and the demo where it is asked for. Safe to repeat and to interrupt. */
export async function installContent(tools: InstallTools): Promise<void> {
  const { config, desk, log } = tools;
  await installSystems(desk.db);
  if (!config.demo || config.production) return;
  const lock = new Client({ connectionString: requireDatabaseUrl(config) });
  lock.on('error', (error) => log.warn({ err: error }, 'the connection that holds the lock of the demo was lost'));
  await lock.connect();
  try {
    await lock.query('select pg_advisory_lock($1)', [DEMO_LOCK]);
    const people = await installDemoAccounts(config.stateFolder);
    if (config.demoEntries) await loadDemo(tools, people);
  } finally {
    await lock.end();
  }
}
