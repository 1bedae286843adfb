/** Bessel's J0 on an even grid from 0, from Bessel's integral (1/π) ∫₀^π cos(x sin θ) dθ by the trapezoidal rule, which converges exponentially. */
function besselTable(largest: number, step: number): Float64Array {
  const table = new Float64Array(Math.ceil(largest / step) + 5);
  const panels = Math.ceil(largest / 2) + 24;
  // The integrand is the same on both halves of 0 to π: panels + 1 points on one half.
  const sines = Float64Array.from({ length: panels + 1 }, (_, index) => Math.sin((Math.PI * index) / (2 * panels)));
  for (let at = 0; at < table.length; at++) {
    const x = at * step;
    let sum = (1 + Math.cos(x)) / 2;
    for (let index = 1; index < panels; index++) sum += Math.cos(x * sines[index]);
    table[at] = sum / panels;
  }
  return table;
}

/** Cubic through the four nearest values of an even function on an even grid from 0. */
export function interpolateEven(table: Float64Array, place: number): number {
  const at = Math.floor(place);
  const t = place - at;
  const before = table[at === 0 ? 1 : at - 1];
  const after = table[at + 1];
  const beyond = table[at + 2];
  const near = table[at] * (1 + t) * (1 - t) * (2 - t) * 0.5 + after * (1 + t) * t * (2 - t) * 0.5;
  return near - (t * (1 - t) * (before * (2 - t) + beyond * (1 + t))) / 6;
}

/** Nodes and weights on 0 to 1 of Fejér's first rule. */
function fejerRule(count: number): { nodes: Float64Array; weights: Float64Array } {
  const nodes = new Float64Array(count);
  const weights = new Float64Array(count);
  for (let index = 0; index < count; index++) {
    const angle = ((index + 0.5) * Math.PI) / count;
    let sum = 1;
    for (let term = 1; term <= count / 2; term++) sum -= (2 * Math.cos(2 * term * angle)) / (4 * term * term - 1);
    nodes[index] = (1 + Math.cos(angle)) / 2;
    weights[index] = sum / count;
  }
  return { nodes, weights };
}

const BESSEL_STEP = 0.01;

export interface DiffractionTable {
  /** Spacing in v = (2π/λ) a sin θ. */
  step: number;
  /** |2 ∫₀¹ J0(vρ) exp(−(g + iu/2)ρ²) ρ dρ|², from v = 0. */
  intensity: Float64Array;
}

/**
 * Irradiance of a circular hole against v = (2π/λ) a sin θ by direct quadrature of the diffraction integral over the
 * hole; 1 on the axis for an evenly lit hole far away.
 *
 * @param u (2π/λ) a² (1/z + 1/R)
 * @param taper (a/w)² for a Gaussian beam of 1/e² irradiance radius w at the hole; 0 for even light
 * @param largestV end of the table; accuracy 3e-8 of the peak up to v = 400
 */
export function diffractionTable(u: number, taper: number, largestV: number): DiffractionTable {
  const step = 0.03;
  const bessel = besselTable(largestV * 1.02 + 1, BESSEL_STEP);
  const { nodes, weights } = fejerRule(Math.ceil(48 + 0.75 * largestV + 0.5 * u));
  const real = weights.map(
    (weight, node) =>
      2 * weight * nodes[node] * Math.exp(-taper * nodes[node] ** 2) * Math.cos((u * nodes[node] ** 2) / 2),
  );
  const imaginary = weights.map(
    (weight, node) =>
      -2 * weight * nodes[node] * Math.exp(-taper * nodes[node] ** 2) * Math.sin((u * nodes[node] ** 2) / 2),
  );
  const intensity = new Float64Array(Math.ceil(largestV / step) + 4);
  for (let row = 0; row < intensity.length; row++) {
    const v = row * step;
    let re = 0;
    let im = 0;
    for (let node = 0; node < nodes.length; node++) {
      const value = interpolateEven(bessel, (v * nodes[node]) / BESSEL_STEP);
      re += value * real[node];
      im += value * imaginary[node];
    }
    intensity[row] = re * re + im * im;
  }
  return { step, intensity };
}
