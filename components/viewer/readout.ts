import type { RadialProfile } from '@/shared/contracts/measureResult';
import { misfitOfByte, pixelIndexAt, type FramePlane, type MisfitPlane } from '@/shared/optics/framePlane';
import type { Point } from './place';
import { toPolar } from './polar';
import type { MeasuredFrame } from './SheetScene';

/** What the frame holds at a point. Null: not known there. */
export interface Readout {
  xPx: number;
  yPx: number;
  angleDeg: number | null;
  radiusMm: number | null;
  counts: number | null;
  aboveBlack: number | null;
  /** Fitted model, counts above black. */
  modelCounts: number | null;
  misfit: number | null;
  masked: boolean;
}

export function readoutAt(
  point: Point,
  plane: FramePlane,
  misfit: MisfitPlane | null,
  measured: MeasuredFrame | null,
): Readout {
  const index = pixelIndexAt(plane, point.x, point.y);
  const counts = index === null ? null : plane.data[index]!;
  const polar = measured ? toPolar(measured.centrePx, point) : null;
  const radiusMm = measured && polar ? (polar.radiusPx * measured.pixelPitchUm) / 1000 : null;
  const sameSize = misfit !== null && misfit.widthPx === plane.widthPx && misfit.heightPx === plane.heightPx;
  const byte = sameSize && index !== null ? misfit.bytes[index]! : null;
  return {
    xPx: point.x,
    yPx: point.y,
    angleDeg: polar?.angleDeg ?? null,
    radiusMm,
    counts,
    aboveBlack: counts === null ? null : counts - plane.blackCount,
    modelCounts: measured && radiusMm !== null ? modelAt(measured.profile, radiusMm) : null,
    misfit: byte === null ? null : misfitOfByte(byte),
    masked: byte === 0,
  };
}

/** The fitted model at a radius, linear between the bins; null beyond the profile. */
export function modelAt(profile: RadialProfile, radiusMm: number): number | null {
  const { radiusMm: radii, modelCounts } = profile;
  const last = radii.length - 1;
  if (last < 0 || radiusMm > radii[last]!) return null;
  if (radiusMm <= radii[0]!) return modelCounts[0]!;
  let low = 0;
  let high = last;
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if (radii[middle]! <= radiusMm) low = middle;
    else high = middle;
  }
  const t = (radiusMm - radii[low]!) / (radii[high]! - radii[low]!);
  return modelCounts[low]! + t * (modelCounts[high]! - modelCounts[low]!);
}
