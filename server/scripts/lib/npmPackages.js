'use strict';
const fs = require('node:fs');
const path = require('node:path');
const { runChild } = require('./children.js');
const { PlainError } = require('./plainError.js');
const { say } = require('./say.js');

/** @typedef {Record<string, { version?: string, integrity?: string, optional?: boolean, link?: boolean }>} LockedPackages */

/**
 * Whether node_modules holds what the lock file names: compared with the list that npm leaves after an installation.
 * @param {string} checkout
 */
function packagesAreCurrent(checkout) {
  const installedFile = path.join(checkout, 'node_modules', '.package-lock.json');
  if (!fs.existsSync(installedFile)) return false;
  const wanted = lockedPackages(path.join(checkout, 'package-lock.json'));
  const installed = lockedPackages(installedFile);
  return Object.entries(wanted).every(([place, entry]) => {
    if (!place.startsWith('node_modules/') || entry.link) return true;
    const there = installed[place];
    if (there === undefined) return entry.optional === true;
    return there.version === entry.version && there.integrity === entry.integrity;
  });
}

/**
 * @param {string} file
 * @returns {LockedPackages}
 */
function lockedPackages(file) {
  return JSON.parse(fs.readFileSync(file, 'utf8')).packages;
}

/**
 * Installs the npm packages when they are missing or the lock file has changed.
 * @param {string} checkout
 */
async function ensurePackages(checkout) {
  if (packagesAreCurrent(checkout)) return;
  say('Installing the npm packages (a minute or two the first time) …');
  const { npm_execpath: npm } = process.env;
  const [command, ...first] = npm ? [process.execPath, npm] : ['npm'];
  const ended = await runChild(command, [...first, 'ci', '--include=dev', '--no-audit', '--no-fund'], {
    cwd: checkout,
    env: withoutProduction(),
  });
  if (ended.status !== 0) {
    throw new PlainError(`npm ci failed. Its last words:\n${ended.output.trim().split('\n').slice(-20).join('\n')}`);
  }
}

/** NODE_ENV=production would leave out the packages that the export and the tests need. */
function withoutProduction() {
  const env = { ...process.env };
  delete env.NODE_ENV;
  return env;
}

module.exports = { ensurePackages, packagesAreCurrent };
