import { normalProbability } from '../../../shared/metrology/normalDistribution';

/** Standard deviation before rounding, counts, above which rounding is plain added noise of 1/12 count². */
const SMOOTH = 0.7;
const SMALLEST = 0.08;
const SIGMAS = 32;
const PLACES = 128;
const STEP = (SMOOTH - SMALLEST) / (SIGMAS - 1);
/** Variance that is always left, counts²: nothing is known better than a thirtieth of a count. */
const LEAST_VARIANCE = 1e-3;

/** Mean and variance of whole counts about a level, see `roundedAt`. */
export interface Rounded {
  /** Mean of the rounded value minus the level. */
  offset: number;
  /** Change of the mean for a change of the level. */
  slope: number;
  variance: number;
}

let cached: Float64Array | null = null;

/**
 * What rounding to whole counts makes of a level with normal noise: with less noise than about half a count the mean no
 * longer follows the level evenly, which biases a fit to 8-bit frames by tenths of a percent when it is not taken into
 * account. Probabilities of the counts by differences of the normal distribution function.
 * @param level counts before rounding, black included
 * @param variance before rounding, counts²
 * @param into filled and returned, so that nothing is allocated for each pixel
 */
export function roundedAt(level: number, variance: number, into: Rounded): Rounded {
  const sigma = Math.sqrt(variance);
  if (!(sigma < SMOOTH)) {
    into.offset = 0;
    into.slope = 1;
    into.variance = variance + 1 / 12;
    return into;
  }
  const table = (cached ??= makeTable());
  const s = sigma <= SMALLEST ? 0 : (sigma - SMALLEST) / STEP;
  const low = Math.min(SIGMAS - 2, s | 0);
  const t = s - low;
  const part = level - Math.floor(level);
  const place = part * PLACES;
  const left = place | 0;
  const u = place - left;
  // Written out, because functions made anew for every cell cost more than the arithmetic.
  const at = (low * (PLACES + 1) + left) * 2;
  const next = at + (PLACES + 1) * 2;
  into.offset = (1 - t) * ((1 - u) * table[at] + u * table[at + 2]) + t * ((1 - u) * table[next] + u * table[next + 2]);
  into.slope = Math.max(0, 1 + PLACES * ((1 - t) * (table[at + 2] - table[at]) + t * (table[next + 2] - table[next])));
  into.variance =
    (1 - t) * ((1 - u) * table[at + 1] + u * table[at + 3]) +
    t * ((1 - u) * table[next + 1] + u * table[next + 3]) +
    LEAST_VARIANCE;
  return into;
}

/** Offset and variance over the fraction of the level (columns) and the noise (rows). */
function makeTable(): Float64Array {
  const table = new Float64Array(SIGMAS * (PLACES + 1) * 2);
  for (let row = 0; row < SIGMAS; row++) {
    const sigma = SMALLEST + row * STEP;
    for (let column = 0; column <= PLACES; column++) {
      const level = column / PLACES;
      let mean = 0;
      let square = 0;
      for (let count = -5; count <= 6; count++) {
        const part =
          normalProbability((count + 0.5 - level) / sigma) - normalProbability((count - 0.5 - level) / sigma);
        mean += count * part;
        square += count * count * part;
      }
      const at = (row * (PLACES + 1) + column) * 2;
      table[at] = mean - level;
      table[at + 1] = square - mean * mean;
    }
  }
  return table;
}
