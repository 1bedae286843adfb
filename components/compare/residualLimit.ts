const STEPS = [0.01, 0.02, 0.05, 0.1, 0.2, 0.5, 1, 2, 5, 10];

/** Where the walls of the residual strip stand, in %: the smallest round number beyond what the used points need. */
export function residualLimit(residualsPercent: readonly number[]): number {
  const most = Math.max(0, ...residualsPercent.map(Math.abs));
  return STEPS.find((step) => step >= most * 1.2) ?? 10;
}
