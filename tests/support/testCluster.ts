import { spawnSync } from 'node:child_process';
import { existsSync, mkdirSync, readFileSync, readdirSync, renameSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { createDatabase, startCluster, stopCluster, withClient } from '../../server/scripts/lib/cluster.js';

/** The database that every test database is copied from: migrated, without rows. */
export const templateDatabase = 'ringwright_template';

/** How to reach the throw-away cluster of this run. `{database}` stands for the name of a database. */
export interface TestCluster {
  clusterUrl: string;
  ownerUrl: string;
  appUrl: string;
}

const repository = path.resolve(__dirname, '../..');
const prefix = 'ringwright-test-';
const startLimitMs = 120_000;

/** A new folder name for the cluster of one test run; nothing is made until a test asks for a database. */
export function runFolder(): string {
  return path.join(reachableTemporaryFolder(), `${prefix}${process.pid}-${Date.now().toString(36)}`);
}

/** Stops the run's cluster, if one was started, and removes it. */
export function discardCluster(folder: string): void {
  if (!existsSync(folder)) return;
  stopCluster(path.join(folder, 'cluster'), { immediately: true });
  rmSync(folder, { recursive: true, force: true });
}

/** Removes clusters that runs which were killed have left behind. */
export function discardAbandonedClusters(): void {
  const parent = reachableTemporaryFolder();
  for (const name of readdirSync(parent).filter((each) => each.startsWith(prefix))) {
    const folder = path.join(parent, name);
    const pid = Number(name.slice(prefix.length).split('-')[0]);
    if (isOurs(folder) && !existsSync(`/proc/${pid}`)) discardCluster(folder);
  }
}

/** The run's cluster with a migrated template; the first caller among the test processes starts it, the rest wait. */
export async function testCluster(): Promise<TestCluster> {
  const folder = process.env.RINGWRIGHT_TEST_RUN;
  if (folder === undefined)
    throw new Error('RINGWRIGHT_TEST_RUN is not set: run the tests by jest, whose global setup sets it.');
  mkdirSync(folder, { recursive: true, mode: 0o711 });
  const outcomeFile = path.join(folder, 'outcome.json');
  if (!existsSync(outcomeFile) && claims(path.join(folder, 'claimed'))) {
    const outcome = await start(path.join(folder, 'cluster')).catch((error: unknown) => ({ problem: String(error) }));
    writeFileSync(`${outcomeFile}.new`, JSON.stringify(outcome), { mode: 0o600 });
    renameSync(`${outcomeFile}.new`, outcomeFile);
  }
  const deadline = Date.now() + startLimitMs;
  while (!existsSync(outcomeFile)) {
    if (Date.now() > deadline) throw new Error('The test cluster did not start in time.');
    await new Promise((resolve) => setTimeout(resolve, 50));
  }
  const outcome = JSON.parse(readFileSync(outcomeFile, 'utf8')) as TestCluster | { problem: string };
  if ('problem' in outcome) throw new Error(outcome.problem);
  return outcome;
}

async function start(home: string): Promise<TestCluster> {
  const cluster = await startCluster({ home, durable: false });
  await createDatabase(cluster, templateDatabase);
  const migrated = spawnSync(process.execPath, ['--import', 'tsx', 'server/scripts/migrate.ts'], {
    cwd: repository,
    encoding: 'utf8',
    env: {
      ...process.env,
      NODE_ENV: 'test',
      TSX_TSCONFIG_PATH: path.join(repository, 'server/tsconfig.json'),
      OWNER_DATABASE_URL: cluster.ownerUrl(templateDatabase),
      DATABASE_URL: cluster.appUrl(templateDatabase),
      TOKEN_SECRET: 'for-tests-only-for-tests-only-for-tests-only',
    },
  });
  if (migrated.status !== 0) throw new Error(`The migrations failed.\n${migrated.stdout}\n${migrated.stderr}`);
  // Nobody may be connected to a template while it is copied.
  await withClient(cluster.clusterUrl('postgres'), async (client) => {
    await client.query(`alter database ${templateDatabase} with allow_connections false`);
  });
  return {
    clusterUrl: cluster.clusterUrl('{database}'),
    ownerUrl: cluster.ownerUrl('{database}'),
    appUrl: cluster.appUrl('{database}'),
  };
}

function claims(folder: string): boolean {
  try {
    mkdirSync(folder);
    return true;
  } catch {
    return false;
  }
}

function isOurs(folder: string): boolean {
  const entry = statSync(folder, { throwIfNoEntry: false });
  return entry !== undefined && entry.uid === process.getuid?.();
}

/** PostgreSQL runs as another user when the tests run as root, so the folder must be open to that user. */
function reachableTemporaryFolder(): string {
  const own = tmpdir();
  if (process.getuid?.() !== 0 || /^\/(var\/)?tmp\/?$/.test(own)) return own;
  return '/tmp';
}
