'use strict';
const crypto = require('node:crypto');
const fs = require('node:fs');
const path = require('node:path');

/**
 * What the checkout remembers of its cluster, in `.ringwright/cluster.json`.
 * @typedef {{ checkout: string, home: string }} ClusterNote
 */

/**
 * The folder `.ringwright` of the checkout, made private when it is not there yet.
 * @param {string} checkout
 */
function stateFolder(checkout) {
  const folder = path.join(checkout, '.ringwright');
  fs.mkdirSync(folder, { recursive: true, mode: 0o700 });
  return folder;
}

/**
 * Where the cluster of this checkout lives. An ordinary user keeps it in `.ringwright/cluster`. Root keeps it under
 * /var/lib, because the user as whom PostgreSQL runs may be unable to reach the checkout. The place is remembered, so
 * a checkout that is moved keeps its data, and one that is copied gets a cluster of its own.
 * @param {string} checkout absolute path
 * @returns {string}
 */
function clusterHome(checkout) {
  const state = stateFolder(checkout);
  if (process.getuid?.() !== 0) return path.join(state, 'cluster');
  const noteFile = path.join(state, 'cluster.json');
  const note = readNote(noteFile);
  const moved = note !== null && note.checkout !== checkout;
  const copied = note !== null && moved && fs.existsSync(path.join(note.checkout, '.ringwright', 'cluster.json'));
  const home = note !== null && !copied ? note.home : `/var/lib/ringwright-${crypto.randomBytes(6).toString('hex')}`;
  if (note === null || moved) writePrivate(noteFile, JSON.stringify({ checkout, home }));
  return home;
}

/**
 * @param {string} file
 * @returns {ClusterNote | null}
 */
function readNote(file) {
  if (!fs.existsSync(file)) return null;
  return JSON.parse(fs.readFileSync(file, 'utf8'));
}

/**
 * Writes a file that only its owner may read, whole or not at all.
 * @param {string} file
 * @param {string} text
 */
function writePrivate(file, text) {
  const fresh = `${file}.${process.pid}`;
  fs.writeFileSync(fresh, text, { mode: 0o600 });
  fs.renameSync(fresh, file);
}

module.exports = { clusterHome, stateFolder, writePrivate };
