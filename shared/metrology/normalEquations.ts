import { CholeskyDecomposition, Matrix } from 'ml-matrix';

/**
 * JᵀJ and Jᵀr of whitened residuals r.
 *
 * @param jacobian row-major, residuals.length × columns
 */
export function normalEquations(
  jacobian: Float64Array,
  residuals: Float64Array,
  columns: number,
): { matrix: Matrix; gradient: Float64Array } {
  const matrix = Matrix.zeros(columns, columns);
  const gradient = new Float64Array(columns);
  const sums = new Float64Array(columns * columns);
  for (let point = 0, at = 0; point < residuals.length; point += 1, at += columns) {
    const residual = residuals[point];
    for (let row = 0; row < columns; row += 1) {
      const value = jacobian[at + row];
      gradient[row] += value * residual;
      for (let column = row; column < columns; column += 1)
        sums[row * columns + column] += value * jacobian[at + column];
    }
  }
  for (let row = 0; row < columns; row += 1)
    for (let column = row; column < columns; column += 1) {
      matrix.set(row, column, sums[row * columns + column]);
      matrix.set(column, row, sums[row * columns + column]);
    }
  return { matrix, gradient };
}

/** Inverse of a symmetric positive definite matrix, columns scaled to equal size first; null when it has none. */
export function invertScaled(matrix: Matrix): Matrix | null {
  const size = matrix.rows;
  const scale = Array.from({ length: size }, (_, index) => 1 / Math.sqrt(matrix.get(index, index)));
  if (!scale.every((value) => Number.isFinite(value))) return null;
  const scaled = new Matrix(size, size);
  for (let row = 0; row < size; row += 1)
    for (let column = 0; column < size; column += 1)
      scaled.set(row, column, matrix.get(row, column) * (scale[row] * scale[column]));
  const cholesky = new CholeskyDecomposition(scaled);
  if (!cholesky.isPositiveDefinite()) return null;
  // A pivot this small is rounding: two columns say the same.
  if (cholesky.lowerTriangularMatrix.diagonal().some((pivot) => pivot < 1e-7)) return null;
  const inverse = cholesky.solve(Matrix.eye(size));
  for (let row = 0; row < size; row += 1)
    for (let column = 0; column < size; column += 1)
      inverse.set(row, column, inverse.get(row, column) * (scale[row] * scale[column]));
  return inverse.to1DArray().every((value) => Number.isFinite(value)) ? inverse : null;
}
