import type { CaptureFrame } from '@/shared/contracts/captures';

/** The light whose size arrived last; null while there is none. */
export function newestMeasured(frames: readonly CaptureFrame[]): CaptureFrame | null {
  const measured = frames.filter((frame) => frame.kind === 'light' && frame.measurement?.state === 'measured');
  const at = (frame: CaptureFrame) => frame.measurement?.finishedAt ?? '';
  return measured.reduce<CaptureFrame | null>((best, frame) => (best && at(best) >= at(frame) ? best : frame), null);
}
