/** PostgreSQL schema of the queue's own tables. */
export const QUEUE_SCHEMA = 'queue';

/** Payload of every job: the id of the row that says what there is to do. */
export interface JobPayload {
  id: string;
}

/** The queues: look at a stored frame; run a measurement. */
export const queueNames = ['inspect-frame', 'run-measurement'] as const;
export type QueueName = (typeof queueNames)[number];

/** Notification channel on which a new job is announced, so that no worker has to wait for its next look. */
export const JOB_CHANNEL = 'ringwright_job';
