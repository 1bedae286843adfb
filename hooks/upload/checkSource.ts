import { FRAME_EXTENSIONS, MAX_FRAME_BYTES } from '@/shared/contracts/captures';
import type { FrameSource } from './frameSource';

/** Bytes from the start of a file that are looked at. */
const HEAD_BYTES = 16;

const startsWith = (head: Uint8Array, ...bytes: number[]) => bytes.every((byte, i) => head[i] === byte);
const text = (head: Uint8Array, start: number, end: number) => String.fromCharCode(...head.subarray(start, end));

/** Whether the first bytes are those of a kind of file that can be measured. */
function isTaken(head: Uint8Array): boolean {
  return (
    startsWith(head, 0x49, 0x49, 0x2a, 0x00) || // TIFF, little-endian
    startsWith(head, 0x4d, 0x4d, 0x00, 0x2a) || // TIFF, big-endian
    startsWith(head, 0x89, 0x50, 0x4e, 0x47) || // PNG
    startsWith(head, 0xff, 0xd8, 0xff) // JPEG
  );
}

/** Kinds that people send by mistake, and what to send instead. */
function misfitKind(head: Uint8Array, name: string): string | null {
  if (text(head, 4, 8) === 'ftyp')
    return 'This is a HEIC or video file. Set the phone to save JPEG, or send TIFF or PNG.';
  if (text(head, 0, 3) === 'GIF') return 'This is a GIF. It keeps 256 colours at most. Save it as TIFF or PNG.';
  if (text(head, 0, 2) === 'BM') return 'This is a BMP. Save it as TIFF or PNG.';
  if (text(head, 0, 4) === 'RIFF') return 'This is a WebP or video file. Save it as TIFF or PNG.';
  if (text(head, 0, 4) === '%PDF') return 'This is a PDF. Send the frame itself, as TIFF or PNG.';
  if (text(head, 0, 6) === 'SIMPLE') return 'This is a FITS file. Save it as 16-bit TIFF.';
  if (/\.(dng|cr2|cr3|crw|nef|arw|raf|rw2|orf|pef)$/i.test(name)) {
    return 'This is a camera raw file. Save the frame as 16-bit TIFF without any adjustment.';
  }
  return null;
}

/**
 * Looks at a file before it is sent. The server decides; this spares a long upload of something that cannot be used.
 * @returns what is wrong and what to send instead, or null when it may be sent.
 */
export async function checkSource(source: FrameSource): Promise<string | null> {
  if (source.sizeBytes === 0) return 'The file is empty. Save the frame again.';
  if (source.sizeBytes > MAX_FRAME_BYTES) {
    const megabytes = Math.ceil(source.sizeBytes / 1024 / 1024);
    return `The file has ${megabytes} MB. The most that is taken is ${MAX_FRAME_BYTES / 1024 / 1024} MB.`;
  }
  let head: Uint8Array;
  try {
    head = await source.read(0, Math.min(HEAD_BYTES, source.sizeBytes));
  } catch {
    return 'The file cannot be read. It may have been moved, or renamed, since it was chosen. Choose it again.';
  }
  const misfit = misfitKind(head, source.name);
  if (misfit) return misfit;
  if (isTaken(head)) return null;
  const named = FRAME_EXTENSIONS.some((extension) => source.name.toLowerCase().endsWith(extension));
  return named
    ? 'The content is not what the name says. Save the frame again as TIFF, PNG or JPEG.'
    : 'This kind of file cannot be measured. Send TIFF, PNG or JPEG.';
}
