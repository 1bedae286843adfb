import type { Logger } from 'pino';
import type { Database } from '../database/Database';
import type { Queue } from './queue/createQueue';
import { findForgotten } from './runs/workRepository';

const EVERY_MS = 5000;
/** A row that nobody has taken in hand for this long is queued again, seconds. */
const GRACE_SECONDS = 10;

export interface Sweep {
  stop(): Promise<void>;
}

/**
 * Queues again what a dead worker had in hand and what has lost its job: at once, then again and again. A row that has
 * a job waiting already gets no second one.
 */
export function startSweep(database: Database, queue: Queue, log: Logger): Sweep {
  let stopped = false;
  let timer: NodeJS.Timeout | undefined;
  let round: Promise<void> = Promise.resolve();

  async function sweep(): Promise<void> {
    const { frames, measurements } = await findForgotten(database, GRACE_SECONDS);
    if (frames.length + measurements.length === 0) return;
    await database.transaction(async (transaction) => {
      for (const id of frames) await queue.send(transaction, 'inspect-frame', id);
      for (const id of measurements) await queue.send(transaction, 'run-measurement', id);
    });
  }

  const turn = (): void => {
    round = sweep()
      .catch((error: unknown) => log.error({ err: error }, 'the sweep failed'))
      .finally(() => {
        if (!stopped) timer = setTimeout(turn, EVERY_MS);
      });
  };
  turn();
  return {
    async stop() {
      stopped = true;
      clearTimeout(timer);
      await round;
    },
  };
}
