import { promisify } from 'node:util';
import { gunzip } from 'node:zlib';
import type { StoredRendition } from './frameRepository';

const PACKED = '+gzip';

/** Whether a rendition's bytes are packed with gzip (RFC 1952). */
export const isPacked = ({ encoding }: StoredRendition): boolean => encoding.endsWith(PACKED);

/** The rendition with its bytes as they are laid out, unpacked if need be. */
export async function unpacked(rendition: StoredRendition): Promise<StoredRendition> {
  if (!isPacked(rendition)) return rendition;
  const bytes = await promisify(gunzip)(rendition.bytes);
  return { ...rendition, encoding: rendition.encoding.slice(0, -PACKED.length), bytes };
}
