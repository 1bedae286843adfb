import { setTimeout as sleep } from 'node:timers/promises';
import { Client } from 'pg';
import type { Logger } from 'pino';

const AGAIN_MS = 1000;

export interface Listening {
  stop(): Promise<void>;
}

/**
 * Listens on a notification channel with a connection of its own and connects again when that breaks. What was said
 * meanwhile is lost, so `onReconnect` tells the caller to look for itself.
 * @returns once the first connection listens
 */
export async function listen(options: {
  databaseUrl: string;
  channel: string;
  applicationName: string;
  log: Logger;
  onNotice: (payload: string) => void;
  onReconnect?: () => void;
}): Promise<Listening> {
  const { databaseUrl, channel, applicationName, log, onNotice, onReconnect } = options;
  const stopping = new AbortController();
  let client: Client | null = null;

  async function connect(): Promise<void> {
    const next = new Client({ connectionString: databaseUrl, application_name: applicationName, keepAlive: true });
    next.on('notification', ({ payload }) => onNotice(payload ?? ''));
    next.on('error', (error) => log.warn({ err: error, channel }, 'the listening connection broke'));
    next.on('end', () => {
      if (client === next) void reconnect();
    });
    await next.connect();
    await next.query(`listen ${next.escapeIdentifier(channel)}`);
    client = next;
  }

  async function reconnect(): Promise<void> {
    client = null;
    while (!stopping.signal.aborted) {
      await sleep(AGAIN_MS, undefined, { signal: stopping.signal }).catch(() => undefined);
      if (stopping.signal.aborted) return;
      try {
        await connect();
        onReconnect?.();
        return;
      } catch (error) {
        log.warn({ err: error, channel }, 'listening failed and is tried again');
      }
    }
  }

  await connect();
  return {
    async stop() {
      stopping.abort();
      const last = client;
      client = null;
      await last?.end();
    },
  };
}
