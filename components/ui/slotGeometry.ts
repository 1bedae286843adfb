/** Limits of a judgement in its own unit; null: there is no wall on that side. */
export interface SlotLimits {
  lower: number | null;
  upper: number | null;
}

export interface SlotScale {
  min: number;
  max: number;
  /** px from the left; held at the ends. */
  x: (value: number) => number;
  /** True where the mark had to be held at an end. */
  pinned: (value: number) => boolean;
}

/**
 * Scale of a slot: the gap and a quarter of it on either side.
 * With one wall only, `values` (sizes and their uncertainty) say how far the open side must reach.
 */
export function slotScale({ lower, upper }: SlotLimits, widthPx: number, values: readonly number[] = []): SlotScale {
  const [min, max] = slotRange(lower, upper, values);
  const x = (value: number) => ((Math.min(max, Math.max(min, value)) - min) / (max - min)) * widthPx;
  return { min, max, x, pinned: (value) => value < min || value > max };
}

function slotRange(lower: number | null, upper: number | null, values: readonly number[]): [number, number] {
  if (lower !== null && upper !== null) {
    const gap = upper - lower;
    if (gap > 0) return [lower - 0.25 * gap, upper + 0.25 * gap];
    const reach = Math.max(...values.map((v) => Math.abs(v - lower)), Math.abs(lower) * 1e-3, 1e-9) * 1.25;
    return [lower - reach, lower + reach];
  }
  const all = [...values, ...(lower === null ? [] : [lower]), ...(upper === null ? [] : [upper])];
  if (all.length === 0) return [0, 1];
  const low = Math.min(...all);
  const high = Math.max(...all);
  const reach = Math.max((high - low) * 0.25, Math.abs(high) * 1e-3, 1e-9);
  return [low - reach, high + reach];
}

/** Where a value lies: between the walls, across one within its uncertainty, or beyond. */
export type SlotPlace = 'inside' | 'across' | 'below' | 'above';

/** Where a value with its expanded uncertainty lies between two walls. A plain reading of the gap, not a decision rule. */
export function slotPlace({ lower, upper }: SlotLimits, value: number, expandedUncertainty: number): SlotPlace {
  if (lower !== null && value + expandedUncertainty < lower) return 'below';
  if (upper !== null && value - expandedUncertainty > upper) return 'above';
  const clear =
    (lower === null || value - expandedUncertainty >= lower) &&
    (upper === null || value + expandedUncertainty <= upper);
  return clear ? 'inside' : 'across';
}
