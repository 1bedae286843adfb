import { bottom, right, type Box } from '@/components/viewer/place';
import type { ComparePoint } from './CompareChart';
import { linearScale } from './scales';

/** Largest x and y of the plot; both axes begin at zero. */
export interface Extent {
  x: number;
  y: number;
}

export function compareExtent(points: readonly ComparePoint[], edgeY: number | null): Extent {
  const x = Math.max(1e-12, ...points.map((p) => p.x)) * 1.1;
  const y = edgeY !== null ? edgeY * 1.16 : Math.max(1e-12, ...points.map((p) => p.y)) * 1.08;
  return { x, y };
}

/** The plot in a drawing of this size; labels stand around it. The strip below uses the same left and right. */
export function comparePlot(width: number, height: number): Box {
  const left = width < 500 ? 46 : 64;
  return { left, top: 32, width: width - left - (width < 500 ? 16 : 24), height: height - 32 - 52 };
}

/** The measurement of the point nearest to a touch, within a fingertip. */
export function nearestPoint(
  points: readonly ComparePoint[],
  extent: Extent,
  plot: Box,
  px: number,
  py: number,
): string | null {
  const x = linearScale(0, extent.x, plot.left, right(plot));
  const y = linearScale(0, extent.y, bottom(plot), plot.top);
  let best: string | null = null;
  let least = 26;
  for (const p of points) {
    const off = Math.hypot(x(p.x) - px, y(p.y) - py);
    if (off <= least) {
      least = off;
      best = p.id;
    }
  }
  return best;
}
