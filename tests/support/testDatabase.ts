import { randomUUID } from 'node:crypto';
import { withClient } from '../../server/scripts/lib/cluster.js';
import { templateDatabase, testCluster } from './testCluster';

/** A database of one test file's own: migrated and empty. */
export interface TestDatabase {
  /** Connection of the role that the application uses: rows only. */
  databaseUrl: string;
  /** Connection of the role that owns the tables. */
  ownerDatabaseUrl: string;
  /** Removes the database; connections that are still open are closed by the server. */
  drop(): Promise<void>;
}

/** Copies the migrated template. Call it in `beforeAll`, and `drop()` in `afterAll` after closing what uses it. */
export async function createTestDatabase(): Promise<TestDatabase> {
  const cluster = await testCluster();
  const name = `test_${randomUUID().replaceAll('-', '')}`;
  const adminUrl = cluster.clusterUrl.replace('{database}', 'postgres');
  await withClient(adminUrl, async (client) => {
    await client.query(`create database ${name} template ${templateDatabase} owner ringwright_owner`);
    await client.query(`revoke all on database ${name} from public`);
    await client.query(`grant connect on database ${name} to ringwright_app`);
  });
  return {
    databaseUrl: cluster.appUrl.replace('{database}', name),
    ownerDatabaseUrl: cluster.ownerUrl.replace('{database}', name),
    drop: () =>
      withClient(adminUrl, async (client) => {
        await client.query(`drop database if exists ${name} with (force)`);
      }),
  };
}
