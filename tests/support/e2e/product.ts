import { spawn, type ChildProcess } from 'node:child_process';
import { closeSync, mkdirSync, openSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { freePort } from '../../../server/scripts/lib/freePort.js';
import { answersWithin } from '../../../server/scripts/lib/request.js';
import { ensureWebBuild } from '../../../server/scripts/lib/webBuild.js';
import { createTestDatabase, type TestDatabase } from '../testDatabase';

const repository = path.resolve(__dirname, '../../..');
/** A name that the test browser resolves to this machine: to a page it is any host of the network, not loopback. */
export const networkHost = 'bench.ringwright.example';

/** The whole product, running for the browser tests: api, worker and demo laboratory on a database of their own. */
export interface Product {
  /** Its address on loopback, which browsers count as a secure context. */
  url: string;
  /** Its address as a phone on the local network sees it without TLS: not a secure context. */
  networkUrl: string;
  /** Folder of the logs of api and worker. */
  logFolder: string;
  stop(): Promise<void>;
}

/** Starts the exported build with the seeded demo laboratory on free ports. */
export async function startProduct(logFolder: string): Promise<Product> {
  await ensureWebBuild(repository);
  mkdirSync(logFolder, { recursive: true });
  const database = await createTestDatabase();
  const port = await freePort();
  const workerPort = await freePort();
  const url = `http://127.0.0.1:${port}`;
  const env = environment(database, port, workerPort, url);
  const running = [
    start('api', 'server/apiMain.ts', env, logFolder),
    start('worker', 'server/worker/workerMain.ts', env, logFolder),
  ];
  const stop = async (): Promise<void> => {
    await Promise.all(running.map(end));
    await database.drop();
  };
  try {
    await healthy('api', `${url}/api/health`, logFolder);
    await healthy('worker', `http://127.0.0.1:${workerPort}/health`, logFolder);
    await seed(env, logFolder);
  } catch (error) {
    await stop();
    throw error;
  }
  return { url, networkUrl: `http://${networkHost}:${port}`, logFolder, stop };
}

function environment(database: TestDatabase, port: number, workerPort: number, url: string): NodeJS.ProcessEnv {
  return {
    ...process.env,
    NODE_ENV: 'production',
    TSX_TSCONFIG_PATH: path.join(repository, 'server/tsconfig.json'),
    DATABASE_URL: database.databaseUrl,
    HOST: '0.0.0.0',
    PORT: String(port),
    PUBLIC_URL: url,
    WORKER_PORT: String(workerPort),
    WEB_DIR: path.join(repository, 'dist/web'),
    TOKEN_SECRET: 'for-tests-only-for-tests-only-for-tests-only',
    DEMO: '1',
    PASSWORD_COST: '4',
    RATE_LIMIT_FACTOR: '100',
    TLS_CERT_FILE: '',
    TLS_KEY_FILE: '',
    SMTP_URL: '',
  };
}

function start(name: string, file: string, env: NodeJS.ProcessEnv, logFolder: string): ChildProcess {
  const log = openSync(path.join(logFolder, `${name}.log`), 'w');
  const preload = path.join(repository, 'server/scripts/lib/endWithParent.js');
  const child = spawn(process.execPath, ['--require', preload, '--import', 'tsx', path.join(repository, file)], {
    cwd: repository,
    env,
    stdio: ['ignore', log, log, 'ipc'],
  });
  closeSync(log);
  return child;
}

async function end(child: ChildProcess): Promise<void> {
  if (child.exitCode !== null || child.signalCode !== null) return;
  const gone = new Promise((resolve) => child.once('exit', resolve));
  child.kill('SIGTERM');
  const timer = setTimeout(() => child.kill('SIGKILL'), 10_000);
  await gone;
  clearTimeout(timer);
}

async function healthy(name: string, url: string, logFolder: string): Promise<void> {
  if (await answersWithin(url, 60_000)) return;
  throw new Error(`The ${name} did not answer.\n${readFileSync(path.join(logFolder, `${name}.log`), 'utf8')}`);
}

async function seed(env: NodeJS.ProcessEnv, logFolder: string): Promise<void> {
  const child = start('seed', 'server/demo/seed.ts', env, logFolder);
  const code = await new Promise((resolve) => child.once('exit', resolve));
  if (code !== 0) {
    throw new Error(`The demo could not be filled.\n${readFileSync(path.join(logFolder, 'seed.log'), 'utf8')}`);
  }
}
