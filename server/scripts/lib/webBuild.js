'use strict';
const crypto = require('node:crypto');
const fs = require('node:fs');
const path = require('node:path');
const zlib = require('node:zlib');
const { copyCanvasKit } = require('./canvasKit.js');
const { stateFolder } = require('./clusterHome.js');
const { runChild } = require('./children.js');
const { withLock } = require('./lock.js');
const { PlainError } = require('./plainError.js');
const { say } = require('./say.js');

const inputFolders = ['app', 'components', 'hooks', 'shared', 'assets', 'public'];
const inputFiles = ['app.json', 'babel.config.js', 'metro.config.js', 'tsconfig.json', 'index.ts', 'package-lock.json'];
const compressible = /\.(js|css|html|json|svg|wasm|ttf|otf|map)$/;

/**
 * Exports the web application to dist/web when its sources have changed since the last time.
 * @param {string} checkout
 * @returns {Promise<boolean>} whether an export was made
 */
async function ensureWebBuild(checkout) {
  const state = stateFolder(checkout);
  return withLock(path.join(state, 'export.lock'), async () => {
    copyCanvasKit(checkout);
    const hash = inputHash(checkout);
    const built = path.join(checkout, 'dist', 'web');
    const hashFile = path.join(checkout, 'dist', 'web.hash');
    if (fs.existsSync(path.join(built, 'index.html')) && read(hashFile) === hash) return false;
    say('Building the web application (about a minute) …');
    const fresh = path.join(checkout, 'dist', 'web.new');
    fs.rmSync(fresh, { recursive: true, force: true });
    await exportTo(checkout, fresh, state);
    for (const file of filesUnder(fresh)) compress(file);
    fs.rmSync(hashFile, { force: true });
    fs.rmSync(built, { recursive: true, force: true });
    fs.renameSync(fresh, built);
    fs.writeFileSync(hashFile, hash);
    return true;
  });
}

/**
 * @param {string} checkout
 * @param {string} folder
 * @param {string} state
 */
async function exportTo(checkout, folder, state) {
  // The bundler keeps its cache in the temporary folder; one of our own is never somebody else's.
  const temporary = path.join(state, 'tmp');
  fs.mkdirSync(temporary, { recursive: true, mode: 0o700 });
  const cli = path.join(checkout, 'node_modules', 'expo', 'bin', 'cli');
  const ended = await runChild(
    process.execPath,
    [cli, 'export', '--platform', 'web', '--output-dir', path.relative(checkout, folder)],
    {
      cwd: checkout,
      env: {
        ...process.env,
        TMPDIR: temporary,
        NODE_ENV: 'production',
        CI: '1',
        EXPO_OFFLINE: '1',
        EXPO_NO_TELEMETRY: '1',
      },
    },
  );
  if (ended.status !== 0 || !fs.existsSync(path.join(folder, 'index.html'))) {
    throw new PlainError(
      `The web application could not be built.\n${ended.output.trim().split('\n').slice(-40).join('\n')}`,
    );
  }
}

/**
 * One hash over names and contents of all that goes into the build.
 * @param {string} checkout
 */
function inputHash(checkout) {
  const hash = crypto.createHash('sha256');
  const files = inputFolders
    .flatMap((folder) => filesUnder(path.join(checkout, folder)))
    .concat(
      inputFiles.map((file) => path.join(checkout, file)),
      __filename,
    );
  for (const file of files.sort()) {
    const content = fs.readFileSync(file);
    hash.update(`${path.relative(checkout, file)}\0${content.length}\0`).update(content);
  }
  return hash.digest('hex');
}

/**
 * @param {string} folder
 * @returns {string[]}
 */
function filesUnder(folder) {
  if (!fs.existsSync(folder)) return [];
  return fs
    .readdirSync(folder, { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile())
    .map((entry) => path.join(entry.parentPath, entry.name));
}

/**
 * Puts `X.gz` beside X, for the server to send, where that saves a tenth and more.
 * @param {string} file
 */
function compress(file) {
  if (!compressible.test(file)) return;
  const content = fs.readFileSync(file);
  if (content.length < 1024) return;
  const packed = zlib.gzipSync(content, { level: 9 });
  if (packed.length < 0.9 * content.length) fs.writeFileSync(`${file}.gz`, packed);
}

/** @param {string} file */
function read(file) {
  return fs.existsSync(file) ? fs.readFileSync(file, 'utf8') : null;
}

module.exports = { ensureWebBuild };
