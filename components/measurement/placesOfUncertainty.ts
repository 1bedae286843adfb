/** Decimal places on which a number with this uncertainty ends: two significant digits of the uncertainty, never negative. */
export function placesOfUncertainty(uncertainty: number): number {
  if (!Number.isFinite(uncertainty) || uncertainty <= 0) return 3;
  const exponent = Number(uncertainty.toExponential(1).split('e')[1]);
  return Math.min(8, Math.max(0, 1 - exponent));
}
