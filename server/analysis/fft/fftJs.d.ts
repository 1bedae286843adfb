declare module 'fft.js' {
  /** Complex radix-4 transform of a fixed power-of-two length; data are interleaved real and imaginary parts. */
  class FFT {
    constructor(size: number);
    readonly size: number;
    transform(out: ArrayLike<number>, data: ArrayLike<number>): void;
    inverseTransform(out: ArrayLike<number>, data: ArrayLike<number>): void;
  }
  export = FFT;
}
