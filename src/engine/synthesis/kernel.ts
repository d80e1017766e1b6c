import { DomainError } from "../../base/errors.ts";

/**
 * The spreading function of the settled beam: the "exponential of semicircle" of Barnett, Magland & af Klinteberg,
 * "A parallel nonuniform fast Fourier transform library based on an 'exponential of semicircle' kernel",
 * SIAM J. Sci. Comput. 41 (2019) C479: φ(z) = exp(β(√(1 − z²) − 1)) for |z| ≤ 1, β = 2.30 × width for a grid
 * twice as fine as the image needs.
 */
export interface Kernel {
  /** Cells a sample spreads over, along each axis. */
  readonly width: number;
  /** Twice as many grid cells as image pixels. */
  readonly oversampling: 2;
  /** Taylor rows: value, first and half the second derivative of each tap, at `3 * (width * row + tap)`. */
  readonly taps: Float64Array;
  readonly rows: number;
}

/** Taylor rows per cell. The cubic term left out is below 1e-9 of the kernel's peak for all widths here. */
const ROWS = 1024;

/**
 * Width in cells, and the largest error of one sample anywhere in the image, as a fraction of its weight: both axes together,
 * over all places in a cell and all pixels to the corners. Measured; the test measures again.
 */
export const WIDTHS: readonly (readonly [width: number, bound: number])[] = [
  [4, 7.5e-3],
  [5, 7.6e-4],
  [6, 6.3e-5],
  [7, 5.4e-6],
  [8, 8.1e-7],
  [9, 1.1e-7],
];

const kernels = new Map<number, Kernel>();

/**
 * The narrowest kernel that keeps a wanted accuracy of the beam, as a fraction of its peak: no sample errs by more, so no
 * weighted mean of samples does. Beams of many samples err by some hundred times less.
 *
 * @throws {@link DomainError} below 1.1e-7, where one would want double the grid instead.
 */
export function kernelFor(tolerance: number): Kernel {
  const width = WIDTHS.find(([, bound]) => bound <= tolerance)?.[0];
  if (width === undefined) throw new DomainError("tolerance", tolerance, "a fraction of the peak of at least 1.1e-7");
  let kernel = kernels.get(width);
  if (!kernel) {
    kernel = makeKernel(width);
    kernels.set(width, kernel);
  }
  return kernel;
}

function makeKernel(width: number): Kernel {
  const taps = new Float64Array(3 * width * (ROWS + 1));
  const h = 1e-4;
  for (let row = 0; row <= ROWS; row++) {
    for (let tap = 0; tap < width; tap++) {
      // The first cell is the lowest whole number at or above sample − width/2, by a fraction row/ROWS of a cell.
      const x = tap + row / ROWS - width / 2;
      const at = 3 * (width * row + tap);
      const here = spreading(x, width);
      const left = spreading(x - h, width);
      const right = spreading(x + h, width);
      taps[at] = here;
      taps[at + 1] = (right - left) / (2 * h);
      taps[at + 2] = (right - 2 * here + left) / (2 * h * h);
    }
  }
  return { width, oversampling: 2, taps, rows: ROWS };
}

/** φ at x cells from the sample; 0 outside the half width. */
export function spreading(x: number, width: number): number {
  const z = (2 * x) / width;
  const inside = 1 - z * z;
  return inside > 0 ? Math.exp(2.3 * width * (Math.sqrt(inside) - 1)) : 0;
}

/**
 * What spreading does to the image, to be divided out: the Fourier transform of φ at each pixel.
 *
 * @param half - Pixels from the centre to either edge.
 * @param gridSize - Cells a side of the grid.
 * @returns (half + 1): the transform at 0 … half pixels from the centre.
 *
 * Gauss–Legendre quadrature of 4 × width + 40 points: exact to rounding for this band-limited integrand.
 */
export function correction(kernel: Kernel, half: number, gridSize: number): Float64Array {
  const { nodes, weights } = gaussLegendre(4 * kernel.width + 40);
  const out = new Float64Array(half + 1);
  for (let pixel = 0; pixel <= half; pixel++) {
    let sum = 0;
    for (let q = 0; q < nodes.length; q++) {
      const x = (nodes[q] * kernel.width) / 2;
      sum += weights[q] * spreading(x, kernel.width) * Math.cos((2 * Math.PI * x * pixel) / gridSize);
    }
    out[pixel] = (sum * kernel.width) / 2;
  }
  return out;
}

/** Nodes and weights on [−1, 1] by Newton's method on the Legendre recurrence (Abramowitz & Stegun 1964, 25.4.29). */
function gaussLegendre(n: number): { nodes: Float64Array; weights: Float64Array } {
  const nodes = new Float64Array(n);
  const weights = new Float64Array(n);
  for (let i = 0; i < n; i++) {
    let x = Math.cos((Math.PI * (i + 0.75)) / (n + 0.5));
    let slope = 1;
    for (let step = 0; step < 100; step++) {
      let p0 = 1;
      let p1 = x;
      for (let k = 2; k <= n; k++) [p0, p1] = [p1, ((2 * k - 1) * x * p1 - (k - 1) * p0) / k];
      slope = (n * (x * p1 - p0)) / (x * x - 1);
      const change = p1 / slope;
      x -= change;
      if (Math.abs(change) < 1e-15) break;
    }
    nodes[i] = x;
    weights[i] = 2 / ((1 - x * x) * slope * slope);
  }
  return { nodes, weights };
}
