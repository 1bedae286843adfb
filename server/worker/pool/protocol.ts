import type { FailureReason, Stage } from '../../../shared/contracts/measureResult';

/**
 * What goes over the control channel between the pool and a child. Bytes never go here: they follow on the
 * bytes channel (file descriptor 3), in the order and with the lengths that the message states.
 */
export interface JobMessage {
  jobId: number;
  kind: string;
  data: unknown;
  /** Length of each file that follows, bytes. */
  fileBytes: number[];
}

export type ChildMessage =
  | { type: 'ready' }
  | { type: 'stage'; jobId: number; stage: Stage }
  | { type: 'failed'; jobId: number; reason: FailureReason; message: string }
  | {
      type: 'done';
      jobId: number;
      answer: unknown;
      /** Length of each piece that follows on the bytes channel, bytes. */
      blobBytes: number[];
    };

/** File descriptor of the bytes channel in the child. */
export const BYTES_FD = 3;

/** What a kind of job takes and gives, besides bytes. */
export type JobKinds = Record<string, { data: unknown; answer: unknown }>;

/** Does one job in a child: `files` are whole files in memory; the answer's blobs are sent as bytes. */
export type JobHandler<Data, Answer> = (
  data: Data,
  files: Buffer[],
  onStage: (stage: Stage) => void,
) => Promise<{ answer: Answer; blobs?: Uint8Array[] }>;

export type JobHandlers<Kinds extends JobKinds> = {
  [Kind in keyof Kinds]: JobHandler<Kinds[Kind]['data'], Kinds[Kind]['answer']>;
};
