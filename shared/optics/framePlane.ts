/** Decoded counts of a frame, row-major, rows from the top, length widthPx × heightPx. */
export interface FramePlane {
  widthPx: number;
  heightPx: number;
  data: Uint16Array;
  /** Level of no light, counts. */
  blackCount: number;
  /** Level at which the sensor is full, counts. */
  whiteCount: number;
}

/** Misfit of each pixel, one byte: 0 masked, else 128 + 10 × misfit held to 1…255. Row-major, rows from the top. */
export interface MisfitPlane {
  widthPx: number;
  heightPx: number;
  bytes: Uint8Array;
}

const MISFIT_ZERO = 128;
const MISFIT_STEPS = 10;

/** Misfit in units of the expected noise; null for a masked pixel. */
export function misfitOfByte(byte: number): number | null {
  return byte === 0 ? null : (byte - MISFIT_ZERO) / MISFIT_STEPS;
}

/**
 * Reads counts as they are sent: 16-bit little-endian, two bytes a pixel.
 * @throws RangeError when the length does not fit the size.
 */
export function decodeCounts(bytes: ArrayBuffer, widthPx: number, heightPx: number): Uint16Array {
  const count = widthPx * heightPx;
  if (bytes.byteLength !== count * 2) {
    throw new RangeError(
      `A plane of ${widthPx} × ${heightPx} pixels takes ${count * 2} bytes, not ${bytes.byteLength}.`,
    );
  }
  if (isLittleEndian()) return new Uint16Array(bytes);
  const view = new DataView(bytes);
  return Uint16Array.from({ length: count }, (_, i) => view.getUint16(2 * i, true));
}

function isLittleEndian(): boolean {
  return new Uint8Array(Uint16Array.of(1).buffer)[0] === 1;
}

/** Pixel whose area holds a point in full-frame pixels (centres at whole numbers); null outside the frame. */
export function pixelIndexAt(plane: { widthPx: number; heightPx: number }, xPx: number, yPx: number): number | null {
  const column = Math.round(xPx);
  const row = Math.round(yPx);
  if (column < 0 || row < 0 || column >= plane.widthPx || row >= plane.heightPx) return null;
  return row * plane.widthPx + column;
}

/** Number of masked pixels. */
export function maskedCount(misfit: MisfitPlane): number {
  let count = 0;
  for (const byte of misfit.bytes) if (byte === 0) count += 1;
  return count;
}
