import type { CalibratedFrame } from '../calibrate/CalibratedFrame';

/** Sectors around the full turn. */
export const SECTORS = 64;

/**
 * The frame gathered in small cells about a point: rings of at most a pixel or two, cut into sectors. A fit over the
 * cells is a fit over all pixels, because the pattern hardly curves within a cell and the little it does is known from
 * the spread of the radii.
 */
export interface Cells {
  centreX: number;
  centreY: number;
  ringWidthPx: number;
  /** Cells with pixels in them. */
  length: number;
  /** Mean place of the cell about the centre, pixels: mean radius in the mean direction. */
  x: Float64Array;
  y: Float64Array;
  /** Variance of the radius within the cell, pixels². */
  radiusVariance: Float64Array;
  pixels: Float64Array;
  /** Mean counts. */
  mean: Float64Array;
  /** Mean square of the counts about their mean. */
  scatter: Float64Array;
  ring: Int32Array;
}

/** Tells whether a pixel at a radius takes part, by what is expected there. */
export interface PixelTest {
  /** Expected counts, lowest and highest accepted, by radius in steps of `stepPx`. */
  stepPx: number;
  lowest: Float64Array;
  highest: Float64Array;
}

/** Largest radius of any pixel about a point. */
export function furthestPx(widthPx: number, heightPx: number, centreX: number, centreY: number): number {
  return Math.hypot(Math.max(centreX, widthPx - 1 - centreX), Math.max(centreY, heightPx - 1 - centreY));
}

/**
 * @param largestPx pixels beyond this radius are left out
 * @param test leaves out single pixels that do not fit what is expected at their radius
 */
export function gatherCells(
  frame: CalibratedFrame,
  centreX: number,
  centreY: number,
  ringWidthPx: number,
  largestPx: number,
  test: PixelTest | null,
): Cells {
  const { widthPx, heightPx, counts, mask } = frame;
  const rings = Math.ceil(Math.min(largestPx, furthestPx(widthPx, heightPx, centreX, centreY)) / ringWidthPx) + 1;
  const total = rings * SECTORS;
  const n = new Float64Array(total);
  const sum = new Float64Array(total);
  const squares = new Float64Array(total);
  const radii = new Float64Array(total);
  const radiiSquares = new Float64Array(total);
  const sumX = new Float64Array(total);
  const sumY = new Float64Array(total);
  const limit = Math.min(largestPx, (rings - 1) * ringWidthPx);
  const quarter = SECTORS / 4;
  const { sqrt } = Math;
  for (let py = 0; py < heightPx; py++) {
    const dy = py - centreY;
    const dy2 = dy * dy;
    if (dy2 > limit * limit) continue;
    const ay = dy < 0 ? -dy : dy;
    for (let px = 0, i = py * widthPx; px < widthPx; px++, i++) {
      if (mask[i] !== 0) continue;
      const dx = px - centreX;
      const radius = sqrt(dx * dx + dy2);
      if (radius > limit) continue;
      const value = counts[i];
      if (test !== null) {
        const at = (radius / test.stepPx) | 0;
        if (value < test.lowest[at] || value > test.highest[at]) continue;
      }
      // Sectors of the square instead of the circle: monotone in the angle, without a transcendental function.
      const ax = dx < 0 ? -dx : dx;
      const turn = ax + ay === 0 ? 0 : ay / (ax + ay);
      const within = dx >= 0 === dy >= 0 ? turn : 1 - turn;
      const quadrant = dy >= 0 ? (dx >= 0 ? 0 : 1) : dx < 0 ? 2 : 3;
      let sector = ((quadrant + within) * quarter) | 0;
      if (sector >= SECTORS) sector = SECTORS - 1;
      const cell = ((radius / ringWidthPx) | 0) * SECTORS + sector;
      n[cell]++;
      sum[cell] += value;
      squares[cell] += value * value;
      radii[cell] += radius;
      radiiSquares[cell] += radius * radius;
      sumX[cell] += dx;
      sumY[cell] += dy;
    }
  }
  let length = 0;
  for (let c = 0; c < total; c++) if (n[c] > 0) length++;
  const cells: Cells = {
    centreX,
    centreY,
    ringWidthPx,
    length,
    x: new Float64Array(length),
    y: new Float64Array(length),
    radiusVariance: new Float64Array(length),
    pixels: new Float64Array(length),
    mean: new Float64Array(length),
    scatter: new Float64Array(length),
    ring: new Int32Array(length),
  };
  let k = 0;
  for (let c = 0; c < total; c++) {
    const count = n[c];
    if (count === 0) continue;
    const meanRadius = radii[c] / count;
    const direction = Math.hypot(sumX[c], sumY[c]);
    const stretch = direction > 0 ? meanRadius / direction : 0;
    cells.x[k] = sumX[c] * stretch;
    cells.y[k] = sumY[c] * stretch;
    cells.radiusVariance[k] = Math.max(0, radiiSquares[c] / count - meanRadius * meanRadius);
    cells.pixels[k] = count;
    cells.mean[k] = sum[c] / count;
    cells.scatter[k] = Math.max(0, squares[c] / count - cells.mean[k] * cells.mean[k]);
    cells.ring[k] = Math.floor(c / SECTORS);
    k++;
  }
  return cells;
}
