import type { FrameSource } from './frameSource';
import { sha256 } from './sha256';

/** Pieces are small enough that hashing one takes a few milliseconds, so that the screen goes on answering. */
const PIECE_BYTES = 1024 * 1024;
/** Above this a file is hashed piece by piece, so that it need not lie in memory at once. */
const WHOLE_BYTES = 64 * 1024 * 1024;

/** The browser's own digest, where the page has a secure context; null elsewhere. */
export type Digest = ((bytes: Uint8Array<ArrayBuffer>) => Promise<ArrayBuffer>) | null;

function ownDigest(): Digest {
  const subtle = globalThis.crypto?.subtle as SubtleCrypto | undefined;
  return subtle ? (bytes) => subtle.digest('SHA-256', bytes) : null;
}

function hexadecimal(buffer: ArrayBuffer): string {
  return Array.from(new Uint8Array(buffer), (byte) => byte.toString(16).padStart(2, '0')).join('');
}

const nextTurn = () => new Promise<void>((resolve) => setTimeout(resolve, 0));

/**
 * SHA-256 of a file as 64 hexadecimal digits, without holding up the screen.
 * @param onProgress part that is done, 0 to 1.
 * @throws the signal's reason when it is aborted; whatever `source.read` throws when the file cannot be read.
 */
export async function hashSource(
  source: FrameSource,
  options: { signal?: AbortSignal; onProgress?: (part: number) => void; digest?: Digest } = {},
): Promise<string> {
  const digest = options.digest === undefined ? ownDigest() : options.digest;
  options.signal?.throwIfAborted();
  if (digest && source.sizeBytes <= WHOLE_BYTES) {
    const bytes = await source.read(0, source.sizeBytes);
    options.signal?.throwIfAborted();
    const answer = hexadecimal(await digest(new Uint8Array(bytes)));
    options.signal?.throwIfAborted();
    return answer;
  }
  const hash = sha256();
  for (let start = 0; start < source.sizeBytes; start += PIECE_BYTES) {
    const end = Math.min(start + PIECE_BYTES, source.sizeBytes);
    hash.update(await source.read(start, end));
    options.onProgress?.(end / source.sizeBytes);
    await nextTurn();
    options.signal?.throwIfAborted();
  }
  return hash.digest();
}
