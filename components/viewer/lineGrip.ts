import type { LineSegment } from '@/shared/optics/lineProfile';
import { toSheet, type Place, type Point } from './place';

export type Grip = 'first' | 'second' | 'body';

/** What of the line a touch takes hold of: an end within `reachPx`, else the line itself, else nothing. */
export function gripAt(place: Place, segment: LineSegment, at: Point, reachPx: number): Grip | null {
  const a = toSheet(place, { x: segment.x0, y: segment.y0 });
  const b = toSheet(place, { x: segment.x1, y: segment.y1 });
  const toA = Math.hypot(at.x - a.x, at.y - a.y);
  const toB = Math.hypot(at.x - b.x, at.y - b.y);
  if (Math.min(toA, toB) <= reachPx) return toA <= toB ? 'first' : 'second';
  const length2 = (b.x - a.x) ** 2 + (b.y - a.y) ** 2;
  if (length2 === 0) return null;
  const t = ((at.x - a.x) * (b.x - a.x) + (at.y - a.y) * (b.y - a.y)) / length2;
  if (t < 0 || t > 1) return null;
  const off = Math.hypot(at.x - a.x - t * (b.x - a.x), at.y - a.y - t * (b.y - a.y));
  return off <= reachPx / 2 ? 'body' : null;
}

/** Moves the held part by frame pixels; ends stay on the frame. */
export function moveGrip(
  segment: LineSegment,
  grip: Grip,
  dx: number,
  dy: number,
  widthPx: number,
  heightPx: number,
): LineSegment {
  const x = (v: number) => Math.min(widthPx - 1, Math.max(0, v));
  const y = (v: number) => Math.min(heightPx - 1, Math.max(0, v));
  if (grip === 'first') return { ...segment, x0: x(segment.x0 + dx), y0: y(segment.y0 + dy) };
  if (grip === 'second') return { ...segment, x1: x(segment.x1 + dx), y1: y(segment.y1 + dy) };
  const least = (a: number, b: number, d: number, size: number) =>
    Math.min(size - 1 - Math.max(a, b), Math.max(-Math.min(a, b), d));
  const sx = least(segment.x0, segment.x1, dx, widthPx);
  const sy = least(segment.y0, segment.y1, dy, heightPx);
  return { ...segment, x0: segment.x0 + sx, x1: segment.x1 + sx, y0: segment.y0 + sy, y1: segment.y1 + sy };
}
