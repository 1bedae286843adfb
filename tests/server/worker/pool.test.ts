import { fork } from 'node:child_process';
import { once } from 'node:events';
import path from 'node:path';
import { setTimeout as sleep } from 'node:timers/promises';
import pino from 'pino';
import { createPool, type Pool } from '../../../server/worker/pool/createPool';
import { type JobFailure, PoolClosed } from '../../../server/worker/pool/jobFailure';
import type { FileSource } from '../../../server/worker/pool/warmChild';
import type { TroublesomeJobs } from './troublesomeChild';

const MB = 1024 * 1024;
const script = path.join(__dirname, 'troublesomeChild.ts');
let pool: Pool<TroublesomeJobs>;

const start = (over: { size?: number; memoryMb?: number; jobSeconds?: number } = {}) =>
  createPool<TroublesomeJobs>({
    script,
    size: 2,
    memoryMb: 400,
    jobSeconds: 20,
    log: pino({ level: 'silent' }),
    ...over,
  });
const file = (...pieces: Buffer[]): FileSource => ({
  byteLength: pieces.reduce((sum, piece) => sum + piece.length, 0),
  pieces,
});
const failureOf = (promise: Promise<unknown>) =>
  promise.then(
    () => {
      throw new Error('the job was answered');
    },
    (error: unknown) => error as JobFailure,
  );
const gone = (pid: number) => {
  try {
    process.kill(pid, 0);
    return false;
  } catch {
    return true;
  }
};

jest.setTimeout(60_000);
afterEach(() => pool?.close());

test('bytes come back as they went, in order and whole', async () => {
  pool = start({ size: 1, memoryMb: 1000 });
  const first = Buffer.alloc(30 * MB);
  for (let i = 0; i < first.length; i += 4) first.writeUInt32LE((i * 2654435761) >>> 0, i);
  const second = Buffer.from('second');
  const { answer, blobs } = await pool.run('echo', { note: 'n' }, [
    file(first.subarray(0, 12345), first.subarray(12345)),
    file(second),
    file(),
  ]);
  expect(answer).toMatchObject({ note: 'n', lengths: [first.length, 6, 0] });
  expect(blobs[0]!.equals(first)).toBe(true);
  expect(blobs[1]!.equals(second)).toBe(true);
  expect(blobs[2]!.length).toBe(0);
});

test('a child is kept for the next job, and more jobs than children wait their turn', async () => {
  pool = start({ size: 1 });
  const answers = await Promise.all([1, 2, 3].map((n) => pool.run('echo', { note: String(n) }, [])));
  expect(answers.map(({ answer }) => answer.note)).toEqual(['1', '2', '3']);
  expect(new Set(answers.map(({ answer }) => answer.pid)).size).toBe(1);
});

test('stages arrive while the child computes without a pause', async () => {
  pool = start({ size: 1 });
  const seen: { stage: string; atMs: number }[] = [];
  await pool.run('stages', null, [], (stage) => seen.push({ stage, atMs: performance.now() }));
  expect(seen.map(({ stage }) => stage)).toEqual(['decode', 'fit']);
  expect(seen[1]!.atMs - seen[0]!.atMs).toBeGreaterThan(300);
});

test('a native abort fails its own job only, and other jobs are answered throughout', async () => {
  pool = start();
  const aborting = failureOf(pool.run('abort', null, []));
  const others = await Promise.all(Array.from({ length: 10 }, () => pool.run('echo', { note: 'on' }, [])));
  expect(others.every(({ answer }) => answer.note === 'on')).toBe(true);
  expect(await aborting).toMatchObject({ name: 'JobFailure', reason: 'unreadable' });
  const after = await Promise.all([1, 2, 3, 4].map(() => pool.run('echo', { note: 'still' }, [])));
  expect(after).toHaveLength(4);
});

test('a job that takes 4 GB is ended as too large, and other jobs are answered meanwhile', async () => {
  pool = start();
  let greedyEnded = false;
  const greedy = failureOf(pool.run('fill', { bytes: 4096 * MB }, [])).finally(() => (greedyEnded = true));
  let answeredMeanwhile = 0;
  while (!greedyEnded) {
    await pool.run('echo', { note: 'on' }, [file(Buffer.from('x'))]);
    if (!greedyEnded) answeredMeanwhile++;
    await sleep(5);
  }
  expect(await greedy).toMatchObject({ reason: 'too-large' });
  expect((await greedy).message).toMatch(/400 MB/);
  expect(answeredMeanwhile).toBeGreaterThan(0);
});

test('a job that never ends is ended at the limit', async () => {
  pool = start({ size: 1, jobSeconds: 1 });
  const failure = await failureOf(pool.run('spin', null, []));
  expect(failure).toMatchObject({ reason: 'timed-out' });
  expect((await pool.run('echo', { note: 'after' }, [])).answer.note).toBe('after');
});

test('a refusal keeps its reason and words, an unforeseen error becomes unreadable, and the child stays', async () => {
  pool = start({ size: 1 });
  const before = (await pool.run('echo', { note: '' }, [])).answer.pid;
  expect(await failureOf(pool.run('refuse', null, []))).toMatchObject({
    reason: 'unsupported',
    message: 'This is a photograph of a cat.',
  });
  expect(await failureOf(pool.run('stumble', null, []))).toMatchObject({ reason: 'unreadable' });
  expect((await pool.run('echo', { note: '' }, [])).answer.pid).toBe(before);
});

test('a child killed from outside fails its job with words and is replaced', async () => {
  pool = start({ size: 1 });
  await pool.run('echo', { note: '' }, []);
  const failure = failureOf(pool.run('spin', null, []));
  await sleep(100);
  process.kill(pool.pids()[0]!, 'SIGKILL');
  expect(await failure).toMatchObject({ name: 'JobFailure', reason: 'too-large' });
  expect((await pool.run('echo', { note: 'on' }, [])).answer.note).toBe('on');
});

test('a source of bytes that breaks off ends the job with its own error', async () => {
  pool = start({ size: 1 });
  async function* broken() {
    yield Buffer.alloc(10);
    throw new Error('connection lost');
  }
  await expect(pool.run('echo', { note: '' }, [{ byteLength: 20, pieces: broken() }])).rejects.toThrow(
    'connection lost',
  );
  expect((await pool.run('echo', { note: 'on' }, [])).answer.note).toBe('on');
});

test('closing rejects what runs and what waits, and leaves no process', async () => {
  pool = start({ size: 1 });
  await pool.run('echo', { note: '' }, []);
  const pids = pool.pids();
  const running = failureOf(pool.run('spin', null, []));
  const waiting = failureOf(pool.run('echo', { note: '' }, []));
  await sleep(50);
  await pool.close();
  expect(await running).toBeInstanceOf(PoolClosed);
  expect(await waiting).toBeInstanceOf(PoolClosed);
  expect(pids.every(gone)).toBe(true);
});

test('a child caught in a loop does not outlive a killed owner', async () => {
  const owner = fork(path.join(__dirname, 'poolOwner.ts'), [], {
    execArgv: ['--import', 'tsx'],
    env: { ...process.env, TSX_TSCONFIG_PATH: path.resolve('server/tsconfig.json') },
  });
  const [childPid] = (await once(owner, 'message')) as [number];
  await sleep(200);
  expect(gone(childPid)).toBe(false);
  owner.kill('SIGKILL');
  const deadline = Date.now() + 10_000;
  while (!gone(childPid) && Date.now() < deadline) await sleep(100);
  expect(gone(childPid)).toBe(true);
});
