import type { ReducedPlane } from './reducePlane';

/**
 * How much of the plane's variation is explained by the distance from a point: 1 − variance within rings over the whole
 * variance, 0 to 1. Rings are one reduced pixel wide.
 */
export function ringScore({ widthPx, heightPx, level, good }: ReducedPlane, cx: number, cy: number): number {
  const reach =
    Math.ceil(
      Math.hypot(Math.max(Math.abs(cx), Math.abs(widthPx - cx)), Math.max(Math.abs(cy), Math.abs(heightPx - cy))),
    ) + 2;
  const n = new Float64Array(reach);
  const sum = new Float64Array(reach);
  const squares = new Float64Array(reach);
  const { sqrt } = Math;
  let total = 0;
  let all = 0;
  let allSquares = 0;
  for (let y = 0; y < heightPx; y++) {
    const dy2 = (y - cy) * (y - cy);
    for (let x = 0; x < widthPx; x++) {
      const i = y * widthPx + x;
      if (good[i] === 0) continue;
      const value = level[i];
      const place = sqrt((x - cx) * (x - cx) + dy2);
      const bin = place | 0;
      const part = place - bin;
      // Shared between two rings, so that the score changes smoothly with the point.
      n[bin] += 1 - part;
      sum[bin] += (1 - part) * value;
      squares[bin] += (1 - part) * value * value;
      n[bin + 1] += part;
      sum[bin + 1] += part * value;
      squares[bin + 1] += part * value * value;
      total++;
      all += value;
      allSquares += value * value;
    }
  }
  let within = 0;
  for (let b = 0; b < reach; b++) {
    if (n[b] > 0) within += (squares[b] - (sum[b] * sum[b]) / n[b]) * (n[b] > 2 ? n[b] / (n[b] - 1) : 2);
  }
  const whole = allSquares - (all * all) / total;
  return whole > 0 ? 1 - within / whole : 0;
}
