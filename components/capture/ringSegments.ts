import type { RingSegment } from '@/components/ui/ProgressRing';
import type { CaptureRow } from './captureRows';

/** One segment for each light that counts; what is left out, called off or turned away has none. */
export function ringSegments(lights: readonly CaptureRow[]): RingSegment[] {
  return lights.flatMap((row): RingSegment[] => {
    if (row.type === 'sending') {
      if (row.file.state === 'cancelled' || row.file.state === 'unfit') return [];
      if (row.file.state === 'sending') return [{ state: 'uploading', part: row.file.part }];
      return [{ state: row.file.state === 'failed' ? 'refused' : 'waiting' }];
    }
    if (row.frame.leftOut) return [];
    if (row.frame.state === 'unusable') return [{ state: 'refused' }];
    switch (row.frame.measurement?.state) {
      case 'measured':
        return [{ state: 'measured' }];
      case 'measuring':
        return [{ state: 'measuring' }];
      case 'refused':
      case 'failed':
        return [{ state: 'refused' }];
      default:
        return [{ state: 'waiting' }];
    }
  });
}
