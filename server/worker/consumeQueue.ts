import type { Logger } from 'pino';
import { queueNames, type QueueName } from './queue/queues';
import type { OpenQueue } from './queue/openQueue';

/** A call that was missed is made good after this, ms; normally a notification wakes the takers at once. */
const LOOK_AGAIN_MS = 2000;
/** Pause after an error of the database, ms. */
const AFTER_ERROR_MS = 1000;

export interface Consumer {
  /** Jobs under way. */
  readonly busy: number;
  /** Tells the takers that there may be a job. */
  wake(): void;
  /** Takes no more jobs; resolves when those under way have ended. */
  stop(): Promise<void>;
}

/**
 * Takes jobs off the queue, as many at a time as asked for. Frames come before measurements, so that a run finds its
 * darks looked at.
 */
export function consumeQueue(options: {
  queue: OpenQueue;
  atOnce: number;
  work: Record<QueueName, (id: string) => Promise<void>>;
  log: Logger;
}): Consumer {
  const { queue, atOnce, work, log } = options;
  let stopped = false;
  let busy = 0;
  /** Counts the calls, so that one that comes between a look and a sleep is not missed. */
  let calls = 0;
  const sleeping = new Set<() => void>();

  async function takeNext(): Promise<boolean> {
    for (const name of queueNames) {
      const id = await queue.take(name);
      if (id === null) continue;
      busy += 1;
      try {
        await work[name](id);
      } catch (error) {
        log.error({ err: error, queue: name, id }, 'a job failed and is left to the sweep');
      } finally {
        busy -= 1;
      }
      return true;
    }
    return false;
  }

  function sleep(ms: number): Promise<void> {
    return new Promise((resolve) => {
      const rise = () => {
        clearTimeout(timer);
        sleeping.delete(rise);
        resolve();
      };
      const timer = setTimeout(rise, ms);
      sleeping.add(rise);
    });
  }

  async function taker(): Promise<void> {
    while (!stopped) {
      const heard = calls;
      try {
        if (await takeNext()) continue;
      } catch (error) {
        log.error({ err: error }, 'the queue could not be read');
        if (!stopped) await sleep(AFTER_ERROR_MS);
        continue;
      }
      if (!stopped && calls === heard) await sleep(LOOK_AGAIN_MS);
    }
  }
  const takers = Array.from({ length: atOnce }, () => taker());

  const wake = () => {
    calls += 1;
    for (const rise of [...sleeping]) rise();
  };
  return {
    get busy() {
      return busy;
    },
    wake,
    async stop() {
      stopped = true;
      wake();
      await Promise.all(takers);
    },
  };
}
