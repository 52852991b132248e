import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { migrations } from '@/migrations';
import { startCluster } from '@/server/cluster/start-cluster';
import { migrateUp } from '@/server/migrate';

/**
 * A PostgreSQL for one run of the tests: its database is migrated once, and every test file copies it.
 *
 * The addresses reach the test files through the environment (`tests/support/database.ts` reads them).
 */
export async function startTestCluster(): Promise<{ end(): Promise<void> }> {
  const stateFolder = mkdtempSync(join(tmpdir(), 'ritornel-test-'));
  const cluster = await startCluster({
    stateFolder,
    postgresBin: process.env['POSTGRES_BIN'] ?? null,
    throwAway: true,
  });
  const end = async (): Promise<void> => {
    await cluster.stop();
    rmSync(stateFolder, { recursive: true, force: true });
    if (!cluster.dataFolder.startsWith(stateFolder)) rmSync(cluster.dataFolder, { recursive: true, force: true });
  };
  try {
    await migrateUp(cluster, migrations);
  } catch (error) {
    await end();
    throw error;
  }
  process.env['TEST_DATABASE_URL'] = cluster.url;
  process.env['TEST_DATABASE_OWNER_URL'] = cluster.ownerUrl;
  return { end };
}
