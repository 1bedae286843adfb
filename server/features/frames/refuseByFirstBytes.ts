import { sniffFormat, type FileKind } from '../../analysis/decode/sniffFormat';

/** As many bytes as the kind of a file is told from. */
export const HEAD_BYTES = 16;

const TAKEN: readonly FileKind[] = ['tiff', 'png', 'jpeg'];
const INSTEAD = 'Send the frame as TIFF or PNG (8 or 16 bits), or as JPEG.';
const WORDS: Partial<Record<FileKind, string>> = {
  heic: 'This is an HEIC or AVIF picture, which is not read here. Set the phone’s camera to its most compatible format, or export the picture as JPEG, and send that.',
  raw: `This is a camera raw file, which is not read here. Develop it without tone curve to a 16-bit TIFF and send that.`,
  gif: `This is a GIF, whose few grey levels cannot be measured. ${INSTEAD}`,
  bmp: `This is a BMP, which is not read here. ${INSTEAD}`,
  webp: `This is a WebP picture, which is not read here. ${INSTEAD}`,
  fits: `This is a FITS file, which is not taken in a capture. ${INSTEAD}`,
  pnm: `This is a PGM or PPM file, which is not taken in a capture. ${INSTEAD}`,
};

/**
 * Why a file is not taken, judged by its first bytes and not by its name; null when it may be a frame. The sentence
 * says what to send instead.
 * @param head the first `HEAD_BYTES` of the file, or all of a shorter one
 */
export function refuseByFirstBytes(head: Buffer): string | null {
  const kind = sniffFormat(head.length < HEAD_BYTES ? Buffer.concat([head], HEAD_BYTES) : head);
  if (TAKEN.includes(kind)) return null;
  return WORDS[kind] ?? `This is not a picture that is read here. ${INSTEAD}`;
}
