import type { Logger } from 'pino';
import type { Database } from '../../database/Database';
import { LEASE_SECONDS, renewLease, type Leased } from './workRepository';

const BEAT_MS = (LEASE_SECONDS * 1000) / 3;

/**
 * Renews the lease of a row from the worker's own process, which never computes, until the returned function is
 * called. A lease that is lost is not an error here: whoever ends the work finds that it no longer holds it.
 */
export function holdLease(database: Database, table: Leased, id: string, owner: string, log: Logger): () => void {
  const beat = setInterval(() => {
    renewLease(database, table, id, owner).then(
      (held) => {
        if (!held) log.warn({ table, id }, 'a lease was lost');
      },
      (error: unknown) => log.error({ err: error, table, id }, 'a lease could not be renewed'),
    );
  }, BEAT_MS);
  return () => clearInterval(beat);
}
