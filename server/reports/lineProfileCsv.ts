import type { LineProfile } from '../../shared/contracts/lineProfile';
import { toCsv } from './toCsv';

const MM_PER_UM = 1e-3;

/** A line profile, one row a step. With a pixel pitch the distance along the line stands in millimetres as well. */
export function lineProfileCsv(profile: LineProfile, pixelPitchUm: number | null): string {
  const { distancePx, xPx, yPx, meanCounts, standardErrorCounts } = profile;
  const inMm = pixelPitchUm === null ? [] : ['distance_mm'];
  return toCsv(
    ['distance_px', ...inMm, 'x_px', 'y_px', 'mean_counts', 'standard_error_counts'],
    distancePx.map((distance, index) => [
      distance,
      ...(pixelPitchUm === null ? [] : [distance * pixelPitchUm * MM_PER_UM]),
      xPx[index] ?? null,
      yPx[index] ?? null,
      meanCounts[index] ?? null,
      standardErrorCounts[index] ?? null,
    ]),
  );
}
