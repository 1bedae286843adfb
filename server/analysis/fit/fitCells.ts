import { CholeskyDecomposition, Matrix } from 'ml-matrix';
import { invertScaled } from '../../../shared/metrology/normalEquations';
import { varianceAt, type NoiseModel } from '../calibrate/noiseModel';
import { roundedAt, type Rounded } from '../calibrate/rounding';
import { COLUMNS, hermite, LARGEST_V, pinholeTable, TABLE_STEP } from '../models/pinholeTable';
import type { Cells } from './cells';
import { fresnelU, type PinholeOptics } from './PinholeOptics';

/** Parameters of the two-dimensional fit, in this order. */
export const PARAMETERS = [
  'logSize',
  'x',
  'y',
  'amplitude',
  'background',
  'slopeX',
  'slopeY',
  'illumination',
  'ovalCos',
  'ovalSin',
  'tiltX',
  'tiltY',
] as const;
export type ParameterName = (typeof PARAMETERS)[number];

/**
 * State of the fit. Centre in full-frame pixels, background slopes in counts a pixel, illumination (a/w)², the oval's
 * two components (half the relative difference of the axes, along x and along the diagonal), tilts in radians
 * (positive: the +x or +y side lies further from the aperture).
 */
export type PinholeParameters = Record<ParameterName, number>;

export interface CellFit {
  values: PinholeParameters;
  free: ParameterName[];
  /** Inverse of the weighted normal matrix over the free parameters. */
  covariance: Matrix;
  /** Σ (mean − model)² / variance over cells. */
  cellChiSquare: number;
  cellCount: number;
  converged: boolean;
  iterations: number;
}

export interface CellModel {
  model: Float64Array;
  /** Variance of the model within each cell, counts². */
  blur: Float64Array;
  /** Row-major, cells × all parameters; empty when not asked for. */
  jacobian: Float64Array;
}

const COUNT = PARAMETERS.length;
const MOST_ITERATIONS = 30;

/** Aperture radius of a state, mm. */
export function radiusOf(values: PinholeParameters): number {
  return Math.exp(values.logSize) / 2;
}

/**
 * The model in every cell and its derivatives.
 * sin θ = ρ / √(ρ² + Z²) exactly, with ρ across and Z along the axis for a tilted sensor; an oval hole of semi-axes
 * a·√(c ± e) has v² = k² a² (xᵀ M x) / (ρ² + Z²) with det M = 1, so that the size is the geometric mean of the axes.
 */
export function cellModel(
  cells: Cells,
  optics: PinholeOptics,
  values: PinholeParameters,
  withJacobian: boolean,
): CellModel {
  const { length } = cells;
  const radius = radiusOf(values);
  const { pitchMm, distanceMm, waveNumber } = optics;
  const scale = waveNumber * radius;
  const shiftX = (values.x - cells.centreX) * pitchMm;
  const shiftY = (values.y - cells.centreY) * pitchMm;
  let furthest = 0;
  for (let c = 0; c < length; c++) furthest = Math.max(furthest, cells.x[c] ** 2 + cells.y[c] ** 2);
  const reach = Math.sqrt(furthest) * pitchMm + Math.hypot(shiftX, shiftY);
  const oval = Math.hypot(values.ovalCos, values.ovalSin);
  const largestV = Math.min(LARGEST_V, 1.05 * (1 + oval) * scale * (reach / Math.hypot(reach, distanceMm)) + 0.5);
  const table = pinholeTable(
    { u: fresnelU(optics, radius), illumination: values.illumination, pixelV: (scale * pitchMm) / distanceMm },
    largestV,
  );
  // Local copies: reaching an imported name once a pixel costs more than the arithmetic.
  const columns = COLUMNS;
  const parameters = COUNT;
  const perV = 1 / TABLE_STEP;
  const cubic = hermite;
  const lastRow = table.length / columns - 2;
  const mean = Math.sqrt(1 + oval * oval);
  const [sinX, sinY] = [Math.sin(values.tiltX), Math.sin(values.tiltY)];
  const [cosX, cosY] = [Math.cos(values.tiltX), Math.cos(values.tiltY)];
  const { amplitude } = values;
  const model = new Float64Array(length);
  const blur = new Float64Array(length);
  const jacobian = new Float64Array(withJacobian ? length * COUNT : 0);
  const { sqrt } = Math;
  for (let c = 0; c < length; c++) {
    const sx = cells.x[c] * pitchMm - shiftX;
    const sy = cells.y[c] * pitchMm - shiftY;
    const x = sx * cosX;
    const y = sy * cosY;
    const z = distanceMm + sx * sinX + sy * sinY;
    const across = x * x + y * y;
    const far = across + z * z;
    const form = (mean + values.ovalCos) * x * x + (mean - values.ovalCos) * y * y + 2 * values.ovalSin * x * y;
    const v = scale * sqrt((form > 0 ? form : 0) / far);
    const place = v * perV;
    let row = place | 0;
    let t = place - row;
    if (row > lastRow) {
      row = lastRow;
      t = 1;
    }
    const at = row * columns;
    const next = at + columns;
    const slope = table[at + 1] + t * (table[next + 1] - table[at + 1]);
    const curvature = table[at + 2] + t * (table[next + 2] - table[at + 2]);
    const dvdr = (scale * pitchMm) / sqrt(far);
    blur[c] = (amplitude * slope * dvdr) ** 2 * cells.radiusVariance[c];
    const spread = 0.5 * cells.radiusVariance[c] * dvdr * dvdr * curvature;
    // Rayleigh–Sommerfeld: the field falls with cos θ and with 1/distance, so the irradiance with cos⁴ θ.
    const fall = (z * z * z * z) / (far * far);
    const intensity = (cubic(table[at], table[at + 1], table[next], table[next + 1], t) + spread) * fall;
    model[c] = amplitude * intensity + values.background + values.slopeX * cells.x[c] + values.slopeY * cells.y[c];
    if (!withJacobian) continue;
    const j = c * parameters;
    const steep = amplitude * fall * slope;
    const bySize = table[at + 3] + t * (table[next + 3] - table[at + 3]);
    // ∂v/∂x of the place on the sensor, tilt and oval to first order.
    const overV = v > 1e-9 ? (scale * scale) / (v * far) : 0;
    const vx = overV * ((mean + values.ovalCos) * x + values.ovalSin * y - (across / far) * x);
    const vy = overV * ((mean - values.ovalCos) * y + values.ovalSin * x - (across / far) * y);
    jacobian[j] = amplitude * fall * bySize;
    jacobian[j + 1] = -steep * vx * pitchMm;
    jacobian[j + 2] = -steep * vy * pitchMm;
    jacobian[j + 3] = intensity;
    jacobian[j + 4] = 1;
    jacobian[j + 5] = cells.x[c];
    jacobian[j + 6] = cells.y[c];
    jacobian[j + 7] = amplitude * fall * (table[at + 4] + t * (table[next + 4] - table[at + 4]));
    jacobian[j + 8] = steep * 0.5 * overV * (x * x - y * y);
    jacobian[j + 9] = steep * overV * x * y;
    const keystone = (-v * z) / far;
    jacobian[j + 10] = steep * (keystone * sx * cosX - vx * sx * sinX);
    jacobian[j + 11] = steep * (keystone * sy * cosY - vy * sy * sinY);
  }
  return { model, blur, jacobian };
}

/** Expected mean of a cell over its level, and variance of one of its pixels. */
export function expectedInCell(noise: NoiseModel, level: number, blur: number, into: Rounded): Rounded {
  const { rounding } = noise;
  if (rounding === undefined) {
    into.offset = 0;
    into.slope = 1;
    into.variance = varianceAt(noise, level);
    return into;
  }
  const above = level > 0 ? level : 0;
  roundedAt(level + rounding.blackCount, rounding.floor + rounding.perCount * above + blur, into);
  into.variance += noise.perSquare * above * above;
  return into;
}

/**
 * Weighted Gauss–Newton with step halving; the weights follow the model's own variance, so that at the solution the
 * equations are those of maximum likelihood (quasi-likelihood) and not those of data-weighted least squares, which are
 * biased low (Neyman's; see Fowler, arXiv 1312.5622, looked up).
 */
export function fitCells(
  cells: Cells,
  optics: PinholeOptics,
  noise: NoiseModel,
  start: PinholeParameters,
  free: ParameterName[],
): CellFit {
  const columns = free.map((name) => PARAMETERS.indexOf(name));
  const p = columns.length;
  let values = { ...start };
  let evaluated = cellModel(cells, optics, values, true);
  let iterations = 0;
  let converged = false;
  let { normal, gradient, variance } = assemble(cells, noise, evaluated, columns);
  let cost = chiSquare(cells, noise, evaluated, variance);
  let damping = 0;
  while (iterations < MOST_ITERATIONS) {
    iterations++;
    const step = solveScaled(normal, gradient, damping);
    if (step === null) {
      damping = damping === 0 ? 1e-6 : damping * 10;
      if (damping > 1e3) break;
      continue;
    }
    let decrement = 0;
    for (let i = 0; i < p; i++) decrement += step[i] * gradient[i];
    // A step this short moves no parameter by a thirtieth of its standard uncertainty.
    if (decrement < 1e-3 && damping === 0) {
      converged = true;
      break;
    }
    const tried = { ...values };
    free.forEach((name, i) => (tried[name] += step[i]));
    const next = admissible(tried, values) ? cellModel(cells, optics, tried, true) : null;
    const nextCost = next === null ? Infinity : chiSquare(cells, noise, next, variance);
    if (!(nextCost <= cost * (1 + 1e-12) + 1e-9)) {
      damping = damping === 0 ? 1e-3 : damping * 8;
      if (damping > 1e8) break;
      continue;
    }
    values = tried;
    evaluated = next as CellModel;
    ({ normal, gradient, variance } = assemble(cells, noise, evaluated, columns));
    cost = chiSquare(cells, noise, evaluated, variance);
    damping = damping < 1e-4 ? 0 : damping / 10;
  }
  return {
    values,
    free,
    covariance: invertScaled(normal) ?? Matrix.eye(p, p).mul(Infinity),
    cellChiSquare: cost,
    cellCount: cells.length,
    converged,
    iterations,
  };
}

/**
 * How much chi-square would fall if more parameters were free, told from the slopes at the solution alone (Rao's score
 * test, from memory).
 */
export function scoreGain(cells: Cells, noise: NoiseModel, evaluated: CellModel, free: ParameterName[]): number {
  const { normal, gradient } = assemble(
    cells,
    noise,
    evaluated,
    free.map((name) => PARAMETERS.indexOf(name)),
  );
  const step = solveScaled(normal, gradient, 1e-9);
  return step === null ? 0 : step.reduce((sum, value, i) => sum + value * gradient[i], 0);
}

/** Keeps a step within what the model can follow. */
function admissible(tried: PinholeParameters, from: PinholeParameters): boolean {
  return (
    Math.abs(tried.logSize - from.logSize) < 0.3 &&
    Math.abs(tried.illumination) < 25 &&
    Math.hypot(tried.ovalCos, tried.ovalSin) < 0.9 &&
    Math.abs(tried.tiltX) < 0.6 &&
    Math.abs(tried.tiltY) < 0.6 &&
    PARAMETERS.every((name) => Number.isFinite(tried[name]))
  );
}

function chiSquare(cells: Cells, noise: NoiseModel, { model, blur }: CellModel, variance: Float64Array): number {
  const expected: Rounded = { offset: 0, slope: 1, variance: 1 };
  let sum = 0;
  for (let c = 0; c < cells.length; c++) {
    const { offset } = expectedInCell(noise, model[c], blur[c], expected);
    sum += (cells.mean[c] - model[c] - offset) ** 2 / variance[c];
  }
  return sum;
}

function assemble(cells: Cells, noise: NoiseModel, { model, blur, jacobian }: CellModel, columns: number[]) {
  const expected: Rounded = { offset: 0, slope: 1, variance: 1 };
  const p = columns.length;
  const sums = new Float64Array(p * p);
  const gradient = new Float64Array(p);
  const variance = new Float64Array(cells.length);
  for (let c = 0; c < cells.length; c++) {
    expectedInCell(noise, model[c], blur[c], expected);
    variance[c] = expected.variance / cells.pixels[c];
    const steep = expected.slope;
    const weight = 1 / variance[c];
    const off = weight * (cells.mean[c] - model[c] - expected.offset) * steep;
    const at = c * COUNT;
    for (let i = 0; i < p; i++) {
      const d = jacobian[at + columns[i]];
      gradient[i] += off * d;
      const scaled = weight * steep * steep * d;
      for (let j = i; j < p; j++) sums[i * p + j] += scaled * jacobian[at + columns[j]];
    }
  }
  const normal = new Matrix(p, p);
  for (let i = 0; i < p; i++) for (let j = i; j < p; j++) normal.set(i, j, sums[i * p + j]).set(j, i, sums[i * p + j]);
  return { normal, gradient, variance };
}

function solveScaled(normal: Matrix, gradient: Float64Array, damping: number): Float64Array | null {
  const p = normal.rows;
  const scale = Array.from({ length: p }, (_, i) => 1 / Math.sqrt(normal.get(i, i)));
  if (!scale.every(Number.isFinite)) return null;
  const scaled = new Matrix(p, p);
  for (let i = 0; i < p; i++)
    for (let j = 0; j < p; j++) scaled.set(i, j, normal.get(i, j) * (scale[i] * scale[j]) + (i === j ? damping : 0));
  const cholesky = new CholeskyDecomposition(scaled);
  if (!cholesky.isPositiveDefinite()) return null;
  const solved = cholesky.solve(Matrix.columnVector(Array.from(gradient, (g, i) => g * scale[i])));
  return Float64Array.from(scale, (s, i) => s * solved.get(i, 0));
}
