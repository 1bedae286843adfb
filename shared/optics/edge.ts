import { fresnelIntegrals } from './fresnelIntegrals';

/**
 * Irradiance behind a straight edge over that of the incident wave: ½{[C(w) + ½]² + [S(w) + ½]²}, w above 0 on the lit
 * side. Kielkopf, optics manual of the University of Louisville, eqs (91) and (92) (looked up); Born & Wolf, 8.7.3 (from
 * memory).
 */
export function edgeIrradiance(w: number): number {
  const { c, s } = fresnelIntegrals(w);
  return ((c + 0.5) ** 2 + (s + 0.5) ** 2) / 2;
}

/** Derivative of `edgeIrradiance` by w. */
export function edgeDerivative(w: number): number {
  const { c, s } = fresnelIntegrals(w);
  const angle = (Math.PI / 2) * w * w;
  return (c + 0.5) * Math.cos(angle) + (s + 0.5) * Math.sin(angle);
}

/**
 * Length on the sensor of one unit of the Fresnel variable, √(λ z (z + R) / 2R), in µm.
 *
 * @param sourceDistanceMm distance R of a point source before the edge; null for a plane wave
 */
export function edgeFringeScaleUm(
  wavelengthNm: number,
  distanceMm: number,
  sourceDistanceMm: number | null = null,
): number {
  const magnification = sourceDistanceMm === null ? 1 : (distanceMm + sourceDistanceMm) / sourceDistanceMm;
  return Math.sqrt((wavelengthNm * 1e-3 * (distanceMm * 1e3) * magnification) / 2);
}
