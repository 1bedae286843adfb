import { randomUUID } from 'node:crypto';
import type http from 'node:http';
import type { AddressInfo } from 'node:net';
import { hostname } from 'node:os';
import path from 'node:path';
import express from 'express';
import type { Logger } from 'pino';
import type { Config } from '../config';
import { createDataSource } from '../database/createDataSource';
import { listen } from '../database/listen';
import { createMailSender } from '../mail/createMailSender';
import { StartError } from '../StartError';
import { consumeQueue } from './consumeQueue';
import type { EngineJobs } from './child/engineJobs';
import { createMetrics } from './metrics';
import { createPool } from './pool/createPool';
import { createQueue } from './queue/createQueue';
import { openQueue } from './queue/openQueue';
import { JOB_CHANNEL } from './queue/queues';
import { inspectStoredFrame } from './runs/inspectStoredFrame';
import { runMeasurement } from './runs/runMeasurement';
import type { WorkContext } from './runs/WorkContext';
import { startSweep } from './sweep';

const CHILD_SCRIPT = path.join(__dirname, 'child', 'childMain.ts');
/** Work under way is handed back when it has not ended after this, ms. */
const DRAIN_MS = 6000;

export interface RunningWorker {
  /** Where health and metrics are answered. */
  port: number;
  /** Ends what is under way or hands it back, then closes everything. */
  stop(): Promise<void>;
}

/** Opens the database and the queue, keeps the child processes, works until it is stopped. */
export async function startWorker(config: Config, log: Logger): Promise<RunningWorker> {
  const database = createDataSource(config.databaseUrl, 'ringwright-worker');
  await database.initialize().catch((error: unknown) => {
    const reason = error instanceof Error ? error.message : String(error);
    throw new StartError(`The database cannot be reached (DATABASE_URL): ${reason}`, { cause: error });
  });
  const jobs = await openQueue(config.databaseUrl, log);
  const queue = createQueue();
  const metrics = createMetrics();
  const pool = createPool<EngineJobs>({
    script: CHILD_SCRIPT,
    size: config.workerChildren,
    memoryMb: config.childMemoryMb,
    jobSeconds: config.frameSeconds,
    log,
  });
  const owner = `${hostname()}-${process.pid}-${randomUUID()}`;
  const context: WorkContext = { database, pool, queue, owner, metrics, log };
  const consumer = consumeQueue({
    queue: jobs,
    atOnce: config.workerChildren,
    work: {
      'inspect-frame': (id) => inspectStoredFrame(context, id),
      'run-measurement': (id) => runMeasurement(context, id),
    },
    log,
  });
  const calls = await listen({
    databaseUrl: config.databaseUrl,
    channel: JOB_CHANNEL,
    applicationName: 'ringwright-worker-calls',
    log,
    onNotice: () => consumer.wake(),
    onReconnect: () => consumer.wake(),
  });
  const sweep = startSweep(database, queue, log);
  const sender =
    config.smtpUrl === null
      ? null
      : createMailSender({ database, smtpUrl: config.smtpUrl, from: config.mailFrom, log });
  sender?.start();

  const app = express();
  app.disable('x-powered-by');
  app.get('/health', async (_request, response) => {
    const answers = await database.query('select 1').then(
      () => true,
      () => false,
    );
    const children = pool.pids().length;
    const ok = answers && children > 0;
    response.status(ok ? 200 : 503).json({ ok, database: answers, children, busy: consumer.busy });
  });
  app.get('/metrics', async (_request, response) => {
    const now = { children: pool.pids().length, busy: consumer.busy, queued: await jobs.waiting() };
    response.type('text/plain; version=0.0.4').send(metrics.text(now));
  });
  const server = await serve(app, config.workerPort);
  const { port } = server.address() as AddressInfo;
  log.info({ port, children: config.workerChildren }, 'worker works');

  return {
    port,
    async stop() {
      await calls.stop();
      await sweep.stop();
      const handBack = setTimeout(() => void pool.close(), DRAIN_MS);
      await consumer.stop();
      clearTimeout(handBack);
      await pool.close();
      await sender?.stop();
      await jobs.stop();
      server.closeAllConnections();
      await new Promise<void>((resolve) => server.close(() => resolve()));
      await database.destroy();
      log.info('worker stopped');
    },
  };
}

function serve(app: express.Express, port: number): Promise<http.Server> {
  return new Promise((resolve, reject) => {
    const server = app.listen(port, '127.0.0.1', (error?: Error) => {
      if (error === undefined || error === null) resolve(server);
      else
        reject(
          new StartError(`Port ${port} for the worker's health cannot be used: ${error.message}. Set WORKER_PORT.`),
        );
    });
  });
}
