import type { Readable } from 'node:stream';
import { ProblemError } from '../../http/ProblemError';
import type { FrameWriter, WrittenFrame } from './FrameWriter';
import { HEAD_BYTES, refuseByFirstBytes } from './refuseByFirstBytes';

/** An upload that sends nothing for this long has broken off, ms. */
const STALL_MS = 30_000;

/**
 * Writes a file while it arrives. What it is, is judged by its first bytes, before anything is stored.
 * @param hangUp ends the connection; called when nothing arrives for too long
 * @throws ProblemError when the file is empty, or of a kind that is not taken
 */
export async function writeFrame(stream: Readable, writer: FrameWriter, hangUp: () => void): Promise<WrittenFrame> {
  let head = Buffer.alloc(0);
  let judged = false;
  const judge = async () => {
    const refusal = refuseByFirstBytes(head);
    if (refusal !== null) throw new ProblemError('unsupported-format', refusal);
    judged = true;
    await writer.begin();
    await writer.write(head);
  };
  const stall = setTimeout(hangUp, STALL_MS);
  try {
    // A refused file is read to its end by the caller, so that its sender gets to read why: it must stay open.
    for await (const piece of stream.iterator({ destroyOnReturn: false }) as AsyncIterable<Buffer>) {
      stall.refresh();
      if (judged) await writer.write(piece);
      else {
        head = Buffer.concat([head, piece]);
        if (head.length >= HEAD_BYTES) await judge();
      }
    }
  } finally {
    clearTimeout(stall);
  }
  if (head.length === 0) throw new ProblemError('invalid', 'The file is empty.', { fields: { file: 'is empty' } });
  if (!judged) await judge();
  return writer.finish();
}
