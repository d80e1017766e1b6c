declare module "fft.js" {
  /** Radix-4 transform of power-of-two sizes on interleaved complex arrays. */
  export default class FFT {
    constructor(size: number);
    readonly size: number;
    createComplexArray(): number[];
    transform(out: number[], data: number[]): void;
    inverseTransform(out: number[], data: number[]): void;
  }
}
