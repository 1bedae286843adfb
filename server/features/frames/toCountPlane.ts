import type { CountPlane } from '../../../shared/optics/lineProfile';
import type { StoredRendition } from './frameRepository';

/** Layout of a plane's bytes: unsigned 16-bit counts, little-endian, row-major, rows from the top. */
export const PLANE_ENCODING = 'uint16-le';

/** The counts of a stored plane; without a copy where the bytes lie on an even address. */
export function toCountPlane({ widthPx, heightPx, encoding, bytes }: StoredRendition): CountPlane {
  if (encoding !== PLANE_ENCODING) throw new Error(`A plane is stored as ${encoding}.`);
  if (bytes.length !== widthPx * heightPx * 2)
    throw new Error(`A plane of ${widthPx} × ${heightPx} has ${bytes.length} bytes.`);
  const aligned = bytes.byteOffset % 2 === 0 ? bytes : Buffer.from(Uint8Array.from(bytes).buffer);
  return { widthPx, heightPx, data: new Uint16Array(aligned.buffer, aligned.byteOffset, widthPx * heightPx) };
}
