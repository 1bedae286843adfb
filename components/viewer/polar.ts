import type { Point } from './place';

export interface PolarPoint {
  /** Distance from the centre, frame pixels. */
  radiusPx: number;
  /** From the direction of x, counter-clockwise as seen on the screen (y runs down), 0 to 360. */
  angleDeg: number;
}

export function toPolar(centre: Point, frame: Point): PolarPoint {
  const dx = frame.x - centre.x;
  const dy = centre.y - frame.y;
  const angleDeg = (Math.atan2(dy, dx) * 180) / Math.PI;
  return { radiusPx: Math.hypot(dx, dy), angleDeg: angleDeg < 0 ? angleDeg + 360 : angleDeg };
}

export function fromPolar(centre: Point, polar: PolarPoint): Point {
  const a = (polar.angleDeg * Math.PI) / 180;
  return { x: centre.x + polar.radiusPx * Math.cos(a), y: centre.y - polar.radiusPx * Math.sin(a) };
}
