/** Place of a minimum of a smooth function between two ends, by golden section and a parabola at the end. */
export function findMinimum(f: (x: number) => number, from: number, to: number): number {
  const ratio = (Math.sqrt(5) - 1) / 2;
  let low = from;
  let high = to;
  for (let step = 0; step < 28; step += 1) {
    const left = high - ratio * (high - low);
    const right = low + ratio * (high - low);
    if (f(left) < f(right)) high = right;
    else low = left;
  }
  const middle = (low + high) / 2;
  const width = 1e-3;
  const [before, here, after] = [f(middle - width), f(middle), f(middle + width)];
  return middle + (width * (before - after)) / (2 * (before - 2 * here + after));
}
