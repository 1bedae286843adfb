import { once } from 'node:events';
import type { Writable } from 'node:stream';

/** Writes to a stream and waits for it to drain where it is full. Rejects when the stream ends meanwhile. */
export async function writeBytes(stream: Writable, bytes: Uint8Array): Promise<void> {
  if (bytes.length === 0) return;
  if (stream.destroyed) throw new Error('The bytes channel was closed.');
  if (!stream.write(bytes)) {
    const waiting = new AbortController();
    try {
      await Promise.race([
        once(stream, 'drain', { signal: waiting.signal }),
        once(stream, 'close', { signal: waiting.signal }).then(() => {
          throw new Error('The bytes channel was closed.');
        }),
      ]);
    } finally {
      waiting.abort();
    }
  }
}
