import type { CalibratedFrame } from '../calibrate/CalibratedFrame';
import { furthestPx } from '../fit/cells';

/** Radial profile about a point; arrays of one length, one entry a bin with pixels in it. */
export interface RadialBins {
  /** Mean radius of the bin's pixels, pixels. */
  radiusPx: Float64Array;
  meanCounts: Float64Array;
  /** Standard deviation of one pixel about the mean, counts. */
  scatterCounts: Float64Array;
  pixelCount: Float64Array;
}

/** Pixels beyond this many standard deviations from their bin's mean are left out of it. */
const REJECTION = 4;
/** Fewest pixels from which a scatter is told. */
const FEWEST = 4;

/**
 * Azimuthal mean in bins one pixel wide. Pixels that stand out of their bin by more than four standard deviations do
 * not count, so that dust and single spots leave no step in the profile.
 */
export function radialProfile(frame: CalibratedFrame, centreX: number, centreY: number): RadialBins {
  const { widthPx, heightPx, counts, mask } = frame;
  const bins = Math.ceil(furthestPx(widthPx, heightPx, centreX, centreY)) + 2;
  let low = new Float64Array(bins).fill(-Infinity);
  let high = new Float64Array(bins).fill(Infinity);
  const n = new Float64Array(bins);
  const sum = new Float64Array(bins);
  const squares = new Float64Array(bins);
  const radii = new Float64Array(bins);
  const { sqrt } = Math;
  for (let round = 0; round < 2; round++) {
    n.fill(0);
    sum.fill(0);
    squares.fill(0);
    radii.fill(0);
    for (let y = 0; y < heightPx; y++) {
      const dy2 = (y - centreY) ** 2;
      for (let x = 0, i = y * widthPx; x < widthPx; x++, i++) {
        if (mask[i] !== 0) continue;
        const dx = x - centreX;
        const radius = sqrt(dx * dx + dy2);
        const bin = (radius + 0.5) | 0;
        const value = counts[i];
        if (value < low[bin] || value > high[bin]) continue;
        n[bin]++;
        sum[bin] += value;
        squares[bin] += value * value;
        radii[bin] += radius;
      }
    }
    if (round === 1) break;
    low = low.map((_, b) => (n[b] < FEWEST ? -Infinity : sum[b] / n[b] - reach(b)));
    high = high.map((_, b) => (n[b] < FEWEST ? Infinity : sum[b] / n[b] + reach(b)));
  }
  function reach(b: number): number {
    return REJECTION * Math.sqrt(Math.max(0.25, squares[b] / n[b] - (sum[b] / n[b]) ** 2));
  }
  const kept = Array.from({ length: bins }, (_, b) => b).filter((b) => n[b] >= FEWEST);
  return {
    radiusPx: Float64Array.from(kept, (b) => radii[b] / n[b]),
    meanCounts: Float64Array.from(kept, (b) => sum[b] / n[b]),
    scatterCounts: Float64Array.from(kept, (b) =>
      Math.sqrt(Math.max(0, squares[b] / n[b] - (sum[b] / n[b]) ** 2) * (n[b] / (n[b] - 1))),
    ),
    pixelCount: Float64Array.from(kept, (b) => n[b]),
  };
}
