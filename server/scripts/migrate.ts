import { ConfigError, readOwnerDatabaseUrl } from '../config';
import { migrateDatabase } from '../database/migrateDatabase';

async function main(): Promise<void> {
  const ran = await migrateDatabase(readOwnerDatabaseUrl());
  for (const name of ran) console.log(`migrated: ${name}`);
}

main().catch((error: unknown) => {
  console.error(error instanceof ConfigError ? error.message : error);
  process.exitCode = 1;
});
