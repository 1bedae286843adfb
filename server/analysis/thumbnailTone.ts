/** Longest side of a thumbnail, pixels. */
const LONGEST_PX = 192;
/** Most that the peak is drawn above the level where the tone turns from linear to logarithmic. */
const MOST_RANGE = 1000;
/** What the brightest tone stands for at least, as part of the camera's range: a dark looks dark. */
const LEAST_PEAK = 0.03;
/** Part of the small picture that is drawn black: what light there is everywhere does not hide the rings. */
const BACKGROUND_PART = 0.05;
/** Most of the camera's range that is taken for such background. */
const MOST_BACKGROUND = 0.03;

/** What a thumbnail's tone is fitted to, counts; peak and noise stand above and about black. */
export interface ToneRange {
  blackCount: number;
  whiteCount: number;
  peakCounts: number;
  noiseCounts: number;
}

/**
 * A small picture in logarithmic tone from the noise upward, so that the rings show beside the core: 0 at or below
 * the background, 255 at the peak and above. Pixels are averaged, never skipped.
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
  const levels = sums.map((sum, i) => sum / numbers[i] - blackCount);
  const range = whiteCount - blackCount;
  const background = levels.toSorted()[Math.floor(BACKGROUND_PART * levels.length)];
  const low = Math.max(0, Math.min(background, MOST_BACKGROUND * range));
  const peak = Math.max(1e-9, peakCounts - low, LEAST_PEAK * range);
  const knee = Math.min(MOST_RANGE, peak / Math.max(1, noiseCounts));
  const bytes = Uint8Array.from(levels, (level) => {
    const part = Math.max(0, Math.min(1, (level - low) / peak));
    return Math.round((255 * Math.log1p(knee * part)) / Math.log1p(knee));
  });
  return { widthPx: width, heightPx: height, bytes };
}
