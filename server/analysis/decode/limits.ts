import { FrameProblem } from './FrameProblem';

/** Largest file that is looked at, bytes. */
export const MAX_FILE_BYTES = 512 * 1024 * 1024;
/** Largest frame that is decoded, pixels. Covers the largest area sensors in common use with room to spare. */
export const MAX_PIXELS = 110_000_000;
/** Smallest side of a frame on which a pattern can be measured, pixels. */
export const MIN_SIDE_PX = 16;
/** No decoder in use makes more than this many bytes out of one (deflate: 1032). */
export const MAX_EXPANSION = 1100;

/**
 * Checks declared dimensions before anything is allocated.
 * @param storedBytes bytes of the file that may hold pixels
 * @param bytesPerPixel bytes of one decoded pixel, all channels
 * @throws FrameProblem when the dimensions are impossible, too small or too large
 */
export function checkDimensions(
  widthPx: number,
  heightPx: number,
  bytesPerPixel: number,
  storedBytes: number,
  compressed: boolean,
): void {
  if (!Number.isInteger(widthPx) || !Number.isInteger(heightPx) || widthPx < 1 || heightPx < 1) {
    throw new FrameProblem(
      'unreadable',
      'The file states no usable width and height. Send the frame again as the camera stored it.',
    );
  }
  if (widthPx * heightPx > MAX_PIXELS) {
    throw new FrameProblem(
      'too-large',
      `The file declares ${widthPx} × ${heightPx} pixels; at most ${MAX_PIXELS / 1e6} megapixels are measured. Send a region of the sensor around the pattern.`,
    );
  }
  if (widthPx < MIN_SIDE_PX || heightPx < MIN_SIDE_PX) {
    throw new FrameProblem(
      'unsupported',
      `The picture is ${widthPx} × ${heightPx} pixels, too small to hold a pattern. Send the whole frame, at least ${MIN_SIDE_PX} pixels a side.`,
    );
  }
  const expected = widthPx * heightPx * bytesPerPixel;
  const most = compressed ? storedBytes * MAX_EXPANSION : storedBytes;
  if (expected > most) {
    throw new FrameProblem(
      'unreadable',
      `The file declares ${widthPx} × ${heightPx} pixels but holds too few bytes for them; it seems cut off. Send it again.`,
    );
  }
}
