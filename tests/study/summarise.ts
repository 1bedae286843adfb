import type { StudyOutcome } from './studyFrame';

export interface StudySummary {
  frames: number;
  refused: number;
  /** Root mean square and median of |error| over the bound with free light, the response's own shift added in square. */
  rmsOfFree: number;
  medianOfFree: number;
  /** The same over the bound that knows what was said of the light. */
  rmsOfInformed: number;
  medianOfInformed: number;
  /** Share of frames whose stated 95 % interval holds the truth. */
  covered: number;
  /** Share whose error is within 1.96 times the fit's own uncertainty. */
  coveredByFit: number;
  warned: number;
}

const WARNINGS = new Set([
  ...['wrong-pattern', 'second-pattern', 'out-of-round', 'tilted-sensor', 'uneven-illumination', 'stray-light'],
  ...['fringes', 'dust', 'hot-pixels', 'under-sampled', 'motion', 'opinions-disagree', 'poor-fit'],
]);

/** Error over what is attainable, for a frame that was measured. */
export function overBound({ error, bound }: StudyOutcome): number {
  return error / Math.hypot(bound.informed, bound.informedShift);
}

export function warningsOf({ flags }: StudyOutcome): string[] {
  return flags.filter((flag) => WARNINGS.has(flag));
}

export function summarise(outcomes: StudyOutcome[]): StudySummary {
  const measured = outcomes.filter(({ refusal }) => refusal === null);
  const free = measured.map(({ error, bound }) => Math.abs(error) / Math.hypot(bound.free, bound.freeShift));
  const informed = measured.map((outcome) => Math.abs(overBound(outcome)));
  const share = (test: (outcome: StudyOutcome) => boolean) => measured.filter(test).length / measured.length;
  return {
    frames: outcomes.length,
    refused: outcomes.length - measured.length,
    rmsOfFree: rootMeanSquare(free),
    medianOfFree: median(free),
    rmsOfInformed: rootMeanSquare(informed),
    medianOfInformed: median(informed),
    covered: share(({ error, expanded }) => Math.abs(error) <= expanded),
    coveredByFit: share(({ error, fit }) => Math.abs(error) <= 1.96 * fit),
    warned: share((outcome) => warningsOf(outcome).length > 0),
  };
}

function rootMeanSquare(values: number[]): number {
  return Math.sqrt(values.reduce((sum, value) => sum + value * value, 0) / values.length);
}

function median(values: number[]): number {
  return values.toSorted((a, b) => a - b)[Math.floor(values.length / 2)] ?? NaN;
}
