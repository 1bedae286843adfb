import { LuDecomposition, Matrix } from 'ml-matrix';
import type { CameraRecord } from '../../../shared/contracts/measureCase';
import { trimmedVariance } from './masterFrame';

/**
 * Variance of one pixel against its level above black, counts²: floor + perCount · level + perSquare · level².
 * The terms are read and dark noise with quantisation, shot noise (the inverse of the gain), and the pixels' unequal
 * response. Model of EMVA 1288: σ² = K²σ_d² + σ_q² + K(µ − µ_dark) (from memory, confirmed in the standard's reference
 * implementation), to which the response term is added.
 */
export interface NoiseModel {
  floor: number;
  perCount: number;
  perSquare: number;
  source: 'record' | 'frame';
  /**
   * Noise before rounding to whole counts, where it is so small that rounding is more than added noise; counts² at
   * black and for each count of level.
   */
  rounding?: { blackCount: number; floor: number; perCount: number };
  /** Variance at black before rounding, counts², where read noise and gain are on record and the frame agrees. */
  recordedFloor?: number;
}

export function varianceAt(noise: NoiseModel, level: number): number {
  const above = level > 0 ? level : 0;
  return noise.floor + above * (noise.perCount + noise.perSquare * above);
}

/** Weights of the fourth difference along a row; the sum of their squares is 70. */
const FOURTH_NORM = 70;
const LEVELS = 40;
const MOST_SAMPLES = 150_000;
/**
 * Recorded variance with rounding, counts², below which the frame cannot contradict the record: differences of whole
 * counts then show the steps of rounding and not the noise.
 */
const LEAST_JUDGED = 0.4;
/** How far the frame's own noise may lie from the camera record's before the record is set aside. */
const RECORD_TOLERANCE = 1.35;

/**
 * Estimates the noise from the frame itself: fourth differences along rows, which a smooth pattern hardly touches,
 * grouped by local level. With a gain and read noise on record these are used, unless the frame contradicts them.
 * @param counts above black, row-major
 * @param mask pixels that are not to be used are not 0
 * @param step distance between neighbours of one colour: 1, or 2 for a mosaic
 * @param darkVariance variance of the master dark that was taken off, counts²: part of the frame's own scatter already,
 *   but unknown to the camera's record
 */
export function noiseModel(
  counts: Float32Array,
  mask: Uint8Array,
  widthPx: number,
  heightPx: number,
  step: number,
  camera: CameraRecord,
  darkVariance = 0,
): { noise: NoiseModel; notes: string[] } {
  const { levels, variances, numbers } = levelVariances(counts, mask, widthPx, heightPx, step);
  const free = fitVariance(levels, variances, numbers, null);
  const notes: string[] = [];
  const gain = camera.electronsPerCount;
  if (gain === undefined) {
    if (free.perCount > 0)
      notes.push(`The gain was estimated from the frame: ${(1 / free.perCount).toPrecision(3)} electrons a count.`);
    return { noise: { ...free, source: 'frame' }, notes };
  }
  const read = camera.readNoiseElectrons;
  const readVariance = read === undefined ? undefined : (read / gain) ** 2 + darkVariance;
  const told = (readVariance ?? free.floor) + 1 / 12;
  const judged = levels.map((level) => told + Math.max(0, level) / gain > LEAST_JUDGED);
  const keep = (values: number[]) => values.filter((_, k) => judged[k]);
  const floor =
    readVariance === undefined
      ? free.floor
      : judged[0]
        ? Math.max(free.floor, readVariance + 1 / 12)
        : readVariance + 1 / 12;
  const recorded = fitVariance(keep(levels), keep(variances), keep(numbers), { floor, perCount: 1 / gain });
  let worst = 1;
  for (let k = 0; k < levels.length; k++) {
    if (numbers[k] < 500 || !judged[k]) continue;
    const ratio = varianceAt({ ...recorded, source: 'record' }, levels[k]) / variances[k];
    worst = Math.max(worst, ratio, 1 / ratio);
  }
  if (worst > RECORD_TOLERANCE) {
    notes.push(
      'The noise of the frame does not agree with the gain and read noise on record; the noise found in the frame was used.',
    );
    return { noise: { ...free, source: 'frame' }, notes };
  }
  return { noise: { ...recorded, source: 'record', recordedFloor: readVariance }, notes };
}

function levelVariances(counts: Float32Array, mask: Uint8Array, widthPx: number, heightPx: number, step: number) {
  const usable = Math.floor((widthPx * heightPx) / (step * step));
  const skip = Math.max(1, Math.floor(usable / MOST_SAMPLES));
  const level: number[] = [];
  const difference: number[] = [];
  for (let y = 0; y < heightPx; y++) {
    for (let x = 2 * step + ((y * 7) % skip); x < widthPx - 2 * step; x += skip) {
      const i = y * widthPx + x;
      if (mask[i] | mask[i - step] | mask[i + step] | mask[i - 2 * step] | mask[i + 2 * step]) continue;
      const outer = counts[i - 2 * step] + counts[i + 2 * step];
      const inner = counts[i - step] + counts[i + step];
      level.push((outer + inner + counts[i]) / 5);
      difference.push(outer - 4 * inner + 6 * counts[i]);
    }
  }
  const sorted = Float64Array.from(level).sort();
  const edges = groupEdges(sorted);
  const groups = edges.slice(1).map((): { level: number; differences: number[] } => ({ level: 0, differences: [] }));
  for (let k = 0; k < level.length; k++) {
    const group = groups[Math.max(0, Math.min(groups.length - 1, placeOf(edges, level[k]) - 1))];
    group.level += level[k];
    group.differences.push(difference[k]);
  }
  const levels: number[] = [];
  const variances: number[] = [];
  const numbers: number[] = [];
  for (const { level: sum, differences } of groups) {
    if (differences.length < 40) continue;
    levels.push(sum / differences.length);
    variances.push(Math.max(1 / 12 / 4, trimmedVariance(differences) / FOURTH_NORM));
    numbers.push(differences.length);
  }
  return { levels, variances, numbers };
}

/** How many of the ascending values are at or below one. */
function placeOf(ascending: ArrayLike<number>, value: number): number {
  let from = 0;
  let to = ascending.length;
  while (from < to) {
    const middle = (from + to) >> 1;
    if (ascending[middle] <= value) from = middle + 1;
    else to = middle;
  }
  return from;
}

/**
 * Edges between groups of levels: half of them part the pixels into equal numbers, half the range into equal steps, so
 * that the bright few are seen too.
 */
function groupEdges(sorted: Float64Array): number[] {
  const n = sorted.length;
  if (n === 0) return [];
  const half = LEVELS / 2;
  const edges = new Set<number>([sorted[0], Math.max(sorted[n - 1], sorted[0] + 1)]);
  for (let k = 1; k < half; k++) {
    edges.add(sorted[Math.floor((n * k) / half)]);
    edges.add(sorted[0] + ((sorted[n - 1] - sorted[0]) * k) / half);
  }
  return [...edges].sort((a, b) => a - b);
}

/**
 * Non-negative weighted least squares of the three terms (two or none of them given). All subsets of terms are tried;
 * the best one whose coefficients are not negative wins.
 */
function fitVariance(
  levels: number[],
  variances: number[],
  numbers: number[],
  given: { floor: number; perCount: number } | null,
): Omit<NoiseModel, 'source'> {
  const quiet = variances.length > 0 ? Math.min(...variances) : 1 / 12;
  let best = { floor: given?.floor ?? quiet, perCount: given?.perCount ?? 0, perSquare: 0 };
  let bestCost = Infinity;
  const subsets = given ? [[], [2]] : [[0], [0, 1], [0, 2], [0, 1, 2]];
  for (const terms of subsets) {
    const n = terms.length;
    const normal = Array.from({ length: n }, () => new Array<number>(n + 1).fill(0));
    for (let k = 0; k < levels.length; k++) {
      const level = Math.max(0, levels[k]);
      const basis = [1, level, level * level];
      const target = variances[k] - (given ? given.floor + given.perCount * level : 0);
      const weight = numbers[k] / variances[k] ** 2;
      for (let i = 0; i < n; i++) {
        for (let j = 0; j < n; j++) normal[i][j] += weight * basis[terms[i]] * basis[terms[j]];
        normal[i][n] += weight * basis[terms[i]] * target;
      }
    }
    const solved = solveAugmented(normal);
    if (solved === null || solved.some((s) => s < 0)) continue;
    const model = { floor: given?.floor ?? 0, perCount: given?.perCount ?? 0, perSquare: 0 };
    terms.forEach((term, i) => {
      if (term === 0) model.floor += solved[i];
      else if (term === 1) model.perCount += solved[i];
      else model.perSquare += solved[i];
    });
    model.floor = Math.max(model.floor, 1e-3);
    let cost = 0;
    for (let k = 0; k < levels.length; k++) {
      const level = Math.max(0, levels[k]);
      const expected = model.floor + level * (model.perCount + model.perSquare * level);
      cost += (numbers[k] * (variances[k] - expected) ** 2) / variances[k] ** 2;
    }
    // A further term must earn its keep.
    if (cost < bestCost - 8 || bestCost === Infinity) {
      best = model;
      bestCost = Math.min(cost, bestCost);
    }
  }
  return best;
}

/** Solves an augmented system, scaled first; null when it is singular. */
function solveAugmented(matrix: number[][]): number[] | null {
  const n = matrix.length;
  if (n === 0) return [];
  const scale = matrix.map((row, i) => Math.sqrt(Math.abs(row[i])) || 1);
  const left = new Matrix(matrix.map((row, i) => row.slice(0, n).map((value, j) => value / (scale[i] * scale[j]))));
  const right = Matrix.columnVector(matrix.map((row, i) => row[n] / scale[i]));
  const decomposition = new LuDecomposition(left);
  if (decomposition.isSingular()) return null;
  return decomposition
    .solve(right)
    .to1DArray()
    .map((value, i) => value / scale[i]);
}
