/**
 * Fresnel number from which a round hole is said to be in the near field: the first dark ring of even light is then seen
 * to be filled, its floor 6.6 % of the bright ring beside it (computed; the floor grows with the square of the Fresnel
 * number, 0.3 % at 0.02, 1.1 % at 0.04). Where to draw the line is convention; models must hold on both sides of it.
 */
export const NEAR_FIELD_FRESNEL_NUMBER = 0.1;

/**
 * Fresnel number a²/λ · (1/z + 1/R) of a hole of diameter (or a slit of width) 2a: well under 1 the pattern is that of the far field, about 1
 * the transition, far over 1 the shadow of the rim. Born & Wolf, 8.8.1 (from memory): Lommel's u is 2π times this.
 *
 * @param sourceDistanceMm distance of a point source before the aperture; null for a plane wave
 */
export function fresnelNumber(
  sizeUm: number,
  wavelengthNm: number,
  distanceMm: number,
  sourceDistanceMm: number | null = null,
): number {
  const radiusMm = sizeUm / 2000;
  const curvature = 1 / distanceMm + (sourceDistanceMm === null ? 0 : 1 / sourceDistanceMm);
  return ((radiusMm * radiusMm) / (wavelengthNm * 1e-6)) * curvature;
}
