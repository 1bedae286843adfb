import PgBoss from 'pg-boss';
import { QUEUE_SCHEMA, queueNames } from './queues';

/**
 * Makes the queue's schema and its queues, or leaves them as they are. To be called with the owner's connection, as
 * part of the migration: at run time the application may make no table.
 *
 * The policy `short` keeps at most one job of a row waiting; retries are not the queue's: the rows that the jobs
 * stand for carry leases of their own, and the worker's sweep queues again what was lost.
 */
export async function installQueue(ownerUrl: string): Promise<void> {
  const boss = new PgBoss({
    connectionString: ownerUrl,
    schema: QUEUE_SCHEMA,
    max: 2,
    supervise: false,
    schedule: false,
  });
  const failures: Error[] = [];
  boss.on('error', (error) => failures.push(error));
  await boss.start();
  try {
    for (const name of queueNames) await boss.createQueue(name, { name, policy: 'short', retryLimit: 0 });
  } finally {
    await boss.stop({ graceful: false });
  }
  const [failure] = failures;
  if (failure) throw failure;
}
