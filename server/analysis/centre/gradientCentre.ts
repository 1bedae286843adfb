import type { ReducedPlane } from './reducePlane';

export interface PlaneCentre {
  x: number;
  y: number;
}

interface Line {
  x: number;
  y: number;
  gx: number;
  gy: number;
  weight: number;
}

const ROUNDS = 25;

/**
 * Where the lines along the level's gradients meet: the centre of any pattern of rings, seen whole or in arcs, in the
 * frame or beside it. Idea: Parthasarathy, Nat. Methods 9, 724 (2012) (looked up by description). Each line counts
 * by the inverse square of its expected distance error, that is gradient over distance, and lines that miss the centre
 * by far lose weight.
 * @param start where to begin; the mean of the bright part when left out
 * @returns reduced-plane pixels, or null without gradients
 */
export function gradientCentre(plane: ReducedPlane, start?: PlaneCentre): PlaneCentre | null {
  const lines = gradientLines(plane);
  if (lines.length < 12) return null;
  let x = start?.x ?? 0;
  let y = start?.y ?? 0;
  if (start === undefined) {
    let sum = 0;
    for (const line of lines) {
      sum += line.weight;
      x += line.weight * line.x;
      y += line.weight * line.y;
    }
    x /= sum;
    y /= sum;
  }
  let scale = Math.max(plane.widthPx, plane.heightPx) / 4;
  for (let round = 0; round < ROUNDS; round++) {
    let xx = 0;
    let xy = 0;
    let yy = 0;
    let bx = 0;
    let by = 0;
    let misses = 0;
    let weights = 0;
    for (const line of lines) {
      const dx = line.x - x;
      const dy = line.y - y;
      // Distance of the line from the centre, along its normal.
      const miss = dx * -line.gy + dy * line.gx;
      const far = dx * dx + dy * dy + 4;
      const w = line.weight / far / (1 + (miss * miss) / (scale * scale));
      xx += w * line.gy * line.gy;
      xy -= w * line.gx * line.gy;
      yy += w * line.gx * line.gx;
      const offset = line.x * -line.gy + line.y * line.gx;
      bx += w * -line.gy * offset;
      by += w * line.gx * offset;
      misses += w * Math.min(miss * miss, scale * scale);
      weights += w;
    }
    const determinant = xx * yy - xy * xy;
    if (!(determinant > 1e-12 * xx * yy)) return null;
    const nx = (yy * bx - xy * by) / determinant;
    const ny = (xx * by - xy * bx) / determinant;
    const moved = Math.hypot(nx - x, ny - y);
    x = nx;
    y = ny;
    scale = Math.max(1, 2 * Math.sqrt(misses / weights), scale * 0.6);
    if (moved < 1e-3 && round > 6) break;
  }
  return Number.isFinite(x + y) ? { x, y } : null;
}

/** Gradients over 2 × 2 blocks that stand out of the noise; directions are unit vectors. */
function gradientLines({ widthPx, heightPx, level, good }: ReducedPlane): Line[] {
  const lines: Line[] = [];
  for (let y = 0; y + 1 < heightPx; y++) {
    for (let x = 0; x + 1 < widthPx; x++) {
      const i = y * widthPx + x;
      if (!(good[i] && good[i + 1] && good[i + widthPx] && good[i + widthPx + 1])) continue;
      const a = level[i + widthPx + 1] - level[i];
      const b = level[i + widthPx] - level[i + 1];
      const gx = (a - b) / 2;
      const gy = (a + b) / 2;
      const square = gx * gx + gy * gy;
      // Noise alone gives 2 (each level has unit variance).
      if (square < 12) continue;
      const length = Math.sqrt(square);
      lines.push({ x: x + 0.5, y: y + 0.5, gx: gx / length, gy: gy / length, weight: square - 2 });
    }
  }
  return lines;
}
