import type { CalibratedFrame } from '../calibrate/CalibratedFrame';
import type { NoiseModel } from '../calibrate/noiseModel';
import type { FoundCentre } from '../centre/findCentre';
import { LARGEST_V } from '../models/pinholeTable';
import { radialProfile } from '../profile/radialProfile';
import { furthestPx, gatherCells, type Cells, type PixelTest } from './cells';
import {
  cellModel,
  fitCells,
  radiusOf,
  scoreGain,
  type CellFit,
  type CellModel,
  type ParameterName,
  type PinholeParameters,
} from './fitCells';
import type { PinholeOptics } from './PinholeOptics';
import { pixelTest } from './pixelTest';
import type { SecondPattern } from '../judge/secondPattern';
import { withoutSecond } from './withoutSecond';
import { roundingNoise } from './roundingNoise';
import { robustCovariance, type Spread } from './robustCovariance';
import { illuminationOf, startSizes } from './startSizes';

const FIRST: ParameterName[] = ['logSize', 'x', 'y', 'amplitude', 'background'];
const ROUND: ParameterName[] = [...FIRST, 'slopeX', 'slopeY', 'illumination'];
const OVAL: ParameterName[] = [...ROUND, 'ovalCos', 'ovalSin'];
const TILTED: ParameterName[] = [...ROUND, 'tiltX', 'tiltY'];
/** A shape is believed when the oval's axes differ by more than this, relative. */
const LEAST_OVAL = 0.0015;
/** A tilt is believed when it changes the scale across the pattern by more than this, relative. */
const LEAST_KEYSTONE = 3e-4;
/** Share of the misfit beyond noise that a shape must explain; else something else is wrong with the frame. */
const LEAST_SHARE = 0.5;
/** Fall of chi-square by which a shape other than round must pay: by chance in four of a million round frames. */
const LEAST_GAIN = 25;
/** Variance at black, counts², from which on rounding is plain added noise. */
const LEAST_SMOOTH = 0.4;
/** Bins to the length λz/D where rings are narrow; never wider than a pixel. */
const BINS_PER_RING = 40;

export type Shape = 'round' | 'oval' | 'tilted';

export interface PinholeFit {
  /** The frame's noise, with what rounding does to it where that matters. */
  noise: NoiseModel;
  fit: CellFit;
  cells: Cells;
  evaluated: CellModel;
  spread: Spread;
  shape: Shape;
  /** The strongest second pattern; a weak one was taken off the cells. */
  second: SecondPattern | null;
  /** Chi-square of the round, even model over that of the model chosen, for what the shape explains. */
  roundChiSquare: number;
  /** Chi-square of a constant. */
  flatChiSquare: number;
  test: PixelTest | null;
  /** Length λz/D on the sensor, pixels. */
  fringePx: number;
}

/** Pixel length of λz/D. */
export function fringePx(optics: PinholeOptics, radiusMm: number): number {
  return (Math.PI * optics.distanceMm) / (optics.waveNumber * radiusMm * optics.pitchMm);
}

function ringWidth(optics: PinholeOptics, values: PinholeParameters): number {
  return Math.min(1, Math.max(0.5, fringePx(optics, radiusOf(values)) / BINS_PER_RING));
}

/** Radius on the sensor, pixels, beyond which the table does not reach. */
function modelledPx(optics: PinholeOptics, values: PinholeParameters): number {
  const sine = (0.95 * LARGEST_V) / (optics.waveNumber * radiusOf(values));
  return sine >= 1 ? Infinity : (optics.distanceMm * sine) / Math.sqrt(1 - sine * sine) / optics.pitchMm;
}

/**
 * The pinhole pattern fitted to a frame: size from the profile, then all of it in two dimensions; outliers off; then with
 * background slopes and illumination free; then with an oval or a tilt where the frame asks for one.
 * @returns null when no size explains any of the frame
 */
export function fitPinhole(frame: CalibratedFrame, optics: PinholeOptics, centre: FoundCentre): PinholeFit | null {
  let { noise } = frame;
  const bins = radialProfile(frame, centre.x, centre.y);
  const start = startSizes(bins, optics, noise, furthestPx(frame.widthPx, frame.heightPx, centre.x, centre.y))[0];
  if (start === undefined) return null;
  let values: PinholeParameters = {
    logSize: Math.log(start.sizeMm),
    x: centre.x,
    y: centre.y,
    amplitude: start.amplitude,
    background: start.background,
    slopeX: 0,
    slopeY: 0,
    illumination: illuminationOf(optics, start.sizeMm / 2),
    ovalCos: 0,
    ovalSin: 0,
    tiltX: 0,
    tiltY: 0,
  };
  const gather = (test: PixelTest | null) =>
    gatherCells(frame, values.x, values.y, ringWidth(optics, values), modelledPx(optics, values), test);

  let cells = gather(null);
  values = fitCells(cells, optics, noise, values, FIRST).values;
  cells = gather(null);
  values = fitCells(cells, optics, noise, values, ROUND).values;
  if (!centreIsSane(frame, values)) return null;
  const test = pixelTest(cells, cellModel(cells, optics, values, false).model, noise, frame.clipCounts);
  cells = gather(test);
  if (cells.length < 50) return null;
  let fit = fitCells(cells, optics, noise, values, ROUND);
  if (frame.wholeCounts && noise.floor < LEAST_SMOOTH) {
    // Twice, because the noise before rounding and the pattern are found from each other.
    for (let round = 0; round < 2; round++) {
      const evaluated = cellModel(cells, optics, fit.values, false);
      noise = { ...noise, rounding: roundingNoise(cells, evaluated, noise, frame.blackCount) };
      fit = fitCells(cells, optics, noise, fit.values, ROUND);
    }
  }
  const separated = withoutSecond(cells, optics, noise, fit, fringePx(optics, radiusOf(fit.values)));
  ({ fit, cells } = separated);
  const roundChiSquare = fit.cellChiSquare;
  let shape: Shape = 'round';
  const reach = furthestPx(frame.widthPx, frame.heightPx, values.x, values.y) * optics.pitchMm;
  const perCell = Math.max(1, fit.cellChiSquare / fit.cellCount);
  const atRound = cellModel(cells, optics, fit.values, true);
  const worthTrying = (free: ParameterName[]) => scoreGain(cells, noise, atRound, free) / perCell > LEAST_GAIN;
  const oval = worthTrying(OVAL) ? fitCells(cells, optics, noise, fit.values, OVAL) : fit;
  const tilted = worthTrying(TILTED) ? fitCells(cells, optics, noise, fit.values, TILTED) : fit;
  const ovalGain = (roundChiSquare - oval.cellChiSquare) / perCell;
  const tiltGain = (roundChiSquare - tilted.cellChiSquare) / perCell;
  const excess = (roundChiSquare - fit.cellCount) / perCell;
  const isOval =
    ovalGain > Math.max(LEAST_GAIN, LEAST_SHARE * excess) &&
    Math.hypot(oval.values.ovalCos, oval.values.ovalSin) > LEAST_OVAL;
  const isTilted =
    tiltGain > Math.max(LEAST_GAIN, LEAST_SHARE * excess) &&
    (Math.hypot(tilted.values.tiltX, tilted.values.tiltY) * reach) / optics.distanceMm > LEAST_KEYSTONE;
  if (isOval && (!isTilted || ovalGain >= tiltGain)) {
    fit = oval;
    shape = 'oval';
  } else if (isTilted) {
    fit = tilted;
    shape = 'tilted';
  }
  if (!centreIsSane(frame, fit.values)) return null;
  const evaluated = cellModel(cells, optics, fit.values, true);
  return {
    noise,
    fit,
    cells,
    evaluated,
    spread: robustCovariance(cells, fit, evaluated, noise, frame.widthPx, frame.heightPx),
    shape,
    second: separated.second,
    roundChiSquare,
    flatChiSquare: flatChiSquare(cells, evaluated.model, frame),
    test,
    fringePx: fringePx(optics, radiusOf(fit.values)),
  };
}

function centreIsSane(frame: CalibratedFrame, { x, y, amplitude }: PinholeParameters): boolean {
  const side = 2 * Math.max(frame.widthPx, frame.heightPx);
  return amplitude > 0 && x > -side && y > -side && x < frame.widthPx + side && y < frame.heightPx + side;
}

/** Weighted chi-square of the best constant, with the variance of the background. */
function flatChiSquare(cells: Cells, model: Float64Array, { noise }: CalibratedFrame): number {
  let weights = 0;
  let sum = 0;
  let squares = 0;
  for (let c = 0; c < cells.length; c++) {
    const level = model[c] > 0 ? model[c] : 0;
    const weight = cells.pixels[c] / (noise.floor + level * (noise.perCount + noise.perSquare * level));
    weights += weight;
    sum += weight * cells.mean[c];
    squares += weight * cells.mean[c] ** 2;
  }
  return squares - (sum * sum) / weights;
}
