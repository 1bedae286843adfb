import { ConfigError, readOwnerDatabaseUrl } from '../config';
import { migrateDatabase } from '../database/migrateDatabase';
import { installQueue } from '../worker/queue/installQueue';

async function main(): Promise<void> {
  const ownerUrl = readOwnerDatabaseUrl();
  const ran = await migrateDatabase(ownerUrl);
  await installQueue(ownerUrl);
  for (const name of ran) console.log(`migrated: ${name}`);
}

main().catch((error: unknown) => {
  console.error(error instanceof ConfigError ? error.message : error);
  process.exitCode = 1;
});
