import type { Compared } from '@/shared/contracts/measurements';
import { fitLine, fitLineBothErrors, type LineFit } from '@/shared/metrology/fitLine';
import { darkRingFactor } from './darkRingFactor';

/** Which size stands below: the nominal one, or the one measured on the bench itself. */
export type SizeBasis = 'nominal' | 'measured';

export interface RingPoint {
  measurementId: string;
  serial: string;
  order: number;
  /** 1/size, 1/µm. */
  x: number;
  xUncertainty: number;
  /** Distance times the sine of the ring's angle, mm: what is exactly proportional to 1/size. */
  y: number;
  yUncertainty: number;
  leftOut: boolean;
  /** Distance from the line, in parts of the line; null without a line. */
  residual: number | null;
}

export interface Outlier {
  measurementId: string;
  serial: string;
  /** Mean distance of its rings from the line of the others, in parts of it. */
  offset: number;
  ringCount: number;
}

export interface CompareLineResult {
  points: RingPoint[];
  /** y of the first order against x, all rings brought to it by their factors; null when there is no line. */
  fit: LineFit | null;
  /** Why there is no line. */
  reason: 'too-few' | 'one-size' | null;
  outliers: Outlier[];
  /** Measurements of another wavelength or distance than the first: they lie on a line of their own. */
  strangers: { measurementId: string; serial: string }[];
  /** Chosen, but without a dark ring on the sensor. */
  ringless: { measurementId: string; serial: string }[];
  usedCount: number;
}

const FEWEST = 3;
/** Share by which wavelength times distance may differ within one line. */
const SAME_CONSTANT = 2e-3;
/** An outlier is further from the middle of the others than this many robust standard deviations … */
const OUTLIER_SPREADS = 5;
/** … and than this share, so that a very tight set has none. */
const OUTLIER_SHARE = 1e-3;

const median = (values: readonly number[]): number => {
  const sorted = [...values].sort((a, b) => a - b);
  const middle = sorted.length / 2;
  return sorted.length % 2 === 1
    ? (sorted[Math.floor(middle)] ?? NaN)
    : ((sorted[middle - 1] ?? NaN) + (sorted[middle] ?? NaN)) / 2;
};

const sizeOf = (compared: Compared, basis: SizeBasis) =>
  basis === 'nominal' ? compared.nominalSizeUm : compared.sizeUm;

function pointsOf(compared: Compared, basis: SizeBasis): RingPoint[] {
  const sizeUm = sizeOf(compared, basis);
  const z = compared.distanceMm;
  return compared.rings
    .filter((ring) => ring.kind === 'dark')
    .map((ring) => {
      const length = Math.hypot(z, ring.radiusMm);
      return {
        measurementId: compared.measurementId,
        serial: compared.apertureSerial,
        order: ring.order,
        x: 1 / sizeUm,
        xUncertainty: basis === 'measured' ? compared.fitUncertaintyUm / sizeUm ** 2 : 0,
        y: (z * ring.radiusMm) / length,
        yUncertainty: (ring.uncertaintyMm * z ** 3) / length ** 3,
        leftOut: false,
        residual: null,
      };
    });
}

/** Bench constant λz in µm·mm that the rings of one piece give with its size: the mean over its orders. */
function constantOf(points: readonly RingPoint[]): number {
  return points.reduce((sum, point) => sum + point.y / darkRingFactor(point.order) / point.x, 0) / points.length;
}

function outliersOf(groups: readonly RingPoint[][]): Outlier[] {
  if (groups.length < FEWEST + 1) return [];
  const constants = groups.map(constantOf);
  const middle = median(constants);
  const spread = 1.4826 * median(constants.map((constant) => Math.abs(constant - middle)));
  return groups.flatMap((points, i) => {
    const offset = ((constants[i] ?? middle) - middle) / middle;
    const first = points[0];
    const far = Math.abs(offset) > Math.max((OUTLIER_SPREADS * spread) / middle, OUTLIER_SHARE);
    return far && first
      ? [{ measurementId: first.measurementId, serial: first.serial, offset, ringCount: points.length }]
      : [];
  });
}

function fitOf(points: readonly RingPoint[], basis: SizeBasis): LineFit {
  const reduced = points.map((point) => {
    const factor = darkRingFactor(point.order);
    return { ...point, y: point.y / factor, yUncertainty: point.yUncertainty / factor };
  });
  // Nominal sizes carry no uncertainty of their own: the scatter about the line speaks for them.
  if (basis === 'nominal') return fitLine(reduced.map(({ x, y }) => ({ x, y })));
  return fitLineBothErrors(
    reduced.map(({ x, y, xUncertainty, yUncertainty }) => ({
      x,
      y,
      xUncertainty,
      yUncertainty: Math.max(yUncertainty, 1e-9),
    })),
  );
}

/**
 * Ring radii against 1/size. In the far field sin θ = m λ/d with m from the zeros of J1, so that z·sin θ of every dark
 * ring lies on a straight line through zero whose slope over m is the bench constant λz.
 * All rings of all orders are fitted together; pieces off the line are named and left out.
 */
export function compareLine(chosen: readonly Compared[], basis: SizeBasis): CompareLineResult {
  const first = chosen[0];
  const constant = first ? first.wavelengthNm * first.distanceMm : 0;
  const isStranger = (one: Compared) =>
    Math.abs(one.wavelengthNm * one.distanceMm - constant) > SAME_CONSTANT * constant;
  const strangers = chosen
    .filter(isStranger)
    .map(({ measurementId, apertureSerial }) => ({ measurementId, serial: apertureSerial }));
  const groups = chosen
    .filter((one) => !isStranger(one))
    .map((one) => pointsOf(one, basis))
    .filter((points) => points.length > 0);
  const outliers = outliersOf(groups);
  const isOut = (point: RingPoint) =>
    [...outliers, ...strangers].some((one) => one.measurementId === point.measurementId);
  const all = chosen.flatMap((one) => pointsOf(one, basis)).map((point) => ({ ...point, leftOut: isOut(point) }));
  const used = all.filter((point) => !point.leftOut);
  const usedCount = new Set(used.map((point) => point.measurementId)).size;
  const sizes = new Set(used.map((point) => point.x));
  const reason = usedCount < FEWEST ? 'too-few' : sizes.size < 2 ? 'one-size' : null;
  const ringless = chosen
    .filter((one) => !one.rings.some((ring) => ring.kind === 'dark'))
    .map(({ measurementId, apertureSerial }) => ({ measurementId, serial: apertureSerial }));
  const base = { outliers, strangers, ringless, usedCount };
  if (reason !== null) return { ...base, points: all, fit: null, reason };
  const fit = fitOf(used, basis);
  const points = all.map((point) => {
    const line = darkRingFactor(point.order) * (fit.intercept + fit.slope * point.x);
    return { ...point, residual: (point.y - line) / line };
  });
  return { ...base, points, fit, reason: null };
}
