'use strict';
const fs = require('node:fs');
const path = require('node:path');
const { stateFolder, writePrivate } = require('./clusterHome.js');
const { PlainError } = require('./plainError.js');

/**
 * Says that this checkout runs, so that a second start of it does not take the same database over. Returns how to let
 * go again. A start that was killed does not count.
 * @param {string} checkout
 * @param {string} url
 * @returns {() => void}
 */
function claimCheckout(checkout, url) {
  const file = path.join(stateFolder(checkout), 'running.json');
  if (fs.existsSync(file)) {
    const holder = JSON.parse(fs.readFileSync(file, 'utf8'));
    if (isLauncher(holder.pid)) {
      throw new PlainError(
        `Ringwright already runs from this folder: ${holder.url} (process ${holder.pid}).\nEnd it with Ctrl-C where it was started, or: kill ${holder.pid}`,
      );
    }
  }
  writePrivate(file, JSON.stringify({ pid: process.pid, url }));
  return () => fs.rmSync(file, { force: true });
}

/** @param {number} pid */
function isLauncher(pid) {
  if (pid === process.pid) return false;
  try {
    return fs.readFileSync(`/proc/${pid}/cmdline`, 'utf8').includes('start.js');
  } catch {
    return false;
  }
}

module.exports = { claimCheckout };
