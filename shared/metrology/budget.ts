import { COVERAGE_PROBABILITY, coverageFactor } from './coverageFactor';

export interface UncertaintyInput {
  name: string;
  /** Standard uncertainty (k = 1) in the input's own unit. */
  standardUncertainty: number;
  /** Change of the result for one unit of the input, with its sign; 1 when the uncertainty is in the result's unit. */
  sensitivity: number;
  /** Null: infinitely many. */
  degreesOfFreedom: number | null;
}

export interface InputCorrelation {
  first: string;
  second: string;
  /** −1 to 1. */
  coefficient: number;
}

export interface CombinedUncertainty {
  standardUncertainty: number;
  /** |sensitivity| × standard uncertainty of each input, in the order given. */
  contributions: { name: string; contribution: number; partOfVariance: number }[];
  /** Null: infinitely many. */
  effectiveDegreesOfFreedom: number | null;
  coverageFactor: number;
  expandedUncertainty: number;
  /** Name of the largest contribution; null when all are zero. */
  dominant: string | null;
}

/**
 * Welch-Satterthwaite formula, JCGM 100:2008, G.4.1, eq. (G.2b) (from memory): ν = u⁴ / Σ (uᵢ⁴/νᵢ).
 *
 * @returns null for infinitely many
 */
export function effectiveDegreesOfFreedom(
  terms: readonly { contribution: number; degreesOfFreedom: number | null }[],
  standardUncertainty: number,
): number | null {
  const sum = terms.reduce(
    (total, { contribution, degreesOfFreedom }) =>
      total + (degreesOfFreedom === null ? 0 : contribution ** 4 / degreesOfFreedom),
    0,
  );
  return sum > 0 ? standardUncertainty ** 4 / sum : null;
}

/**
 * Combined and expanded uncertainty by the law of propagation, JCGM 100:2008, eqs (10) and (16), correlated inputs included
 * (from memory). The effective degrees of freedom are those of Welch and Satterthwaite, which hold for inputs that are not
 * correlated.
 *
 * @throws RangeError for uncertainties under 0, names that do not exist or repeat, coefficients outside −1 to 1, or
 *   correlations that contradict each other (a variance under 0)
 */
export function combineUncertainty(
  inputs: readonly UncertaintyInput[],
  {
    correlations = [],
    probability = COVERAGE_PROBABILITY,
  }: { correlations?: readonly InputCorrelation[]; probability?: number } = {},
): CombinedUncertainty {
  const signed = new Map<string, number>();
  for (const { name, standardUncertainty, sensitivity } of inputs) {
    if (!(standardUncertainty >= 0) || !Number.isFinite(standardUncertainty * sensitivity))
      throw new RangeError(`The uncertainty of ${name} must be a number of at least 0.`);
    if (signed.has(name)) throw new RangeError(`${name} stands twice in the budget.`);
    signed.set(name, standardUncertainty * sensitivity);
  }
  let variance = 0;
  for (const value of signed.values()) variance += value * value;
  let magnitude = variance;
  for (const { first, second, coefficient } of correlations) {
    const one = signed.get(first);
    const other = signed.get(second);
    if (one === undefined || other === undefined || first === second)
      throw new RangeError(`There is no pair ${first}, ${second} in the budget.`);
    if (!(Math.abs(coefficient) <= 1)) throw new RangeError('A correlation lies between −1 and 1.');
    variance += 2 * coefficient * one * other;
    magnitude += Math.abs(2 * one * other);
  }
  if (variance < -1e-12 * magnitude) throw new RangeError('The correlations contradict each other.');
  const standardUncertainty = Math.sqrt(Math.max(0, variance));
  const contributions = inputs.map(({ name, degreesOfFreedom }) => ({
    name,
    degreesOfFreedom,
    contribution: Math.abs(signed.get(name) ?? 0),
  }));
  const degrees = effectiveDegreesOfFreedom(contributions, standardUncertainty);
  const factor = coverageFactor(degrees, probability);
  const largest = contributions.reduce((most, line) => Math.max(most, line.contribution), 0);
  return {
    standardUncertainty,
    contributions: contributions.map(({ name, contribution }) => ({
      name,
      contribution,
      partOfVariance: variance > 0 ? contribution ** 2 / variance : 0,
    })),
    effectiveDegreesOfFreedom: degrees,
    coverageFactor: factor,
    expandedUncertainty: factor * standardUncertainty,
    dominant: largest > 0 ? (contributions.find((line) => line.contribution === largest)?.name ?? null) : null,
  };
}
