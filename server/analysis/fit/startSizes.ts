import { leastSquares } from '../../../shared/metrology/leastSquares';
import { varianceAt, type NoiseModel } from '../calibrate/noiseModel';
import { COLUMNS, hermite, LARGEST_V, pinholeTable, TABLE_STEP } from '../models/pinholeTable';
import type { RadialBins } from '../profile/radialProfile';
import { fresnelU, type PinholeOptics } from './PinholeOptics';

/** Ratio of neighbouring sizes of the first search. */
const RATIO = 1.022;
/** Bins of the profile that the search looks at. */
const MOST_BINS = 200;
/** Part of the level by which a bin may be off in the search: centre not settled yet, uneven response. */
const SLACK = 0.03;
/** Below this u the pattern is Airy's for the search. */
const AIRY_U = 0.15;
/** Sizes that are followed up. */
const CANDIDATES = 3;

// Local copies: reaching an imported name in the innermost loop costs more than the arithmetic.
const ROW = COLUMNS;
const PER_V = 1 / TABLE_STEP;
const cubic = hermite;

export interface StartSize {
  sizeMm: number;
  amplitude: number;
  background: number;
  /** Weighted mean square of profile minus model. */
  reducedChiSquare: number;
}

interface Points {
  radiusMm: Float64Array;
  mean: Float64Array;
  sigma: Float64Array;
}

/**
 * Sizes from the radial profile alone, best first. All sizes from a first dark ring beyond the profile's end down to
 * rings two pixels wide are tried with amplitude and background solved for; the deepest valleys are followed by
 * Levenberg–Marquardt. No nominal size enters.
 */
export function startSizes(
  bins: RadialBins,
  optics: PinholeOptics,
  noise: NoiseModel,
  furthestPx: number,
): StartSize[] {
  const points = choosePoints(bins, optics, noise);
  if (points.mean.length < 12) return [];
  const lambdaZ = ((2 * Math.PI) / optics.waveNumber) * optics.distanceMm;
  const smallest = (0.45 * lambdaZ) / (furthestPx * optics.pitchMm);
  const largest = lambdaZ / (2 * optics.pitchMm);
  const sizes: number[] = [];
  const costs: number[] = [];
  let airy: Float64Array | null = null;
  const reach = Math.max(...points.radiusMm);
  for (let size = smallest; size <= largest; size *= RATIO) {
    const u = fresnelU(optics, size / 2);
    const illumination = illuminationOf(optics, size / 2);
    const pixelV = (optics.waveNumber * size * optics.pitchMm) / 2 / optics.distanceMm;
    let table: Float64Array;
    if (u < AIRY_U && illumination < 0.02)
      table = airy ??= pinholeTable({ u: 0, illumination: 0, pixelV: 0 }, LARGEST_V);
    else
      table = pinholeTable(
        { u, illumination, pixelV: Math.min(pixelV, 2) },
        Math.min(LARGEST_V, (optics.waveNumber * size * reach) / 2 / optics.distanceMm + 1),
      );
    sizes.push(size);
    costs.push(linearFit(points, optics, size, table).cost);
  }
  const valleys = costs
    .map((cost, i) => ({ cost, i }))
    .filter(({ cost, i }) => cost <= (costs[i - 1] ?? Infinity) && cost <= (costs[i + 1] ?? Infinity))
    .sort((a, b) => a.cost - b.cost)
    .slice(0, CANDIDATES);
  return valleys
    .map(({ i }) => follow(points, optics, sizes[i]))
    .filter((s) => s !== null)
    .sort((a, b) => a.reducedChiSquare - b.reducedChiSquare);
}

export function illuminationOf(optics: PinholeOptics, radiusMm: number): number {
  return optics.beamRadiusMm === null ? 0 : (radiusMm / optics.beamRadiusMm) ** 2;
}

function choosePoints(bins: RadialBins, optics: PinholeOptics, noise: NoiseModel): Points {
  const stride = Math.max(1, Math.ceil(bins.radiusPx.length / MOST_BINS));
  const count = Math.floor(bins.radiusPx.length / stride);
  const points: Points = {
    radiusMm: new Float64Array(count),
    mean: new Float64Array(count),
    sigma: new Float64Array(count),
  };
  for (let k = 0; k < count; k++) {
    let n = 0;
    let sum = 0;
    let radii = 0;
    for (let b = k * stride; b < (k + 1) * stride; b++) {
      n += bins.pixelCount[b];
      sum += bins.pixelCount[b] * bins.meanCounts[b];
      radii += bins.pixelCount[b] * bins.radiusPx[b];
    }
    points.radiusMm[k] = (radii / n) * optics.pitchMm;
    points.mean[k] = sum / n;
    points.sigma[k] = Math.sqrt(varianceAt(noise, sum / n) / n + (SLACK * Math.max(0, sum / n)) ** 2);
  }
  return points;
}

/** Intensity by table at the points of a size. */
function pattern(points: Points, optics: PinholeOptics, size: number, table: Float64Array, at: number): number {
  const onSensor = points.radiusMm[at];
  const v = (optics.waveNumber * size * onSensor) / 2 / Math.hypot(onSensor, optics.distanceMm);
  const place = v * PER_V;
  const row = Math.min(place | 0, table.length / ROW - 2);
  const from = row * ROW;
  return cubic(table[from], table[from + 1], table[from + ROW], table[from + ROW + 1], Math.min(1, place - row));
}

/** Best amplitude and background for a size; an amplitude below zero does not count. */
function linearFit(points: Points, optics: PinholeOptics, size: number, table: Float64Array) {
  let w = 0;
  let wm = 0;
  let wmm = 0;
  let wy = 0;
  let wmy = 0;
  let wyy = 0;
  for (let i = 0; i < points.mean.length; i++) {
    const weight = 1 / points.sigma[i] ** 2;
    const model = pattern(points, optics, size, table, i);
    const y = points.mean[i];
    w += weight;
    wm += weight * model;
    wmm += weight * model * model;
    wy += weight * y;
    wmy += weight * model * y;
    wyy += weight * y * y;
  }
  const determinant = w * wmm - wm * wm;
  const amplitude = determinant > 0 ? (w * wmy - wm * wy) / determinant : 0;
  if (!(amplitude > 0)) return { cost: Infinity, amplitude: 0, background: wy / w };
  const background = (wy - amplitude * wm) / w;
  const cost = wyy - amplitude * wmy - background * wy;
  return { cost, amplitude, background };
}

function follow(points: Points, optics: PinholeOptics, size: number): StartSize | null {
  const tableOf = (s: number) =>
    pinholeTable(
      {
        u: fresnelU(optics, s / 2),
        illumination: illuminationOf(optics, s / 2),
        pixelV: Math.min(2, (optics.waveNumber * s * optics.pitchMm) / 2 / optics.distanceMm),
      },
      Math.min(LARGEST_V, (optics.waveNumber * s * Math.max(...points.radiusMm)) / 2 / optics.distanceMm + 1),
    );
  const linear = linearFit(points, optics, size, tableOf(size));
  if (!Number.isFinite(linear.cost)) return null;
  const fit = leastSquares(
    {
      parameters: [
        {
          name: 'logSize',
          unit: '1',
          initialValue: Math.log(size),
          minValue: Math.log(size) - 0.2,
          maxValue: Math.log(size) + 0.2,
        },
        { name: 'amplitude', unit: 'count', initialValue: linear.amplitude },
        { name: 'background', unit: 'count', initialValue: linear.background },
      ],
      y: points.mean,
      yUncertainty: points.sigma,
      evaluate: (values, model, jacobian) => {
        const s = Math.exp(values[0]);
        const table = tableOf(s);
        for (let i = 0; i < model.length; i++) {
          const value = pattern(points, optics, s, table, i);
          model[i] = values[1] * value + values[2];
          if (jacobian === null) continue;
          const v =
            (optics.waveNumber * s * points.radiusMm[i]) / 2 / Math.hypot(points.radiusMm[i], optics.distanceMm);
          const row = Math.min(table.length / COLUMNS - 1, Math.round(v / TABLE_STEP));
          jacobian[3 * i] = values[1] * table[row * COLUMNS + 3];
          jacobian[3 * i + 1] = value;
          jacobian[3 * i + 2] = 1;
        }
      },
    },
    { maxIterations: 40 },
  );
  const [logSize, amplitude, background] = fit.parameters.map((p) => p.value) as [number, number, number];
  if (fit.status === 'non-finite' || !(amplitude > 0)) return null;
  return { sizeMm: Math.exp(logSize), amplitude, background, reducedChiSquare: fit.reducedChiSquare ?? fit.chiSquare };
}
