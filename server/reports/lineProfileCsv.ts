import type { LineProfile } from '../../shared/contracts/lineProfile';
import { toCsv, type Column } from './toCsv';

const MM_PER_UM = 1e-3;

/** A line profile, one row a step. With a pixel pitch the distance along the line stands in millimetres as well. */
export function lineProfileCsv(profile: LineProfile, pixelPitchUm: number | null): string {
  const { distancePx, xPx, yPx, meanCounts, standardErrorCounts } = profile;
  const inMm: Column[] = pixelPitchUm === null ? [] : [['distance_mm', 'mm']];
  return toCsv(
    [
      ['distance_px', 'px'],
      ...inMm,
      ['x_px', 'px'],
      ['y_px', 'px'],
      ['mean_counts', 'counts'],
      ['standard_error_counts', 'counts'],
    ],
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
