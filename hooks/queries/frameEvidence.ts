import { useMemo } from 'react';
import type { MeasurementDetail } from '@/shared/contracts/measurements';
import { useRadialProfile } from './measurements';
import { useMisfit, usePlane } from './planes';

/** What a frame and its profile are drawn from. Null: nothing is asked for. */
export function useFrameEvidence(frameId: string | null, measurement: MeasurementDetail | null) {
  const result = measurement?.result?.status === 'measured' ? measurement.result : null;
  const plane = usePlane(frameId);
  const profile = useRadialProfile(result && frameId ? (measurement?.id ?? null) : null);
  const { widthPx = null, heightPx = null } = measurement ?? {};
  const size = useMemo(
    () => (widthPx !== null && heightPx !== null ? { widthPx, heightPx } : null),
    [widthPx, heightPx],
  );
  const misfit = useMisfit(measurement?.hasMisfit && frameId ? measurement.id : null, size);
  const pixelPitchUm = measurement?.inputs.pixelPitchUm ?? null;
  const measured = useMemo(() => {
    if (!result?.centrePx || !profile.data || pixelPitchUm === null) return null;
    return { centrePx: result.centrePx, rings: result.rings, profile: profile.data, pixelPitchUm };
  }, [result, profile.data, pixelPitchUm]);
  return { plane: plane.data ?? null, misfit: misfit.data ?? null, measured, error: plane.error };
}
