import type { Logger } from 'pino';
import type { Database } from '../../database/Database';
import type { EngineJobs } from '../child/engineJobs';
import type { WorkMetrics } from '../metrics';
import type { Pool } from '../pool/createPool';
import type { Queue } from '../queue/createQueue';

/** What the work on frames and measurements is done with. */
export interface WorkContext {
  database: Database;
  pool: Pool<EngineJobs>;
  queue: Queue;
  /** Name under which this worker holds leases; new at every start. */
  owner: string;
  metrics: WorkMetrics;
  log: Logger;
}
