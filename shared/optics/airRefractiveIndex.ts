/**
 * Wavelength in vacuum of an unstabilised helium-neon laser with its relative standard uncertainty: CIPM
 * Recommendation 2 (2007), doi 10.59161/CIPM2007REC2E (looked up).
 */
export const HELIUM_NEON_VACUUM = {
  value: 632.9908,
  unit: 'nm',
  relativeStandardUncertainty: 1.5e-6,
  reference: 'CIPM Recommendation 2 (2007)',
} as const;

export interface AirState {
  temperatureC: number;
  pressureKpa: number;
  /** Relative humidity, 0 to 100. */
  humidityPercent: number;
}

export const STANDARD_AIR: AirState = { temperatureC: 20, pressureKpa: 101.325, humidityPercent: 50 };

/**
 * Refractive index of air near 633 nm: n = 1 + 7.86e-4 p/(273 + t) − 1.5e-11 h (t² + 160), p in kPa, t in °C, h in %.
 * Source: shop-floor formula of the NIST Engineering Metrology Toolbox, appendix B (page seen, formula from memory). Valid
 * for 10 °C to 30 °C and 60 kPa to 120 kPa; within 1e-7 of the modified Edlén equation at 20 °C.
 */
export function airRefractiveIndex({ temperatureC, pressureKpa, humidityPercent }: AirState = STANDARD_AIR): number {
  return 1 + (7.86e-4 * pressureKpa) / (273 + temperatureC) - 1.5e-11 * humidityPercent * (temperatureC ** 2 + 160);
}

/** Wavelength in air of a line known in vacuum. */
export function wavelengthInAir(vacuumNm: number, air: AirState = STANDARD_AIR): number {
  return vacuumNm / airRefractiveIndex(air);
}
