import type { CalibratedFrame } from '../calibrate/CalibratedFrame';
import { varianceAt } from '../calibrate/noiseModel';

/** A smaller plane of block means for finding the centre. */
export interface ReducedPlane {
  widthPx: number;
  heightPx: number;
  /** Full-frame pixels along one side of a block. */
  factor: number;
  /**
   * Stabilised level, noise about 1 everywhere: 2·√ of the level where shot noise rules, linear beneath. 0 where there
   * are no good pixels.
   */
  level: Float64Array;
  /** 1 where the block holds good pixels enough. */
  good: Uint8Array;
}

/** Longest side of the reduced plane, pixels. */
const LONGEST = 200;

export function reducePlane(frame: CalibratedFrame, longest: number = LONGEST): ReducedPlane {
  const factor = Math.max(1, Math.ceil(Math.max(frame.widthPx, frame.heightPx) / longest));
  const widthPx = Math.floor(frame.widthPx / factor);
  const heightPx = Math.floor(frame.heightPx / factor);
  const level = new Float64Array(widthPx * heightPx);
  const good = new Uint8Array(widthPx * heightPx);
  const usable = (factor * factor) / (frame.step * frame.step);
  const { counts, mask, noise } = frame;
  const quiet = Math.sqrt(noise.floor);
  for (let by = 0; by < heightPx; by++) {
    for (let bx = 0; bx < widthPx; bx++) {
      let sum = 0;
      let n = 0;
      for (let y = by * factor; y < (by + 1) * factor; y++) {
        for (let i = y * frame.widthPx + bx * factor, end = i + factor; i < end; i++) {
          if (mask[i] !== 0) continue;
          sum += counts[i];
          n++;
        }
      }
      if (n < Math.max(1, usable / 3)) continue;
      const mean = sum / n;
      const at = by * widthPx + bx;
      good[at] = 1;
      // ∫ dI/σ(I) with σ² = floor + perCount·I.
      level[at] =
        noise.perCount > 0 && mean > 0
          ? (2 / noise.perCount) * (Math.sqrt(varianceAt({ ...noise, perSquare: 0 }, mean)) - quiet)
          : mean / quiet;
      level[at] *= Math.sqrt(n);
    }
  }
  return { widthPx, heightPx, factor, level, good };
}
