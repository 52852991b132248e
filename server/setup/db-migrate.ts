import { migrations } from '@/migrations';
import { readConfig, requireDatabaseUrl } from '@/server/config';
import { migrateUp } from '@/server/migrate';

async function main(): Promise<void> {
  const config = readConfig();
  const url = requireDatabaseUrl(config);
  const ran = await migrateUp({ url, ownerUrl: config.databaseOwnerUrl ?? url }, migrations);
  console.log(ran.length === 0 ? 'The database is up to date' : `Ran: ${ran.join(', ')}`);
}

main().catch((error: unknown) => {
  console.error(error instanceof Error ? error.message : error);
  process.exitCode = 1;
});
