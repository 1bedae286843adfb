import type { Logger } from 'pino';
import { listen } from '../../database/listen';
import type { EventStream } from '../../http/EventStream';
import { PROGRESS_CHANNEL, type ProgressNotice } from './publishProgress';

/** Hands the progress of a laboratory to its people's open event streams. */
export interface ProgressHub {
  /** Sends what happens in the laboratory to the stream until it closes. */
  join(laboratoryId: string, stream: EventStream): void;
  stop(): Promise<void>;
}

/** Listens to the database once for all streams of this process. */
export async function startProgressHub(options: { databaseUrl: string; log: Logger }): Promise<ProgressHub> {
  const streams = new Map<string, Set<EventStream>>();

  function handOn(payload: string): void {
    const { laboratoryId, event } = JSON.parse(payload) as ProgressNotice;
    for (const stream of streams.get(laboratoryId) ?? []) stream.send(event.type, event);
  }

  const listening = await listen({
    ...options,
    channel: PROGRESS_CHANNEL,
    applicationName: 'ringwright-api-progress',
    onNotice: handOn,
    // What was said while the connection was down is lost: browsers join again and read their lists anew.
    onReconnect: () => {
      for (const stream of [...streams.values()].flatMap((members) => [...members])) stream.end();
    },
  });

  return {
    join(laboratoryId, stream) {
      const members = streams.get(laboratoryId) ?? new Set();
      streams.set(laboratoryId, members.add(stream));
      stream.onClose(() => {
        members.delete(stream);
        if (members.size === 0) streams.delete(laboratoryId);
      });
    },
    stop: () => listening.stop(),
  };
}
