import { queryOptions, useQueries, useQuery, type UseQueryResult } from '@tanstack/react-query';
import { useCallback } from 'react';
import { callBytes } from '@/hooks/api/call';
import { fresh } from '@/hooks/api/createQueryClient';
import { useThemeState, type ThemeName } from '@/hooks/theme/ThemeProvider';
import { captureEndpoints } from '@/shared/contracts/captures';

const PIECE = 0x2000;

/** Bytes as a data address, which a picture takes on every platform and which nobody has to give back. */
function dataAddress(bytes: ArrayBuffer, type: string): string {
  const all = new Uint8Array(bytes);
  let text = '';
  for (let start = 0; start < all.length; start += PIECE) {
    text += String.fromCharCode(...all.subarray(start, start + PIECE));
  }
  return `data:${type};base64,${btoa(text)}`;
}

const thumbnailQuery = (frameId: string, theme: ThemeName, wavelengthNm: number | null) =>
  queryOptions({
    queryKey: ['thumbnails', frameId, theme, wavelengthNm] as const,
    queryFn: async ({ signal }) => {
      const query = { theme, wavelengthNm: wavelengthNm ?? undefined };
      const { bytes } = await callBytes(captureEndpoints.thumbnail, { params: { frameId }, query, signal });
      return dataAddress(bytes, 'image/png');
    },
    staleTime: fresh.fixed,
    gcTime: 10 * 60_000,
  });

/** The small picture of one frame as a data address. Null: nothing is asked for. */
export function useThumbnail(frameId: string | null, wavelengthNm: number | null) {
  const { theme } = useThemeState();
  return useQuery({ ...thumbnailQuery(frameId ?? '', theme, wavelengthNm), enabled: frameId !== null });
}

/** Addresses of pictures by frame; a frame whose picture has not come is not among them. */
export type Thumbnails = Readonly<Record<string, string>>;

/**
 * Small pictures of frames in the own colour of their laser, as data addresses: a picture needs the access token, so it
 * cannot be named by its address alone.
 */
export function useThumbnails(frameIds: readonly string[], wavelengthNm: number | null): Thumbnails {
  const { theme } = useThemeState();
  const wanted = wavelengthNm === null ? [] : [...new Set(frameIds)];
  const listed = wanted.join(',');
  const combine = useCallback(
    (results: UseQueryResult<string>[]): Thumbnails => {
      const ids = listed.split(',');
      return Object.fromEntries(results.flatMap(({ data }, i) => (data === undefined ? [] : [[ids[i] ?? '', data]])));
    },
    [listed],
  );
  return useQueries({ queries: wanted.map((frameId) => thumbnailQuery(frameId, theme, wavelengthNm)), combine });
}
