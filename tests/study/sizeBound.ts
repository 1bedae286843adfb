import { inverse, Matrix } from 'ml-matrix';
import { lookUp } from './diffraction';
import type { StudyCase } from './drawStudyCase';
import { electronsPerCount, type ExpectedFrame } from './exposeFrame';

export interface SizeBound {
  /** Cramér–Rao bound of the relative size, the light over the hole free. */
  free: number;
  /** The same with (a / w)² known beforehand to `taperDeviation`. */
  informed: number;
  /** Relative shift of the size that an uneven response gives to first order, for the two; 0 without one. */
  freeShift: number;
  informedShift: number;
}

/** Parameters: size, x, y, amplitude, background, slope across, slope down, taper. */
const COUNT = 8;
const TAPER = 7;
/** Part of a table's step over which its slope is taken. */
const SMALL = 0.05;
/** Above this standard deviation, counts, rounding is noise of 1/12 count². */
const SMOOTH = 0.8;

/**
 * Cramér–Rao bound of the size from all pixels that are not clipped, with what the engine's fit leaves free: size,
 * centre, amplitude, background, its slopes and the taper of the light. The information of a pixel is that of a
 * normally distributed level seen through rounding to whole counts.
 * @param response of each pixel about 1, which a fit takes for 1
 */
export function sizeBound(
  study: StudyCase,
  expected: ExpectedFrame,
  response: Float64Array | null,
  taperDeviation: number,
): SizeBound {
  const { widthPx, heightPx, centre } = study;
  const { table, peakElectrons, electrons } = expected;
  const gain = electronsPerCount(study);
  const perStep = study.pitchUm / 1000 / table.stepMm;
  const white = 2 ** study.bitDepth - 1;
  const information = new Float64Array(COUNT * COUNT);
  const pull = new Float64Array(COUNT);
  const d = new Float64Array(COUNT);
  for (let y = 0; y < heightPx; y++) {
    for (let x = 0; x < widthPx; x++) {
      const i = y * widthPx + x;
      const sigma = Math.sqrt(electrons[i] + study.readNoiseElectrons ** 2) / gain;
      const level = study.blackCount + electrons[i] / gain;
      if (level + 3 * sigma >= white) continue;
      const dx = x - centre.x;
      const dy = y - centre.y;
      const radius = Math.hypot(dx, dy);
      const place = radius * perStep;
      // The table is even about the axis.
      const inner = lookUp(table.intensity, Math.abs(place - SMALL));
      const steep = ((lookUp(table.intensity, place + SMALL) - inner) / (2 * SMALL)) * perStep;
      const scale = peakElectrons / gain;
      d[0] = scale * lookUp(table.bySize, place);
      d[1] = radius > 0 ? (-scale * steep * dx) / radius : 0;
      d[2] = radius > 0 ? (-scale * steep * dy) / radius : 0;
      d[3] = scale * lookUp(table.intensity, place);
      d[4] = scale;
      d[5] = (scale * dx) / widthPx;
      d[6] = (scale * dy) / heightPx;
      d[TAPER] = scale * lookUp(table.byTaper, place);
      const weight = informationOf(level, sigma);
      const off = response === null ? 0 : ((response[i] - 1) * electrons[i]) / gain;
      for (let a = 0; a < COUNT; a++) {
        pull[a] += weight * off * d[a];
        for (let b = a; b < COUNT; b++) information[a * COUNT + b] += weight * d[a] * d[b];
      }
    }
  }
  const full = new Matrix(COUNT, COUNT);
  for (let a = 0; a < COUNT; a++)
    for (let b = a; b < COUNT; b++) full.set(a, b, information[a * COUNT + b]).set(b, a, information[a * COUNT + b]);
  const of = (matrix: Matrix): [number, number] => {
    const scale = Array.from({ length: COUNT }, (_, a) => 1 / Math.sqrt(matrix.get(a, a)));
    const scaled = Matrix.zeros(COUNT, COUNT);
    for (let a = 0; a < COUNT; a++)
      for (let b = 0; b < COUNT; b++) scaled.set(a, b, matrix.get(a, b) * scale[a] * scale[b]);
    const covariance = inverse(scaled);
    let shift = 0;
    for (let a = 0; a < COUNT; a++) shift += covariance.get(0, a) * scale[0] * scale[a] * pull[a];
    return [Math.sqrt(covariance.get(0, 0)) * scale[0], shift];
  };
  const [free, freeShift] = of(full);
  full.set(TAPER, TAPER, full.get(TAPER, TAPER) + 1 / taperDeviation ** 2);
  const [informed, informedShift] = of(full);
  return { free, informed, freeShift, informedShift };
}

/** Fisher information of one whole count on its level, 1/counts². */
function informationOf(level: number, sigma: number): number {
  if (sigma > SMOOTH) return 1 / (sigma * sigma + 1 / 12);
  const reach = Math.ceil(6 * sigma) + 1;
  const middle = Math.round(level);
  let sum = 0;
  for (let count = middle - reach; count <= middle + reach; count++) {
    const upper = (count + 0.5 - level) / sigma;
    const lower = (count - 0.5 - level) / sigma;
    const share = below(upper) - below(lower);
    if (share < 1e-5) continue;
    const change = (Math.exp((-lower * lower) / 2) - Math.exp((-upper * upper) / 2)) / (Math.sqrt(2 * Math.PI) * sigma);
    sum += (change * change) / share;
  }
  return sum;
}

/** Normal distribution function to 1e-7 (Abramowitz & Stegun 26.2.17, from memory). */
function below(x: number): number {
  const t = 1 / (1 + 0.2316419 * Math.abs(x));
  const tail =
    (Math.exp((-x * x) / 2) / Math.sqrt(2 * Math.PI)) *
    t *
    (0.31938153 + t * (-0.356563782 + t * (1.781477937 + t * (-1.821255978 + t * 1.330274429))));
  return x > 0 ? 1 - tail : tail;
}
