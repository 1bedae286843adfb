/** Longest side of a thumbnail, pixels. */
const LONGEST_PX = 192;
/** Most that the peak is drawn above the level where the tone turns from linear to logarithmic. */
const MOST_RANGE = 1000;
/** What the brightest tone stands for at least, as part of the camera's range: a dark looks dark. */
const LEAST_PEAK = 0.03;

/** What a thumbnail's tone is fitted to, counts; peak and noise stand above and about black. */
export interface ToneRange {
  blackCount: number;
  whiteCount: number;
  peakCounts: number;
  noiseCounts: number;
}

/**
 * A small picture in logarithmic tone from the noise upward, so that the rings show beside the core: 0 at or below
 * black, 255 at the peak and above. Pixels are averaged, never skipped.
 * @param plane counts, row-major
 */
export function thumbnailTone(
  plane: Uint16Array | Float32Array,
  widthPx: number,
  heightPx: number,
  { blackCount, whiteCount, peakCounts, noiseCounts }: ToneRange,
): { widthPx: number; heightPx: number; bytes: Uint8Array } {
  const scale = Math.min(1, LONGEST_PX / Math.max(widthPx, heightPx));
  const width = Math.max(1, Math.round(widthPx * scale));
  const height = Math.max(1, Math.round(heightPx * scale));
  const sums = new Float64Array(width * height);
  const numbers = new Uint32Array(width * height);
  const column = Uint16Array.from({ length: widthPx }, (_, x) =>
    Math.min(width - 1, Math.floor((x * width) / widthPx)),
  );
  for (let y = 0; y < heightPx; y++) {
    const row = Math.min(height - 1, Math.floor((y * height) / heightPx)) * width;
    for (let x = 0; x < widthPx; x++) {
      sums[row + column[x]] += plane[y * widthPx + x];
      numbers[row + column[x]]++;
    }
  }
  const bytes = new Uint8Array(width * height);
  const peak = Math.max(1e-9, peakCounts, LEAST_PEAK * (whiteCount - blackCount));
  const knee = Math.min(MOST_RANGE, peak / Math.max(1, noiseCounts));
  for (let i = 0; i < bytes.length; i++) {
    const level = Math.max(0, Math.min(1, (sums[i] / numbers[i] - blackCount) / peak));
    bytes[i] = Math.round((255 * Math.log1p(knee * level)) / Math.log1p(knee));
  }
  return { widthPx: width, heightPx: height, bytes };
}
