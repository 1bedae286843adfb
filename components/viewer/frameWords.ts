import type { CaptureFrame } from '@/shared/contracts/captures';
import { formatPercent, formatQuantity } from '@/shared/units/format';
import type { SheetView } from './SheetScene';

const kindWords = { light: 'Frame', dark: 'Dark', flat: 'Flat' } as const;

/** “Frame 5”, “Dark 2”. */
export function frameName(frame: Pick<CaptureFrame, 'kind'>, position: { number: number }): string {
  return `${kindWords[frame.kind]} ${position.number}`;
}

/** “Frame 5 of 8, 6.0 ms”. */
export function frameSubtitle(frame: CaptureFrame, position: { number: number; count: number }): string {
  const exposure = frame.exposureMs === null ? '' : `, ${formatQuantity(frame.exposureMs, 'ms', { significant: 2 })}`;
  return `${frameName(frame, position)} of ${position.count}${exposure}`;
}

/** “6.0 ms, peak 82 %, 5 darks taken off”. */
export function frameNote(frame: CaptureFrame, darkCount: number | null): string {
  const parts: string[] = [];
  if (frame.exposureMs !== null) parts.push(formatQuantity(frame.exposureMs, 'ms', { significant: 2 }));
  if (frame.health) parts.push(`peak ${formatPercent(frame.health.peakFraction)}`);
  if (frame.health && frame.health.clippedFraction > 0)
    parts.push(`${formatPercent(frame.health.clippedFraction)} clipped`);
  if (darkCount !== null)
    parts.push(
      darkCount === 0
        ? 'no darks taken off'
        : `${darkCount} ${darkCount === 1 ? 'dark' : 'darks'} taken off for the fit`,
    );
  return parts.join(', ');
}

/** The views that this frame has. */
export function viewsFor(measured: boolean, misfit: boolean): { value: SheetView; label: string }[] {
  const views: { value: SheetView; label: string }[] = [{ value: 'frame', label: 'Frame' }];
  if (measured) views.push({ value: 'unwrapped', label: 'Unwrapped' });
  if (misfit) views.push({ value: 'misfit', label: 'Misfit' });
  return views;
}
