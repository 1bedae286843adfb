import { useQuery } from '@tanstack/react-query';
import { callBytes } from '@/hooks/api/call';
import { captureEndpoints } from '@/shared/contracts/captures';
import { measurementEndpoints } from '@/shared/contracts/measurements';
import { decodeCounts, type FramePlane, type MisfitPlane } from '@/shared/optics/framePlane';

export const planeKeys = {
  plane: (frameId: string) => ['planes', 'counts', frameId] as const,
  misfit: (measurementId: string) => ['planes', 'misfit', measurementId] as const,
};

/** Tens of megabytes each: let go shortly after nobody looks at them. */
const KEEP_MS = 15_000;

function numberOf(headers: Headers, name: string): number {
  const text = headers.get(name);
  const value = text === null ? NaN : Number(text);
  if (!Number.isFinite(value)) throw new TypeError(`The plane came without ${name}.`);
  return value;
}

/** Decoded counts of a frame. Null: nothing is asked for. Fetching stops when nobody looks any more. */
export function usePlane(frameId: string | null) {
  return useQuery({
    queryKey: planeKeys.plane(frameId ?? ''),
    queryFn: async ({ signal }): Promise<FramePlane> => {
      const { bytes, headers } = await callBytes(captureEndpoints.plane, {
        params: { frameId: frameId ?? '' },
        signal,
      });
      const widthPx = numberOf(headers, 'X-Width');
      const heightPx = numberOf(headers, 'X-Height');
      return {
        widthPx,
        heightPx,
        data: decodeCounts(bytes, widthPx, heightPx),
        blackCount: numberOf(headers, 'X-Black'),
        whiteCount: numberOf(headers, 'X-White'),
      };
    },
    enabled: frameId !== null,
    structuralSharing: false,
    staleTime: Infinity,
    gcTime: KEEP_MS,
  });
}

/** Misfit of each pixel of a measured frame; `size` is that of the frame. Null: nothing is asked for. */
export function useMisfit(measurementId: string | null, size: { widthPx: number; heightPx: number } | null) {
  return useQuery({
    queryKey: planeKeys.misfit(measurementId ?? ''),
    queryFn: async ({ signal }): Promise<MisfitPlane> => {
      const { bytes, headers } = await callBytes(measurementEndpoints.misfit, {
        params: { measurementId: measurementId ?? '' },
        signal,
      });
      const widthPx = headers.has('X-Width') ? numberOf(headers, 'X-Width') : (size?.widthPx ?? 0);
      const heightPx = headers.has('X-Height') ? numberOf(headers, 'X-Height') : (size?.heightPx ?? 0);
      if (bytes.byteLength !== widthPx * heightPx) throw new RangeError('The misfit does not fit the frame.');
      return { widthPx, heightPx, bytes: new Uint8Array(bytes) };
    },
    enabled: measurementId !== null && size !== null,
    structuralSharing: false,
    staleTime: Infinity,
    gcTime: KEEP_MS,
  });
}
