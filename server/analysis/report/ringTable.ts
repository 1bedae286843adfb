import { Matrix } from 'ml-matrix';
import type { Ring } from '../../../shared/contracts/measureResult';
import { invertScaled } from '../../../shared/metrology/normalEquations';
import { AIRY_DARK_V } from '../../../shared/optics/airy';
import { varianceAt, type NoiseModel } from '../calibrate/noiseModel';
import { radiusOf, type PinholeParameters } from '../fit/fitCells';
import { fresnelU, reducedRadius, type PinholeOptics } from '../fit/PinholeOptics';
import { COLUMNS, LARGEST_V, pinholeTable, TABLE_STEP } from '../models/pinholeTable';
import type { FittedProfile } from '../profile/profileOfCells';

/** Half the window in which a ring is measured, as part of λz/D. */
const WINDOW = 0.3;
const DEGREE = 4;
/** A ring is told from noise when its curvature exceeds this many standard deviations. */
const LEAST_CURVATURE = 5;
const MOST_RINGS = 24;

interface Extremum {
  v: number;
  kind: 'dark' | 'bright';
  order: number;
}

/** Extrema of the modelled pattern beyond the core, in v. */
function modelExtrema(table: Float64Array): Extremum[] {
  const found: Extremum[] = [];
  const rows = table.length / COLUMNS;
  for (let row = 20; row + 1 < rows; row++) {
    const a = table[row * COLUMNS + 1];
    const b = table[(row + 1) * COLUMNS + 1];
    if (a * b > 0 || a === b) continue;
    const v = (row + a / (a - b)) * TABLE_STEP;
    const kind = a < 0 ? 'dark' : 'bright';
    // Dark rings by the nearest zero of J1; a bright ring follows the dark ring of its order.
    const beneath = AIRY_DARK_V.filter((z) => z < v).length;
    const order =
      kind === 'bright'
        ? beneath
        : beneath > 0 && (beneath >= AIRY_DARK_V.length || v - AIRY_DARK_V[beneath - 1] < AIRY_DARK_V[beneath] - v)
          ? beneath
          : beneath + 1;
    if (order >= 1) found.push({ v, kind, order });
  }
  return found;
}

/**
 * Every dark and bright ring measured on the profile by a quartic over a window around it, on its own: neither the
 * fitted amplitude nor background nor size enters the radius, but for the small lean of a quartic's extremum, which is
 * taken from the same quartic on the model's profile. Rings that do not stand out of the noise are left out.
 */
export function ringTable(
  profile: FittedProfile,
  values: PinholeParameters,
  optics: PinholeOptics,
  noise: NoiseModel,
): Ring[] {
  const radius = radiusOf(values);
  const sizeUm = 2000 * radius;
  const { pitchMm, distanceMm, waveNumber } = optics;
  const outermost = profile.radiusPx[profile.radiusPx.length - 1] * pitchMm;
  const largestV = Math.min(LARGEST_V, reducedRadius(optics, radius, outermost));
  const table = pinholeTable(
    {
      u: fresnelU(optics, radius),
      illumination: values.illumination,
      pixelV: (waveNumber * radius * pitchMm) / distanceMm,
    },
    largestV,
  );
  const fringeMm = (Math.PI * distanceMm) / (waveNumber * radius);
  const rings: Ring[] = [];
  for (const { v, kind, order } of modelExtrema(table)) {
    if (v > largestV || rings.length >= MOST_RINGS) break;
    const sine = v / (waveNumber * radius);
    const predictedMm = (distanceMm * sine) / Math.sqrt(1 - sine * sine);
    const window = bins(profile, predictedMm / pitchMm, (WINDOW * fringeMm) / pitchMm);
    if (window === null) continue;
    const measured = quarticExtremum(profile, window, predictedMm / pitchMm, profile.meanCounts, noise);
    const lean = quarticExtremum(profile, window, predictedMm / pitchMm, profile.modelCounts, noise);
    if (measured === null || lean === null) continue;
    const sign = kind === 'dark' ? 1 : -1;
    if (sign * measured.curvature < LEAST_CURVATURE * measured.curvatureDeviation) continue;
    const radiusMm = predictedMm + (measured.place - lean.place) * pitchMm;
    if (Math.abs(radiusMm - predictedMm) > 0.25 * fringeMm) continue;
    const measuredSine = radiusMm / Math.hypot(radiusMm, distanceMm);
    rings.push({
      order,
      kind,
      radiusMm,
      uncertaintyMm: measured.deviation * pitchMm,
      predictedMm,
      sizeUm: (sizeUm * sine) / measuredSine,
    });
  }
  return rings;
}

/** First and last bin of a window, or null where it is not wholly in the profile or too sparse. */
function bins(profile: FittedProfile, atPx: number, halfPx: number): { from: number; to: number } | null {
  const { radiusPx } = profile;
  let from = 0;
  while (from < radiusPx.length && radiusPx[from] < atPx - halfPx) from++;
  let to = from;
  while (to < radiusPx.length && radiusPx[to] <= atPx + halfPx) to++;
  if (to - from < DEGREE + 3) return null;
  const span = radiusPx[to - 1] - radiusPx[from];
  // Gaps left by clipping make the window lopsided.
  return span > 1.6 * halfPx ? { from, to } : null;
}

function quarticExtremum(
  profile: FittedProfile,
  { from, to }: { from: number; to: number },
  atPx: number,
  counts: Float64Array,
  noise: NoiseModel,
) {
  const count = to - from;
  const half = (profile.radiusPx[to - 1] - profile.radiusPx[from]) / 2;
  const design = new Matrix(count, DEGREE + 1);
  const target = new Matrix(count, 1);
  for (let k = 0; k < count; k++) {
    const bin = from + k;
    const deviation = Math.sqrt(varianceAt(noise, profile.modelCounts[bin]) / profile.pixelCount[bin]);
    const x = (profile.radiusPx[bin] - atPx) / half;
    for (let p = 0; p <= DEGREE; p++) design.set(k, p, x ** p / deviation);
    target.set(k, 0, counts[bin] / deviation);
  }
  const normal = design.transpose().mmul(design);
  const inverse = invertScaled(normal);
  if (inverse === null) return null;
  const c = inverse.mmul(design.transpose().mmul(target)).to1DArray();
  const residual = Matrix.sub(target, design.mmul(Matrix.columnVector(c))).to1DArray();
  const reduced = residual.reduce((s, r) => s + r * r, 0) / Math.max(1, count - DEGREE - 1);
  let x = 0;
  for (let round = 0; round < 20; round++) {
    const slope = c[1] + x * (2 * c[2] + x * (3 * c[3] + x * 4 * c[4]));
    const bend = 2 * c[2] + x * (6 * c[3] + x * 12 * c[4]);
    if (bend === 0) return null;
    const step = Math.max(-0.3, Math.min(0.3, slope / bend));
    x -= step;
    if (Math.abs(step) < 1e-9) break;
  }
  if (!(Math.abs(x) < 1)) return null;
  const bend = 2 * c[2] + x * (6 * c[3] + x * 12 * c[4]);
  const bySlope = Matrix.rowVector([0, 1, 2 * x, 3 * x * x, 4 * x ** 3]);
  const byBend = Matrix.rowVector([0, 0, 2, 6 * x, 12 * x * x]);
  const widen = Math.max(1, reduced);
  const spread = (row: Matrix) => Math.sqrt(row.mmul(inverse).mmul(row.transpose()).get(0, 0) * widen);
  return {
    place: atPx + x * half,
    deviation: (spread(bySlope) / Math.abs(bend)) * half,
    curvature: bend,
    curvatureDeviation: spread(byBend),
  };
}

/** Size from the dark rings together; each counts by its own uncertainty. Null without dark rings. */
export function sizeOfDarkRings(rings: Ring[]): { sizeUm: number; uncertaintyUm: number } | null {
  const dark = rings.filter((r) => r.kind === 'dark' && r.uncertaintyMm > 0);
  if (dark.length === 0) return null;
  let weights = 0;
  let sum = 0;
  for (const ring of dark) {
    const weight = (ring.radiusMm / (ring.sizeUm * ring.uncertaintyMm)) ** 2;
    weights += weight;
    sum += weight * ring.sizeUm;
  }
  const sizeUm = sum / weights;
  const excess =
    dark.reduce((s, r) => s + ((r.radiusMm * (r.sizeUm - sizeUm)) / (r.sizeUm * r.uncertaintyMm)) ** 2, 0) /
    Math.max(1, dark.length - 1);
  return { sizeUm, uncertaintyUm: Math.sqrt(Math.max(1, excess) / weights) };
}
