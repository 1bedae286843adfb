import tQuantile from '@stdlib/stats-base-dists-t-quantile';

/**
 * Coverage probability of stated expanded uncertainties: that of k = 2 for a normal distribution, "about 95 %" in
 * calibration practice (EA-4/02, from memory).
 */
export const COVERAGE_PROBABILITY = 0.9545;

/**
 * Coverage factor k = t_p(ν) of JCGM 100:2008, G.3 and table G.2: the two-sided quantile of Student's distribution.
 *
 * @param degreesOfFreedom effective degrees of freedom, cut to a whole number as G.4.1 asks; null for infinitely many;
 *   values under 1 count as 1
 * @param probability coverage probability, 0 to 1
 */
export function coverageFactor(degreesOfFreedom: number | null, probability: number = COVERAGE_PROBABILITY): number {
  const whole = degreesOfFreedom === null ? Infinity : Math.max(1, Math.floor(degreesOfFreedom));
  return tQuantile((1 + probability) / 2, Math.min(whole, 1e9));
}
