import type { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import type { Request, Response } from 'express';

/** An answer that is a file rather than JSON. */
export interface FileAnswer {
  /** The whole, or a stream of it. */
  content: string | Uint8Array | Readable;
  /** Default: by the kind of the endpoint. */
  contentType?: string;
  /** When the browser is to save it under a name. */
  fileName?: string;
  /** Length of a stream in bytes, when it is known. */
  byteLength?: number;
  /** Changes whenever the content does; without quotes. Lets a browser ask "still the same?". */
  etag?: string;
  /** The address always gives the same bytes: a browser may keep them for good. */
  immutable?: boolean;
  headers?: Record<string, string>;
}

/** Sends a file answer; a stream is never held whole. */
export async function sendFile(
  request: Request,
  response: Response,
  answer: FileAnswer,
  kindType: string,
): Promise<void> {
  response.set({
    'Cache-Control': answer.immutable ? 'private, max-age=31536000, immutable' : 'private, no-cache',
    'Content-Type': answer.contentType ?? kindType,
    ...answer.headers,
  });
  if (answer.fileName !== undefined) response.attachment(answer.fileName).type(answer.contentType ?? kindType);
  if (answer.etag !== undefined) response.set('ETag', `"${answer.etag}"`);
  const { content } = answer;
  if (request.fresh) {
    if (isStream(content)) content.destroy();
    response.status(304).end();
    return;
  }
  if (!isStream(content)) {
    response.send(
      typeof content === 'string' ? content : Buffer.from(content.buffer, content.byteOffset, content.byteLength),
    );
    return;
  }
  if (answer.byteLength !== undefined) response.set('Content-Length', String(answer.byteLength));
  await pipeline(content, response);
}

const isStream = (content: FileAnswer['content']): content is Readable =>
  typeof content !== 'string' && !(content instanceof Uint8Array);
