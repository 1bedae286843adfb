import type { MeasureCase } from '../../../shared/contracts/measureCase';

/** What the bench tells about a pinhole frame, in millimetres. */
export interface PinholeOptics {
  /** k = 2π/λ, 1/mm. */
  waveNumber: number;
  /** Aperture to sensitive plane, cover glass taken as air of the same effect, mm. */
  distanceMm: number;
  /** 1/R of the source, 1/mm; 0 for a plane wave. */
  sourceCurvature: number;
  pitchMm: number;
  /** Given 1/e² radius of a Gaussian beam at the aperture, mm; null for even light. */
  beamRadiusMm: number | null;
}

/**
 * A cover glass of thickness t and index n shortens the path that counts by t(1 − 1/n) (paraxial refraction at a plane
 * plate; computed for field use: 0.17 mm for 0.5 mm of n = 1.515).
 */
export function coverGlassShift(camera: MeasureCase['camera']): number {
  const { coverGlassMm, coverGlassIndex } = camera;
  return coverGlassMm === undefined || coverGlassIndex === undefined ? 0 : coverGlassMm * (1 - 1 / coverGlassIndex);
}

export function pinholeOptics(measureCase: MeasureCase): PinholeOptics {
  const { illumination } = measureCase;
  return {
    waveNumber: (2 * Math.PI) / (measureCase.wavelengthNm * 1e-6),
    distanceMm: measureCase.distanceMm - coverGlassShift(measureCase.camera),
    sourceCurvature: illumination.kind === 'diverging' ? 1 / illumination.sourceDistanceMm : 0,
    pitchMm: (measureCase.pixelPitchUm ?? 0) / 1000,
    beamRadiusMm: illumination.kind === 'gaussian' ? illumination.beamRadiusUm / 1000 : null,
  };
}

/** u = k a² (1/z + 1/R), 2π times the Fresnel number. */
export function fresnelU(optics: PinholeOptics, radiusMm: number): number {
  return optics.waveNumber * radiusMm * radiusMm * (1 / optics.distanceMm + optics.sourceCurvature);
}

/** v = k a sin θ for a radius on the sensor. */
export function reducedRadius(optics: PinholeOptics, radiusMm: number, onSensorMm: number): number {
  return (optics.waveNumber * radiusMm * onSensorMm) / Math.hypot(onSensorMm, optics.distanceMm);
}
