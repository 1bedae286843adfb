import { formatQuantity } from '@/shared/units/format';

export interface TolerancePosition {
  lower: number;
  upper: number;
  /** Distance to the nearer limit in µm; negative outside. */
  marginUm: number;
  /** Where the size lies, in words. It is no verdict: no decision rule has been applied. */
  words: string;
  /** True where the uncertainty reaches over the limit. */
  across: boolean;
}

/**
 * Where a size lies in its tolerance, without deciding anything.
 * @param expandedUncertaintyUm null: not known, then nothing is said about it.
 */
export function tolerancePosition(
  sizeUm: number,
  expandedUncertaintyUm: number | null,
  nominalSizeUm: number,
  toleranceUm: number,
): TolerancePosition {
  const marginUm = toleranceUm - Math.abs(sizeUm - nominalSizeUm);
  const across = expandedUncertaintyUm !== null && Math.abs(marginUm) < expandedUncertaintyUm;
  const digits = { significant: 2 };
  const amount = formatQuantity(Math.abs(marginUm), 'µm', digits);
  const words = `${marginUm >= 0 ? 'inside' : 'outside'} the tolerance by ${amount}`;
  return { lower: nominalSizeUm - toleranceUm, upper: nominalSizeUm + toleranceUm, marginUm, words, across };
}
