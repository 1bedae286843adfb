import type { RadialProfile } from '@/shared/contracts/measureResult';

/** A radial profile as it is drawn: one entry a dot. */
export interface ProfileSeries {
  radiusMm: number[];
  meanCounts: number[];
  standardErrorCounts: number[];
  modelCounts: number[];
  /** (mean − model) ÷ standard error; 0 where there is no error. */
  misfit: number[];
}

/**
 * Joins neighbouring bins until dots stand at least `minGapPx` apart; each bin counts with its number of pixels, and the
 * standard error of the joined mean follows from those of its bins as independent means.
 */
export function profileSeries(profile: RadialProfile, pxPerMm: number, minGapPx = 3.4): ProfileSeries {
  const out: ProfileSeries = { radiusMm: [], meanCounts: [], standardErrorCounts: [], modelCounts: [], misfit: [] };
  const gapMm = minGapPx / pxPerMm;
  let i = 0;
  while (i < profile.radiusMm.length) {
    const from = profile.radiusMm[i]!;
    let pixels = 0;
    let radius = 0;
    let mean = 0;
    let model = 0;
    let variance = 0;
    for (; i < profile.radiusMm.length && (pixels === 0 || profile.radiusMm[i]! < from + gapMm); i += 1) {
      const n = Math.max(1, profile.pixelCount[i]!);
      pixels += n;
      radius += n * profile.radiusMm[i]!;
      mean += n * profile.meanCounts[i]!;
      model += n * profile.modelCounts[i]!;
      variance += (n * profile.standardErrorCounts[i]!) ** 2;
    }
    const error = Math.sqrt(variance) / pixels;
    out.radiusMm.push(radius / pixels);
    out.meanCounts.push(mean / pixels);
    out.modelCounts.push(model / pixels);
    out.standardErrorCounts.push(error);
    out.misfit.push(error > 0 ? (mean - model) / pixels / error : 0);
  }
  return out;
}

/** Range of counts for a logarithmic axis: from about the read noise of the profile upward to a little above the peak. */
export function countRange(profile: RadialProfile): { from: number; to: number } {
  const peak = Math.max(1, ...profile.meanCounts, ...profile.modelCounts);
  const errors = profile.standardErrorCounts.filter((e) => e > 0).sort((a, b) => a - b);
  const noise = errors[Math.floor(errors.length / 2)] ?? 0.1;
  const least = Math.min(...profile.modelCounts.filter((c) => c > 0), peak);
  const from = Math.max(peak * 1e-6, Math.min(peak / 30, Math.max(least / 2, noise)));
  return { from, to: peak * 1.7 };
}

/** Farthest radius worth drawing: a little past the last dark ring, or the whole profile where there are no rings. */
export function reachMm(profile: RadialProfile, darkRadiiMm: readonly number[]): number {
  const end = profile.radiusMm[profile.radiusMm.length - 1] ?? 1;
  const last = Math.max(0, ...darkRadiiMm);
  return last > 0 ? Math.min(Math.max(end, last), last * 1.058) : end;
}
