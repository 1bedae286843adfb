import { EigenvalueDecomposition, Matrix } from 'ml-matrix';

export interface PlannedStep {
  damping: number;
  /** Length of the step in scaled parameters. */
  length: number;
  predictedDecrease: number;
  /** Whether the limit left the step undamped. */
  full: boolean;
}

/** Keeps a step finite where the data do not determine a parameter; scaled columns are at most of length one. */
const SMALLEST_DAMPING = 1e-13;

/** The damping that keeps a step in scaled parameters within a radius (to 1 %), by the eigenvalues of the scaled normal matrix. */
export function planStep(matrix: Matrix, gradient: number[], scale: number[], radius: number): PlannedStep {
  const scaled = new Matrix(matrix.rows, matrix.rows);
  for (let row = 0; row < matrix.rows; row += 1)
    for (let column = 0; column < matrix.rows; column += 1)
      scaled.set(row, column, matrix.get(row, column) / (scale[row] * scale[column]));
  const { realEigenvalues, eigenvectorMatrix } = new EigenvalueDecomposition(scaled, { assumeSymmetric: true });
  const pull = gradient.map((value, at) => value / scale[at]);
  const along = realEigenvalues.map((_, index) =>
    pull.reduce((sum, value, at) => sum + value * eigenvectorMatrix.get(at, index), 0),
  );
  const smallest = Number.EPSILON * Math.max(...realEigenvalues);
  const stepAlong = (damping: number) =>
    along.map((value, index) => value / (Math.max(realEigenvalues[index], smallest) + damping));
  const lengthAt = (damping: number) => Math.hypot(...stepAlong(damping));

  let damping = SMALLEST_DAMPING;
  const full = lengthAt(0) <= radius;
  if (!full) {
    let low = 0;
    let high = Math.hypot(...along) / radius;
    while (lengthAt(high) < 0.99 * radius || lengthAt(high) > radius) {
      const middle = (low + high) / 2;
      if (middle === low || middle === high) break;
      if (lengthAt(middle) > radius) low = middle;
      else high = middle;
      if (lengthAt(high) >= 0.99 * radius) break;
    }
    damping = high;
  }
  const steps = stepAlong(damping);
  const predictedDecrease = steps.reduce(
    (sum, step, index) => sum + step * (2 * along[index] - realEigenvalues[index] * step),
    0,
  );
  return { damping, length: Math.hypot(...steps), predictedDecrease, full };
}
