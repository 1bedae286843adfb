import type { CalibratedFrame } from '../calibrate/CalibratedFrame';
import { gradientCentre, type PlaneCentre } from './gradientCentre';
import { reducePlane, type ReducedPlane } from './reducePlane';
import { ringScore } from './ringScore';
import { symmetryCentre } from './symmetryCentre';

export interface FoundCentre {
  /** Full-frame pixels. */
  x: number;
  y: number;
  /** Part of the stabilised frame's variation that rings about the centre explain, 0 to 1. */
  score: number;
}

/** Further than this many frame sides beside the frame no centre is looked for. */
const FURTHEST = 1.5;

/**
 * First centres by two ways that fail differently: half-turn symmetry and meeting gradients, each improved by how well
 * rings about it explain the frame. Best first; the brightest pixel is never asked.
 */
export function findCentre(frame: CalibratedFrame): FoundCentre[] {
  const plane = reducePlane(frame);
  const symmetric = symmetryCentre(plane);
  const starts = [symmetric, gradientCentre(plane), symmetric ? gradientCentre(plane, symmetric) : null];
  const found: FoundCentre[] = [];
  for (const start of starts) {
    if (start === null) continue;
    const { x, y, score } = climb(plane, start);
    if (Math.abs(x / plane.widthPx - 0.5) > FURTHEST || Math.abs(y / plane.heightPx - 0.5) > FURTHEST) continue;
    const offset = (plane.factor - 1) / 2;
    const centre = { x: x * plane.factor + offset, y: y * plane.factor + offset, score };
    const same = found.find((f) => Math.hypot(f.x - centre.x, f.y - centre.y) < plane.factor);
    if (same === undefined) found.push(centre);
  }
  return found.sort((a, b) => b.score - a.score);
}

/** Compass search on the ring score. */
function climb(plane: ReducedPlane, start: PlaneCentre): PlaneCentre & { score: number } {
  let { x, y } = start;
  let score = ringScore(plane, x, y);
  let step = 3;
  for (let round = 0; round < 60 && step > 0.06; round++) {
    let better = false;
    for (const [dx, dy] of [
      [step, 0],
      [-step, 0],
      [0, step],
      [0, -step],
    ]) {
      const tried = ringScore(plane, x + dx, y + dy);
      if (tried > score) {
        score = tried;
        x += dx;
        y += dy;
        better = true;
        break;
      }
    }
    if (!better) step /= 2;
  }
  return { x, y, score };
}
