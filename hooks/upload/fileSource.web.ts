import type { FrameSource } from './frameSource';

/** A file chosen in the browser, dropped on the page, or caught by its camera. */
export function fileSource(file: File, name: string = file.name): FrameSource {
  return {
    name,
    sizeBytes: file.size,
    modifiedAt: file.lastModified,
    read: async (start, end) => new Uint8Array(await file.slice(start, end).arrayBuffer()),
    part: file,
  };
}
