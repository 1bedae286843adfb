import { setTimeout as sleep } from 'node:timers/promises';
import type { Logger } from 'pino';
import type { Stage } from '../../../shared/contracts/measureResult';
import { PoolClosed } from './jobFailure';
import type { JobKinds } from './protocol';
import { WarmChild, type ChildLimits, type FileSource } from './warmChild';

export interface PoolOptions extends ChildLimits {
  /** Path of the script that the children run; it calls `serveJobs`. */
  script: string;
  /** How many children are kept. */
  size: number;
  log: Logger;
}

export interface Pool<Kinds extends JobKinds> {
  readonly size: number;
  /** Children that wait for a job. */
  readonly free: number;
  /**
   * Runs a job in a child, as soon as one is free. Rejects with a `JobFailure` that says why this job has no answer,
   * or with `PoolClosed`. A child that broke down over a job is replaced.
   */
  run<Kind extends keyof Kinds & string>(
    kind: Kind,
    data: Kinds[Kind]['data'],
    files: FileSource[],
    onStage?: (stage: Stage) => void,
  ): Promise<{ answer: Kinds[Kind]['answer']; blobs: Buffer[] }>;
  /** Process ids of the children, for tests and the log. */
  pids(): number[];
  /** Ends every child at once; jobs under way are rejected with `PoolClosed`. */
  close(): Promise<void>;
}

const FIRST_PAUSE_MS = 250;
const LONGEST_PAUSE_MS = 15_000;

/**
 * A fixed number of child processes that are kept warm between jobs. A child that ends is replaced; one that cannot
 * even start is tried again with growing pauses, so that a broken installation does not spin.
 */
export function createPool<Kinds extends JobKinds>(options: PoolOptions): Pool<Kinds> {
  const children = new Set<WarmChild>();
  const idle: WarmChild[] = [];
  const waiting: { take: (child: WarmChild) => void; refuse: (error: Error) => void }[] = [];
  const closing = new AbortController();
  let nextJobId = 1;

  function offer(child: WarmChild): void {
    const next = waiting.shift();
    if (next) next.take(child);
    else idle.push(child);
  }

  async function keep(): Promise<void> {
    let pauseMs = FIRST_PAUSE_MS;
    while (!closing.signal.aborted) {
      const child = new WarmChild(options.script, options);
      children.add(child);
      const started = await child.ready.then(
        () => true,
        () => false,
      );
      if (started) {
        pauseMs = FIRST_PAUSE_MS;
        offer(child);
      }
      await child.ended;
      children.delete(child);
      const place = idle.indexOf(child);
      if (place >= 0) idle.splice(place, 1);
      if (closing.signal.aborted) return;
      options.log.warn({ pid: child.pid, said: child.errorOutput }, 'a child process ended and is replaced');
      if (started) continue;
      await sleep(pauseMs, undefined, { signal: closing.signal }).catch(() => undefined);
      pauseMs = Math.min(2 * pauseMs, LONGEST_PAUSE_MS);
    }
  }
  const keepers = Array.from({ length: options.size }, () => keep());

  function nextFree(): Promise<WarmChild> {
    if (closing.signal.aborted) return Promise.reject(new PoolClosed());
    const child = idle.shift();
    if (child) return Promise.resolve(child);
    return new Promise((take, refuse) => waiting.push({ take, refuse }));
  }

  return {
    size: options.size,
    get free() {
      return idle.length;
    },
    async run(kind, data, files, onStage = () => undefined) {
      const child = await nextFree();
      const job = { jobId: nextJobId++, kind, data, fileBytes: files.map((file) => file.byteLength) };
      try {
        const { answer, blobs } = await child.run(job, files, onStage);
        return { answer, blobs };
      } catch (error) {
        throw closing.signal.aborted ? new PoolClosed() : error;
      } finally {
        if (await child.isHeavy()) child.kill();
        if (child.alive) offer(child);
      }
    },
    pids: () => [...children].flatMap((child) => child.pid ?? []),
    async close() {
      closing.abort();
      for (const { refuse } of waiting.splice(0)) refuse(new PoolClosed());
      for (const child of children) child.kill();
      await Promise.all(keepers);
    },
  };
}
