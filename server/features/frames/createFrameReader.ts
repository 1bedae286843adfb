import type { Request, Response } from 'express';
import multer, { MulterError, type StorageEngine } from 'multer';
import type { z } from 'zod';
import { MAX_FRAME_BYTES, type captureEndpoints, type uploadFields } from '../../../shared/contracts/captures';
import type { FileReader } from '../../http/Api';
import type { Database } from '../../database/Database';
import { OpenTransaction } from '../../database/OpenTransaction';
import { ProblemError } from '../../http/ProblemError';
import { createGate } from './createGate';
import { FrameWriter, type WrittenFrame } from './FrameWriter';
import { writeFrame } from './writeFrame';

/** What the handler of an upload is given in place of the file. */
export interface ReceivedFrame {
  /** The file's name as the sender's machine has it, without folders. */
  name: string;
  written: WrittenFrame;
  /** The transaction in which the file was written; the handler gives the frame its place in it and commits. */
  open: OpenTransaction;
}

type Fields = z.output<typeof uploadFields>;

/** Uploads that one process takes at a time; each holds a connection to the database while it runs. */
const UPLOADS_AT_ONCE = 6;
const MAX_NAME_LENGTH = 255;

/**
 * Reader of the uploads: multer with a storage engine of its own, which hashes the file and writes it to the database
 * in chunks while it arrives, never holding more than one. A file that is refused, breaks off or does not match the
 * hash that was stated leaves nothing behind: whatever happens, the transaction ends with the response.
 * @param authorise asked before the first byte is taken; throws to refuse the upload
 */
export function createFrameReader(
  database: Database,
  authorise: (laboratoryId: string, captureId: string) => Promise<void>,
): FileReader<typeof captureEndpoints.upload, ReceivedFrame> {
  const gate = createGate(UPLOADS_AT_ONCE);

  return async ({ actor, params, request, response, validBody }) => {
    await authorise(actor.laboratoryId, params.captureId);
    let open: OpenTransaction | null = null;
    let received: { body: Fields; file: ReceivedFrame } | null = null;
    const storage: StorageEngine = {
      _handleFile(_request, file, callback) {
        const receive = async () => {
          const body = validBody(request.body);
          const opened = await OpenTransaction.begin(database, await gate.enter());
          open = opened;
          response.once('close', () => void opened.rollBack());
          try {
            if (response.closed) throw brokenOff();
            const writer = new FrameWriter(opened.transaction, actor.laboratoryId);
            const written = await writeFrame(file.stream, writer, () => request.destroy());
            requireHash(written.sha256, body.sha256);
            received = { body, file: { name: plainName(file.originalname), written, open: opened } };
          } catch (error) {
            await opened.rollBack();
            throw error;
          }
        };
        receive().then(
          () => callback(null, {}),
          (error: unknown) => {
            file.stream.resume();
            callback(error);
          },
        );
      },
      _removeFile(_request, _file, callback) {
        callback(null);
      },
    };
    try {
      await parse(storage, request, response);
      if (received === null) {
        throw new ProblemError('invalid', 'The form holds no file.', { fields: { file: 'Choose a file.' } });
      }
      return received;
    } catch (error) {
      await (open as OpenTransaction | null)?.rollBack();
      throw error;
    }
  };
}

function parse(storage: StorageEngine, request: Request, response: Response): Promise<void> {
  const limits = { fileSize: MAX_FRAME_BYTES, files: 1, fields: 10, fieldSize: 10_000, fieldNameSize: 100, parts: 12 };
  const read = multer({ storage, limits, defParamCharset: 'utf8' }).single('file');
  return new Promise((resolve, reject) => {
    void read(request, response, (error: unknown) => {
      if (error === undefined || error === null) resolve();
      else reject(asProblem(error));
    });
  });
}

/** The parser's own errors are all about what was sent, except those of the storage, which stay as they are. */
function asProblem(error: unknown): unknown {
  if (error instanceof MulterError && error.code === 'LIMIT_FILE_SIZE') {
    return new ProblemError('too-large', `A frame may have ${MAX_FRAME_BYTES / 1024 / 1024} MiB at most.`);
  }
  if (error instanceof MulterError) return new ProblemError('invalid', `The form cannot be read: ${error.message}.`);
  if (
    error instanceof Error &&
    /Unexpected end|Malformed|Multipart|Request (aborted|closed)|aborted/.test(error.message)
  ) {
    return brokenOff(error);
  }
  return error;
}

function brokenOff(cause?: unknown): ProblemError {
  return new ProblemError('invalid', 'The upload broke off before its end. Send the file again.', { cause });
}

function requireHash(arrived: string, stated: string | undefined): void {
  if (stated === undefined || stated === arrived) return;
  throw new ProblemError('invalid', 'The file that arrived is not the one that was announced. Send it again.', {
    fields: { sha256: 'does not match the bytes that arrived' },
  });
}

/** The last part of a path, without control characters, of bounded length. */
function plainName(name: string): string {
  const last = name.split(/[\\/]/).at(-1) ?? '';
  return (
    last
      .replace(/\p{Cc}/gu, '')
      .trim()
      .slice(0, MAX_NAME_LENGTH) || 'frame'
  );
}
