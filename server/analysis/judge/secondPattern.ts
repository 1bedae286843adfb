import { varianceAt, type NoiseModel } from '../calibrate/noiseModel';
import type { PinholeFit } from '../fit/fitPinhole';

export interface SecondPattern {
  /** Full-frame pixels. */
  x: number;
  y: number;
  /** Strength as part of the first pattern's peak. */
  relative: number;
  /** Part of the misfit that a second pattern of the same size there takes away. */
  explained: number;
}

/** Grid on which the brightest misfit is looked for, parts of λz/D. */
const GRID = 0.25;
/** Rounds of taking the first pattern's distortion by the second into account. */
const NEAREST = 0.8;

/**
 * The strongest second pattern of the same size: the brightest part of the misfit, and how much of the misfit a copy of
 * the pattern there explains (profile taken from the fitted model's radial mean).
 */
export function secondPattern(
  found: Pick<PinholeFit, 'cells' | 'fit' | 'fringePx'> & { evaluated: { model: Float64Array } },
  noise: NoiseModel,
): SecondPattern | null {
  const { cells, evaluated, fit, fringePx } = found;
  const { amplitude } = fit.values;
  const side = Math.max(2, GRID * fringePx);
  const tiles = new Map<string, { n: number; sum: number; x: number; y: number }>();
  for (let c = 0; c < cells.length; c++) {
    const key = `${Math.floor(cells.x[c] / side)},${Math.floor(cells.y[c] / side)}`;
    const tile = tiles.get(key) ?? { n: 0, sum: 0, x: 0, y: 0 };
    const pixels = cells.pixels[c];
    tile.n += pixels;
    tile.sum += pixels * (cells.mean[c] - evaluated.model[c]);
    tile.x += pixels * cells.x[c];
    tile.y += pixels * cells.y[c];
    tiles.set(key, tile);
  }
  let best: { value: number; x: number; y: number } | null = null;
  for (const { n, sum, x, y } of tiles.values()) {
    if (n < Math.min(30, side * side * 0.5)) continue;
    const value = sum / n;
    if (Math.hypot(x / n, y / n) < NEAREST * fringePx) continue;
    if (best === null || value > best.value) best = { value, x: x / n, y: y / n };
  }
  if (best === null || !(best.value > 0)) return null;
  // A copy's core, close to a Gaussian of the Airy core's width, fitted to the misfit around it.
  let weights = 0;
  let shape = 0;
  let cross = 0;
  let before = 0;
  const near = 0.7 * fringePx;
  for (let c = 0; c < cells.length; c++) {
    const distance = Math.hypot(cells.x[c] - best.x, cells.y[c] - best.y);
    if (distance > near) continue;
    const weight = cells.pixels[c] / varianceAt(noise, evaluated.model[c]);
    const off = cells.mean[c] - evaluated.model[c];
    const copy = Math.exp(-((distance / (0.6 * fringePx)) ** 2) * 2.0);
    weights += weight;
    shape += weight * copy * copy;
    cross += weight * copy * off;
    before += weight * off * off;
  }
  if (weights === 0 || shape === 0) return null;
  const strength = cross / shape;
  return {
    x: best.x + cells.centreX,
    y: best.y + cells.centreY,
    relative: strength / (amplitude * peakOf(found)),
    explained: before > 0 ? (cross * cross) / shape / before : 0,
  };
}

/** Largest modelled level above background over the amplitude. */
function peakOf({
  evaluated,
  fit,
  cells,
}: Pick<PinholeFit, 'cells' | 'fit'> & { evaluated: { model: Float64Array } }): number {
  let peak = 0;
  for (let c = 0; c < cells.length; c++) peak = Math.max(peak, evaluated.model[c] - fit.values.background);
  return Math.max(1e-9, peak / fit.values.amplitude);
}
