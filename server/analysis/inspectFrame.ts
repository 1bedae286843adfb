import type { z } from 'zod';
import type { frameHealthSchema } from '../../shared/contracts/captures';
import type { CameraRecord } from '../../shared/contracts/measureCase';
import { clipLevel } from './calibrate/clipLevel';
import { trimmedVariance } from './calibrate/masterFrame';
import { decodeFrame } from './decode/decodeFrame';
import type { DecodedFrame } from './decode/DecodedFrame';
import { thumbnailTone } from './thumbnailTone';

/** Part of the range that a guessed black level lies in: a frame that is bright all over does not show its black. */
const HIGHEST_BLACK = 1 / 8;
/** Standard deviations of a pixel by which the darkest fiftieth lies under black, between a dark (2.1) and a pattern. */
const BLACK_RISE = 1.7;

type FrameHealth = z.infer<typeof frameHealthSchema>;

export interface FrameInspection {
  format: string;
  widthPx: number;
  heightPx: number;
  bitDepth: number;
  exposureMs: number | null;
  health: FrameHealth;
  /** Decoded counts, row-major. */
  plane: Uint16Array;
  /** Logarithmic tone 0 to 255 from the noise upward, longest side 192. */
  thumbnailTone: { widthPx: number; heightPx: number; bytes: Uint8Array };
}

/**
 * Decodes a frame as soon as it arrives and says whether it is fit to be measured.
 * @throws FrameProblem when the file cannot be used, in words that say what to send instead
 */
export async function inspectFrame(bytes: Buffer, camera: CameraRecord): Promise<FrameInspection> {
  const decoded = await decodeFrame(bytes, camera);
  const { widthPx, heightPx, bitDepth } = decoded;
  const plane = integerPlane(decoded);
  const health = frameHealth(decoded, plane, camera);
  return {
    format: decoded.format,
    widthPx,
    heightPx,
    bitDepth: Math.min(16, bitDepth),
    exposureMs: decoded.exposureMs,
    health,
    plane,
    thumbnailTone: thumbnailTone(plane, widthPx, heightPx, health),
  };
}

/** Counts as 16-bit integers; samples of a wider or floating kind are scaled so that their range fits. */
function integerPlane(decoded: DecodedFrame): Uint16Array {
  if (decoded.data instanceof Uint16Array) return decoded.data;
  let low = Infinity;
  let high = -Infinity;
  for (const value of decoded.data) {
    if (value < low) low = value;
    if (value > high) high = value;
  }
  const fits = low >= 0 && high <= 65_535 && high > 255;
  const offset = fits ? 0 : low;
  const scale = fits ? 1 : high > low ? 65_535 / (high - low) : 1;
  return Uint16Array.from(decoded.data, (value) => Math.round((value - offset) * scale));
}

function frameHealth(decoded: DecodedFrame, plane: Uint16Array, camera: CameraRecord): FrameHealth {
  const histogram = new Uint32Array(65_536);
  for (let i = 0; i < plane.length; i++) histogram[plane[i]]++;
  const level = (part: number) => {
    let sum = 0;
    for (let v = 0; v < histogram.length; v++) {
      sum += histogram[v];
      if (sum >= part * plane.length) return v;
    }
    return 65_535;
  };
  const nominal = camera.whiteCount ?? decoded.whiteCount ?? 2 ** Math.min(16, decoded.bitDepth) - 1;
  const { clipCount } = clipLevel(plane, nominal);
  const noiseCounts = quietNoise(
    plane,
    decoded.widthPx,
    decoded.heightPx,
    level(0.25),
    decoded.mosaic === null ? 1 : 2,
  );
  const darkest = Math.min(level(0.02) + BLACK_RISE * noiseCounts, HIGHEST_BLACK * clipCount);
  const blackCount = camera.blackCount ?? decoded.blackCount ?? darkest;
  const peakCounts = Math.max(0, level(0.9999) - blackCount);
  let clipped = 0;
  for (let v = Math.ceil(clipCount); v < histogram.length; v++) clipped += histogram[v];
  return {
    blackCount,
    whiteCount: clipCount,
    peakCounts,
    peakFraction: Math.min(1, peakCounts / Math.max(1, clipCount - blackCount)),
    clippedFraction: clipped / plane.length,
    noiseCounts,
  };
}

/** Standard deviation of one pixel among the darker quarter, from second differences along rows. */
function quietNoise(plane: Uint16Array, widthPx: number, heightPx: number, below: number, step: number): number {
  const skip = Math.max(1, Math.floor((widthPx * heightPx) / 200_000));
  const differences: number[] = [];
  for (let y = 0; y < heightPx; y++) {
    for (let x = step + (y % skip); x < widthPx - step; x += skip) {
      const i = y * widthPx + x;
      const sum = plane[i - step] + plane[i] + plane[i + step];
      if (sum <= 3 * below) differences.push(plane[i - step] - 2 * plane[i] + plane[i + step]);
    }
  }
  return differences.length < 20 ? 0 : Math.sqrt(trimmedVariance(differences) / 6);
}
