import type { BudgetLine, BudgetSource } from '../contracts/measureResult';
import { COVERAGE_PROBABILITY, coverageFactor } from './coverageFactor';

export interface Repeat {
  sizeUm: number;
  budget: Pick<BudgetLine, 'source' | 'contributionUm' | 'degreesOfFreedom'>[];
}

export interface CombineOptions {
  /**
   * Whether the pattern fell on other pixels each time, by at least a ring spacing. If it stayed in place the uneven
   * response of the same pixels pulls every frame the same way, and repeats do not average it.
   */
  patternMoved?: boolean;
  coverageProbability?: number;
}

export interface CombinedSize {
  count: number;
  sizeUm: number;
  standardUncertaintyUm: number;
  /** Part that differs from frame to frame. */
  scatterUncertaintyUm: number;
  /** Part that all repeats share and that more frames do not reduce. */
  commonUncertaintyUm: number;
  /** Null: infinitely many. */
  effectiveDegreesOfFreedom: number | null;
  coverageFactor: number;
  expandedUncertaintyUm: number;
}

const SCATTERING: readonly BudgetSource[] = ['fit', 'repeat-frames'];

/**
 * Mean of repeated sizes of one aperture on one bench, with what scatters told apart from what is common.
 *
 * Each size is weighted by 1/u² of the part that scatters (fit, repeat frames, and pixel response if the pattern
 * moved). The uncertainty of that part is the larger of what the fits state and what the sizes show
 * (JCGM 100:2008, 4.2, with the Birge ratio; common practice). Every other source (distance, wavelength, pitch, cover
 * glass, tilt, illumination, model) is fully correlated between the repeats and adds linearly over them
 * (JCGM 100:2008, 5.2.2 and F.1.2.3), so that it stays as it is.
 *
 * @throws RangeError when there is no repeat
 */
export function combineRepeats(repeats: readonly Repeat[], options: CombineOptions = {}): CombinedSize {
  const count = repeats.length;
  if (count === 0) throw new RangeError('There is nothing to combine.');
  const scattering = options.patternMoved === true ? [...SCATTERING, 'pixel-response'] : SCATTERING;
  const scatters = (line: { source: BudgetSource }) => scattering.includes(line.source);

  const own = repeats.map(({ budget }) => Math.hypot(0, ...budget.filter(scatters).map((line) => line.contributionUm)));
  const allKnown = own.every((value) => value > 0);
  const rawWeights = own.map((value) => (allKnown ? 1 / value ** 2 : 1));
  const total = rawWeights.reduce((sum, weight) => sum + weight, 0);
  const weights = rawWeights.map((weight) => weight / total);
  const sizeUm = repeats.reduce((sum, repeat, index) => sum + weights[index] * repeat.sizeUm, 0);

  const terms: { variance: number; degreesOfFreedom: number | null }[] = [];
  const stated = Math.hypot(0, ...own.map((value, index) => value * weights[index]));
  const spread = repeats.reduce((sum, repeat, index) => sum + weights[index] * (repeat.sizeUm - sizeUm) ** 2, 0);
  const shown = count > 1 ? Math.sqrt(spread / (count - 1)) : 0;
  const scatterUncertaintyUm = Math.max(stated, shown);
  terms.push({ variance: scatterUncertaintyUm ** 2, degreesOfFreedom: shown > stated ? count - 1 : null });

  const sources = new Set(
    repeats.flatMap(({ budget }) => budget.filter((line) => !scatters(line)).map((line) => line.source)),
  );
  for (const source of sources) {
    let contribution = 0;
    let degreesOfFreedom: number | null = null;
    repeats.forEach(({ budget }, index) => {
      for (const line of budget.filter((candidate) => candidate.source === source)) {
        contribution += weights[index] * Math.abs(line.contributionUm);
        if (line.degreesOfFreedom !== null)
          degreesOfFreedom = Math.min(degreesOfFreedom ?? Infinity, line.degreesOfFreedom);
      }
    });
    terms.push({ variance: contribution ** 2, degreesOfFreedom });
  }

  const variance = terms.reduce((sum, term) => sum + term.variance, 0);
  const commonUncertaintyUm = Math.sqrt(Math.max(0, variance - scatterUncertaintyUm ** 2));
  const denominator = terms.reduce(
    (sum, term) => sum + (term.degreesOfFreedom === null ? 0 : term.variance ** 2 / term.degreesOfFreedom),
    0,
  );
  const effectiveDegreesOfFreedom = denominator > 0 ? variance ** 2 / denominator : null;
  const factor = coverageFactor(effectiveDegreesOfFreedom, options.coverageProbability ?? COVERAGE_PROBABILITY);
  const standardUncertaintyUm = Math.sqrt(variance);
  return {
    count,
    sizeUm,
    standardUncertaintyUm,
    scatterUncertaintyUm,
    commonUncertaintyUm,
    effectiveDegreesOfFreedom,
    coverageFactor: factor,
    expandedUncertaintyUm: factor * standardUncertaintyUm,
  };
}
