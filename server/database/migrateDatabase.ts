import { createDataSource } from './createDataSource';

/** Advisory lock that keeps two migrations of one database apart. */
const MIGRATION_LOCK = 7_305_812_211;

/**
 * Brings the schema up to date as its owner, all or nothing, and returns the names of the migrations that ran. Two
 * processes that start at once do it one after the other.
 */
export async function migrateDatabase(ownerUrl: string): Promise<string[]> {
  const dataSource = await createDataSource(ownerUrl, 'ringwright-migrate', {
    poolSize: 2,
    statementTimeoutMs: 0,
  }).initialize();
  try {
    const lock = dataSource.createQueryRunner();
    await lock.connect();
    try {
      await lock.query('select pg_advisory_lock($1)', [MIGRATION_LOCK]);
      const ran = await dataSource.runMigrations({ transaction: 'all' });
      await lock.query('select pg_advisory_unlock($1)', [MIGRATION_LOCK]);
      return ran.map((migration) => migration.name);
    } finally {
      await lock.release();
    }
  } finally {
    await dataSource.destroy();
  }
}
