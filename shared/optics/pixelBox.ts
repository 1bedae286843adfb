/**
 * Mean of a round pattern over a square pixel, to fourth order in the pixel's width p, averaged over the direction in which the radius
 * crosses the pixel: f + (p²/24) ∇²f + (7p⁴/11520) ∇⁴f with the Laplacian of a function of the radius. In units in which p D/λz = p v/(π r)
 * is below 0.3 the rest is below 1e-6 of the peak (computed).
 *
 * @param values f at 0, step, 2 step, … (even about 0)
 * @param widthV width of the pixel in the unit of the step
 * @returns a new array of the same length; the last four entries repeat what can be known there
 */
export function pixelBoxed(values: Float64Array, step: number, widthV: number): Float64Array {
  const once = laplacian(values, step);
  const twice = laplacian(once, step);
  const second = widthV ** 2 / 24;
  const fourth = (7 * widthV ** 4) / 11_520;
  return values.map((value, index) => value + second * once[index] + fourth * twice[index]);
}

/** ∂²f/∂r² + (1/r) ∂f/∂r of an even function on an even grid from 0, by five-point differences. */
function laplacian(f: Float64Array, step: number): Float64Array {
  const last = f.length - 1;
  const at = (index: number) => f[Math.min(last, Math.abs(index))];
  return f.map((_, index) => {
    const centre = Math.min(index, last - 2);
    const second =
      (-at(centre - 2) + 16 * at(centre - 1) - 30 * at(centre) + 16 * at(centre + 1) - at(centre + 2)) /
      (12 * step * step);
    if (index === 0) return 2 * second;
    const first = (at(centre - 2) - 8 * at(centre - 1) + 8 * at(centre + 1) - at(centre + 2)) / (12 * step);
    return second + first / (centre * step);
  });
}
