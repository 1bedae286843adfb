import type { NoiseModel } from '../calibrate/noiseModel';
import { roundedAt, type Rounded } from '../calibrate/rounding';
import type { Cells } from './cells';
import type { CellModel } from './fitCells';

/** Variances at black that are tried, counts². */
const FLOORS = Array.from({ length: 12 }, (_, k) => 0.006 * 1.45 ** k);
/** Gains that are tried about the frame's own estimate, where no gain is on record. */
const GAINS = [0.7, 0.85, 1, 1.18, 1.4];

/** Steps of the refinement. */
const FINER = [1.09, 1.04, 1.02];

/**
 * The noise before rounding that explains best how the counts of each cell scatter about the model: maximum likelihood
 * over the cells' means and mean squares, on a grid. Where read noise and gain are on record, these are taken.
 */
export function roundingNoise(
  cells: Cells,
  { model, blur }: CellModel,
  noise: NoiseModel,
  blackCount: number,
): NonNullable<NoiseModel['rounding']> {
  if (noise.recordedFloor !== undefined) return { blackCount, floor: noise.recordedFloor, perCount: noise.perCount };
  const expected: Rounded = { offset: 0, slope: 1, variance: 1 };
  const costOf = (floor: number, perCount: number): number => {
    let cost = 0;
    for (let c = 0; c < cells.length; c++) {
      const above = model[c] > 0 ? model[c] : 0;
      roundedAt(model[c] + blackCount, floor + perCount * above + blur[c], expected);
      const variance = expected.variance + noise.perSquare * above * above;
      const off = cells.mean[c] - model[c] - expected.offset;
      // A level that is off by a tenth of a count must not rule through a vanishing variance.
      const square = off * off < 0.01 ? off * off : 0.01;
      cost += cells.pixels[c] * (Math.log(variance) + (cells.scatter[c] + square) / variance);
    }
    return cost;
  };
  let best = { floor: FLOORS[0], perCount: noise.perCount };
  let bestCost = Infinity;
  const search = (floors: number[], gains: number[]) => {
    for (const perCount of gains) {
      for (const floor of floors) {
        const cost = costOf(floor, perCount);
        if (cost >= bestCost) continue;
        bestCost = cost;
        best = { floor, perCount };
      }
    }
  };
  const gains = noise.source === 'record' ? [1] : GAINS;
  search(
    FLOORS,
    gains.map((gain) => gain * noise.perCount),
  );
  for (const step of FINER) {
    const around = (value: number) => [value / step, value, value * step];
    search(around(best.floor), gains.length > 1 ? around(best.perCount) : [best.perCount]);
  }
  return { blackCount, ...best };
}
