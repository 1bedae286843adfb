import type { FrameSource } from '@/hooks/upload/frameSource';

export const TIFF_HEAD = [0x49, 0x49, 0x2a, 0x00];

/** A file that lies in memory. */
export function memorySource(name: string, bytes: ArrayLike<number> = TIFF_HEAD): FrameSource {
  const content = Uint8Array.from(bytes);
  return {
    name,
    sizeBytes: content.length,
    modifiedAt: 0,
    read: async (start, end) => content.slice(start, end),
    part: new Blob([content]),
  };
}
