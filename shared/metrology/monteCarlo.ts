import { COVERAGE_PROBABILITY } from './coverageFactor';
import { seededRandom } from './seededRandom';
import type { SeededRandom } from './seededRandom';

/** How an input may lie: JCGM 101:2008, 6.4 (from memory). */
export type InputDistribution =
  | { kind: 'normal'; mean: number; standardUncertainty: number }
  | { kind: 'rectangular'; mean: number; halfWidth: number }
  | { kind: 'triangular'; mean: number; halfWidth: number }
  | { kind: 'arcsine'; mean: number; halfWidth: number }
  /** Scaled and shifted t, for an input known from few readings. */
  | { kind: 'student'; mean: number; standardUncertainty: number; degreesOfFreedom: number }
  /** Rectangular with limits that are themselves known to ± limitHalfWidth only (6.4.3). */
  | { kind: 'curvilinear-trapezoid'; mean: number; halfWidth: number; limitHalfWidth: number };

/** One value of an input. */
export function drawInput(distribution: InputDistribution, random: SeededRandom): number {
  const { mean } = distribution;
  switch (distribution.kind) {
    case 'normal':
      return mean + distribution.standardUncertainty * random.normal();
    case 'student':
      return mean + distribution.standardUncertainty * random.studentT(distribution.degreesOfFreedom);
    case 'rectangular':
      return mean + distribution.halfWidth * (2 * random.uniform() - 1);
    case 'triangular':
      return mean + distribution.halfWidth * (random.uniform() - random.uniform());
    case 'arcsine':
      return mean + distribution.halfWidth * Math.sin(2 * Math.PI * random.uniform());
    case 'curvilinear-trapezoid': {
      const halfWidth = distribution.halfWidth + distribution.limitHalfWidth * (2 * random.uniform() - 1);
      return mean + halfWidth * (2 * random.uniform() - 1);
    }
  }
}

export interface MonteCarloResult {
  trials: number;
  mean: number;
  standardUncertainty: number;
  probability: number;
  /** As much probability below as above. */
  symmetricInterval: [number, number];
  shortestInterval: [number, number];
}

export interface MonteCarloOptions {
  /** Number of trials; at least 10⁴/(1 − p) for two digits (JCGM 101:2008, 7.2.2, from memory). Default 220 000. */
  trials?: number;
  probability?: number;
  seed: number;
}

/**
 * Propagates distributions through a model by Monte Carlo: JCGM 101:2008, clause 7 (from memory). The same seed gives the
 * same result to the last digit.
 *
 * @param draw one value of the result from random inputs
 */
export function monteCarlo(
  draw: (random: SeededRandom) => number,
  { trials = 220_000, probability = COVERAGE_PROBABILITY, seed }: MonteCarloOptions,
): MonteCarloResult {
  if (!(Number.isInteger(trials) && trials >= 100)) throw new RangeError('At least 100 trials are needed.');
  if (!(probability > 0 && probability < 1)) throw new RangeError('A coverage probability lies between 0 and 1.');
  const random = seededRandom(seed);
  const values = new Float64Array(trials);
  for (let trial = 0; trial < trials; trial += 1) values[trial] = draw(random);
  if (!values.every((value) => Number.isFinite(value)))
    throw new RangeError('The model gave a value that is not finite.');
  values.sort();
  let mean = 0;
  for (const value of values) mean += value / trials;
  let squares = 0;
  for (const value of values) squares += (value - mean) ** 2;

  const inside = Math.min(trials - 1, Math.round(probability * trials));
  const below = Math.floor((trials - inside) / 2);
  let shortest = 0;
  for (let first = 1; first + inside < trials; first += 1)
    if (values[first + inside] - values[first] < values[shortest + inside] - values[shortest]) shortest = first;
  return {
    trials,
    mean,
    standardUncertainty: Math.sqrt(squares / (trials - 1)),
    probability,
    symmetricInterval: [values[below], values[Math.min(trials - 1, below + inside)]],
    shortestInterval: [values[shortest], values[shortest + inside]],
  };
}

/** Propagates independent inputs through a model of their values. */
export function propagateDistributions(
  inputs: readonly InputDistribution[],
  model: (values: readonly number[]) => number,
  options: MonteCarloOptions,
): MonteCarloResult {
  const values = inputs.map(({ mean }) => mean);
  return monteCarlo((random) => {
    inputs.forEach((input, index) => (values[index] = drawInput(input, random)));
    return model(values);
  }, options);
}

/**
 * Whether an interval y ± U from the law of propagation agrees with a Monte Carlo interval: both ends within half a unit of
 * the last of the given significant digits of the standard uncertainty (JCGM 101:2008, 7.9.2 and 8.1, from memory).
 */
export function intervalsAgree(
  estimate: number,
  standardUncertainty: number,
  expandedUncertainty: number,
  interval: readonly [number, number],
  significantDigits = 2,
): { agree: boolean; tolerance: number } {
  const exponent =
    Number(standardUncertainty.toExponential(significantDigits - 1).split('e')[1]) - (significantDigits - 1);
  const tolerance = 0.5 * 10 ** exponent;
  const low = Math.abs(estimate - expandedUncertainty - interval[0]);
  const high = Math.abs(estimate + expandedUncertainty - interval[1]);
  return { agree: low <= tolerance && high <= tolerance, tolerance };
}
