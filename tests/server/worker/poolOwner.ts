import path from 'node:path';
import pino from 'pino';
import { createPool } from '../../../server/worker/pool/createPool';
import type { TroublesomeJobs } from './troublesomeChild';

/** A process that owns a pool whose only child is caught in a loop; it tells the child's id and waits to be killed. */
const pool = createPool<TroublesomeJobs>({
  script: path.join(__dirname, 'troublesomeChild.ts'),
  size: 1,
  memoryMb: 400,
  jobSeconds: 600,
  log: pino({ level: 'silent' }),
});
void pool.run('stages', null, []).then(() => {
  void pool.run('spin', null, []).catch(() => undefined);
  process.send?.(pool.pids()[0]);
});
