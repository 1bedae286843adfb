import type { StoredSamples } from './DecodedFrame';
import { FrameProblem } from './FrameProblem';
import { checkDimensions } from './limits';

const BLOCK = 2880;
const MAX_HEADER_BLOCKS = 64;

/**
 * Reads the primary image of a FITS file: BITPIX 8, 16, 32, -32 and -64 with BZERO and BSCALE, two axes. Physical
 * value = BZERO + BSCALE × stored (FITS standard 4.0, sections 4.4.2.5 and 5.2.5, from memory). The first stored row is
 * kept on top.
 * @throws FrameProblem when the primary array is no single plane or the file is cut off
 */
export function readFits(bytes: Buffer): StoredSamples {
  const cards = new Map<string, string>();
  let at = 0;
  let ended = false;
  for (let block = 0; block < MAX_HEADER_BLOCKS && !ended; block++) {
    if (at + BLOCK > bytes.length) break;
    for (let c = 0; c < 36 && !ended; c++) {
      const card = bytes.toString('latin1', at + c * 80, at + c * 80 + 80);
      const key = card.slice(0, 8).trim();
      if (key === 'END') ended = true;
      else if (card.slice(8, 10) === '= ' && !cards.has(key))
        cards.set(key, (card.slice(10).split('/')[0] ?? '').trim());
    }
    at += BLOCK;
  }
  if (!ended)
    throw new FrameProblem('unreadable', 'The FITS header does not end; the file seems cut off. Send it again.');
  const number = (key: string, otherwise: number) => {
    const text = cards.get(key);
    const read = text === undefined ? NaN : Number(text.replace(/D/i, 'E'));
    return Number.isFinite(read) ? read : otherwise;
  };
  const axes = number('NAXIS', 0);
  const extra = axes > 2 ? number('NAXIS3', 1) : 1;
  if (axes < 2 || extra !== 1) {
    throw new FrameProblem(
      'unsupported',
      'The primary part of this FITS file is not one single image. Send each frame as a FITS file of its own with two axes.',
    );
  }
  const widthPx = number('NAXIS1', 0);
  const heightPx = number('NAXIS2', 0);
  const kind = number('BITPIX', 0);
  if (![8, 16, 32, -32, -64].includes(kind)) {
    throw new FrameProblem('unsupported', `FITS samples of BITPIX ${kind} are not read. Send 16-bit integers.`);
  }
  const size = Math.abs(kind) / 8;
  checkDimensions(widthPx, heightPx, size, bytes.length - at, false);
  const zero = number('BZERO', 0);
  const scale = number('BSCALE', 1);
  const count = widthPx * heightPx;
  // Signed samples without an offset hold counts too, as long as none lies below zero.
  const signed = kind === 16 && zero === 0 && scale === 1 && !hasNegative(bytes, at, count);
  const whole = scale === 1 && ((kind === 8 && zero === 0) || (kind === 16 && zero === 32_768) || signed);
  const data = whole ? new Uint16Array(count) : new Float32Array(count);
  for (let i = 0; i < count; i++) {
    const p = at + i * size;
    const stored =
      kind === 8
        ? bytes[p]
        : kind === 16
          ? bytes.readInt16BE(p)
          : kind === 32
            ? bytes.readInt32BE(p)
            : kind === -32
              ? bytes.readFloatBE(p)
              : bytes.readDoubleBE(p);
    data[i] = zero + scale * stored;
  }
  const seconds = number('EXPTIME', NaN);
  const white = number('SATURATE', NaN);
  return {
    format: `FITS, BITPIX ${kind}`,
    widthPx,
    heightPx,
    data,
    storedBits: whole ? Math.abs(kind) : 32,
    exposureMs: seconds > 0 ? seconds * 1000 : null,
    blackCount: null,
    whiteCount: white > 0 ? white : null,
    mosaic: null,
    rendered: false,
    notes: [],
  };
}

function hasNegative(bytes: Buffer, from: number, count: number): boolean {
  for (let i = 0; i < count; i++) if (bytes.readInt16BE(from + 2 * i) < 0) return true;
  return false;
}
