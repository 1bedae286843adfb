import type { mosaics } from '../../../shared/contracts/measureCase';

export type Mosaic = Exclude<(typeof mosaics)[number], 'auto' | 'mono'>;

/** Counts as the file stores them, before significant bits are settled. */
export interface StoredSamples {
  format: string;
  widthPx: number;
  heightPx: number;
  /** Row-major, first stored row on top, length widthPx * heightPx. */
  data: Uint16Array | Float32Array;
  /** Bits of one stored sample; 32 for floating point. */
  storedBits: number;
  /** What the file itself says; null where it is silent. */
  exposureMs: number | null;
  blackCount: number | null;
  whiteCount: number | null;
  /** Phase of the colour mosaic, or null for a frame without one. */
  mosaic: Mosaic | null;
  /** True when a camera or a program has rendered the picture (tone curve, colour, lossy compression). */
  rendered: boolean;
  /** What was found out or chosen on the way, in words. */
  notes: string[];
}

/** One plane of counts at the low end of its samples. */
export interface DecodedFrame extends StoredSamples {
  /** Significant bits. */
  bitDepth: number;
}
