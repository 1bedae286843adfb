import { Worker } from 'node:worker_threads';

const EVERY_MS = 1000;

/**
 * Ends this process within about a second of its parent's end, even while its main thread is caught in a loop: a
 * child must not outlive a worker that was killed.
 */
export function watchParent(): void {
  const watch = `
    const { workerData } = require('node:worker_threads');
    setInterval(() => {
      if (process.ppid !== workerData.parentPid) process.kill(process.pid, 'SIGKILL');
    }, workerData.everyMs);
  `;
  new Worker(watch, { eval: true, workerData: { parentPid: process.ppid, everyMs: EVERY_MS } }).unref();
}
