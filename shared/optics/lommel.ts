import { besselSequence } from './besselJ';

export interface LommelFunctions {
  u1: number;
  u2: number;
  v0: number;
  v1: number;
}

const MAX_TERMS = 600;
const TERM_TOLERANCE = 1e-18;
const sequence = new Float64Array(MAX_TERMS + 2);

/** Terms after which ratio^n J_n(x), ratio at most 1, is below the tolerance. */
function termCount(ratio: number, x: number): number {
  const decay = ratio < 1 ? Math.ceil(Math.log(TERM_TOLERANCE) / Math.log(ratio)) : Infinity;
  return Math.min(MAX_TERMS, Math.max(4, Math.min(decay, Math.ceil(x + 12 * Math.cbrt(x + 1) + 16))));
}

/** Σ (−1)^s ratio^(n+2s) J_(n+2s)(v) for n = first and first + 1. */
function pairOfSums(ratio: number, v: number, first: number): [number, number] {
  const count = termCount(ratio, v);
  const values = sequence.subarray(0, count + 2);
  besselSequence(v, values);
  const sums: [number, number] = [0, 0];
  let power = ratio ** first;
  for (let order = first; order < values.length; order += 1) {
    const step = order - first;
    sums[step % 2 === 0 ? 0 : 1] += (step % 4 < 2 ? 1 : -1) * power * values[order];
    power *= ratio;
  }
  return sums;
}

/**
 * Lommel's functions of two variables, U_n = Σ (−1)^s (u/v)^(n+2s) J_(n+2s)(v) and V_n = Σ (−1)^s (v/u)^(n+2s) J_(n+2s)(v).
 *
 * The series whose ratio is below one is summed; the other pair follows from U1 + V1 = sin ½(u + v²/u) and
 * V0 − U2 = cos ½(u + v²/u). Source: Born & Wolf, Principles of Optics, 8.8.1 (from memory). Accuracy 1e-14 absolute.
 *
 * @param u above 0
 * @param v at least 0
 */
export function lommelFunctions(u: number, v: number): LommelFunctions {
  if (!(u > 0 && v >= 0)) throw new RangeError('Lommel functions need u above 0 and v of at least 0.');
  const phase = (u + (v * v) / u) / 2;
  if (u < v) {
    const [u1, u2] = pairOfSums(u / v, v, 1);
    return { u1, u2, v0: u2 + Math.cos(phase), v1: Math.sin(phase) - u1 };
  }
  const [v0, v1] = pairOfSums(v / u, v, 0);
  return { u1: Math.sin(phase) - v1, u2: v0 - Math.cos(phase), v0, v1 };
}

/**
 * Irradiance behind a uniformly lit circular hole over that of the incident wave, U1² + U2²: Born & Wolf, 8.8.1 (from
 * memory); K. D. Mielenz, J. Res. NIST 103, 497 (1998), doi 10.6028/jres.103.030 (looked up).
 *
 * @param u 2π times the Fresnel number, above 0
 * @param v π D sin θ / λ
 */
export function fresnelCircleIrradiance(u: number, v: number): number {
  const { u1, u2 } = lommelFunctions(u, Math.abs(v));
  return u1 * u1 + u2 * u2;
}
