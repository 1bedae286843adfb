import type { z } from 'zod';
import type { Capture, CaptureFrame, captureMeanSchema } from '../../../shared/contracts/captures';
import type { BudgetLine } from '../../../shared/contracts/measureResult';
import type { Measurement } from '../../../shared/contracts/measurements';
import { combineRepeats } from '../../../shared/metrology/combineRepeats';
import type { CaptureRow, PlaceRow } from './captureRepository';

export function presentCapture({ createdAt, apertureKind: _kind, ...capture }: CaptureRow): Capture {
  return { ...capture, createdAt: createdAt.toISOString() };
}

/** A frame in its capture; only a light shows a measurement. */
export function presentPlace(place: PlaceRow, measurement: Measurement | null): CaptureFrame {
  const { blackCount, whiteCount, peakCounts, peakFraction, clippedFraction, noiseCounts, createdAt, ...frame } = place;
  const known =
    blackCount !== null &&
    whiteCount !== null &&
    peakCounts !== null &&
    peakFraction !== null &&
    clippedFraction !== null &&
    noiseCounts !== null;
  return {
    ...frame,
    health: known ? { blackCount, whiteCount, peakCounts, peakFraction, clippedFraction, noiseCounts } : null,
    createdAt: createdAt.toISOString(),
    measurement: place.kind === 'light' ? measurement : null,
  };
}

/** Mean of the sizes of a capture, or null when there is none. */
export function presentMean(
  sizes: { sizeUm: number; budget: BudgetLine[] }[],
): z.output<typeof captureMeanSchema> | null {
  return sizes.length === 0 ? null : combineRepeats(sizes);
}
