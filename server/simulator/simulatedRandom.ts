/** Random numbers of the simulator; the same seed gives the same frame. */
export interface SimulatedRandom {
  /** Uniform over the open interval 0 to 1. */
  uniform(): number;
  /** Normal with mean 0 and standard deviation 1. */
  normal(): number;
  /** Poisson with the given mean. */
  poisson(mean: number): number;
}

/**
 * A 32-bit counter generator (sfc32, C. Doty-Humphrey, from memory); normals by the Box-Muller transform; Poisson numbers by counting below a mean
 * of 12, above it by the transformed rejection PTRS of W. Hörmann, Insurance: Mathematics and Economics 12, 39 (1993)
 * (from memory).
 */
export function simulatedRandom(seed: number): SimulatedRandom {
  let a = seed | 0;
  let b = Math.imul(seed ^ 0x5bd1e995, 0x2c1b3c6d) | 0;
  let c = Math.imul(seed + 0x7f4a7c15, 0x297a2d39) | 0;
  let counter = 1;
  const next = () => {
    const sum = (((a + b) | 0) + counter) | 0;
    counter = (counter + 1) | 0;
    a = b ^ (b >>> 9);
    b = (c + (c << 3)) | 0;
    c = ((c << 21) | (c >>> 11)) + sum;
    c |= 0;
    return sum >>> 0;
  };
  for (let round = 0; round < 16; round++) next();
  const uniform = () => (next() + 0.5) / 4294967296;

  let kept = NaN;
  const normal = () => {
    if (!Number.isNaN(kept)) {
      const value = kept;
      kept = NaN;
      return value;
    }
    const length = Math.sqrt(-2 * Math.log(uniform()));
    const angle = 2 * Math.PI * uniform();
    kept = length * Math.sin(angle);
    return length * Math.cos(angle);
  };

  const poisson = (mean: number) => {
    if (!(mean > 0)) return 0;
    if (mean < 12) {
      const limit = Math.exp(-mean);
      let count = -1;
      let product = 1;
      do {
        product *= uniform();
        count++;
      } while (product > limit);
      return count;
    }
    const spread = 0.931 + 2.53 * Math.sqrt(mean);
    const shape = -0.059 + 0.02483 * spread;
    const inverse = 1.1239 + 1.1328 / (spread - 3.4);
    const easy = 0.9277 - 3.6224 / (spread - 2);
    for (;;) {
      const u = uniform() - 0.5;
      const v = uniform();
      const side = 0.5 - Math.abs(u);
      const count = Math.floor(((2 * shape) / side + spread) * u + mean + 0.43);
      if (side >= 0.07 && v <= easy) return count;
      if (count < 0 || (side < 0.013 && v > side)) continue;
      const bound = count * Math.log(mean) - mean - logFactorial(count);
      if (Math.log((v * inverse) / (shape / (side * side) + spread)) <= bound) return count;
    }
  };
  return { uniform, normal, poisson };
}

/** ln n! by Stirling's series, exact sums below 10. */
function logFactorial(n: number): number {
  if (n < 10) {
    let sum = 0;
    for (let factor = 2; factor <= n; factor++) sum += Math.log(factor);
    return sum;
  }
  const x = n + 1;
  return (x - 0.5) * Math.log(x) - x + 0.9189385332046727 + 1 / (12 * x) - 1 / (360 * x ** 3);
}
