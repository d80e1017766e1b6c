/**
 * A beam sampled on a parallelogram of directions: pixel (x, y) stands at `size * y + x` and shows the direction
 * (l, m) = (x − size/2)·(xl, xm) + (y − size/2)·(yl, ym), radians, l east and m north. Values are fractions of the peak.
 */
export interface BeamPlane extends PlaneAxes {
  readonly values: Float64Array;
}

export interface PlaneAxes {
  /** Pixels a side, even. */
  readonly size: number;
  /** One step of x. */
  readonly xl: number;
  readonly xm: number;
  /** One step of y. */
  readonly yl: number;
  readonly ym: number;
}

/** The usual image: square pixels, x to the east, y to the north. */
export function squareAxes(size: number, pixelRad: number): PlaneAxes {
  return { size, xl: pixelRad, xm: 0, yl: 0, ym: pixelRad };
}

/** Pixel coordinates, from the centre, of a direction. */
export function planePixel(axes: PlaneAxes, l: number, m: number): { x: number; y: number } {
  const { xl, xm, yl, ym } = axes;
  const det = xl * ym - xm * yl;
  return { x: (l * ym - m * yl) / det, y: (m * xl - l * xm) / det };
}

/** Pixels from the centre within which `interpolate` has all the neighbours it needs. */
export function planeReach(axes: PlaneAxes): number {
  return axes.size / 2 - 4;
}

/**
 * The beam between pixels by Lagrange's formula on 6 × 6 neighbours (Abramowitz & Stegun 1964, 25.2.6): its error for the
 * finest ripple that a beam of 6 pixels a FWHM carries is below 1e-4 of that ripple.
 *
 * @param x - Pixels from the centre, each within `planeReach`.
 * @param y - Goes with x.
 */
export function interpolate(plane: BeamPlane, x: number, y: number): number {
  const { size, values } = plane;
  const column = Math.floor(x);
  const row = Math.floor(y);
  lagrange6(x - column, WX);
  lagrange6(y - row, WY);
  let sum = 0;
  let at = size * (row + size / 2 - 2) + column + size / 2 - 2;
  for (let b = 0; b < 6; b++, at += size) {
    sum +=
      WY[b] *
      (WX[0] * values[at] +
        WX[1] * values[at + 1] +
        WX[2] * values[at + 2] +
        WX[3] * values[at + 3] +
        WX[4] * values[at + 4] +
        WX[5] * values[at + 5]);
  }
  return sum;
}

// Written before each use within one call: nothing is carried over.
const WX = new Float64Array(6);
const WY = new Float64Array(6);

/** Weights of the points −2 … 3 for a place f in [0, 1). */
function lagrange6(f: number, out: Float64Array): void {
  const a = f + 2;
  const b = f + 1;
  const d = f - 1;
  const e = f - 2;
  const g = f - 3;
  out[0] = (-b * f * d * e * g) / 120;
  out[1] = (a * f * d * e * g) / 24;
  out[2] = (-a * b * d * e * g) / 12;
  out[3] = (a * b * f * e * g) / 12;
  out[4] = (-a * b * f * d * g) / 24;
  out[5] = (a * b * f * d * e) / 120;
}
