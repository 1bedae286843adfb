/**
 * Distance that counts when a cover glass stands before the sensitive plane: a plane plate of thickness t and index n brings
 * the pattern nearer by t(1 − 1/n) (paraxial refraction; common practice). Lengths in mm.
 *
 * @param distanceMm from the aperture to the sensitive plane
 */
export function opticalDistanceMm(
  distanceMm: number,
  coverGlassMm?: number | null,
  coverGlassIndex?: number | null,
): number {
  if (typeof coverGlassMm !== 'number' || typeof coverGlassIndex !== 'number') return distanceMm;
  return distanceMm - coverGlassMm * (1 - 1 / coverGlassIndex);
}

/** sin θ of a place on a flat sensor square to the axis: r / √(r² + z²), exact. */
export function sinThetaOfRadius(radiusMm: number, distanceMm: number): number {
  return radiusMm / Math.hypot(radiusMm, distanceMm);
}

/** Radius on a flat sensor square to the axis: z sin θ / √(1 − sin²θ), exact; infinite for sin θ of 1 and more. */
export function radiusOfSinTheta(sinTheta: number, distanceMm: number): number {
  const cosine = Math.sqrt(Math.max(0, (1 - sinTheta) * (1 + sinTheta)));
  return cosine === 0 ? Infinity : (distanceMm * sinTheta) / cosine;
}

/** v = π D sin θ / λ of a place on the sensor, for a hole of diameter `sizeUm`. */
export function reducedRadius(radiusMm: number, sizeUm: number, wavelengthNm: number, distanceMm: number): number {
  return (Math.PI * sizeUm * 1000 * sinThetaOfRadius(radiusMm, distanceMm)) / wavelengthNm;
}

/** Radius on the sensor, mm, at which v = π D sin θ / λ has a given value; infinite when no angle reaches it. */
export function radiusOfReduced(v: number, sizeUm: number, wavelengthNm: number, distanceMm: number): number {
  return radiusOfSinTheta((v * wavelengthNm) / (Math.PI * sizeUm * 1000), distanceMm);
}

/** Diameter in µm of the hole whose pattern has a given v at a radius. */
export function sizeOfRing(v: number, radiusMm: number, wavelengthNm: number, distanceMm: number): number {
  return (v * wavelengthNm) / (Math.PI * 1000 * sinThetaOfRadius(radiusMm, distanceMm));
}
