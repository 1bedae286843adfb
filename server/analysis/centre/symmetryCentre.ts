import { transform2d } from '../fft/transform2d';
import type { PlaneCentre } from './gradientCentre';
import type { ReducedPlane } from './reducePlane';

/** Least overlap of the plane with itself turned about the centre, as part of the plane. */
const LEAST_OVERLAP = 0.1;

/**
 * The point about which the plane, turned by half a turn, agrees best with itself: Σ I(x) · I(2c − x) at its largest,
 * found for all c at once as an autoconvolution by FFT. A masked core, dust and single spots hardly move it. It needs
 * both sides of the pattern in the frame.
 * @returns reduced-plane pixels, or null when nothing is symmetric
 */
export function symmetryCentre({ widthPx, heightPx, level, good }: ReducedPlane): PlaneCentre | null {
  let size = 2;
  while (size < 2 * Math.max(widthPx, heightPx)) size *= 2;
  const sorted = Float64Array.from(level.filter((_, i) => good[i] === 1)).sort();
  if (sorted.length < 64) return null;
  const base = sorted[sorted.length >> 1];
  const top = Math.max(1e-9, sorted[Math.floor(sorted.length * 0.995)] - base);
  const data = new Float64Array(2 * size * size);
  const area = new Float64Array(2 * size * size);
  for (let y = 0; y < heightPx; y++) {
    for (let x = 0; x < widthPx; x++) {
      const i = y * widthPx + x;
      if (good[i] === 0) continue;
      // Compressed, so that rings count beside the core and single spots do not rule.
      const value = (level[i] - base) / top;
      data[2 * (y * size + x)] = Math.sign(value) * Math.sqrt(Math.min(1, Math.abs(value)));
      area[2 * (y * size + x)] = 1;
    }
  }
  for (const plane of [data, area]) {
    transform2d(plane, size, false);
    for (let i = 0; i < plane.length; i += 2) {
      const re = plane[i];
      const im = plane[i + 1];
      plane[i] = re * re - im * im;
      plane[i + 1] = 2 * re * im;
    }
    transform2d(plane, size, true);
  }
  let best = 0;
  let at = -1;
  const least = LEAST_OVERLAP * widthPx * heightPx;
  for (let i = 0; i < size * size; i++) {
    if (area[2 * i] < least) continue;
    if (data[2 * i] > best) {
      best = data[2 * i];
      at = i;
    }
  }
  return at < 0 ? null : { x: (at % size) / 2, y: Math.floor(at / size) / 2 };
}
