import { coverageFactor } from './coverageFactor';
import { normalProbability } from './normalDistribution';

/** Limits of a tolerance; null where there is none. */
export interface ToleranceLimits {
  lower: number | null;
  upper: number | null;
}

export type Verdict = 'conforms' | 'does not conform' | 'undecided';

/**
 * How a verdict is reached. `simple`: the value alone against the limits. `guarded`: the limits are drawn in by
 * guardFactor × standard uncertainty to state conformity, and pushed out by as much to state the contrary.
 */
export type DecisionRule = { kind: 'simple' } | { kind: 'guarded'; guardFactor: number };

/**
 * Rule of ISO 14253-1:2017 where nothing else is agreed: conformity and nonconformity are each proven at 95 % or more, a guard band of
 * 1.65 standard uncertainties (from memory; principle looked up).
 */
export const DEFAULT_RULE: DecisionRule = { kind: 'guarded', guardFactor: coverageFactor(null, 0.9) };

function checkLimits({ lower, upper }: ToleranceLimits): void {
  if (lower === null && upper === null) throw new RangeError('A tolerance needs at least one limit.');
  if (lower !== null && upper !== null && !(lower < upper))
    throw new RangeError('The lower limit must be below the upper one.');
}

/**
 * Probability that the true value lies within the limits, for a normal distribution about the measured value: JCGM 106:2012,
 * 7.3 and 7.4 (looked up through an accreditation body's guide).
 */
export function conformanceProbability(value: number, standardUncertainty: number, limits: ToleranceLimits): number {
  checkLimits(limits);
  if (!(standardUncertainty > 0)) throw new RangeError('The standard uncertainty must be above 0.');
  const below = limits.lower === null ? 0 : normalProbability((limits.lower - value) / standardUncertainty);
  const above = limits.upper === null ? 0 : normalProbability((value - limits.upper) / standardUncertainty);
  return 1 - below - above;
}

export interface Decision {
  verdict: Verdict;
  conformanceProbability: number;
  guardBand: number;
  /** Values between these conform; null limits are open. Lower above upper: the uncertainty leaves no room to prove conformity. */
  acceptance: ToleranceLimits;
}

/** Verdict on a measured value by a rule agreed before: JCGM 106:2012, clause 8; ISO 14253-1:2017. */
export function decide(
  value: number,
  standardUncertainty: number,
  limits: ToleranceLimits,
  rule: DecisionRule = DEFAULT_RULE,
): Decision {
  const probability = conformanceProbability(value, standardUncertainty, limits);
  const guardBand = rule.kind === 'simple' ? 0 : rule.guardFactor * standardUncertainty;
  if (!(guardBand >= 0)) throw new RangeError('A guard factor cannot be negative.');
  const { lower, upper } = limits;
  const within = (shift: number) =>
    (lower === null || value >= lower + shift) && (upper === null || value <= upper - shift);
  const verdict = within(guardBand)
    ? 'conforms'
    : within(-guardBand) && guardBand > 0
      ? 'undecided'
      : 'does not conform';
  return {
    verdict,
    conformanceProbability: probability,
    guardBand,
    acceptance: { lower: lower === null ? null : lower + guardBand, upper: upper === null ? null : upper - guardBand },
  };
}

export interface DecisionRisks {
  /** Probability that an item is accepted and does not conform. */
  consumer: number;
  /** Probability that an item is rejected and conforms. */
  producer: number;
  /** Probability that an item does not conform. */
  nonconforming: number;
}

/**
 * Global risks of accepting by measurement when it is known how items vary: JCGM 106:2012, 9.5 (from memory), the integrals
 * by Simpson's rule.
 *
 * @param density probability density of the true value among items; zero outside `from` to `to`
 * @param acceptance measured values between these are accepted
 */
export function decisionRisks(
  density: (value: number) => number,
  [from, to]: readonly [number, number],
  standardUncertainty: number,
  tolerance: ToleranceLimits,
  acceptance: ToleranceLimits,
): DecisionRisks {
  checkLimits(tolerance);
  const accepted = (value: number) =>
    (acceptance.upper === null ? 1 : normalProbability((acceptance.upper - value) / standardUncertainty)) -
    (acceptance.lower === null ? 0 : normalProbability((acceptance.lower - value) / standardUncertainty));
  const integrate = (low: number, high: number, f: (value: number) => number) => {
    if (!(high > low)) return 0;
    const panels = 2000;
    let sum = 0;
    for (let index = 0; index <= panels; index += 1) {
      const weight = index === 0 || index === panels ? 1 : index % 2 === 1 ? 4 : 2;
      sum += weight * f(low + ((high - low) * index) / panels);
    }
    return (sum * (high - low)) / (3 * panels);
  };
  const lower = Math.min(Math.max(tolerance.lower ?? from, from), to);
  const upper = Math.max(Math.min(tolerance.upper ?? to, to), from);
  const outside = (f: (value: number) => number) => integrate(from, lower, f) + integrate(upper, to, f);
  return {
    consumer: outside((value) => density(value) * accepted(value)),
    producer: integrate(lower, upper, (value) => density(value) * (1 - accepted(value))),
    nonconforming: outside(density),
  };
}
