import { tabulateCircularPattern, type PatternTable } from '../../../shared/optics/circularPattern';
import { radialLaplacian } from '../../../shared/optics/pixelBox';

/** Spacing of the table in v = k a sin θ. Cubic interpolation is then good to 1e-8 of the peak. */
export const TABLE_STEP = 0.05;
/** Largest v that is modelled; the intensity there is 1e-6 of the peak. */
export const LARGEST_V = 100;
/** Columns of a table row. */
export const COLUMN = { intensity: 0, slope: 1, curvature: 2, bySize: 3, byIllumination: 4 } as const;
export const COLUMNS = 5;

const ROWS = Math.round(LARGEST_V / TABLE_STEP) + 1;
/** Rows beyond the outermost for the differences at the edge. */
const SPARE_ROWS = 4;

export interface PinholeState {
  /** 2π times the Fresnel number: k a² (1/z + 1/R). */
  u: number;
  /** (a / w)² of a Gaussian beam of 1/e² intensity radius w on the aperture; 0 for even light. */
  illumination: number;
  /** Width of the pixel in units of v: k a p / z. */
  pixelV: number;
}

/**
 * Irradiance of a circular hole against v = k a sin θ for one state (`circularPattern`), with derivatives, averaged over
 * the pixel's square to fourth order, its direction over all angles: I + (p²/24) ∇²I + (7p⁴/11520) ∇⁴I.
 * @param largestV the table reaches at least this far (at most LARGEST_V)
 * @returns rows of COLUMNS values: intensity, ∂/∂v, ∂²/∂v², derivative by ln a at fixed place, derivative by g
 */
export function pinholeTable(state: PinholeState, largestV: number): Float64Array {
  const { u, illumination, pixelV } = state;
  const rows = Math.min(ROWS, Math.ceil(largestV / TABLE_STEP) + 4);
  const all = rows + SPARE_ROWS;
  const point: PatternTable = {
    intensity: new Float64Array(all),
    byV: new Float64Array(all),
    byU: new Float64Array(all),
    byTaper: new Float64Array(all),
  };
  tabulateCircularPattern(u, illumination, TABLE_STEP, point);
  const { intensity, byV: slope, byU, byTaper: byG } = point;
  // What the scale of the hole changes beside v itself.
  const inner = new Float64Array(all);
  for (let row = 0; row < all; row++) inner[row] = 2 * u * byU[row] + 2 * illumination * byG[row];
  const second = (pixelV * pixelV) / 24;
  const fourth = (7 * pixelV ** 4) / 11_520;
  const once = radialLaplacian(intensity, TABLE_STEP);
  const twice = radialLaplacian(once, TABLE_STEP);
  const boxed = blend(intensity, once, twice, second, fourth);
  const boxedSlope = blend(slope, derivative(once), derivative(twice), second, fourth);
  const innerBoxed = blend(inner, radialLaplacian(inner, TABLE_STEP), null, second, 0);
  const gBoxed = blend(byG, radialLaplacian(byG, TABLE_STEP), null, second, 0);
  const table = new Float64Array(rows * COLUMNS);
  for (let row = 0; row < rows; row++) {
    const at = row * COLUMNS;
    const v = row * TABLE_STEP;
    table[at] = boxed[row];
    table[at + 1] = boxedSlope[row];
    const before = row === 0 ? -boxedSlope[1] : boxedSlope[row - 1];
    table[at + 2] = (boxedSlope[row + 1] - before) / (2 * TABLE_STEP);
    table[at + 3] = v * boxedSlope[row] + innerBoxed[row] + 2 * second * once[row] + 4 * fourth * twice[row];
    table[at + 4] = gBoxed[row];
  }
  return table;
}

function blend(
  base: Float64Array,
  once: Float64Array,
  twice: Float64Array | null,
  second: number,
  fourth: number,
): Float64Array {
  return base.map((value, i) => value + second * once[i] + (twice === null ? 0 : fourth * twice[i]));
}

/** Central difference of an even function. */
function derivative(f: Float64Array): Float64Array {
  const last = f.length - 1;
  return f.map((_, i) => (i === 0 ? 0 : (f[Math.min(last, i + 1)] - f[i - 1]) / (2 * TABLE_STEP)));
}

/** Intensity at v by cubic Hermite interpolation of a table; beyond its end the last row's. */
export function intensityAt(table: Float64Array, v: number): number {
  const rows = table.length / COLUMNS;
  const place = v / TABLE_STEP;
  const row = Math.floor(place);
  if (row >= rows - 1) return table[(rows - 1) * COLUMNS];
  const t = place - row;
  const at = row * COLUMNS;
  return hermite(table[at], table[at + 1], table[at + COLUMNS], table[at + COLUMNS + 1], t);
}

/** Cubic through values and slopes at both ends of one table step; t from 0 to 1. */
export function hermite(f0: number, s0: number, f1: number, s1: number, t: number): number {
  const d = f1 - f0;
  const m0 = s0 * TABLE_STEP;
  const m1 = s1 * TABLE_STEP;
  return f0 + t * (m0 + t * (3 * d - 2 * m0 - m1 + t * (m0 + m1 - 2 * d)));
}
