import type { LineProfile } from '../contracts/lineProfile';

export interface CountPlane {
  widthPx: number;
  heightPx: number;
  /** Counts, row-major, length widthPx × heightPx. */
  data: Uint16Array;
}

export interface LineSegment {
  /** Ends in full-frame pixels; the centre of the top-left pixel is 0, 0, x right, y down. */
  x0: number;
  y0: number;
  x1: number;
  y1: number;
  /** Width averaged across the line, at least 1. */
  widthPx: number;
}

/** Bilinear between the four pixel centres around (x, y); NaN outside the outermost centres. */
function sampleBilinear({ widthPx, heightPx, data }: CountPlane, x: number, y: number): number {
  if (!(x >= 0 && y >= 0 && x <= widthPx - 1 && y <= heightPx - 1)) return NaN;
  const column = Math.min(Math.floor(x), Math.max(widthPx - 2, 0));
  const row = Math.min(Math.floor(y), Math.max(heightPx - 2, 0));
  const right = widthPx > 1 ? 1 : 0;
  const below = heightPx > 1 ? widthPx : 0;
  const fx = x - column;
  const fy = y - row;
  const at = row * widthPx + column;
  const upper = data[at] * (1 - fx) + data[at + right] * fx;
  const lower = data[at + below] * (1 - fx) + data[at + below + right] * fx;
  return upper * (1 - fy) + lower * fy;
}

/**
 * Mean counts along a segment, one sample a pixel of length from its first end, each the mean of equally spaced
 * samples across the width (as many as the width has whole pixels, bilinear between pixel centres).
 *
 * Samples across the width that fall outside the frame are left out; where none is inside, the mean is null.
 * The standard error is the scatter across the width over the root of the number of samples, null for fewer than
 * two. Interpolated neighbours share pixels, so on an oblique line it is a little too small (common practice).
 */
export function lineProfile(plane: CountPlane, segment: LineSegment): LineProfile {
  const { x0, y0, x1, y1, widthPx } = segment;
  const lengthPx = Math.hypot(x1 - x0, y1 - y0);
  const alongX = lengthPx > 0 ? (x1 - x0) / lengthPx : 1;
  const alongY = lengthPx > 0 ? (y1 - y0) / lengthPx : 0;
  const across = Math.max(1, Math.round(widthPx));
  const acrossStepPx = widthPx / across;
  const profile: LineProfile = { distancePx: [], xPx: [], yPx: [], meanCounts: [], standardErrorCounts: [] };

  for (let distancePx = 0; distancePx <= lengthPx + 1e-9; distancePx += 1) {
    const x = x0 + alongX * distancePx;
    const y = y0 + alongY * distancePx;
    let count = 0;
    let mean = 0;
    let squares = 0;
    for (let index = 0; index < across; index += 1) {
      const offsetPx = (index - (across - 1) / 2) * acrossStepPx;
      const sample = sampleBilinear(plane, x - alongY * offsetPx, y + alongX * offsetPx);
      if (Number.isNaN(sample)) continue;
      count += 1;
      const step = sample - mean;
      mean += step / count;
      squares += step * (sample - mean);
    }
    profile.distancePx.push(distancePx);
    profile.xPx.push(x);
    profile.yPx.push(y);
    profile.meanCounts.push(count > 0 ? mean : null);
    profile.standardErrorCounts.push(count > 1 ? Math.sqrt(squares / (count - 1) / count) : null);
  }
  return profile;
}
