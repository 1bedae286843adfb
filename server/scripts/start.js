'use strict';
const { X509Certificate } = require('node:crypto');
const fs = require('node:fs');
const os = require('node:os');
const path = require('node:path');
const { checkout, typeScript, typeScriptEnvironment } = require('./lib/checkout.js');
const { checkNodeVersion } = require('./lib/nodeVersion.js');
const { endAllChildren, startChild } = require('./lib/children.js');
const { clusterHome, stateFolder } = require('./lib/clusterHome.js');
const { createDatabase, startCluster, stopCluster } = require('./lib/cluster.js');
const { ensureCertificate } = require('./lib/certificate.js');
const { ensureDebianPackages, postgres } = require('./lib/debianPackages.js');
const { ensurePackages } = require('./lib/npmPackages.js');
const { ensureWebBuild } = require('./lib/webBuild.js');
const { freePort, isPortFree } = require('./lib/freePort.js');
const { migrate } = require('./lib/migrate.js');
const { networkAddresses } = require('./lib/networkAddresses.js');
const { PlainError } = require('./lib/plainError.js');
const { answersWithin, get } = require('./lib/request.js');
const { lastLines, startService } = require('./lib/service.js');
const { say, sayProblem } = require('./lib/say.js');
const { claimCheckout } = require('./lib/startLock.js');
const { tokenSecret } = require('./lib/secrets.js');

const usage = `npm start                  for this machine only, with the demo laboratory
npm start -- --network     for the local network: TLS, no demo sign-ins, a database of its own

PORT=8490 npm start        another port than 8480`;

/** What there is to undo, newest last. @type {(() => void | Promise<void>)[]} */
const undo = [];
/** @type {Promise<void> | null} */
let closing = null;

/** Ends everything that was started, newest first. Safe to call more than once. */
function close() {
  closing ??= (async () => {
    await endAllChildren();
    for (const step of undo.reverse()) await step();
  })();
  return closing;
}

/** @param {NodeJS.Signals | 'orphaned'} reason */
async function interrupt(reason) {
  if (closing) return;
  if (reason !== 'orphaned') say('\nStopping …');
  try {
    await close();
    say('Stopped. The data are kept.');
    process.exit(0);
  } catch (error) {
    sayProblem(error);
    process.exit(1);
  }
}

/** npm may be killed without a chance to pass the signal on; then nobody could stop us any more. */
function watchParent() {
  if (process.env.npm_lifecycle_event !== 'start') return;
  const parent = process.ppid;
  setInterval(() => process.ppid !== parent && void interrupt('orphaned'), 1000).unref();
}

/**
 * @typedef {object} Mode
 * @property {'demo' | 'network'} name
 * @property {string} database a network start must not show the demo's people, so each has a database of its own
 * @property {string} host
 * @property {number} port
 */

/** @returns {Mode} */
function readMode() {
  const words = process.argv.slice(2);
  if (words.includes('--help')) {
    say(usage);
    process.exit(0);
  }
  const unknown = words.filter((word) => word !== '--network');
  if (unknown.length > 0) throw new PlainError(`Not understood: ${unknown.join(' ')}\n\n${usage}`);
  const port = Number(process.env.PORT || 8480);
  if (!Number.isInteger(port) || port < 1 || port > 65_535) {
    throw new PlainError(`PORT must be a whole number from 1 to 65535, not ${process.env.PORT}.`);
  }
  const { HOST: host } = process.env;
  if (words.includes('--network') || process.env.RINGWRIGHT_NETWORK === '1') {
    return { name: 'network', database: 'ringwright', host: host || '0.0.0.0', port };
  }
  if (host && !['127.0.0.1', 'localhost', '::1'].includes(host)) {
    throw new PlainError(
      `The demo has sign-ins that anybody can read, so it listens on this machine only, not on ${host}.\nFor other devices: npm start -- --network`,
    );
  }
  return { name: 'demo', database: 'ringwright_demo', host: host || '127.0.0.1', port };
}

/** @param {Mode} mode */
async function checkPort({ host, port }) {
  if (await isPortFree(port, host)) return;
  const reason = port < 1024 && process.getuid?.() !== 0 ? 'may be used by root only' : 'is taken by another program';
  throw new PlainError(
    `Port ${port} ${reason}. Choose another one, for example: PORT=${port < 1024 ? 8480 : port + 10} npm start`,
  );
}

async function main() {
  checkNodeVersion();
  const mode = readMode();
  const scheme = mode.name === 'network' ? 'https' : 'http';
  const local = `${scheme}://${mode.host === '0.0.0.0' ? '127.0.0.1' : mode.host === '::1' ? '[::1]' : mode.host}:${mode.port}`;
  undo.push(claimCheckout(checkout, local));
  await checkPort(mode);

  await ensureDebianPackages([postgres]);
  await ensurePackages(checkout);

  const home = clusterHome(checkout);
  undo.push(() => stopCluster(home));
  const cluster = await startCluster({ home, durable: true });
  if (cluster.wasRunning) say('The database still ran from a start that broke off; going on with it.');
  await createDatabase(cluster, mode.database);
  await migrate(cluster.ownerUrl(mode.database), cluster.appUrl(mode.database));
  await ensureWebBuild(checkout);

  const env = await serviceEnvironment(mode, cluster.appUrl(mode.database), local);
  const logFolder = path.join(stateFolder(checkout), 'logs');
  const api = startService({ name: 'api', file: 'server/apiMain.ts', env, logFolder });
  undo.push(api.end);
  const worker = startService({ name: 'worker', file: 'server/worker/workerMain.ts', env, logFolder });
  undo.push(worker.end);
  const broken = Promise.race([api.givenUp, worker.givenUp]);
  await Promise.race([broken, healthy('api', `${local}/api/health`, api)]);
  await Promise.race([broken, healthy('worker', `http://127.0.0.1:${env.WORKER_PORT}/health`, worker)]);

  if (mode.name === 'demo') await Promise.race([broken, seedDemo(home, env, local)]);
  await announce(mode, env, local);
  await broken;
}

/**
 * @param {Mode} mode
 * @param {string} databaseUrl
 * @param {string} local
 * @returns {Promise<NodeJS.ProcessEnv>}
 */
async function serviceEnvironment(mode, databaseUrl, local) {
  const wantedWorkerPort = Number(process.env.WORKER_PORT || 8481);
  const workerPort = (await isPortFree(wantedWorkerPort)) ? wantedWorkerPort : await freePort();
  /** @type {NodeJS.ProcessEnv} */
  const env = {
    ...process.env,
    NODE_ENV: 'production',
    DATABASE_URL: databaseUrl,
    HOST: mode.host,
    PORT: String(mode.port),
    WORKER_PORT: String(workerPort),
    WEB_DIR: path.join(checkout, 'dist', 'web'),
    TOKEN_SECRET: tokenSecret(checkout, mode.name),
    OWNER_DATABASE_URL: undefined,
  };
  if (mode.name === 'demo') {
    return { ...env, DEMO: '1', PUBLIC_URL: local, TLS_CERT_FILE: '', TLS_KEY_FILE: '' };
  }
  const { certFile, keyFile } = await ensureCertificate(checkout);
  const [address = os.hostname()] = networkAddresses();
  const publicUrl = process.env.PUBLIC_URL || `https://${address}:${mode.port}`;
  return { ...env, DEMO: '0', PUBLIC_URL: publicUrl, TLS_CERT_FILE: certFile, TLS_KEY_FILE: keyFile };
}

/**
 * @param {string} name
 * @param {string} url
 * @param {import('./lib/service.js').Service} service
 */
async function healthy(name, url, { logFile, nowHealthy }) {
  if (await answersWithin(url, 60_000)) {
    nowHealthy();
    return;
  }
  throw new PlainError(
    `The ${name} did not answer within a minute. The end of its log (${logFile}):\n${lastLines(logFile)}`,
  );
}

/**
 * Fills the demo laboratory through the running api, once. A filling that broke off is taken up again.
 * @param {string} home
 * @param {NodeJS.ProcessEnv} env
 * @param {string} local
 */
async function seedDemo(home, env, local) {
  const done = path.join(home, 'demo-filled');
  if (fs.existsSync(done)) return;
  say(`Filling the demo laboratory (a minute the first time); ${local} can be opened already …`);
  const seed = startChild(process.execPath, typeScript('server/demo/seed.ts'), {
    cwd: checkout,
    env: { ...env, ...typeScriptEnvironment, PUBLIC_URL: local },
  });
  const ended = await seed.ended;
  if (ended.status !== 0) throw new PlainError(`The demo laboratory could not be filled.\n${ended.output.trim()}`);
  fs.writeFileSync(done, new Date().toISOString());
}

/**
 * @param {Mode} mode
 * @param {NodeJS.ProcessEnv} env
 * @param {string} local
 */
async function announce(mode, env, local) {
  if (mode.name === 'demo') {
    const { signIns } = JSON.parse((await get(`${local}/api/welcome`)).text);
    const width = Math.max(...signIns.map((/** @type {{ email: string }} */ each) => each.email.length));
    say(`\nRingwright runs at ${local}\n\nDemo sign-ins:`);
    for (const each of signIns) say(`  ${each.email.padEnd(width)}  ${each.password}  (${each.role}: ${each.name})`);
  } else {
    say('\nRingwright runs for the local network:');
    for (const address of networkAddresses()) say(`  https://${address}:${mode.port}`);
    say(`  ${local} (this machine)`);
    say('\nThere are no demo people here: register your laboratory on the sign-in page.');
    if (!process.env.TLS_CERT_FILE) {
      say('\nThe certificate was made on this machine, so each browser asks once whether to trust it.');
      say(`To compare, its SHA-256 fingerprint is\n  ${fingerprint(env.TLS_CERT_FILE ?? '')}`);
    }
    if (!process.env.SMTP_URL) say('\nNo SMTP_URL is set: mails such as invitations wait until there is one.');
  }
  say('\nCtrl-C stops it. The data are kept.');
}

/** @param {string} certFile */
function fingerprint(certFile) {
  return new X509Certificate(fs.readFileSync(certFile)).fingerprint256;
}

for (const signal of /** @type {const} */ (['SIGINT', 'SIGTERM', 'SIGHUP']))
  process.on(signal, () => void interrupt(signal));
watchParent();
main().catch(async (error) => {
  // While stopping, whatever was under way fails: that is the stop, not a problem.
  if (closing) return;
  sayProblem(error);
  await close().catch(sayProblem);
  process.exit(1);
});
