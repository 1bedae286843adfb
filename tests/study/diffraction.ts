/** What throws a pattern, in millimetres. */
export interface RoundHole {
  radiusMm: number;
  wavelengthMm: number;
  distanceMm: number;
  /** (a / w)²: a the radius of the hole, w the 1/e² radius of a Gaussian beam on it; 0 for even light. */
  taper: number;
}

/** Values against the distance from the axis in equal steps; the first two lie on the other side of the axis. */
export interface RadialTable {
  stepMm: number;
  intensity: Float64Array;
  /** Change for a change of the logarithm of the size, taper and place kept. */
  bySize: Float64Array;
  byTaper: Float64Array;
}

// Local names: looking up a global once a point costs more than the arithmetic in some surroundings.
const { ceil, cos, exp, floor, min, PI, sin, sqrt } = Math;

/** Points of a period of v that the tables hold: one every eighth of a radian. */
const STEP_V = 0.125;
const RADIAL_NODES = 48;
const BEFORE = 2;

/**
 * Irradiance behind a round hole by direct summation of the Rayleigh–Sommerfeld integral of the first kind (Goodman,
 * Introduction to Fourier Optics, §3.5, from memory) over the hole, with true distances in the phase: no Bessel
 * function, no series, no far-field or paraxial form. Gauss–Legendre across the radius, midpoints around the turn. One
 * on the axis for an infinitely far sensor and even light.
 * @param reachMm the table reaches at least this far
 */
export function tabulatePattern(hole: RoundHole, reachMm: number): RadialTable {
  const { radiusMm: a, distanceMm: z, taper } = hole;
  const k = (2 * PI) / hole.wavelengthMm;
  const stepMm = (STEP_V * z) / (k * a);
  const rows = ceil(reachMm / stepMm) + 5;
  const [nodes, weights] = gaussLegendre(RADIAL_NODES);
  const intensity = new Float64Array(rows + BEFORE);
  const bySize = new Float64Array(rows + BEFORE);
  const byTaper = new Float64Array(rows + BEFORE);
  for (let row = 0; row < rows; row++) {
    const r = row * stepMm;
    const centre = sqrt(z * z + r * r);
    const turns = ceil(0.5 * row * STEP_V + 12);
    const sums = [0, 0, 0, 0, 0, 0];
    for (let n = 0; n < RADIAL_NODES; n++) {
      const rho = nodes[n];
      const s = a * rho;
      const weight = (2 * weights[n] * rho * exp(-taper * rho * rho)) / turns;
      for (let m = 0; m < turns; m++) {
        const cosine = cos((PI * (m + 0.5)) / turns);
        const beyond = s * s - 2 * r * s * cosine;
        const far = sqrt(centre * centre + beyond);
        // The distance beyond that from the hole's middle, without loss of digits.
        const phase = (k * beyond) / (far + centre);
        const fall = (weight * z * z) / (far * far);
        const real = fall * cos(phase);
        const imaginary = fall * sin(phase);
        const bySizePhase = (k * (s * s - r * s * cosine)) / far;
        sums[0] += real;
        sums[1] += imaginary;
        sums[2] -= bySizePhase * imaginary;
        sums[3] += bySizePhase * real;
        sums[4] -= rho * rho * real;
        sums[5] -= rho * rho * imaginary;
      }
    }
    const at = row + BEFORE;
    intensity[at] = sums[0] ** 2 + sums[1] ** 2;
    bySize[at] = 2 * (sums[0] * sums[2] + sums[1] * sums[3]);
    byTaper[at] = 2 * (sums[0] * sums[4] + sums[1] * sums[5]);
  }
  for (const table of [intensity, bySize, byTaper]) {
    table[1] = table[3];
    table[0] = table[4];
  }
  return { stepMm, intensity, bySize, byTaper };
}

/** Value of a table by the polynomial through its six nearest points (Lagrange). */
export function lookUp(table: Float64Array, place: number): number {
  const row = min(floor(place), table.length - BEFORE - 4);
  const t = place - row;
  const i = row + BEFORE;
  const [p, q, s, w] = [t + 1, t - 1, t - 2, t + 2];
  const e = t - 3;
  return (
    (-table[i - 2] * p * t * q * s * e) / 120 +
    (table[i - 1] * w * t * q * s * e) / 24 -
    (table[i] * w * p * q * s * e) / 12 +
    (table[i + 1] * w * p * t * s * e) / 12 -
    (table[i + 2] * w * p * t * q * e) / 24 +
    (table[i + 3] * w * p * t * q * s) / 120
  );
}

/** Nodes and weights on 0 … 1, by Newton's method on the Legendre polynomial. */
function gaussLegendre(n: number): [Float64Array, Float64Array] {
  const nodes = new Float64Array(n);
  const weights = new Float64Array(n);
  for (let i = 0; i < n; i++) {
    let x = cos((PI * (i + 0.75)) / (n + 0.5));
    let slope = 1;
    for (let round = 0; round < 8; round++) {
      let before = 1;
      let value = x;
      for (let order = 2; order <= n; order++) {
        [before, value] = [value, ((2 * order - 1) * x * value - (order - 1) * before) / order];
      }
      slope = (n * (x * value - before)) / (x * x - 1);
      x -= value / slope;
    }
    nodes[i] = (1 - x) / 2;
    weights[i] = 1 / ((1 - x * x) * slope * slope);
  }
  return [nodes, weights];
}
