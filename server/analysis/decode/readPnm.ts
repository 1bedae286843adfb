import type { StoredSamples } from './DecodedFrame';
import { FrameProblem } from './FrameProblem';
import { checkDimensions } from './limits';

/**
 * Reads a binary portable graymap (P5), 8 or 16 bits, big-endian as the format's definition says (from memory: the
 * netpbm manual page of pgm). The comment lines of the header are skipped.
 * @throws FrameProblem when the file is not a P5 graymap or is cut off
 */
export function readPnm(bytes: Buffer): StoredSamples {
  const kind = bytes.toString('latin1', 0, 2);
  if (kind !== 'P5') {
    throw new FrameProblem(
      'unsupported',
      `A portable bitmap of kind ${kind} is not measured. Send a binary graymap (P5) or a 16-bit TIFF.`,
    );
  }
  const header = bytes.toString('latin1', 2, Math.min(bytes.length, 4096));
  const fields: number[] = [];
  let at = 0;
  while (fields.length < 3) {
    const rest = /^(?:\s|#[^\n]*\n)*(\d{1,10})/.exec(header.slice(at));
    if (!rest) throw new FrameProblem('unreadable', 'The graymap header is damaged. Send the file again.');
    fields.push(Number(rest[1]));
    at += rest[0].length;
  }
  const [widthPx, heightPx, whiteCount] = fields as [number, number, number];
  const start = 2 + at + 1;
  if (whiteCount < 1 || whiteCount > 65_535) {
    throw new FrameProblem('unreadable', 'The graymap states a white level outside 1 to 65 535. Send the file again.');
  }
  const wide = whiteCount > 255;
  checkDimensions(widthPx, heightPx, wide ? 2 : 1, bytes.length - start, false);
  const data = new Uint16Array(widthPx * heightPx);
  for (let i = 0; i < data.length; i++) data[i] = wide ? bytes.readUInt16BE(start + 2 * i) : bytes[start + i];
  return {
    format: wide ? 'PGM, 16-bit' : 'PGM, 8-bit',
    widthPx,
    heightPx,
    data,
    storedBits: wide ? 16 : 8,
    exposureMs: null,
    blackCount: null,
    whiteCount: null,
    mosaic: null,
    rendered: false,
    notes: [],
  };
}
