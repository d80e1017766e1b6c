import type { BeamImage } from "../../assess/result.ts";
import { ARCSEC_PER_RAD, RAD_PER_DEG } from "../../base/constants.ts";

/** Weights of the four neighbours of a point `t` past the second (Catmull & Rom 1974): through the samples, without their blocks. */
function weights(t: number, out: Float64Array): void {
  const t2 = t * t;
  const t3 = t2 * t;
  out[0] = (-t3 + 2 * t2 - t) / 2;
  out[1] = (3 * t3 - 5 * t2 + 2) / 2;
  out[2] = (-3 * t3 + 4 * t2 + t) / 2;
  out[3] = (t3 - t2) / 2;
}

/**
 * The middle of a beam image drawn again on other pixels, for the screen only.
 *
 * @param halfWidthArcsec - From the peak to the edge of the new image.
 * @param size - Pixels a side of the new image.
 * @returns (size, size) row-major, l to the east with x and m to the north with y as in the image itself; what lies outside
 *   the image is 0.
 */
export function resampled(image: BeamImage, halfWidthArcsec: number, size: number): Float32Array {
  const step = (2 * halfWidthArcsec) / ARCSEC_PER_RAD / image.pixelRad / size;
  const start = image.size / 2 - halfWidthArcsec / ARCSEC_PER_RAD / image.pixelRad + step / 2;
  const n = image.size;
  const w = new Float64Array(4);
  const first = new Int32Array(size);
  const taps = new Float64Array(4 * size);
  for (let k = 0; k < size; k++) {
    const at = start + k * step;
    first[k] = Math.floor(at) - 1;
    weights(at - Math.floor(at), w);
    taps.set(w, 4 * k);
  }
  const rows = new Float64Array(n * size);
  for (let y = 0; y < n; y++) {
    for (let k = 0; k < size; k++) {
      let sum = 0;
      for (let j = 0; j < 4; j++) {
        const x = first[k] + j;
        if (x >= 0 && x < n) sum += taps[4 * k + j] * image.values[n * y + x];
      }
      rows[size * y + k] = sum;
    }
  }
  const out = new Float32Array(size * size);
  for (let k = 0; k < size; k++) {
    for (let j = 0; j < 4; j++) {
      const y = first[k] + j;
      if (y < 0 || y >= n) continue;
      const tap = taps[4 * k + j];
      for (let x = 0; x < size; x++) out[size * k + x] += tap * rows[size * y + x];
    }
  }
  return out;
}

/** The beam at an offset, arcsec east and north of the peak; NaN outside the image. Drawing only: figures come from the result. */
export function beamAtArcsec(image: BeamImage, east: number, north: number): number {
  const n = image.size;
  const x = n / 2 + east / ARCSEC_PER_RAD / image.pixelRad;
  const y = n / 2 + north / ARCSEC_PER_RAD / image.pixelRad;
  const x0 = Math.floor(x) - 1;
  const y0 = Math.floor(y) - 1;
  if (!(x0 >= 0 && y0 >= 0 && x0 + 3 < n && y0 + 3 < n)) return Number.NaN;
  const wx = new Float64Array(4);
  const wy = new Float64Array(4);
  weights(x - Math.floor(x), wx);
  weights(y - Math.floor(y), wy);
  let sum = 0;
  for (let j = 0; j < 4; j++) {
    for (let i = 0; i < 4; i++) sum += wy[j] * wx[i] * image.values[n * (y0 + j) + x0 + i];
  }
  return sum;
}

/** East and north parts of a unit step along a position angle, north through east. */
export function along(positionAngleDeg: number): { readonly east: number; readonly north: number } {
  return { east: Math.sin(positionAngleDeg * RAD_PER_DEG), north: Math.cos(positionAngleDeg * RAD_PER_DEG) };
}
