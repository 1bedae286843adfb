import { varianceAt, type NoiseModel } from '../calibrate/noiseModel';
import type { Cells, PixelTest } from './cells';

/** Pixels this many standard deviations from the model are left out. */
const LIMIT = 6;
/** Levels within this many standard deviations of the clipping level are left out whole. */
const CLIP_GUARD = 5;
const STEP_PX = 0.5;

/**
 * Which single pixels belong to the pattern: within six standard deviations of the model at their radius, with room for
 * what the model does not describe there (an oval hole, a tilt), and only where the model itself keeps clear of the
 * clipping level, so that noise is not cut on one side.
 */
export function pixelTest(cells: Cells, model: Float64Array, noise: NoiseModel, clipCounts: number): PixelTest {
  const rings = cells.ring.length === 0 ? 0 : cells.ring[cells.length - 1] + 1;
  const n = new Float64Array(rings);
  const level = new Float64Array(rings);
  const most = new Float64Array(rings).fill(-Infinity);
  const off = new Float64Array(rings);
  for (let c = 0; c < cells.length; c++) {
    const ring = cells.ring[c];
    n[ring]++;
    level[ring] += model[c];
    most[ring] = Math.max(most[ring], model[c]);
    off[ring] = Math.max(
      off[ring],
      Math.abs(cells.mean[c] - model[c]) - 4 * Math.sqrt(varianceAt(noise, model[c]) / cells.pixels[c]),
    );
  }
  const steps = Math.ceil((rings * cells.ringWidthPx) / STEP_PX) + 2;
  const lowest = new Float64Array(steps).fill(-Infinity);
  const highest = new Float64Array(steps).fill(Infinity);
  for (let s = 0; s < steps; s++) {
    const ring = Math.floor((s * STEP_PX) / cells.ringWidthPx);
    if (ring >= rings || n[ring] === 0) continue;
    const mean = level[ring] / n[ring];
    // The model's change across the ring.
    const before = ring > 0 && n[ring - 1] > 0 ? level[ring - 1] / n[ring - 1] : mean;
    const after = ring + 1 < rings && n[ring + 1] > 0 ? level[ring + 1] / n[ring + 1] : mean;
    const room =
      LIMIT * Math.sqrt(varianceAt(noise, mean)) +
      Math.max(0, off[ring]) +
      Math.max(Math.abs(before - mean), Math.abs(after - mean)) +
      1;
    lowest[s] = mean - room;
    highest[s] = mean + room;
    if (most[ring] + CLIP_GUARD * Math.sqrt(varianceAt(noise, most[ring])) > clipCounts) {
      lowest[s] = Infinity;
      highest[s] = -Infinity;
    }
  }
  return { stepPx: STEP_PX, lowest, highest };
}
