import type { CalibratedFrame } from '../calibrate/CalibratedFrame';
import { varianceAt } from '../calibrate/noiseModel';
import { cellModel, type PinholeParameters } from '../fit/fitCells';
import type { PinholeOptics } from '../fit/PinholeOptics';

/** One byte a pixel: 0 masked, else 128 + SCALE × misfit, held to 1 … 255. */
const SCALE = 10;
/** Pixels modelled at a time. */
const ROWS_AT_ONCE = 64;

export interface Misfit {
  widthPx: number;
  heightPx: number;
  bytes: Uint8Array;
  /** Mean square of frame minus model over the expected variance, over all good pixels. */
  reducedChiSquare: number;
  /** Good pixels that stand out by more than six standard deviations. */
  outliers: number;
  pixels: number;
}

/** Frame minus model in units of the expected noise, for every pixel. */
export function misfit(
  frame: CalibratedFrame,
  optics: PinholeOptics,
  values: PinholeParameters,
  parameters: number,
): Misfit {
  const { widthPx, heightPx, counts, mask, noise } = frame;
  const bytes = new Uint8Array(widthPx * heightPx);
  const { sqrt, round } = Math;
  const variance = varianceAt;
  let sum = 0;
  let pixels = 0;
  let outliers = 0;
  const xs = new Float64Array(widthPx * ROWS_AT_ONCE);
  const ys = new Float64Array(widthPx * ROWS_AT_ONCE);
  const none = new Float64Array(widthPx * ROWS_AT_ONCE);
  for (let top = 0; top < heightPx; top += ROWS_AT_ONCE) {
    const rows = Math.min(ROWS_AT_ONCE, heightPx - top);
    const length = rows * widthPx;
    for (let i = 0; i < length; i++) {
      xs[i] = (i % widthPx) - values.x;
      ys[i] = top + Math.floor(i / widthPx) - values.y;
    }
    const band = {
      centreX: values.x,
      centreY: values.y,
      ringWidthPx: 1,
      length,
      x: xs,
      y: ys,
      radiusVariance: none,
      pixels: none,
      mean: none,
      scatter: none,
      ring: new Int32Array(0),
    };
    const { model } = cellModel(band, optics, values, false);
    for (let i = 0; i < length; i++) {
      const at = top * widthPx + i;
      if (mask[at] !== 0) continue;
      const off = (counts[at] - model[i]) / sqrt(variance(noise, model[i]));
      const byte = round(128 + SCALE * off);
      bytes[at] = byte < 1 ? 1 : byte > 255 ? 255 : byte;
      if (off > 6 || off < -6) {
        outliers++;
        continue;
      }
      sum += off * off;
      pixels++;
    }
  }
  return { widthPx, heightPx, bytes, reducedChiSquare: sum / Math.max(1, pixels - parameters), outliers, pixels };
}
