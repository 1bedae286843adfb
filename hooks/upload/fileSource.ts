import { File } from 'expo-file-system';
import type { FrameSource } from './frameSource';

/** A file of a native device by its address. */
export function fileSource(address: string, name: string, mimeType?: string): FrameSource {
  const file = new File(address);
  return {
    name,
    sizeBytes: file.size,
    modifiedAt: file.modificationTime ?? 0,
    async read(start, end) {
      const handle = file.open();
      try {
        handle.offset = start;
        return handle.readBytes(end - start);
      } finally {
        handle.close();
      }
    },
    // React Native's FormData takes a file by its address and streams it; its type is not that of the web.
    part: { uri: address, name, type: mimeType ?? 'application/octet-stream' } as unknown as Blob,
  };
}
