import { availableParallelism } from 'node:os';
import { join } from 'node:path';
import { pino } from 'pino';
import type { MeasureResult } from '../../shared/contracts/measureResult';
import { createPool } from '../worker/pool/createPool';
import type { MeasureJobs } from './measure/measureJobs';
import { readCases, USAGE, UsageError, type CaseList } from './measure/readCases';
import { runCase } from './measure/runCase';

const JOB_SECONDS = 120;
const MEMORY_MB = 1500;

/** Measures all cases with a child process a core and prints each result in order, as soon as it is known. */
async function run({ cases, folder }: CaseList): Promise<void> {
  const size = Math.max(1, Math.min(cases.length, availableParallelism()));
  const log = pino({ level: 'warn' }, pino.destination({ dest: 2, sync: true }));
  const pool = createPool<MeasureJobs>({
    script: join(__dirname, 'measure', 'measureChild.ts'),
    size,
    jobSeconds: JOB_SECONDS,
    memoryMb: MEMORY_MB,
    log,
  });
  const waiting = new Map<number, Promise<MeasureResult>>();
  let next = 0;
  const begin = () => {
    if (next < cases.length) {
      const position = next++;
      waiting.set(position, runCase(cases[position], position, folder, pool));
    }
  };
  // One case ahead of the children, so that files are read while others are measured; never all of them at once.
  for (let k = 0; k <= size; k++) begin();
  for (let position = 0; position < cases.length; position++) {
    const result = await waiting.get(position);
    waiting.delete(position);
    begin();
    process.stdout.write(`${JSON.stringify(result)}\n`);
  }
  await pool.close();
}

let list: CaseList | null = null;
try {
  list = readCases(process.argv.slice(2));
} catch (error) {
  if (!(error instanceof UsageError)) throw error;
  process.stderr.write(`${error.message}${error.message === '' ? '' : '\n\n'}${USAGE}\n`);
  process.exitCode = 2;
}
if (list !== null) {
  run(list).catch((error: unknown) => {
    process.stderr.write(`${error instanceof Error ? (error.stack ?? error.message) : String(error)}\n`);
    process.exitCode = 1;
  });
}
