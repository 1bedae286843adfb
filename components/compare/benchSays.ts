import type { Compared } from '@/shared/contracts/measurements';
import type { CompareLineResult } from './compareLine';

export interface SlopeSays {
  /** Distance from the slope, mm, and its standard uncertainty. */
  distanceMm: number;
  distanceUncertaintyMm: number | null;
  /** Distance that the measurements were made with. */
  benchDistanceMm: number;
}

/** The distance that the slope gives for the wavelength of the bench; null without a line. */
export function slopeSays(line: CompareLineResult, chosen: readonly Compared[]): SlopeSays | null {
  const first = chosen[0];
  if (!line.fit || !first) return null;
  const wavelengthUm = first.wavelengthNm / 1000;
  return {
    distanceMm: line.fit.slope / wavelengthUm,
    distanceUncertaintyMm: line.fit.slopeUncertainty === null ? null : line.fit.slopeUncertainty / wavelengthUm,
    benchDistanceMm: first.distanceMm,
  };
}
