/**
 * Secondary maxima of the slit pattern, tan β = β, in order; minima lie at β = mπ. Born & Wolf, table 8.1 (from memory;
 * computed).
 */
export const SLIT_BRIGHT_BETA: readonly number[] = [4.493409458, 7.725251837, 10.90412166, 14.06619391, 17.22075527];

/**
 * Irradiance of an evenly lit slit far away over that on the axis: (sin β/β)², β = π b sin θ / λ. Outside the direct beam the
 * pattern of an opaque strip of the same width is the same (Babinet). Born & Wolf, 8.5.1 (from memory).
 */
export function slitIntensity(beta: number): number {
  if (Math.abs(beta) < 1e-4) return 1 - (beta * beta) / 3;
  const amplitude = Math.sin(beta) / beta;
  return amplitude * amplitude;
}

/** Derivative of `slitIntensity` by β. */
export function slitDerivative(beta: number): number {
  if (Math.abs(beta) < 1e-2) return (-2 * beta) / 3 + (8 * beta ** 3) / 45 - (2 * beta ** 5) / 105;
  const amplitude = Math.sin(beta) / beta;
  return (2 * amplitude * (Math.cos(beta) - amplitude)) / beta;
}
