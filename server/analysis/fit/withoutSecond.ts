import type { NoiseModel } from '../calibrate/noiseModel';
import type { Rounded } from '../calibrate/rounding';
import { secondPattern, type SecondPattern } from '../judge/secondPattern';
import type { Cells } from './cells';
import { cellModel, expectedInCell, fitCells, type CellFit, type ParameterName } from './fitCells';
import type { PinholeOptics } from './PinholeOptics';

/** A second pattern weaker than this part of the first, or that explains less of the misfit, is left alone. */
const LEAST_RELATIVE = 0.003;
const LEAST_EXPLAINED = 0.5;
/** Stronger than this it is no reflection to be taken off, but a frame of two patterns. */
const MOST_RELATIVE = 0.2;
const ROUNDS = 4;
/** Part of λz/D about the second centre within which it is fitted. */
const NEAR = 1.1;
const PLACE: ParameterName[] = ['x', 'y', 'amplitude', 'background'];

export interface Separated {
  fit: CellFit;
  /** With the second pattern taken off the means. */
  cells: Cells;
  second: SecondPattern | null;
}

/**
 * Takes a weak copy of the pattern (a reflection) off the frame: its place and strength are fitted to what the first
 * pattern leaves, and the first is fitted again to what the copy leaves, in turn.
 */
export function withoutSecond(
  cells: Cells,
  optics: PinholeOptics,
  noise: NoiseModel,
  start: CellFit,
  fringePx: number,
): Separated {
  const rounded: Rounded = { offset: 0, slope: 1, variance: 1 };
  const smooth = { ...noise, rounding: undefined };
  let fit = start;
  let clean = cells;
  let second: SecondPattern | null = null;
  for (let round = 0; round < ROUNDS; round++) {
    const evaluated = cellModel(cells, optics, fit.values, false);
    const expected = evaluated.model.map(
      (level, c) => level + expectedInCell(noise, level, evaluated.blur[c], rounded).offset,
    );
    if (second === null) {
      second = secondPattern({ cells, evaluated: { model: expected }, fit, fringePx }, noise);
      if (
        second === null ||
        second.explained < LEAST_EXPLAINED ||
        second.relative < LEAST_RELATIVE ||
        second.relative > MOST_RELATIVE
      ) {
        return { fit: start, cells, second };
      }
    }
    const left = { ...cells, mean: cells.mean.map((mean, c) => mean - expected[c]) };
    const near = nearby(left, second, NEAR * fringePx);
    const bare = { ...fit.values, background: 0, slopeX: 0, slopeY: 0 };
    const copy = fitCells(
      near,
      optics,
      smooth,
      { ...bare, x: second.x, y: second.y, amplitude: fit.values.amplitude * second.relative },
      PLACE,
    );
    const { x, y, amplitude } = copy.values;
    if (!(amplitude > 0) || Math.hypot(x - second.x, y - second.y) > fringePx) return { fit: start, cells, second };
    second = { x, y, relative: amplitude / fit.values.amplitude, explained: second.explained };
    const { model } = cellModel(cells, optics, { ...bare, x, y, amplitude }, false);
    clean = { ...cells, mean: cells.mean.map((mean, c) => mean - model[c]) };
    fit = fitCells(clean, optics, noise, fit.values, fit.free);
  }
  return { fit, cells: clean, second };
}

function nearby(cells: Cells, at: { x: number; y: number }, reachPx: number): Cells {
  const kept = Array.from({ length: cells.length }, (_, c) => c).filter(
    (c) => Math.hypot(cells.x[c] + cells.centreX - at.x, cells.y[c] + cells.centreY - at.y) < reachPx,
  );
  const pick = (values: Float64Array) => Float64Array.from(kept, (c) => values[c]);
  return {
    ...cells,
    length: kept.length,
    x: pick(cells.x),
    y: pick(cells.y),
    radiusVariance: pick(cells.radiusVariance),
    pixels: pick(cells.pixels),
    mean: pick(cells.mean),
    scatter: pick(cells.scatter),
    ring: Int32Array.from(kept, (c) => cells.ring[c]),
  };
}
