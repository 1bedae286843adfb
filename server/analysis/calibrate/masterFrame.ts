/** Mean of several exposures, pixel by pixel. */
export interface MasterFrame {
  mean: Float32Array;
  /** Variance of one exposure, the same for all pixels (robust), counts². */
  variance: number;
  exposures: number;
}

/** Exposures beyond this many standard deviations from a pixel's median are left out there. */
const REJECTION = 5;

/**
 * Combines exposures of the same scene per pixel. An exposure that lies more than five standard deviations from the
 * pixel's median (a cosmic ray) is left out at that pixel. With fewer than three exposures nothing can be told apart
 * and the plain mean is taken.
 * @param planes counts, row-major, all of one length
 */
export function masterFrame(planes: (Uint16Array | Float32Array)[]): MasterFrame {
  const count = planes[0].length;
  const exposures = planes.length;
  const mean = new Float32Array(count);
  if (exposures === 1) {
    mean.set(planes[0]);
    return { mean, variance: neighbourVariance(planes[0]), exposures };
  }
  const variance = betweenVariance(planes);
  const limit = REJECTION * Math.sqrt(variance);
  const values = new Float64Array(exposures);
  for (let i = 0; i < count; i++) {
    let sum = 0;
    let low = Infinity;
    let high = -Infinity;
    for (let k = 0; k < exposures; k++) {
      const value = planes[k][i];
      values[k] = value;
      sum += value;
      if (value < low) low = value;
      if (value > high) high = value;
    }
    mean[i] = sum / exposures;
    if (exposures < 3 || high - low <= limit) continue;
    const sorted = values.slice().sort();
    const median =
      exposures % 2 === 1 ? sorted[exposures >> 1] : (sorted[exposures / 2 - 1] + sorted[exposures / 2]) / 2;
    let kept = 0;
    let keptSum = 0;
    for (let k = 0; k < exposures; k++) {
      if (Math.abs(values[k] - median) > limit) continue;
      kept++;
      keptSum += values[k];
    }
    mean[i] = kept > 0 ? keptSum / kept : median;
  }
  return { mean, variance, exposures };
}

/** Median over pixels of the variance between exposures, corrected to a mean for the chi-square law. */
function betweenVariance(planes: (Uint16Array | Float32Array)[]): number {
  const first = planes[0];
  const second = planes[1];
  const step = Math.max(1, Math.floor(first.length / 100_000));
  const differences: number[] = [];
  for (let i = 0; i < first.length; i += step) differences.push(first[i] - second[i]);
  return trimmedVariance(differences) / 2;
}

/** Variance of one exposure from the differences of neighbouring pixels. */
function neighbourVariance(plane: Uint16Array | Float32Array): number {
  const step = Math.max(2, Math.floor(plane.length / 100_000));
  const differences: number[] = [];
  for (let i = 1; i < plane.length; i += step) differences.push(plane[i] - plane[i - 1]);
  return trimmedVariance(differences) / 2;
}

/** Variance about the mean with values beyond four standard deviations left out, at least the quantisation's 1/12. */
export function trimmedVariance(values: ArrayLike<number>): number {
  let low = -Infinity;
  let high = Infinity;
  let variance = 1 / 12;
  for (let round = 0; round < 6; round++) {
    let n = 0;
    let sum = 0;
    let squares = 0;
    for (let i = 0; i < values.length; i++) {
      const value = values[i];
      if (value < low || value > high) continue;
      n++;
      sum += value;
      squares += value * value;
    }
    if (n < 2) break;
    const mean = sum / n;
    variance = Math.max(1 / 12, squares / n - mean * mean);
    const reach = 4 * Math.sqrt(variance);
    low = mean - reach;
    high = mean + reach;
  }
  return variance;
}
