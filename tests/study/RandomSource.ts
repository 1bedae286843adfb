/** A seeded stream of random numbers for simulated frames. */
export class RandomSource {
  private state: Uint32Array;
  private spare: number | null = null;

  /** @param seed any whole number; equal seeds give equal streams */
  constructor(seed: number) {
    this.state = Uint32Array.of(seed, 0x9e3779b9, 0x243f6a88, 1);
    for (let k = 0; k < 20; k++) this.next();
  }

  /** Even in 0 … 1, neither end. Small fast counter of three words (from memory; the mean and variance are tested). */
  next(): number {
    const s = this.state;
    const out = (s[0] + s[1] + s[3]) >>> 0;
    s[3]++;
    s[0] = s[1] ^ (s[1] >>> 9);
    s[1] = s[2] + (s[2] << 3);
    s[2] = ((s[2] << 21) | (s[2] >>> 11)) + out;
    return (out + 0.5) / 4_294_967_296;
  }

  between(from: number, to: number): number {
    return from + (to - from) * this.next();
  }

  /** Even in the logarithm. */
  betweenLog(from: number, to: number): number {
    return from * (to / from) ** this.next();
  }

  chance(share: number): boolean {
    return this.next() < share;
  }

  /** Of mean 0 and standard deviation 1 (Box and Muller). */
  normal(): number {
    if (this.spare !== null) {
      const kept = this.spare;
      this.spare = null;
      return kept;
    }
    const radius = Math.sqrt(-2 * Math.log(this.next()));
    const angle = 2 * Math.PI * this.next();
    this.spare = radius * Math.sin(angle);
    return radius * Math.cos(angle);
  }

  /** Whole events of a mean: by products below 30, above by transformed rejection (Hörmann 1993, from memory). */
  poisson(mean: number): number {
    if (mean <= 0) return 0;
    if (mean < 30) {
      const least = Math.exp(-mean);
      let events = 0;
      for (let product = this.next(); product > least; product *= this.next()) events++;
      return events;
    }
    const b = 0.931 + 2.53 * Math.sqrt(mean);
    const a = -0.059 + 0.02483 * b;
    const inverseAlpha = 1.1239 + 1.1328 / (b - 3.4);
    for (;;) {
      const u = this.next() - 0.5;
      const v = this.next();
      const us = 0.5 - Math.abs(u);
      const k = Math.floor(((2 * a) / us + b) * u + mean + 0.43);
      if (us >= 0.07 && v <= 0.9277 - 3.6224 / (b - 2)) return k;
      if (k < 0 || (us < 0.013 && v > us)) continue;
      if (Math.log((v * inverseAlpha) / (a / (us * us) + b)) <= k * Math.log(mean) - mean - logFactorial(k)) return k;
    }
  }
}

function logFactorial(k: number): number {
  if (k < 10) {
    let sum = 0;
    for (let i = 2; i <= k; i++) sum += Math.log(i);
    return sum;
  }
  return (k + 0.5) * Math.log(k) - k + 0.9189385332046727 + 1 / (12 * k) - 1 / (360 * k ** 3);
}
