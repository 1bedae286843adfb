'use strict';
const fs = require('node:fs');
const path = require('node:path');
const { execFileSync } = require('node:child_process');
const { PlainError } = require('./plainError.js');

const debianRoot = '/usr/lib/postgresql';

/**
 * The PostgreSQL programs of this machine.
 * @typedef {{ major: number, bin: string }} PostgresPrograms
 */

/**
 * Every installed PostgreSQL server, newest first. RINGWRIGHT_POSTGRES_BIN names a folder of programs to use instead.
 * @returns {PostgresPrograms[]}
 */
function installedPostgres() {
  const given = process.env.RINGWRIGHT_POSTGRES_BIN;
  const folders = given ? [given] : debianFolders();
  return folders
    .filter((bin) => ['initdb', 'pg_ctl', 'postgres'].every((name) => fs.existsSync(path.join(bin, name))))
    .map((bin) => ({ bin, major: majorOf(bin) }))
    .sort((a, b) => b.major - a.major);
}

/** @returns {string[]} */
function debianFolders() {
  if (!fs.existsSync(debianRoot)) return [];
  return fs
    .readdirSync(debianRoot)
    .filter((name) => /^\d+$/.test(name))
    .map((name) => path.join(debianRoot, name, 'bin'));
}

/** @param {string} bin */
function majorOf(bin) {
  const answer = execFileSync(path.join(bin, 'postgres'), ['--version'], { encoding: 'utf8' });
  const found = /(\d+)(?:\.\d+|devel|beta|rc)/.exec(answer);
  if (!found) throw new PlainError(`${bin}/postgres does not say its version: ${answer.trim()}`);
  return Number(found[1]);
}

/**
 * The user as whom PostgreSQL runs. PostgreSQL refuses to run as root, so root hands over to `postgres`, or to
 * `nobody` where Debian's user does not exist. Anyone else runs it as themselves.
 * @returns {{ uid: number, gid: number } | null} null: as ourselves
 */
function postgresUser() {
  if (process.getuid?.() !== 0) return null;
  for (const name of ['postgres', 'nobody']) {
    try {
      const uid = Number(execFileSync('id', ['-u', name], { encoding: 'utf8', stdio: ['ignore', 'pipe', 'ignore'] }));
      const gid = Number(execFileSync('id', ['-g', name], { encoding: 'utf8', stdio: ['ignore', 'pipe', 'ignore'] }));
      if (uid > 0) return { uid, gid };
    } catch {
      continue;
    }
  }
  throw new PlainError('PostgreSQL does not run as root, and this machine has neither a user postgres nor nobody.');
}

module.exports = { installedPostgres, postgresUser };
