import type { Matrix } from 'ml-matrix';
import type { PinholeFit } from './fitPinhole';
import { radiusOf, type PinholeParameters } from './fitCells';
import type { PinholeOptics } from './PinholeOptics';

/**
 * Standard deviation of (a/w)² that "even light" leaves open: a beam more than eighteen times wider than the hole. Common
 * practice, no source.
 */
const EVEN_DEVIATION = 0.003;
/** The operator's beam radius is believed to 15 %: twice that in (a/w)². Common practice, no source. */
const BEAM_DEVIATION = 0.3;
/** Beyond this many standard deviations the frame's own illumination counts alone. */
const DISAGREEMENT = 4;
/**
 * Typical smooth unevenness of the pixel response over a sensor, relative, where no flat was given. Sensors' pixels
 * differ by 1 to 2 % (looked up); how much of it is smooth is common practice, no source.
 */
const TYPICAL_PATCHES = 0.001;

/**
 * With less noise at black than a fifth of a count most pixels of a dark ring carry the same count, and what is left of
 * their level cannot be told; the covariance is then widened by this factor. Found on simulated 8-bit frames.
 */
const COARSE_FLOOR = 0.04;
const COARSE_FACTOR = 9;

export interface SizeSpread {
  values: PinholeParameters;
  /** Relative standard uncertainties of the size. */
  fit: number;
  response: number;
  responseDegreesOfFreedom: number | null;
  illumination: number;
  /** Change of the relative size for a change of (a/w)². */
  illuminationSensitivity: number;
  illuminationDeviation: number;
  /** True when the frame contradicts the stated illumination. */
  unevenLight: boolean;
}

/**
 * Joins what the frame says of the illumination with what the operator says, and shares out the variance of the size.
 * The free fit's estimate is moved along its covariance with the illumination (Bayes' rule for normal distributions),
 * with the covariance that the misfit itself shows, so that an uneven sensor is not taken for a narrow beam.
 */
export function joinPrior(found: PinholeFit, optics: PinholeOptics, hasFlats: boolean): SizeSpread {
  const { fit, spread, noise } = found;
  const { free, values } = fit;
  const g = free.indexOf('illumination');
  const typical = hasFlats ? 0 : TYPICAL_PATCHES;
  const coarse = noise.rounding !== undefined && noise.rounding.floor < COARSE_FLOOR ? COARSE_FACTOR : 1;
  const total = (i: number, j: number) =>
    coarse * combined(spread.observed, spread.white, spread.response, i, j) + typical ** 2 * spread.patches.get(i, j);
  const radius = radiusOf(values);
  const expected = optics.beamRadiusMm === null ? 0 : (radius / optics.beamRadiusMm) ** 2;
  const priorDeviation =
    optics.beamRadiusMm === null ? EVEN_DEVIATION : Math.max(EVEN_DEVIATION, BEAM_DEVIATION * expected);
  const variance = total(g, g);
  const off = values.illumination - expected;
  // Coarse counts imitate uneven light: then the operator's word stands.
  const unevenLight = coarse === 1 && Math.abs(off) > DISAGREEMENT * Math.sqrt(variance + priorDeviation ** 2);
  const keep = unevenLight ? 0 : variance / (variance + priorDeviation ** 2);
  const joined = { ...values };
  free.forEach((name, i) => (joined[name] -= ((keep * total(i, g)) / variance) * off));
  const sensitivity = total(0, g) / variance;
  const across = (m: Matrix) => m.get(0, 0) - 2 * sensitivity * m.get(0, g) + sensitivity ** 2 * m.get(g, g);
  const white = Math.max(0, across(spread.white));
  const given = Math.max(white, total(0, 0) - sensitivity ** 2 * variance);
  const illuminationDeviation = Math.sqrt(unevenLight ? variance : keep * priorDeviation ** 2);
  return {
    values: joined,
    fit: Math.sqrt(white),
    response: Math.sqrt(given - white),
    responseDegreesOfFreedom: hasFlats ? Math.max(1, spread.blocks - free.length) : null,
    illumination: Math.abs(sensitivity) * illuminationDeviation,
    illuminationSensitivity: sensitivity,
    illuminationDeviation,
    unevenLight,
  };
}

/** The observed covariance, but never less than that of the pixels' own noise. */
function combined(observed: Matrix, white: Matrix, response: Matrix, i: number, j: number): number {
  const scale = Math.max(1, (white.get(0, 0) + response.get(0, 0)) / observed.get(0, 0));
  return observed.get(i, j) * scale;
}
