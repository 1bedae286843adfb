import { existsSync, readFileSync } from 'node:fs';
import http from 'node:http';
import https from 'node:https';
import type { AddressInfo } from 'node:net';
import path from 'node:path';
import type { Logger } from 'pino';
import type { Config } from './config';
import { createApp } from './createApp';
import { createDataSource } from './database/createDataSource';
import { demoSignIns } from './demo/demoSignIns';
import { startProgressHub } from './features/events/startProgressHub';
import { createMailSender } from './mail/createMailSender';
import { startFakeInbox } from './mail/startFakeInbox';
import { StartError } from './StartError';

/** Slow phones need this long for a large file, ms. */
const REQUEST_MS = 30 * 60_000;
/** Requests that have not ended after this are cut off when the process stops, ms. */
const DRAIN_MS = 8_000;

export interface RunningApi {
  /** Where it listens. */
  port: number;
  /** Takes no more requests, lets those at hand end, closes everything. */
  stop(): Promise<void>;
}

/** Opens the database, listens, and in the demo also takes in and sends the mails. */
export async function startApi(config: Config, log: Logger): Promise<RunningApi> {
  const database = createDataSource(config.databaseUrl, 'ringwright-api');
  await database.initialize().catch((error: unknown) => {
    const reason = error instanceof Error ? error.message : String(error);
    throw new StartError(`The database cannot be reached (DATABASE_URL): ${reason}`, { cause: error });
  });
  const progress = await startProgressHub({ databaseUrl: config.databaseUrl, log });
  const inbox = config.demo && config.smtpUrl === null ? await startFakeInbox() : null;
  const sender = inbox && createMailSender({ database, smtpUrl: inbox.smtpUrl, from: config.mailFrom, log });
  const app = createApp({
    config,
    database,
    log,
    webDir: webDirOf(config, log),
    inbox,
    demoSignIns,
    progress,
  });
  const server = config.tls
    ? https.createServer(
        { cert: readFileSync(config.tls.certFile), key: readFileSync(config.tls.keyFile) },
        app.express,
      )
    : http.createServer(app.express);
  server.requestTimeout = REQUEST_MS;
  try {
    await listen(server, config);
  } catch (error) {
    await inbox?.stop();
    await progress.stop();
    await database.destroy();
    throw error;
  }
  sender?.start();
  const { port } = server.address() as AddressInfo;
  log.info({ host: config.host, port, tls: config.tls !== null }, 'api listens');

  return {
    port,
    async stop() {
      const closed = new Promise<void>((resolve) => server.close(() => resolve()));
      app.endStreams();
      server.closeIdleConnections();
      const cut = setTimeout(() => server.closeAllConnections(), DRAIN_MS);
      await closed;
      clearTimeout(cut);
      await app.background.idle();
      await sender?.stop();
      await inbox?.stop();
      await progress.stop();
      await database.destroy();
      log.info('api stopped');
    },
  };
}

function webDirOf(config: Config, log: Logger): string | null {
  if (existsSync(path.join(config.webDir, 'index.html'))) return config.webDir;
  log.warn({ webDir: config.webDir }, 'no web build here: the api answers alone');
  return null;
}

function listen(server: http.Server, { host, port }: Config): Promise<void> {
  return new Promise((resolve, reject) => {
    server.once('error', (error: NodeJS.ErrnoException) => {
      const reasons: Record<string, string> = {
        EADDRINUSE: `Port ${port} on ${host} is taken. Stop the program that uses it, or choose another port with PORT.`,
        EACCES: `Port ${port} needs more rights than this process has. Choose one above 1023 with PORT.`,
        EADDRNOTAVAIL: `This machine has no address ${host}. Choose another with HOST.`,
      };
      const reason = reasons[error.code ?? ''];
      reject(reason === undefined ? error : new StartError(reason, { cause: error }));
    });
    server.listen(port, host, resolve);
  });
}
