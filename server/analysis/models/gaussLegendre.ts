/**
 * Nodes and weights of Gauss–Legendre quadrature on 0 to 1, by Newton iteration on the Legendre polynomials.
 * Source: Abramowitz & Stegun 25.4.29 and 25.4.30 (from memory).
 */
export function gaussLegendre(count: number): { nodes: Float64Array; weights: Float64Array } {
  const nodes = new Float64Array(count);
  const weights = new Float64Array(count);
  for (let i = 0; i < count; i++) {
    let x = Math.cos((Math.PI * (i + 0.75)) / (count + 0.5));
    let slope = 1;
    for (let round = 0; round < 50; round++) {
      let previous = 1;
      let value = x;
      for (let n = 2; n <= count; n++) [previous, value] = [value, ((2 * n - 1) * x * value - (n - 1) * previous) / n];
      slope = (count * (x * value - previous)) / (x * x - 1);
      const step = value / slope;
      x -= step;
      if (Math.abs(step) < 1e-15) break;
    }
    nodes[i] = (1 - x) / 2;
    weights[i] = 1 / ((1 - x * x) * slope * slope);
  }
  return { nodes, weights };
}
