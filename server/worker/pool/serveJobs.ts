import { Socket } from 'node:net';
import type { FailureReason } from '../../../shared/contracts/measureResult';
import { ByteReader } from './byteReader';
import { JobFailure } from './jobFailure';
import { BYTES_FD, type ChildMessage, type JobHandlers, type JobKinds, type JobMessage } from './protocol';
import { watchParent } from './watchParent';
import { writeBytes } from './writeBytes';

/**
 * The child's side of the pool: takes one job after the other from the process that forked it, until that process
 * ends. A handler that throws a `JobFailure` fails its job with that reason; anything else it throws is reported as
 * `unreadable`, because a handler's input is a file of unknown make.
 */
export function serveJobs<Kinds extends JobKinds>(handlers: JobHandlers<Kinds>): void {
  const bytes = new Socket({ fd: BYTES_FD, readable: true, writable: true });
  const reader = new ByteReader(bytes);
  watchParent();
  process.on('disconnect', () => process.exit(0));
  process.on('message', (message) => {
    void serve(message as JobMessage);
  });
  tell({ type: 'ready' });

  async function serve(job: JobMessage): Promise<void> {
    const { jobId } = job;
    try {
      const files: Buffer[] = [];
      for (const length of job.fileBytes) files.push(await reader.read(length));
      const handler = handlers[job.kind];
      if (!handler) throw new JobFailure('bad-case', `No job of the kind “${job.kind}” is known here.`);
      const { answer, blobs = [] } = await handler(job.data, files, (stage) => tell({ type: 'stage', jobId, stage }));
      tell({ type: 'done', jobId, answer, blobBytes: blobs.map((blob) => blob.byteLength) });
      for (const blob of blobs) await writeBytes(bytes, blob);
    } catch (error) {
      tell({ type: 'failed', jobId, ...failureOf(error) });
    }
  }
}

function tell(message: ChildMessage): void {
  process.send?.(message);
}

function failureOf(error: unknown): { reason: FailureReason; message: string } {
  if (error instanceof JobFailure) return { reason: error.reason, message: error.message };
  const said = error instanceof Error ? error.message : String(error);
  return { reason: 'unreadable', message: `The file could not be read: ${said}` };
}
