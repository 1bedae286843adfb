import PgBoss from 'pg-boss';
import type { Logger } from 'pino';
import { QUEUE_SCHEMA, queueNames, type JobPayload, type QueueName } from './queues';

/** The worker's end of the queue. */
export interface OpenQueue {
  /** Takes the next job of a queue; null when there is none. A job that is taken is gone: its row's lease is the truth. */
  take(name: QueueName): Promise<string | null>;
  /** Jobs that wait, by queue. */
  waiting(): Promise<Record<QueueName, number>>;
  stop(): Promise<void>;
}

/** Opens the queue as a role that may make no table; old jobs are tidied away in the background. */
export async function openQueue(databaseUrl: string, log: Logger): Promise<OpenQueue> {
  const boss = new PgBoss({
    connectionString: databaseUrl,
    schema: QUEUE_SCHEMA,
    application_name: 'ringwright-worker-queue',
    max: 4,
    migrate: false,
    schedule: false,
    supervise: true,
    archiveCompletedAfterSeconds: 60,
    deleteAfterMinutes: 10,
    maintenanceIntervalSeconds: 60,
  });
  boss.on('error', (error) => log.error({ err: error }, 'the queue reported an error'));
  await boss.start();
  return {
    async take(name) {
      const [job] = await boss.fetch<JobPayload>(name);
      if (!job) return null;
      await boss.complete(name, job.id);
      return job.data.id;
    },
    async waiting() {
      const sizes = await Promise.all(queueNames.map(async (name) => [name, await boss.getQueueSize(name)] as const));
      return Object.fromEntries(sizes) as Record<QueueName, number>;
    },
    stop: () => boss.stop({ graceful: false }),
  };
}
