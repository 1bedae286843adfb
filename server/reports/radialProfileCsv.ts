import type { RadialProfile } from '../../shared/contracts/measureResult';
import { toCsv } from './toCsv';

/** A radial profile with the fitted model, one row a bin; counts stand above black. */
export function radialProfileCsv(profile: RadialProfile): string {
  const { radiusMm, meanCounts, standardErrorCounts, pixelCount, modelCounts } = profile;
  return toCsv(
    [
      ['radius_mm', 'mm'],
      ['mean_counts', 'counts'],
      ['standard_error_counts', 'counts'],
      ['pixel_count', null],
      ['model_counts', 'counts'],
    ],
    radiusMm.map((radius, index) => [
      radius,
      meanCounts[index] ?? null,
      standardErrorCounts[index] ?? null,
      pixelCount[index] ?? null,
      modelCounts[index] ?? null,
    ]),
  );
}
