import { AIRY_DARK_V } from '@/shared/optics/airy';

/**
 * Factor m of sin θ = m λ/d for the dark ring of an order in the pattern of a round hole in the far field: the zero of J1
 * over π. Beyond the tabulated orders by McMahon's expansion (DLMF 10.21.19, from memory), good to 1e-9 there.
 */
export function darkRingFactor(order: number): number {
  const known = AIRY_DARK_V[order - 1];
  if (known !== undefined) return known / Math.PI;
  const a = (order + 0.25) * Math.PI;
  const b = 8 * a;
  const zero = a - 3 / b - (4 * 3 * (28 - 31)) / (3 * b ** 3) - (32 * 3 * (83 * 16 - 982 * 4 + 3779)) / (15 * b ** 5);
  return zero / Math.PI;
}
