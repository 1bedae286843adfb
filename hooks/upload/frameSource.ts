/** A file on this device that can be read in pieces and put into a form, whatever the platform calls it. */
export interface FrameSource {
  name: string;
  sizeBytes: number;
  /** Milliseconds since 1970, 0 where the platform does not say. */
  modifiedAt: number;
  /** Reads bytes from `start` up to, not including, `end`. */
  read(start: number, end: number): Promise<Uint8Array>;
  /** What `FormData.append` takes as the file. */
  part: Blob;
}
