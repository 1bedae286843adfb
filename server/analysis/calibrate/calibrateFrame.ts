import type { Flag } from '../../../shared/contracts/measureResult';
import type { MeasureCase } from '../../../shared/contracts/measureCase';
import type { DecodedFrame } from '../decode/DecodedFrame';
import { FrameProblem } from '../decode/FrameProblem';
import type { CalibratedFrame } from './CalibratedFrame';
import { clipLevel } from './clipLevel';
import { markDarkDefects, markFrameDefects } from './defects';
import { growMask } from './growMask';
import { lineariseSrgb } from './linearise';
import { MASK } from './mask';
import { masterFrame } from './masterFrame';
import { maskOtherColours } from './mosaicMask';
import { noiseModel } from './noiseModel';

/** Pixels around a clipped one that are left out with it: charge spills over. */
const CLIP_MARGIN_PX = 2;

export interface CalibrationInput {
  light: DecodedFrame;
  darks: DecodedFrame[];
  flats: DecodedFrame[];
  measureCase: Pick<MeasureCase, 'camera' | 'mosaic' | 'encoding'>;
}

/**
 * Dark and flat correction, masks and noise model of one light frame.
 * @throws FrameProblem `bad-case` when a dark or flat has other dimensions than the light frame
 */
export function calibrateFrame({ light, darks, flats, measureCase }: CalibrationInput): CalibratedFrame {
  const { widthPx, heightPx } = light;
  const { camera } = measureCase;
  for (const other of [...darks, ...flats]) {
    if (other.widthPx !== widthPx || other.heightPx !== heightPx) {
      throw new FrameProblem(
        'bad-case',
        `A dark or flat frame is ${other.widthPx} × ${other.heightPx} pixels, the light frame ${widthPx} × ${heightPx}. Give darks and flats of the same size and region.`,
      );
    }
  }
  const flags: Flag[] = [];
  const assumed = [...light.notes];
  const mask = new Uint8Array(widthPx * heightPx);

  const mosaic =
    measureCase.mosaic === 'auto' ? light.mosaic : measureCase.mosaic === 'mono' ? null : measureCase.mosaic;
  let step = 1;
  if (mosaic !== null) {
    const colour = maskOtherColours(light.data, mask, widthPx, heightPx, mosaic);
    step = 2;
    flags.push('mosaic');
    assumed.push(`Of the ${mosaic.toUpperCase()} mosaic the ${colour} sites were measured, at their true positions.`);
  }

  const whiteCount = camera.whiteCount ?? light.whiteCount ?? 2 ** light.bitDepth - 1;
  const rendered = light.rendered || measureCase.encoding === 'rendered';
  const srgb = measureCase.encoding === 'srgb' || (measureCase.encoding === 'auto' && rendered);
  if (rendered || srgb) flags.push('camera-rendered');

  const { clipCount, flatTop } = clipLevel(light.data, whiteCount);
  if (flatTop)
    assumed.push(
      `The frame is clipped at ${Math.round(clipCount)} counts, below the nominal white level of ${Math.round(whiteCount)}.`,
    );
  let clipped = 0;
  let usable = 0;
  for (let i = 0; i < mask.length; i++) {
    if (mask[i] & MASK.otherColour) continue;
    usable++;
    if (light.data[i] >= clipCount) {
      mask[i] |= MASK.clipped;
      clipped++;
    }
  }

  const linear = (data: Uint16Array | Float32Array) => (srgb ? lineariseSrgb(data, whiteCount) : data);
  const counts = new Float32Array(widthPx * heightPx);
  const source = linear(light.data);
  let blackCount: number;
  let darkVariance = 0;
  if (darks.length > 0) {
    const master = masterFrame(darks.map((d) => linear(d.data)));
    markDarkDefects(master.mean, mask, master.variance);
    for (let i = 0; i < counts.length; i++) counts[i] = source[i] - master.mean[i];
    blackCount = medianOf(master.mean);
    darkVariance = master.variance / master.exposures;
  } else {
    flags.push('no-darks');
    const recorded = srgb ? 0 : (camera.blackCount ?? light.blackCount);
    blackCount = recorded ?? darkestLevel(source, mask);
    if (recorded === null || recorded === undefined) {
      assumed.push(
        `No darks and no black level were given: black was taken from the darkest part of the frame, ${blackCount.toFixed(1)} counts, and the fit finds the rest of the background.`,
      );
    } else if (camera.blackCount === undefined && !srgb) {
      assumed.push(`The black level is the file's own, ${blackCount.toFixed(1)} counts.`);
    }
    for (let i = 0; i < counts.length; i++) counts[i] = source[i] - blackCount;
  }
  if (flats.length > 0) divideFlat(counts, mask, flats, blackCount);
  else flags.push('no-flat');

  if (clipped > 0) growMask(mask, widthPx, heightPx, MASK.clipped, CLIP_MARGIN_PX * step);
  const estimate = () => noiseModel(counts, mask, widthPx, heightPx, step, srgb ? {} : camera, darkVariance);
  const before = estimate();
  const marked = markFrameDefects(counts, mask, widthPx, heightPx, step, before.noise);
  let defectCount = 0;
  let clippedPixels = 0;
  for (let i = 0; i < mask.length; i++) {
    if (mask[i] & MASK.otherColour) continue;
    if (mask[i] & MASK.defect) defectCount++;
    if (mask[i] & MASK.clipped) clippedPixels++;
  }
  const { noise, notes } = marked > 0 ? estimate() : before;
  // Rounding to whole counts is never less than the variance of an even spread over one count.
  noise.floor = Math.max(noise.floor, 1 / 12);
  assumed.push(...notes);
  return {
    widthPx,
    heightPx,
    counts,
    mask,
    step,
    blackCount,
    whiteCount,
    clipCounts: clipCount - blackCount,
    clippedFraction: usable > 0 ? clippedPixels / usable : 0,
    defectCount,
    noise,
    wholeCounts: darks.length === 0 && flats.length === 0 && !srgb && !rendered && light.data instanceof Uint16Array,
    hasDarks: darks.length > 0,
    hasFlats: flats.length > 0,
    flags,
    assumed,
  };
}

/** Median of a sample of the plane. */
function medianOf(plane: Float32Array): number {
  const step = Math.max(1, Math.floor(plane.length / 100_000));
  const some: number[] = [];
  for (let i = 0; i < plane.length; i += step) some.push(plane[i]);
  some.sort((a, b) => a - b);
  return some[some.length >> 1];
}

/** Level of the darkest part: mean of 16 × 16 pixel blocks, second percentile. */
function darkestLevel(plane: Uint16Array | Float32Array, mask: Uint8Array): number {
  const means: number[] = [];
  const block = 256;
  for (let from = 0; from + block <= plane.length; from += block) {
    let sum = 0;
    let n = 0;
    for (let i = from; i < from + block; i++) {
      if (mask[i]) continue;
      sum += plane[i];
      n++;
    }
    if (n > 8) means.push(sum / n);
  }
  means.sort((a, b) => a - b);
  return means.length > 0 ? means[Math.floor(means.length * 0.02)] : 0;
}

/** Divides by the mean flat above black, scaled to a mean of one; pixels without light in the flat are marked. */
function divideFlat(counts: Float32Array, mask: Uint8Array, flats: DecodedFrame[], blackCount: number): void {
  const { mean } = masterFrame(flats.map((f) => f.data));
  const level = medianOf(mean) - blackCount;
  if (!(level > 0)) {
    throw new FrameProblem(
      'unsupported',
      'The flat frames hold no light above black. Take flats with the sensor lit evenly to about half of its range.',
    );
  }
  for (let i = 0; i < counts.length; i++) {
    const response = (mean[i] - blackCount) / level;
    if (response > 0.3 && response < 3) counts[i] /= response;
    else mask[i] |= MASK.defect;
  }
}
