'use strict';
const fs = require('node:fs');

/**
 * Holds a lock file with our process id while the work runs; waits for another launcher that holds it, and takes over
 * from one that is gone.
 * @template T
 * @param {string} file
 * @param {() => Promise<T>} work
 * @returns {Promise<T>}
 */
async function withLock(file, work) {
  while (!take(file)) await new Promise((resolve) => setTimeout(resolve, 300));
  try {
    return await work();
  } finally {
    fs.rmSync(file, { force: true });
  }
}

/** @param {string} file */
function take(file) {
  try {
    fs.writeFileSync(file, String(process.pid), { flag: 'wx', mode: 0o600 });
    return true;
  } catch (error) {
    if (!(error instanceof Error && 'code' in error && error.code === 'EEXIST')) throw error;
  }
  const holder = Number(fs.readFileSync(file, { encoding: 'utf8', flag: 'a+' }));
  if (holder > 0 && holder !== process.pid && !isAlive(holder)) fs.rmSync(file, { force: true });
  return false;
}

/** @param {number} pid */
function isAlive(pid) {
  try {
    process.kill(pid, 0);
    return true;
  } catch (error) {
    return error instanceof Error && 'code' in error && error.code === 'EPERM';
  }
}

module.exports = { withLock, isAlive };
