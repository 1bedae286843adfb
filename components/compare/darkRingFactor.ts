/** Zeros of J1 divided by π, orders 1 to 7: DLMF 10.21 (looked up), computed to nine digits. */
const FIRST = [1.219669891, 2.233130594, 3.238315484, 4.241062864, 5.242764377, 6.24392169, 7.244759869];

/**
 * Factor m of sin θ = m λ/d for the dark ring of an order in the pattern of a round hole in the far field.
 * Beyond the seventh by McMahon's expansion, DLMF 10.21.19, good to 1e-9 there.
 */
export function darkRingFactor(order: number): number {
  const known = FIRST[order - 1];
  if (known !== undefined) return known;
  const a = (order + 0.25) * Math.PI;
  const b = 8 * a;
  return (
    (a - 3 / b - (4 * 3 * (28 - 31)) / (3 * b ** 3) - (32 * 3 * (83 * 16 - 982 * 4 + 3779)) / (15 * b ** 5)) / Math.PI
  );
}
