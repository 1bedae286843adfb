import FFT from 'fft.js';
import ndarray from 'ndarray';

/**
 * Two-dimensional Fourier transform in place.
 * @param data interleaved complex, row-major, size × size, size a power of two
 * @param inverse scaled by 1 / size² when true
 */
export function transform2d(data: Float64Array, size: number, inverse: boolean): void {
  const fft = new FFT(size);
  const line = new Float64Array(2 * size);
  const out = new Float64Array(2 * size);
  // Real and imaginary parts as two views on the same numbers, so that rows and columns are reached the same way.
  const grid = ndarray(data, [size, size, 2]);
  for (const view of [grid, grid.transpose(1, 0, 2)]) {
    const [along] = [view.stride[1]];
    for (let k = 0; k < size; k++) {
      const from = k * view.stride[0];
      for (let j = 0; j < size; j++) {
        line[2 * j] = data[from + j * along];
        line[2 * j + 1] = data[from + j * along + 1];
      }
      if (inverse) fft.inverseTransform(out, line);
      else fft.transform(out, line);
      for (let j = 0; j < size; j++) {
        data[from + j * along] = out[2 * j];
        data[from + j * along + 1] = out[2 * j + 1];
      }
    }
  }
}
