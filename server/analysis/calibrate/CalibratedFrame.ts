import type { Flag } from '../../../shared/contracts/measureResult';
import type { NoiseModel } from './noiseModel';

/** A frame ready to be measured. Arrays are row-major, length widthPx * heightPx. */
export interface CalibratedFrame {
  widthPx: number;
  heightPx: number;
  /** Linear counts above black, flat field divided out where there was one. */
  counts: Float32Array;
  /** Bits of MASK; 0 is a good pixel. */
  mask: Uint8Array;
  /** Distance between neighbours of one colour, pixels: 1, or 2 for a mosaic. */
  step: number;
  blackCount: number;
  whiteCount: number;
  /** Level above black beyond which pixels are not trusted; Infinity when the samples carry no such level. */
  clipCounts: number;
  /** Part of the usable pixels that is clipped, margin included. */
  clippedFraction: number;
  /** Single bad pixels found. */
  defectCount: number;
  noise: NoiseModel;
  /** True when counts above black plus blackCount are the whole numbers that the sensor's converter gave. */
  wholeCounts: boolean;
  hasDarks: boolean;
  hasFlats: boolean;
  flags: Flag[];
  assumed: string[];
}
