export interface LinePoint {
  x: number;
  y: number;
  /** Standard uncertainty of y; give it for every point or for none. */
  yUncertainty?: number;
}

export interface LinePointBoth {
  x: number;
  y: number;
  xUncertainty: number;
  yUncertainty: number;
  /** Correlation between the errors of x and y, −1 to 1; 0 when left out. */
  correlation?: number;
}

export interface LineFit {
  /** Value of y at x = 0. */
  intercept: number;
  slope: number;
  interceptUncertainty: number | null;
  slopeUncertainty: number | null;
  /** Covariance of intercept and slope. */
  covariance: number | null;
  /** y minus the line, in the order of the points. */
  residuals: number[];
  /** Residuals in units of their own expected standard deviation; null without uncertainties. */
  standardisedResiduals: number[] | null;
  /** Weighted sum of squares; plain sum of squares without uncertainties. */
  chiSquare: number;
  /** Null when two points leave no degree of freedom. */
  reducedChiSquare: number | null;
  degreesOfFreedom: number;
  /** Where the uncertainties come from: the points' own, or the scatter about the line. */
  uncertaintyScaling: 'none' | 'reduced-chi-square';
  iterations: number;
  status: 'converged' | 'max-iterations';
}

function checkPoints(points: readonly { x: number; y: number }[]): void {
  if (points.length < 2) throw new RangeError('A line needs at least two points.');
  if (!points.every(({ x, y }) => Number.isFinite(x) && Number.isFinite(y)))
    throw new RangeError('Every point must be finite.');
  const [first] = points;
  if (points.every(({ x }) => x === first?.x)) throw new RangeError('A line needs two different values of x.');
}

/**
 * Weighted least-squares straight line y = intercept + slope·x, errors in y only.
 *
 * With uncertainties the weights are 1/u² and the parameters' uncertainties follow from them alone; without, all
 * points weigh the same and the scatter about the line gives the uncertainties (null for two points).
 * Source: JCGM 100:2008, H.3 (unweighted form); weighted normal equations about the weighted mean (common practice).
 *
 * @throws RangeError for fewer than two points, equal x, non-finite numbers or uncertainties for some points only
 */
export function fitLine(points: readonly LinePoint[]): LineFit {
  checkPoints(points);
  const weighted = points.some((point) => point.yUncertainty !== undefined);
  const weights = points.map(({ yUncertainty }) => {
    if (!weighted) return 1;
    if (yUncertainty === undefined || !(yUncertainty > 0))
      throw new RangeError('Give an uncertainty above zero for every point or for none.');
    return 1 / yUncertainty ** 2;
  });
  const total = weights.reduce((sum, weight) => sum + weight, 0);
  const mean = (of: (point: LinePoint) => number) =>
    points.reduce((sum, point, index) => sum + weights[index] * of(point), 0) / total;
  const xMean = mean(({ x }) => x);
  const yMean = mean(({ y }) => y);
  const spread = total * mean(({ x }) => (x - xMean) ** 2);
  const slope = (total * mean(({ x, y }) => (x - xMean) * (y - yMean))) / spread;
  const intercept = yMean - slope * xMean;
  const residuals = points.map(({ x, y }) => y - yMean - slope * (x - xMean));
  const chiSquare = residuals.reduce((sum, residual, index) => sum + weights[index] * residual ** 2, 0);
  const degreesOfFreedom = points.length - 2;
  const reducedChiSquare = degreesOfFreedom > 0 ? chiSquare / degreesOfFreedom : null;
  const scale = weighted ? 1 : reducedChiSquare;
  return {
    intercept,
    slope,
    interceptUncertainty: scale === null ? null : Math.sqrt(scale * (1 / total + xMean ** 2 / spread)),
    slopeUncertainty: scale === null ? null : Math.sqrt(scale / spread),
    covariance: scale === null ? null : (-scale * xMean) / spread,
    residuals,
    standardisedResiduals: weighted ? residuals.map((residual, index) => residual * Math.sqrt(weights[index])) : null,
    chiSquare,
    reducedChiSquare,
    degreesOfFreedom,
    uncertaintyScaling: weighted ? 'none' : 'reduced-chi-square',
    iterations: 0,
    status: 'converged',
  };
}

const MAX_ITERATIONS = 200;
const SLOPE_TOLERANCE = 1e-13;

/**
 * Straight line with errors in both axes, possibly correlated: the unified equations of D. York, N. M. Evensen,
 * M. López Martínez and J. De Basabe Delgado, Am. J. Phys. 72, 367 (2004), iterated on the slope.
 *
 * Uncertainties are the paper's maximum-likelihood ones, evaluated at the adjusted points and not scaled by the scatter.
 * A point without error in one axis may have an uncertainty of 0 there, but not in both.
 *
 * @throws RangeError for fewer than two points, equal x, non-finite numbers, or a point without any uncertainty
 */
export function fitLineBothErrors(points: readonly LinePointBoth[]): LineFit {
  checkPoints(points);
  for (const { xUncertainty, yUncertainty, correlation = 0 } of points) {
    if (!(xUncertainty >= 0 && yUncertainty >= 0 && xUncertainty + yUncertainty > 0))
      throw new RangeError('Every point needs an uncertainty above zero in x or y.');
    if (!(Math.abs(correlation) <= 1)) throw new RangeError('A correlation lies between −1 and 1.');
  }
  const n = points.length;
  /** Weight of a point and the weighted means for a trial slope; in variances, so that one of them may be 0. */
  const at = (slope: number) => {
    const weights = points.map(({ xUncertainty, yUncertainty, correlation = 0 }) => {
      const variance =
        yUncertainty ** 2 + slope ** 2 * xUncertainty ** 2 - 2 * slope * correlation * xUncertainty * yUncertainty;
      return 1 / Math.max(variance, 1e-300);
    });
    const total = weights.reduce((sum, weight) => sum + weight, 0);
    const xMean = points.reduce((sum, { x }, index) => sum + weights[index] * x, 0) / total;
    const yMean = points.reduce((sum, { y }, index) => sum + weights[index] * y, 0) / total;
    const adjustments = points.map(({ x, y, xUncertainty, yUncertainty, correlation = 0 }, index) => {
      const u = x - xMean;
      const v = y - yMean;
      const cross = correlation * xUncertainty * yUncertainty;
      return weights[index] * (u * yUncertainty ** 2 + slope * v * xUncertainty ** 2 - (slope * u + v) * cross);
    });
    return { weights, total, xMean, yMean, adjustments };
  };

  let { slope } = fitLine(points.map(({ x, y }) => ({ x, y })));
  let status: LineFit['status'] = 'max-iterations';
  let iterations = 0;
  while (iterations < MAX_ITERATIONS && status !== 'converged') {
    iterations += 1;
    const { weights, xMean, yMean, adjustments } = at(slope);
    let numerator = 0;
    let denominator = 0;
    points.forEach(({ x, y }, index) => {
      const pull = weights[index] * adjustments[index];
      numerator += pull * (y - yMean);
      denominator += pull * (x - xMean);
    });
    const next = numerator / denominator;
    if (Math.abs(next - slope) <= SLOPE_TOLERANCE * Math.max(Math.abs(next), Number.MIN_VALUE)) status = 'converged';
    slope = next;
  }

  const { weights, total, xMean, yMean, adjustments } = at(slope);
  const adjusted = adjustments.map((adjustment) => xMean + adjustment);
  const adjustedMean = adjusted.reduce((sum, x, index) => sum + weights[index] * x, 0) / total;
  const spread = adjusted.reduce((sum, x, index) => sum + weights[index] * (x - adjustedMean) ** 2, 0);
  const residuals = points.map(({ x, y }) => y - yMean - slope * (x - xMean));
  const standardisedResiduals = residuals.map((residual, index) => residual * Math.sqrt(weights[index]));
  const chiSquare = standardisedResiduals.reduce((sum, residual) => sum + residual ** 2, 0);
  return {
    intercept: yMean - slope * xMean,
    slope,
    interceptUncertainty: Math.sqrt(1 / total + adjustedMean ** 2 / spread),
    slopeUncertainty: Math.sqrt(1 / spread),
    covariance: -adjustedMean / spread,
    residuals,
    standardisedResiduals,
    chiSquare,
    reducedChiSquare: n > 2 ? chiSquare / (n - 2) : null,
    degreesOfFreedom: n - 2,
    uncertaintyScaling: 'none',
    iterations,
    status,
  };
}
