import { migrations } from '@/migrations';
import { readConfig, requireDatabaseUrl } from '@/server/config';
import { migrateDown } from '@/server/migrate';

/** Undo the newest migration. What it made, data included, is gone after that. */
async function main(): Promise<void> {
  const config = readConfig();
  const url = requireDatabaseUrl(config);
  const ran = await migrateDown({ url, ownerUrl: config.databaseOwnerUrl ?? url }, migrations, 1);
  console.log(ran.length === 0 ? 'There is nothing to undo' : `Undid: ${ran.join(', ')}`);
}

main().catch((error: unknown) => {
  console.error(error instanceof Error ? error.message : error);
  process.exitCode = 1;
});
