import { DEFAULT_RULE, decide } from '@/shared/metrology/decision';
import { formatQuantity } from '@/shared/units/format';

export interface TolerancePosition {
  lower: number;
  upper: number;
  /** Distance to the nearer limit in µm; negative outside. */
  marginUm: number;
  /** Where the size lies, in words. */
  words: string;
  /** How the rule reads it; null without an uncertainty. Nobody has reviewed it. */
  reading: { place: 'conforms' | 'undecided' | 'above' | 'below'; guardBandUm: number; words: string } | null;
}

const digits = { significant: 2 };

/**
 * Where a size lies in its tolerance, and how the guarded rule of ISO 14253-1 reads it. It is no verdict: that is for
 * the review to give, by the rule agreed with the client.
 */
export function tolerancePosition(
  sizeUm: number,
  standardUncertaintyUm: number | null,
  nominalSizeUm: number,
  toleranceUm: number,
): TolerancePosition {
  const lower = nominalSizeUm - toleranceUm;
  const upper = nominalSizeUm + toleranceUm;
  const marginUm = toleranceUm - Math.abs(sizeUm - nominalSizeUm);
  const amount = formatQuantity(Math.abs(marginUm), 'µm', digits);
  const words = `${marginUm >= 0 ? 'inside' : 'outside'} the tolerance by ${amount}`;
  if (standardUncertaintyUm === null || standardUncertaintyUm <= 0) {
    return { lower, upper, marginUm, words, reading: null };
  }
  const { verdict, guardBand } = decide(sizeUm, standardUncertaintyUm, { lower, upper }, DEFAULT_RULE);
  const place = verdict === 'does not conform' ? (sizeUm > nominalSizeUm ? 'above' : 'below') : verdict;
  return {
    lower,
    upper,
    marginUm,
    words,
    reading: {
      place,
      guardBandUm: guardBand,
      words: `By ISO 14253-1, guard band ${formatQuantity(guardBand, 'µm', digits)}: ${verdict}. Not reviewed.`,
    },
  };
}
