import type { FramePlane } from '@/shared/optics/framePlane';

export const tones = ['linear', 'root', 'log'] as const;
export type Tone = (typeof tones)[number];

/** Counts drawn as no light and as full light. */
export interface Levels {
  low: number;
  high: number;
}

/** How many pixels have each count; index is the count, length 65 536. */
export function countTable(plane: FramePlane): Uint32Array {
  const table = new Uint32Array(65536);
  for (const count of plane.data) table[count]! += 1;
  return table;
}

/** Smallest count that at least the part `fraction` (0 to 1) of the pixels does not exceed. */
export function countAt(table: Uint32Array, fraction: number): number {
  let total = 0;
  for (const n of table) total += n;
  const wanted = fraction * total;
  let sum = 0;
  for (let count = 0; count < table.length; count += 1) {
    sum += table[count]!;
    if (sum >= wanted && sum > 0) return count;
  }
  return table.length - 1;
}

/** Part of the camera's range that the fitting levels span at least: a frame without light looks dark. */
const LEAST_SPAN = 0.03;
/** Most of the camera's range that is taken for light that is there everywhere. */
const MOST_BACKGROUND = 0.03;

/**
 * From the background (the darkest tenth of the pixels, black at least) to the brightest but one in ten thousand
 * pixels; never narrower than 16 counts.
 */
export function fittingLevels(table: Uint32Array, blackCount: number, whiteCount: number): Levels {
  const black = Math.round(Math.min(blackCount, whiteCount));
  const range = Math.max(0, whiteCount - black);
  const low = Math.max(black, Math.min(countAt(table, 0.1), black + Math.round(MOST_BACKGROUND * range)));
  const least = low + Math.max(16, Math.round(LEAST_SPAN * range));
  const high = Math.min(Math.max(countAt(table, 0.9999), least), Math.max(whiteCount, low + 16));
  return { low, high };
}

/** Tone 0 to 1 of a count. `floorCounts` is where the logarithm turns over: about the noise of a dark pixel. */
export function toneOf(count: number, levels: Levels, tone: Tone, floorCounts: number): number {
  const range = levels.high - levels.low;
  const above = Math.min(range, Math.max(0, count - levels.low));
  if (tone === 'linear') return above / range;
  if (tone === 'root') return Math.sqrt(above / range);
  return Math.log1p(above / floorCounts) / Math.log1p(range / floorCounts);
}

/** The count whose tone is t, 0 to 1: the inverse of `toneOf`. */
export function countOfTone(t: number, levels: Levels, tone: Tone, floorCounts: number): number {
  const range = levels.high - levels.low;
  if (tone === 'linear') return levels.low + t * range;
  if (tone === 'root') return levels.low + t * t * range;
  return levels.low + floorCounts * Math.expm1(t * Math.log1p(range / floorCounts));
}

/** Bars of the histogram over the whole range in log tone; heights 0 to 1, root of the number so that few show too. */
export function histogramBars(table: Uint32Array, whole: Levels, floorCounts: number, bars: number): number[] {
  const sums = new Array<number>(bars).fill(0);
  for (let count = 0; count < table.length; count += 1) {
    const n = table[count]!;
    if (n === 0) continue;
    const bar = Math.min(bars - 1, Math.floor(toneOf(count, whole, 'log', floorCounts) * bars));
    sums[bar]! += n;
  }
  const top = Math.max(1, ...sums);
  return sums.map((n) => Math.sqrt(n / top));
}

/** Moves one handle; the two keep at least 8 counts between them and stay within the whole range. */
export function moveLevel(levels: Levels, which: keyof Levels, count: number, whole: Levels): Levels {
  const gap = Math.min(8, whole.high - whole.low);
  const rounded = Math.round(count);
  return which === 'low'
    ? { ...levels, low: Math.min(Math.max(rounded, whole.low), levels.high - gap) }
    : { ...levels, high: Math.max(Math.min(rounded, whole.high), levels.low + gap) };
}

/**
 * Noise of a dark pixel in counts, from the pixels below black: half of a symmetric spread. At least 1; 2 where too few
 * pixels lie below black to tell.
 */
export function noiseFloor(table: Uint32Array, blackCount: number): number {
  let pixels = 0;
  let squares = 0;
  for (let count = 0; count < Math.min(blackCount, table.length); count += 1) {
    const n = table[count]!;
    pixels += n;
    squares += n * (count - blackCount) ** 2;
  }
  return pixels < 100 ? 2 : Math.max(1, Math.sqrt(squares / pixels));
}
