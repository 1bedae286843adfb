import type { Cells } from '../fit/cells';

/** Radial profile of data and model over the same pixels; arrays of one length. */
export interface FittedProfile {
  radiusPx: Float64Array;
  meanCounts: Float64Array;
  standardErrorCounts: Float64Array;
  pixelCount: Float64Array;
  modelCounts: Float64Array;
}

/** Fewest pixels of a bin that has a scatter. */
const FEWEST = 3;

/**
 * Azimuthal mean about the fitted centre in bins of at most a pixel, outliers off, with the standard error from the
 * azimuthal scatter and the model averaged over the same pixels.
 */
export function profileOfCells(cells: Cells, model: Float64Array): FittedProfile {
  const rings = cells.length === 0 ? 0 : cells.ring[cells.length - 1] + 1;
  const n = new Float64Array(rings);
  const sum = new Float64Array(rings);
  const squares = new Float64Array(rings);
  const radii = new Float64Array(rings);
  const models = new Float64Array(rings);
  for (let c = 0; c < cells.length; c++) {
    const ring = cells.ring[c];
    const pixels = cells.pixels[c];
    n[ring] += pixels;
    sum[ring] += pixels * cells.mean[c];
    squares[ring] += pixels * (cells.scatter[c] + cells.mean[c] ** 2);
    radii[ring] += pixels * Math.hypot(cells.x[c], cells.y[c]);
    models[ring] += pixels * model[c];
  }
  const kept = Array.from({ length: rings }, (_, r) => r).filter((r) => n[r] >= FEWEST);
  const of = (value: (ring: number) => number) => Float64Array.from(kept, value);
  return {
    radiusPx: of((r) => radii[r] / n[r]),
    meanCounts: of((r) => sum[r] / n[r]),
    standardErrorCounts: of((r) => Math.sqrt(Math.max(1e-12, squares[r] / n[r] - (sum[r] / n[r]) ** 2) / (n[r] - 1))),
    pixelCount: of((r) => n[r]),
    modelCounts: of((r) => models[r] / n[r]),
  };
}
