import besselj0 from '@stdlib/math-base-special-besselj0';
import besselj1 from '@stdlib/math-base-special-besselj1';
import { gaussLegendre } from './gaussLegendre';

/** Spacing of the table in v = k a sin θ. Cubic interpolation is then good to 1e-8 of the peak. */
export const TABLE_STEP = 0.05;
/** Largest v that is modelled; the intensity there is 1e-6 of the peak. */
export const LARGEST_V = 100;
/** Columns of a table row. */
export const COLUMN = { intensity: 0, slope: 1, curvature: 2, bySize: 3, byIllumination: 4 } as const;
export const COLUMNS = 5;

const NODES = 72;
const ROWS = Math.round(LARGEST_V / TABLE_STEP) + 1;
/** Rows beyond the outermost for the differences at the edge. */
const SPARE_ROWS = 4;

interface BesselRows {
  /** ρ² of the nodes. */
  squares: Float64Array;
  /** weight · 2ρ of the nodes. */
  weights: Float64Array;
  /** J0(vρ), then J1(vρ)·ρ; row by v, column by node. */
  zero: Float64Array;
  one: Float64Array;
}

let cached: BesselRows | null = null;

function besselRows(): BesselRows {
  if (cached) return cached;
  const { nodes, weights } = gaussLegendre(NODES);
  const rows = ROWS + SPARE_ROWS;
  const zero = new Float64Array(rows * NODES);
  const one = new Float64Array(rows * NODES);
  for (let row = 0; row < rows; row++) {
    const v = row * TABLE_STEP;
    for (let j = 0; j < NODES; j++) {
      zero[row * NODES + j] = besselj0(v * nodes[j]);
      one[row * NODES + j] = besselj1(v * nodes[j]) * nodes[j];
    }
  }
  cached = { squares: nodes.map((n) => n * n), weights: weights.map((w, j) => 2 * w * nodes[j]), zero, one };
  return cached;
}

export interface PinholeState {
  /** 2π times the Fresnel number: k a² (1/z + 1/R). */
  u: number;
  /** (a / w)² of a Gaussian beam of 1/e² intensity radius w on the aperture; 0 for even light. */
  illumination: number;
  /** Width of the pixel in units of v: k a p / z. */
  pixelV: number;
}

/**
 * Irradiance of a circular hole against v = k a sin θ for one state, with derivatives, averaged over the pixel's square.
 *
 * I(v) = |2 ∫₀¹ J₀(vρ) exp(−(g + iu/2) ρ²) ρ dρ|², g = (a/w)². For g = 0 this is Lommel's solution U₁² + U₂² over
 * (u/2)² (Born & Wolf §8.8.1, from memory; Mielenz, J. Res. NIST 103 (1998) 497, looked up); for u = 0 too it is Airy's
 * (2 J₁(v)/v)². It is evaluated by 72-point Gauss–Legendre quadrature, good to 1e-13 for v ≤ 100 and u ≤ 40.
 * The pixel's square is averaged to fourth order, its direction over all angles:
 * I + (p²/24) ∇²I + (7p⁴/11520) ∇⁴I.
 * @param largestV the table reaches at least this far (at most LARGEST_V)
 * @returns rows of COLUMNS values: intensity, ∂/∂v, ∂²/∂v², derivative by ln a at fixed place, derivative by g
 */
export function pinholeTable(state: PinholeState, largestV: number): Float64Array {
  const { squares, weights, zero, one } = besselRows();
  const { u, illumination, pixelV } = state;
  const rows = Math.min(ROWS, Math.ceil(largestV / TABLE_STEP) + 4);
  const all = rows + SPARE_ROWS;
  const real = new Float64Array(NODES);
  const imaginary = new Float64Array(NODES);
  for (let j = 0; j < NODES; j++) {
    const size = weights[j] * Math.exp(-illumination * squares[j]);
    real[j] = size * Math.cos((u * squares[j]) / 2);
    imaginary[j] = -size * Math.sin((u * squares[j]) / 2);
  }
  const intensity = new Float64Array(all);
  const slope = new Float64Array(all);
  const byU = new Float64Array(all);
  const byG = new Float64Array(all);
  for (let row = 0; row < all; row++) {
    let aRe = 0;
    let aIm = 0;
    let tRe = 0;
    let tIm = 0;
    let vRe = 0;
    let vIm = 0;
    for (let j = 0, at = row * NODES; j < NODES; j++, at++) {
      const re = zero[at] * real[j];
      const im = zero[at] * imaginary[j];
      aRe += re;
      aIm += im;
      tRe += re * squares[j];
      tIm += im * squares[j];
      vRe -= one[at] * real[j];
      vIm -= one[at] * imaginary[j];
    }
    intensity[row] = aRe * aRe + aIm * aIm;
    slope[row] = 2 * (aRe * vRe + aIm * vIm);
    // ∂A/∂g = −T and ∂A/∂u = −(i/2) T with T = 2 ∫ J₀ e^… ρ³ dρ.
    byG[row] = -2 * (aRe * tRe + aIm * tIm);
    byU[row] = aRe * tIm - aIm * tRe;
  }
  // What the scale of the hole changes beside v itself.
  const inner = new Float64Array(all);
  for (let row = 0; row < all; row++) inner[row] = 2 * u * byU[row] + 2 * illumination * byG[row];
  const second = (pixelV * pixelV) / 24;
  const fourth = (7 * pixelV ** 4) / 11_520;
  const once = laplacian(intensity);
  const twice = laplacian(once);
  const boxed = blend(intensity, once, twice, second, fourth);
  const boxedSlope = blend(slope, derivative(once), derivative(twice), second, fourth);
  const innerBoxed = blend(inner, laplacian(inner), null, second, 0);
  const gBoxed = blend(byG, laplacian(byG), null, second, 0);
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

/** ∂²f/∂v² + (1/v) ∂f/∂v of an even function on the table's grid. */
function laplacian(f: Float64Array): Float64Array {
  const h = TABLE_STEP;
  const last = f.length - 1;
  return f.map((value, i) => {
    if (i === 0) return (4 * (f[1] - value)) / (h * h);
    const after = f[Math.min(last, i + 1)];
    return (after - 2 * value + f[i - 1]) / (h * h) + (after - f[i - 1]) / (2 * h * (i * h));
  });
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
