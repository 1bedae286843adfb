'use strict';
const fs = require('node:fs');
const path = require('node:path');
const { runChild } = require('./children.js');
const { PlainError } = require('./plainError.js');
const { installedPostgres } = require('./postgresPrograms.js');
const { say } = require('./say.js');

/**
 * A program that comes with Debian.
 * @typedef {{ debianPackage: string, purpose: string, isThere: () => boolean }} Need
 */

/** @type {Need} */
const postgres = {
  debianPackage: 'postgresql',
  purpose: 'the database',
  isThere: () => installedPostgres().length > 0,
};

/** @type {Need} */
const chromium = {
  debianPackage: 'chromium',
  purpose: 'the browser of the tests',
  isThere: () => findChromium() !== null,
};

/**
 * The browser for the tests: RINGWRIGHT_CHROMIUM, or one of the usual names on PATH.
 * @returns {string | null}
 */
function findChromium() {
  const given = process.env.RINGWRIGHT_CHROMIUM;
  if (given) return fs.existsSync(given) ? given : null;
  const folders = (process.env.PATH ?? '').split(path.delimiter).concat('/usr/bin');
  const places = ['chromium', 'chromium-browser'].flatMap((name) => folders.map((folder) => path.join(folder, name)));
  return places.find((place) => fs.existsSync(place)) ?? null;
}

const createClusterFile = '/etc/postgresql-common/createcluster.conf';

/**
 * Installs what is missing by apt. An ordinary user is told what to install instead.
 * @param {Need[]} needs
 */
async function ensureDebianPackages(needs) {
  const missing = needs.filter((need) => !need.isThere());
  if (missing.length === 0) return;
  const names = missing.map((need) => need.debianPackage);
  const list = missing.map((need) => `  ${need.debianPackage}: ${need.purpose}`).join('\n');
  const command = `apt-get install -y --no-install-recommends ${names.join(' ')}`;
  if (!fs.existsSync('/usr/bin/apt-get')) {
    throw new PlainError(`These programs are missing, and this system has no apt to install them with:\n${list}`);
  }
  if (process.getuid?.() !== 0) throw new PlainError(instructions(list, command, names));

  say(`Installing ${names.join(' and ')} from Debian …`);
  if (names.includes('postgresql')) preventMainCluster();
  const quiet = ['-q', '-y', '-o', 'DPkg::Lock::Timeout=300', '-o', 'Acquire::Retries=3'];
  const updated = await apt([...quiet, 'update']);
  // The file that prevents the main cluster counts as changed by the administrator: keep it, without asking.
  const keep = ['-o', 'Dpkg::Options::=--force-confdef', '-o', 'Dpkg::Options::=--force-confold'];
  const installed = await apt([...quiet, ...keep, 'install', '--no-install-recommends', ...names]);
  if (installed.status !== 0) {
    const words = `${updated.status === 0 ? '' : updated.output}\n${installed.output}`.trim().split('\n');
    throw new PlainError(
      `apt could not install ${names.join(' and ')}. Its last words:\n${words.slice(-15).join('\n')}\n` +
        `Put that right, or install by hand, then start again:\n  ${command}`,
    );
  }
  const still = missing.filter((need) => !need.isThere()).map((need) => need.debianPackage);
  if (still.length > 0)
    throw new PlainError(`apt installed ${still.join(' and ')}, and yet its programs are not found.`);
}

/**
 * @param {string} list
 * @param {string} command
 * @param {string[]} names
 */
function instructions(list, command, names) {
  const prevention = names.includes('postgresql')
    ? `  mkdir -p ${path.dirname(createClusterFile)} && echo 'create_main_cluster = false' > ${createClusterFile}\n`
    : '';
  const why =
    prevention === ''
      ? ''
      : '\nThe first line keeps Debian from starting a database of its own; leave it out if you want one.';
  return `These Debian packages are missing:\n${list}\nAs root, run:\n${prevention}  ${command}${why}`;
}

/** Debian starts a cluster of its own when PostgreSQL is installed; nobody here would use it. */
function preventMainCluster() {
  if (fs.existsSync(createClusterFile)) return;
  fs.mkdirSync(path.dirname(createClusterFile), { recursive: true });
  fs.writeFileSync(
    createClusterFile,
    '# Written by the Ringwright launcher: it keeps a cluster of its own.\n# Remove this file before you create one for other uses by installing a server.\ncreate_main_cluster = false\n',
  );
}

/** @param {string[]} args */
function apt(args) {
  return runChild('/usr/bin/apt-get', args, {
    cwd: '/',
    env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive', LC_ALL: 'C.UTF-8' },
    finishes: true,
  });
}

module.exports = { ensureDebianPackages, findChromium, postgres, chromium };
