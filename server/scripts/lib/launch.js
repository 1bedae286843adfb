'use strict';
const fs = require('node:fs');
const path = require('node:path');
const { spawn } = require('node:child_process');
const { checkout, typeScript, typeScriptEnvironment } = require('./checkout.js');
const { checkNodeVersion } = require('./nodeVersion.js');
const { packagesAreCurrent } = require('./npmPackages.js');
const { sayProblem } = require('./say.js');
const { PlainError } = require('./plainError.js');

/**
 * Runs one of our TypeScript files in the place of this process: same terminal, same arguments, same end.
 * @param {string} file relative to the checkout
 */
function launch(file) {
  try {
    checkNodeVersion();
    requirePackages();
  } catch (error) {
    sayProblem(error);
    process.exit(2);
  }
  const child = spawn(process.execPath, [...typeScript(file), ...process.argv.slice(2)], {
    stdio: 'inherit',
    env: { ...process.env, ...typeScriptEnvironment },
  });
  // At a terminal the child hears Ctrl-C itself; what only we hear is passed on.
  for (const signal of /** @type {const} */ (['SIGINT', 'SIGTERM', 'SIGHUP']))
    process.on(signal, () => child.kill(signal));
  child.once('exit', (code, signal) => process.exit(code ?? (signal === 'SIGINT' ? 130 : 1)));
}

/** Says what to do in a clone whose packages are not installed, or not those that its lock file names now. */
function requirePackages() {
  if (packagesAreCurrent(checkout)) return;
  const there = fs.existsSync(path.join(checkout, 'node_modules'));
  const problem = there
    ? 'The npm packages are not those of package-lock.json.'
    : 'The npm packages are not installed.';
  throw new PlainError(`${problem} Run this once, then try again:\n  cd '${checkout}' && npm ci`);
}

module.exports = { launch, requirePackages };
