import { useQuery } from '@tanstack/react-query';
import { callBytes } from '@/hooks/api/call';
import { useThemeState } from '@/hooks/theme/ThemeProvider';
import { captureEndpoints } from '@/shared/contracts/captures';

const PIECE = 0x2000;

/** Bytes as a data address, which a picture takes on every platform and which nobody has to give back. */
function dataAddress(bytes: ArrayBuffer, type: string): string {
  const all = new Uint8Array(bytes);
  let text = '';
  for (let start = 0; start < all.length; start += PIECE) text += String.fromCharCode(...all.subarray(start, start + PIECE));
  return `data:${type};base64,${btoa(text)}`;
}

/**
 * A small picture of a frame in the own colour of its laser. Null: the frame has not been looked at yet.
 * The picture needs the access token, so it cannot be named by its address alone.
 */
export function useThumbnail(frameId: string | null, wavelengthNm: number) {
  const { theme } = useThemeState();
  return useQuery({
    queryKey: ['thumbnails', frameId, theme, wavelengthNm] as const,
    queryFn: async ({ signal }) => {
      const query = { theme, wavelengthNm: wavelengthNm };
      const { bytes } = await callBytes(captureEndpoints.thumbnail, { params: { frameId: frameId ?? '' }, query, signal });
      return dataAddress(bytes, 'image/png');
    },
    enabled: frameId !== null,
    staleTime: Infinity,
    gcTime: 10 * 60_000,
  });
}
