/** Longest side of a thumbnail, pixels. */
const LONGEST_PX = 192;
/** Decades below the peak that the tone spans. */
const DECADES = 3;

/**
 * A small picture in logarithmic tone, so that the rings show beside the core: 0 at or below black, 255 at the peak and
 * above, three decades between. Pixels are averaged, never skipped.
 * @param plane counts, row-major
 * @param peakCounts level above black that is drawn brightest
 */
export function thumbnailTone(
  plane: Uint16Array | Float32Array,
  widthPx: number,
  heightPx: number,
  blackCount: number,
  peakCounts: number,
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
  const knee = 10 ** DECADES;
  const peak = Math.max(1e-9, peakCounts);
  for (let i = 0; i < bytes.length; i++) {
    const level = Math.max(0, Math.min(1, (sums[i] / numbers[i] - blackCount) / peak));
    bytes[i] = Math.round((255 * Math.log1p(knee * level)) / Math.log1p(knee));
  }
  return { widthPx: width, heightPx: height, bytes };
}
