import { describe, expect, it } from "vitest";
import type { BeamImage } from "../../../src/assess/result.ts";
import { ARCSEC_PER_RAD } from "../../../src/base/constants.ts";
import { along, beamAtArcsec, resampled } from "../../../src/view/resolve/sample.ts";

const FWHM = 1.8;
const PIXEL = FWHM / 6;
/** A round Gaussian, displaced so that east and north differ. */
const gaussian = (east: number, north: number): number =>
  Math.exp((-4 * Math.LN2 * ((east - 0.4) ** 2 + (north + 0.2) ** 2)) / FWHM ** 2);
const size = 64;
const image: BeamImage = {
  size,
  pixelRad: PIXEL / ARCSEC_PER_RAD,
  values: Float32Array.from({ length: size * size }, (_, k) =>
    gaussian(((k % size) - size / 2) * PIXEL, (Math.floor(k / size) - size / 2) * PIXEL),
  ),
};
// Cubic interpolation of a Gaussian with six samples a FWHM: the error is of third order in the step, below half a percent.
const TOLERANCE = 5e-3;

describe("beamAtArcsec", () => {
  it("reads the image between its pixels, east and north of the peak", () => {
    for (const [east, north] of [
      [0, 0],
      [0.4, -0.2],
      [1.13, 0.77],
      [-0.91, 1.3],
      [2.04, -1.99],
    ] as const) {
      expect(Math.abs(beamAtArcsec(image, east, north) - gaussian(east, north))).toBeLessThan(TOLERANCE);
    }
  });

  it("is not a number outside the image", () => {
    expect(beamAtArcsec(image, 40, 0)).toBeNaN();
    expect(beamAtArcsec(image, 0, -40)).toBeNaN();
  });
});

describe("resampled", () => {
  it("draws the middle on finer pixels, in the order of the image", () => {
    const half = 4;
    const n = 100;
    const out = resampled(image, half, n);
    let worst = 0;
    for (let y = 0; y < n; y++) {
      for (let x = 0; x < n; x++) {
        const at = (k: number): number => ((k + 0.5) * 2 * half) / n - half;
        worst = Math.max(worst, Math.abs(out[n * y + x] - gaussian(at(x), at(y))));
      }
    }
    expect(worst).toBeLessThan(TOLERANCE);
  });

  it("is zero outside the image", () => {
    expect(resampled(image, 20, 50)[0]).toBe(0);
  });
});

describe("along", () => {
  it("counts position angles north through east", () => {
    expect(along(0)).toEqual({ east: 0, north: 1 });
    expect(along(90).east).toBeCloseTo(1, 12);
  });
});
