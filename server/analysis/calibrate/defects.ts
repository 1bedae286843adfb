import { MASK } from './mask';
import { varianceAt, type NoiseModel } from './noiseModel';

/** A pixel this many standard deviations off its neighbours is taken for a defect. */
const LIMIT = 7;

/**
 * Marks single pixels that stand out from the median of their eight neighbours, bright or dark alike so that nothing is
 * biased. A diffraction pattern that is sampled well enough to be measured has no such pixels.
 * @param step distance between neighbours of one colour
 * @returns how many were marked
 */
export function markFrameDefects(
  counts: Float32Array,
  mask: Uint8Array,
  widthPx: number,
  heightPx: number,
  step: number,
  noise: NoiseModel,
): number {
  const around = new Float64Array(8);
  const offsets = [-1, 1, -widthPx, widthPx, -widthPx - 1, -widthPx + 1, widthPx - 1, widthPx + 1].map((o) => o * step);
  const found: number[] = [];
  for (let y = step; y < heightPx - step; y++) {
    for (let x = step; x < widthPx - step; x++) {
      const i = y * widthPx + x;
      if (mask[i] !== 0) continue;
      const cross = (counts[i - step] + counts[i + step] + counts[i - widthPx * step] + counts[i + widthPx * step]) / 4;
      const off = counts[i] - cross;
      const quick = 0.6 * LIMIT;
      if (off * off < quick * quick * varianceAt(noise, cross)) continue;
      for (let k = 0; k < 8; k++) around[k] = counts[i + offsets[k]];
      around.sort();
      const median = (around[3] + around[4]) / 2;
      const far = counts[i] - median;
      if (far * far > LIMIT * LIMIT * 1.2 * varianceAt(noise, median)) found.push(i);
    }
  }
  // More than one in five hundred is structure, not defects.
  if (found.length > counts.length / 500) return 0;
  for (const i of found) mask[i] |= MASK.defect;
  return found.length;
}

/**
 * Marks pixels whose dark signal stands far out of the dark frame: hot pixels keep their noise after subtraction.
 * @returns how many were marked
 */
export function markDarkDefects(dark: Float32Array, mask: Uint8Array, singleVariance: number): number {
  const step = Math.max(1, Math.floor(dark.length / 100_000));
  const some: number[] = [];
  for (let i = 0; i < dark.length; i += step) some.push(dark[i]);
  some.sort((a, b) => a - b);
  const median = some[some.length >> 1];
  const spread =
    1.4826 *
    Math.max(some[Math.floor(some.length * 0.75)] - median, median - some[Math.floor(some.length * 0.25)]) *
    1.0;
  const limit = LIMIT * Math.max(Math.sqrt(singleVariance), spread);
  let marked = 0;
  for (let i = 0; i < dark.length; i++) {
    if (Math.abs(dark[i] - median) > limit) {
      mask[i] |= MASK.defect;
      marked++;
    }
  }
  return marked;
}
