export interface SeededRandom {
  /** Uniform over the open interval 0 to 1, 53 bits. */
  uniform(): number;
  /** Normal with mean 0 and standard deviation 1. */
  normal(): number;
  /** Student's t with `degreesOfFreedom` above 0. */
  studentT(degreesOfFreedom: number): number;
  /** Gamma with shape and scale above 0. */
  gamma(shape: number, scale: number): number;
}

/**
 * Random numbers that repeat for the same seed, so that a result that used them can be repeated to the last digit.
 *
 * xoshiro128** (D. Blackman and S. Vigna, ACM Trans. Math. Softw. 47, 36 (2021)), its state filled by a 32-bit
 * splitmix; normals by the polar method of Marsaglia and Bray (1964); gammas by G. Marsaglia and W. W. Tsang, ACM
 * Trans. Math. Softw. 26, 363 (2000). Names from memory. Not for secrets.
 *
 * @param seed any finite number; its lower 32 bits are used
 */
export function seededRandom(seed: number): SeededRandom {
  let state = seed >>> 0;
  const fill = () => {
    state = (state + 0x9e3779b9) >>> 0;
    let mixed = state ^ (state >>> 16);
    mixed = Math.imul(mixed, 0x21f0aaad);
    mixed ^= mixed >>> 15;
    mixed = Math.imul(mixed, 0x735a2d97);
    return (mixed ^ (mixed >>> 15)) >>> 0;
  };
  let a = fill();
  let b = fill();
  let c = fill();
  let d = fill();
  const rotate = (value: number, by: number) => ((value << by) | (value >>> (32 - by))) >>> 0;
  const next = () => {
    const result = Math.imul(rotate(Math.imul(b, 5), 7), 9) >>> 0;
    const shifted = b << 9;
    c ^= a;
    d ^= b;
    b ^= c;
    a ^= d;
    c ^= shifted;
    d = rotate(d, 11);
    return result;
  };
  const uniform = () => ((next() >>> 5) * 67_108_864 + (next() >>> 6) + 0.5) / 9_007_199_254_740_992;

  let spare: number | null = null;
  const normal = () => {
    if (spare !== null) {
      const kept = spare;
      spare = null;
      return kept;
    }
    let x = 0;
    let y = 0;
    let square = 0;
    do {
      x = 2 * uniform() - 1;
      y = 2 * uniform() - 1;
      square = x * x + y * y;
    } while (square >= 1 || square === 0);
    const factor = Math.sqrt((-2 * Math.log(square)) / square);
    spare = y * factor;
    return x * factor;
  };

  const gamma = (shape: number, scale: number): number => {
    if (shape < 1) return gamma(shape + 1, scale) * uniform() ** (1 / shape);
    const third = shape - 1 / 3;
    const width = 1 / Math.sqrt(9 * third);
    for (;;) {
      const deviate = normal();
      const cubeRoot = 1 + width * deviate;
      if (cubeRoot <= 0) continue;
      const cube = cubeRoot ** 3;
      if (Math.log(uniform()) < deviate ** 2 / 2 + third - third * cube + third * Math.log(cube))
        return third * cube * scale;
    }
  };
  const studentT = (degreesOfFreedom: number) =>
    normal() / Math.sqrt(gamma(degreesOfFreedom / 2, 2) / degreesOfFreedom);
  return { uniform, normal, studentT, gamma };
}
