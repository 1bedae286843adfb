import type { Colours } from '@/components/ui/tokens';
import type { LineSegment } from '@/shared/optics/lineProfile';
import type { Pen } from './Pen';
import { toSheet, type Place } from './place';

const HANDLE_PX = 12;

/** The line over the frame: its width as two hairlines, a square at each end to take hold of. */
export function drawLineHandle(pen: Pen, onFrame: Colours, place: Place, segment: LineSegment): void {
  const a = toSheet(place, { x: segment.x0, y: segment.y0 });
  const b = toSheet(place, { x: segment.x1, y: segment.y1 });
  const length = Math.hypot(b.x - a.x, b.y - a.y) || 1;
  const half = (segment.widthPx * place.k) / 2;
  const nx = (-(b.y - a.y) / length) * half;
  const ny = ((b.x - a.x) / length) * half;
  if (half > 2) {
    for (const side of [1, -1]) {
      pen.line(a.x + side * nx, a.y + side * ny, b.x + side * nx, b.y + side * ny, onFrame.ink1, 1, 'dashes');
    }
  }
  pen.line(a.x, a.y, b.x, b.y, onFrame.gap, 4, 'solid', 0.7);
  pen.line(a.x, a.y, b.x, b.y, onFrame.ink0, 1.5);
  for (const end of [a, b]) {
    const box = { left: end.x - HANDLE_PX / 2, top: end.y - HANDLE_PX / 2, width: HANDLE_PX, height: HANDLE_PX };
    pen.rect(box, onFrame.gap);
    pen.outline(box, onFrame.ink0, 2);
  }
}
