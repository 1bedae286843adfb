import type { MeasureCase } from '../../../shared/contracts/measureCase';
import { fresnelNumber } from '../../../shared/optics/fresnelNumber';
import { opticalDistanceMm, sinThetaOfRadius } from '../../../shared/optics/geometry';

/** What the bench tells about a pinhole frame, in millimetres. */
export interface PinholeOptics {
  wavelengthNm: number;
  /** k = 2π/λ, 1/mm. */
  waveNumber: number;
  /** Aperture to sensitive plane, cover glass taken as air of the same effect, mm. */
  distanceMm: number;
  /** Point source to aperture, mm; null for a plane wave. */
  sourceDistanceMm: number | null;
  pitchMm: number;
  /** Given 1/e² radius of a Gaussian beam at the aperture, mm; null for even light. */
  beamRadiusMm: number | null;
}

export function pinholeOptics(measureCase: MeasureCase): PinholeOptics {
  const { illumination, camera, wavelengthNm } = measureCase;
  return {
    wavelengthNm,
    waveNumber: (2 * Math.PI) / (wavelengthNm * 1e-6),
    distanceMm: opticalDistanceMm(measureCase.distanceMm, camera.coverGlassMm, camera.coverGlassIndex),
    sourceDistanceMm: illumination.kind === 'diverging' ? illumination.sourceDistanceMm : null,
    pitchMm: (measureCase.pixelPitchUm ?? 0) / 1000,
    beamRadiusMm: illumination.kind === 'gaussian' ? illumination.beamRadiusUm / 1000 : null,
  };
}

/** Lommel's u = k a² (1/z + 1/R), 2π times the Fresnel number. */
export function fresnelU(optics: PinholeOptics, radiusMm: number): number {
  const { wavelengthNm, distanceMm, sourceDistanceMm } = optics;
  return 2 * Math.PI * fresnelNumber(2000 * radiusMm, wavelengthNm, distanceMm, sourceDistanceMm);
}

/** v = k a sin θ for a radius on the sensor. */
export function reducedRadius(optics: PinholeOptics, radiusMm: number, onSensorMm: number): number {
  return optics.waveNumber * radiusMm * sinThetaOfRadius(onSensorMm, optics.distanceMm);
}
