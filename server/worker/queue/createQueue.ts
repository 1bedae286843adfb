import PgBoss from 'pg-boss';
import type { Transaction } from '../../database/Database';
import { JOB_CHANNEL, QUEUE_SCHEMA, type JobPayload, type QueueName } from './queues';

/** How jobs are put into the queue: always within the transaction that writes the row they stand for. */
export interface Queue {
  /**
   * Adds a job for a row, visible to the workers when the transaction commits. Does nothing when one for the same row
   * is waiting already.
   */
  send(manager: Transaction, name: QueueName, id: string): Promise<void>;
}

/** Statements of the queue run on the connection, and so in the transaction, of an entity manager. */
const onConnectionOf = (manager: Transaction): PgBoss.Db => ({
  async executeSql(text, values) {
    if (!manager.queryRunner) throw new Error('A job can only be queued within a transaction.');
    const { records } = await manager.queryRunner.query(text, values, true);
    return { rows: records ?? [] };
  },
});

const noConnection: PgBoss.Db = {
  executeSql: () => Promise.reject(new Error('A job can only be queued within a transaction.')),
};

/** A queue that only sends; it holds no connection of its own. */
export function createQueue(): Queue {
  const boss = new PgBoss({
    schema: QUEUE_SCHEMA,
    db: noConnection,
    migrate: false,
    supervise: false,
    schedule: false,
  });
  return {
    async send(manager, name, id) {
      const payload: JobPayload = { id };
      await boss.send(name, payload, { db: onConnectionOf(manager), singletonKey: id });
      await manager.query('select pg_notify($1, $2)', [JOB_CHANNEL, name]);
    },
  };
}
