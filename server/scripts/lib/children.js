'use strict';
const { spawn } = require('node:child_process');

/**
 * A program that a launcher has started. Each runs in a process group of its own, so that Ctrl-C reaches the launcher
 * alone and the launcher ends the rest in order.
 * @typedef {object} ChildOptions
 * @property {string} cwd
 * @property {NodeJS.ProcessEnv} [env]
 * @property {number | 'inherit' | 'pipe'} [output] a file descriptor, the terminal, or kept and given back
 * @property {boolean} [finishes] an interrupt waits for it: ending it half-way would leave a mess
 * @property {boolean} [linked] it hears when the launcher is gone (see endWithParent.js)
 *
 * @typedef {{ status: number | null, signal: NodeJS.Signals | null, output: string }} Ended
 * @typedef {{ pid: number | undefined, ended: Promise<Ended>, finishes: boolean }} Child
 */

const graceMs = 10_000;

/** @type {Set<Child>} */
const running = new Set();
let closing = false;

/**
 * @param {string} command
 * @param {string[]} args
 * @param {ChildOptions} options
 * @returns {Child}
 */
function startChild(command, args, { cwd, env = process.env, output = 'pipe', finishes = false, linked = false }) {
  if (closing) throw new Error('interrupted');
  const child = spawn(command, args, {
    cwd,
    env,
    detached: true,
    stdio: linked ? ['ignore', output, output, 'ipc'] : ['ignore', output, output],
  });
  let kept = '';
  child.stdout?.on('data', (data) => (kept += data));
  child.stderr?.on('data', (data) => (kept += data));
  /** @type {Promise<Ended>} */
  const ended = new Promise((resolve) => {
    child.once('error', (error) => resolve({ status: 127, signal: null, output: error.message }));
    child.once('close', (status, signal) => resolve({ status, signal, output: kept }));
  });
  const entry = { pid: child.pid, ended, finishes };
  running.add(entry);
  void ended.then(() => running.delete(entry));
  return entry;
}

/**
 * Runs a program to its end.
 * @param {string} command
 * @param {string[]} args
 * @param {ChildOptions} options
 * @returns {Promise<Ended>}
 */
function runChild(command, args, options) {
  return startChild(command, args, options).ended;
}

/**
 * Ends one child: SIGTERM, and SIGKILL to its whole group when it has not gone after ten seconds.
 * @param {Child} child
 */
async function endChild(child) {
  if (!running.has(child) || child.pid === undefined) return;
  const { pid } = child;
  if (child.finishes) {
    await child.ended;
    return;
  }
  signalGroup(pid, 'SIGTERM');
  const timer = setTimeout(() => signalGroup(pid, 'SIGKILL'), graceMs);
  await child.ended;
  clearTimeout(timer);
}

/** Whether the launcher is ending everything. */
function isClosing() {
  return closing;
}

/** Ends every child that still runs, and lets no new one start. */
async function endAllChildren() {
  closing = true;
  await Promise.all([...running].map(endChild));
}

/**
 * @param {number} pid
 * @param {NodeJS.Signals} signal
 */
function signalGroup(pid, signal) {
  try {
    process.kill(-pid, signal);
  } catch {
    // The group is gone already.
  }
}

module.exports = { startChild, runChild, endChild, endAllChildren, isClosing };
