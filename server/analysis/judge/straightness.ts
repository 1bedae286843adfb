import type { ReducedPlane } from '../centre/reducePlane';

/**
 * How much the gradients of the plane share one direction, 0 to 1: coherence of the mean structure tensor (from memory,
 * standard image analysis). Straight fringes (slit, wire, edge) come near 1; rings seen whole, speckle and noise near 0.
 */
export function straightness({ widthPx, heightPx, level, good }: ReducedPlane): number {
  let xx = 0;
  let xy = 0;
  let yy = 0;
  for (let y = 0; y + 1 < heightPx; y++) {
    for (let x = 0; x + 1 < widthPx; x++) {
      const i = y * widthPx + x;
      if (!(good[i] && good[i + 1] && good[i + widthPx] && good[i + widthPx + 1])) continue;
      const a = level[i + widthPx + 1] - level[i];
      const b = level[i + widthPx] - level[i + 1];
      const gx = (a - b) / 2;
      const gy = (a + b) / 2;
      // Each direction counts once, however steep: a bright core must not rule.
      const square = gx * gx + gy * gy;
      if (square < 12) continue;
      xx += (gx * gx) / square;
      xy += (gx * gy) / square;
      yy += (gy * gy) / square;
    }
  }
  const sum = xx + yy;
  return sum > 0 ? Math.hypot(xx - yy, 2 * xy) / sum : 0;
}
