/** A straight scale: value → px. */
export interface Scale {
  (value: number): number;
}

export function linearScale(fromValue: number, toValue: number, fromPx: number, toPx: number): Scale {
  const slope = (toPx - fromPx) / (toValue - fromValue);
  return (value) => fromPx + (value - fromValue) * slope;
}

/** Values at or below zero land where the smallest value does. */
export function logScale(fromValue: number, toValue: number, fromPx: number, toPx: number): Scale {
  const slope = (toPx - fromPx) / (Math.log10(toValue) - Math.log10(fromValue));
  return (value) => fromPx + (Math.log10(Math.max(value, fromValue)) - Math.log10(fromValue)) * slope;
}

/** A step of 1, 2 or 5 times a power of ten that leaves at least `minGapPx` between marks. */
export function niceStep(pxPerUnit: number, minGapPx: number): number {
  const least = minGapPx / pxPerUnit;
  const power = 10 ** Math.floor(Math.log10(least));
  for (const m of [1, 2, 5]) if (m * power >= least * (1 - 1e-9)) return m * power;
  return 10 * power;
}

/** Multiples of `step` from `from` to `to`, both included; zero is never negative. */
export function marks(from: number, to: number, step: number): number[] {
  const out: number[] = [];
  for (let i = Math.ceil(from / step - 1e-9); i * step <= to + 1e-9 * step; i += 1) out.push(i * step + 0);
  return out;
}

/** Decimals that a mark at a multiple of `step` needs. */
export function decimalsOf(step: number): number {
  return Math.max(0, -Math.floor(Math.log10(step) + 1e-9));
}

/** A number for an axis, with a true minus. */
export function axisText(value: number, decimals: number): string {
  const text = Math.abs(value).toFixed(decimals);
  return value < 0 && Number(text) !== 0 ? `−${text}` : text;
}

/** Powers of ten within a range. */
export function decades(from: number, to: number): number[] {
  const out: number[] = [];
  for (let p = Math.ceil(Math.log10(from) - 1e-9); p <= Math.log10(to) + 1e-9; p += 1) out.push(10 ** p);
  return out;
}
