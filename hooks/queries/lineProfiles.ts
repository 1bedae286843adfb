import { useMutation } from '@tanstack/react-query';
import { callText } from '@/hooks/api/call';
import { captureEndpoints } from '@/shared/contracts/captures';
import type { LineSegment } from '@/shared/optics/lineProfile';

/** Fetches the profile along a line over a frame as CSV text; millimetres too where the pixel pitch is known. */
export function useLineProfileCsv(frameId: string) {
  return useMutation({
    mutationFn: ({ segment, pixelPitchUm }: { segment: LineSegment; pixelPitchUm: number | null }) =>
      callText(captureEndpoints.lineProfileCsv, {
        params: { frameId },
        query: { ...segment, ...(pixelPitchUm === null ? {} : { pixelPitchUm }) },
      }),
  });
}
