import { Matrix } from 'ml-matrix';
import type { NoiseModel } from '../calibrate/noiseModel';
import type { Rounded } from '../calibrate/rounding';
import type { Cells } from './cells';
import { expectedInCell, PARAMETERS, type CellFit, type CellModel } from './fitCells';

/** Sides of the blocks over which the misfit is summed, as parts of the frame's longer side. */
const BLOCK_PARTS = [1 / 32, 1 / 16, 1 / 9, 1 / 5];

export interface Spread {
  /** Of the pixels' shot and read noise alone, covariance over the free parameters. */
  white: Matrix;
  /** Of the pixels' unequal response from pixel to pixel. */
  response: Matrix;
  /** As the misfit itself shows it, summed over blocks of pixels: contains whatever is correlated within a block. */
  observed: Matrix;
  /** Of a response that varies smoothly over the sensor by one part in one, patches a sixth of the frame wide. */
  patches: Matrix;
  blocks: number;
}

/**
 * Covariances of a fit by what makes the pixels scatter. With weights w, derivatives d and the normal matrix H the
 * covariance for any noise is H⁻¹ B H⁻¹, B = Σ over blocks of s sᵀ, s = Σ w (mean − model) d (Huber's sandwich,
 * clustered; from memory). Of several block sizes the one with the largest variance of the size counts.
 */
export function robustCovariance(
  cells: Cells,
  fit: CellFit,
  evaluated: CellModel,
  noise: NoiseModel,
  widthPx: number,
  heightPx: number,
): Spread {
  const columns = fit.free.map((name) => PARAMETERS.indexOf(name));
  const p = columns.length;
  const longest = Math.max(widthPx, heightPx);
  const white = Matrix.zeros(p, p);
  const response = Matrix.zeros(p, p);
  const expected: Rounded = { offset: 0, slope: 1, variance: 1 };
  const groups = BLOCK_PARTS.map((part) => ({ side: longest * part, scores: new Map<number, Float64Array>() }));
  const patches = { side: longest / 6, scores: new Map<number, Float64Array>() };
  const add = (group: { side: number; scores: Map<number, Float64Array> }, c: number, value: number) => {
    const bx = Math.floor((cells.x[c] + cells.centreX) / group.side);
    const by = Math.floor((cells.y[c] + cells.centreY) / group.side);
    const key = by * 4096 + bx;
    let score = group.scores.get(key);
    if (score === undefined) group.scores.set(key, (score = new Float64Array(p)));
    for (let i = 0; i < p; i++) score[i] += value * evaluated.jacobian[c * PARAMETERS.length + columns[i]];
  };
  const d = new Float64Array(p);
  for (let c = 0; c < cells.length; c++) {
    const level = evaluated.model[c];
    const { variance, slope, offset } = expectedInCell(noise, level, evaluated.blur[c], expected);
    const weight = (cells.pixels[c] / variance) * slope;
    const shot = (weight * slope * (variance - noise.perSquare * Math.max(0, level) ** 2)) / variance;
    const uneven = weight * slope - shot;
    for (let i = 0; i < p; i++) d[i] = evaluated.jacobian[c * PARAMETERS.length + columns[i]];
    for (let i = 0; i < p; i++) {
      for (let j = i; j < p; j++) {
        white.set(i, j, white.get(i, j) + shot * d[i] * d[j]);
        response.set(i, j, response.get(i, j) + uneven * d[i] * d[j]);
      }
    }
    const off = weight * (cells.mean[c] - level - offset);
    for (const group of groups) add(group, c, off);
    add(patches, c, weight * slope * level);
  }
  for (const m of [white, response]) for (let i = 0; i < p; i++) for (let j = 0; j < i; j++) m.set(i, j, m.get(j, i));
  const around = (middle: Matrix) => fit.covariance.mmul(middle).mmul(fit.covariance);
  const summed = (scores: Map<number, Float64Array>) => {
    const middle = Matrix.zeros(p, p);
    for (const s of scores.values())
      for (let i = 0; i < p; i++) for (let j = 0; j < p; j++) middle.set(i, j, middle.get(i, j) + s[i] * s[j]);
    return middle;
  };
  let observed: Matrix | null = null;
  let blocks = 0;
  for (const { scores } of groups) {
    if (scores.size < 2 * p) continue;
    const candidate = around(summed(scores)).mul(scores.size / (scores.size - p));
    if (observed === null || candidate.get(0, 0) > observed.get(0, 0)) {
      observed = candidate;
      blocks = scores.size;
    }
  }
  return {
    white: around(white),
    response: around(response),
    observed: observed ?? fit.covariance.clone(),
    patches: around(summed(patches.scores)),
    blocks,
  };
}
