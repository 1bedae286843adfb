import { fork, type ChildProcess } from 'node:child_process';
import { writeFile } from 'node:fs/promises';
import path from 'node:path';
import type { Duplex } from 'node:stream';
import type { Stage } from '../../../shared/contracts/measureResult';
import { ByteReader } from './byteReader';
import { JobFailure } from './jobFailure';
import { BYTES_FD, type ChildMessage, type JobMessage } from './protocol';
import { residentBytes } from './residentBytes';
import { writeBytes } from './writeBytes';

/** A file on its way to a child: its length, and its bytes in pieces, so that nobody has to hold it whole. */
export interface FileSource {
  byteLength: number;
  pieces: AsyncIterable<Uint8Array> | Iterable<Uint8Array>;
}

export interface ChildLimits {
  /** Resident memory above which the child is killed, MB (1024 × 1024 bytes). */
  memoryMb: number;
  /** Wall clock of one job, seconds. */
  jobSeconds: number;
}

export interface JobAnswer {
  answer: unknown;
  blobs: Buffer[];
}

const CHECK_MEMORY_EVERY_MS = 50;
const REPOSITORY = path.resolve(__dirname, '../../..');
/** Part of the memory limit that JavaScript's own heap may take; decoders work outside it. */
const HEAP_PART = 0.75;
const KEPT_STDERR = 2000;
const MB = 1024 * 1024;

/**
 * One child process of the pool. It does one job at a time and stays for the next; when it ends, whatever the reason,
 * `ended` resolves and it is of no further use.
 */
export class WarmChild {
  readonly ready: Promise<void>;
  readonly ended: Promise<void>;
  private readonly child: ChildProcess;
  private readonly channel: Duplex;
  private readonly reader: ByteReader;
  private lastWords = '';
  private over = false;
  /** Why this side killed it, if it did. */
  private verdict: JobFailure | null = null;
  private onMessage: ((message: ChildMessage) => void) | null = null;

  constructor(
    script: string,
    private readonly limits: ChildLimits,
  ) {
    this.child = fork(script, [], {
      cwd: REPOSITORY,
      execArgv: ['--import', 'tsx', `--max-old-space-size=${Math.floor(limits.memoryMb * HEAP_PART)}`],
      // A child reads files of unknown make: it is given nothing it could give away.
      env: { TSX_TSCONFIG_PATH: path.join(REPOSITORY, 'server/tsconfig.json'), MALLOC_ARENA_MAX: '2' },
      serialization: 'advanced',
      stdio: ['ignore', 'ignore', 'pipe', 'pipe', 'ipc'],
    });
    this.channel = this.child.stdio[BYTES_FD] as Duplex;
    this.reader = new ByteReader(this.channel);
    this.child.stderr?.on('data', (chunk: Buffer) => {
      this.lastWords = (this.lastWords + chunk.toString()).slice(-KEPT_STDERR);
    });
    this.ended = new Promise((resolve) => {
      const end = () => {
        this.over = true;
        resolve();
      };
      this.child.once('exit', end);
      this.child.once('error', end);
    });
    this.ready = new Promise((resolve, reject) => {
      this.onMessage = (message) => message.type === 'ready' && resolve();
      void this.ended.then(() => reject(this.whyEnded()));
    });
    this.ready.catch(() => undefined);
    this.child.on('message', (message) => this.onMessage?.(message as ChildMessage));
    this.child.once('spawn', () => void this.offerToTheSystem());
  }

  get pid(): number | undefined {
    return this.child.pid;
  }

  /** Whether it can take another job: it runs, and is not about to be ended. */
  get alive(): boolean {
    return !this.over && !this.child.killed;
  }

  /** What the child last wrote to its error output, for the log. */
  get errorOutput(): string {
    return this.lastWords;
  }

  /**
   * Sends a job with its files and waits for the answer. Rejects with a `JobFailure` that says what is wrong with the
   * job, or with whatever error the source of the files ended in. Afterwards `alive` tells whether it can be used on.
   */
  async run(job: JobMessage, files: FileSource[], onStage: (stage: Stage) => void): Promise<JobAnswer> {
    const stopWatch = this.watch();
    try {
      return await Promise.race([this.converse(job, files, onStage), this.explainEnd()]);
    } catch (error) {
      // The files' source failed: the child waits for bytes that will not come.
      if (!(error instanceof JobFailure)) this.kill();
      throw error;
    } finally {
      stopWatch();
      this.onMessage = null;
    }
  }

  /** Whether it holds on to so much memory between jobs that the next one had better start in a new child. */
  async isHeavy(): Promise<boolean> {
    const bytes = this.child.pid === undefined ? null : await residentBytes(this.child.pid);
    return bytes !== null && bytes > (this.limits.memoryMb * MB) / 2;
  }

  kill(): void {
    this.child.kill('SIGKILL');
  }

  private async converse(job: JobMessage, files: FileSource[], onStage: (stage: Stage) => void): Promise<JobAnswer> {
    const answered = new Promise<Extract<ChildMessage, { type: 'done' }>>((resolve, reject) => {
      this.onMessage = (message) => {
        if (message.type === 'ready' || message.jobId !== job.jobId) return;
        if (message.type === 'stage') onStage(message.stage);
        else if (message.type === 'failed') reject(new JobFailure(message.reason, message.message));
        else resolve(message);
      };
    });
    answered.catch(() => undefined);
    this.child.send(job);
    const explain = () => this.explainEnd();
    for (const file of files) {
      for await (const piece of file.pieces) await writeBytes(this.channel, piece).catch(explain);
    }
    const done = await answered;
    const blobs: Buffer[] = [];
    for (const length of done.blobBytes) blobs.push(await this.reader.read(length).catch(explain));
    return { answer: done.answer, blobs };
  }

  /** Watches the clock and the memory of the child while a job runs; returns what ends the watch. */
  private watch(): () => void {
    const { memoryMb, jobSeconds } = this.limits;
    const clock = setTimeout(() => {
      this.condemn('timed-out', `The file was not done after ${jobSeconds} s, which is the limit here.`);
    }, jobSeconds * 1000);
    let checking = false;
    let watching = true;
    const memory = setInterval(() => {
      if (checking || this.child.pid === undefined) return;
      checking = true;
      void residentBytes(this.child.pid).then((bytes) => {
        checking = false;
        if (watching && bytes !== null && bytes > memoryMb * MB) this.condemn('too-large', tooLarge(memoryMb));
      });
    }, CHECK_MEMORY_EVERY_MS);
    return () => {
      watching = false;
      clearTimeout(clock);
      clearInterval(memory);
    };
  }

  private condemn(reason: 'timed-out' | 'too-large', message: string): void {
    this.verdict ??= new JobFailure(reason, message);
    this.kill();
  }

  /** Waits for the end of the child, which a broken channel announces, and throws the reason. */
  private async explainEnd(): Promise<never> {
    await this.ended;
    throw this.whyEnded();
  }

  private whyEnded(): JobFailure {
    if (this.verdict) return this.verdict;
    if (/heap out of memory|Array buffer allocation failed/.test(this.lastWords)) {
      return new JobFailure('too-large', tooLarge(this.limits.memoryMb));
    }
    if (this.child.signalCode === 'SIGKILL') {
      return new JobFailure(
        'too-large',
        'The system ended the process that read the file, most often for want of memory.',
      );
    }
    return new JobFailure(
      'unreadable',
      'The process that read the file broke down over it. The file is most likely damaged.',
    );
  }

  /** When memory runs out, the system shall take this process rather than the one that holds the queue. */
  private async offerToTheSystem(): Promise<void> {
    await writeFile(`/proc/${this.child.pid}/oom_score_adj`, '1000').catch(() => undefined);
  }
}

function tooLarge(memoryMb: number): string {
  return `The file needs more than the ${memoryMb} MB of memory that one frame may take here.`;
}
