/**
 * Inverse of the sRGB transfer function, IEC 61966-2-1: c ≤ 0.04045 → c / 12.92, else ((c + 0.055) / 1.055)^2.4.
 * The "≤" is the standard's (looked up). Negative values stay linear; NaN stays NaN.
 * @param encoded 0 to 1
 */
export function srgbToLinear(encoded: number): number {
  return encoded <= 0.04045 ? encoded / 12.92 : ((encoded + 0.055) / 1.055) ** 2.4;
}

/** Linear counts on the same scale as the stored ones: 0 stays 0 and white stays white. */
export function lineariseSrgb(data: Uint16Array | Float32Array, whiteCount: number): Float32Array {
  const table = new Float32Array(Math.ceil(whiteCount) + 1);
  for (let c = 0; c < table.length; c++) table[c] = srgbToLinear(c / whiteCount) * whiteCount;
  const out = new Float32Array(data.length);
  for (let i = 0; i < data.length; i++) out[i] = table[Math.min(table.length - 1, Math.max(0, Math.round(data[i])))];
  return out;
}
