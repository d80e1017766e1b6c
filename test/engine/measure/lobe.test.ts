import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { curvatureEllipse, fitLobe, wrapAngle } from "../../../src/engine/measure/lobe.ts";
import { discBeam, gaussianBeam, planeOf, squarePlane } from "../../support/analytic.ts";

const angleGap = (p: number, q: number): number => {
  const d = wrapAngle(p - q);
  return Math.min(d, Math.PI - d);
};

describe("the fitted lobe", () => {
  it("gives a Gaussian back: widths and position angle, on square and on skewed pixels", () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1, max: 8, noNaN: true }),
        fc.double({ min: 0, max: Math.PI - 1e-6, noNaN: true }),
        fc.boolean(),
        (ratio, angle, skewed) => {
          const minor = 1e-5;
          const major = minor * ratio;
          const p = minor / 24;
          const axes = skewed
            ? { size: 512, xl: p, xm: 0.2 * p, yl: -0.3 * p, ym: 1.1 * p }
            : { size: 512, xl: p, xm: 0, yl: 0, ym: p };
          const lobe = fitLobe(planeOf(axes, gaussianBeam(major, minor, angle)));
          if (!lobe) throw new Error("no lobe");
          // Gauss–Newton ends at 1e-13 of the form; angles of nearly round lobes are as uncertain as 1/(ratio − 1).
          expect(Math.abs(lobe.majorRad / major - 1)).toBeLessThan(1e-9);
          expect(Math.abs(lobe.minorRad / minor - 1)).toBeLessThan(1e-9);
          if (ratio > 1.01) expect(angleGap(lobe.positionAngleRad, angle)).toBeLessThan(1e-7);
        },
      ),
      { seed: 20260101, numRuns: 30 },
    );
  });

  it("of a disc's beam stops moving as the pixels shrink", () => {
    const rho = 1e5;
    const width = (pixels: number) => fitLobe(squarePlane(8 * pixels, 0.705 / rho / pixels, discBeam(rho)))?.majorRad ?? Number.NaN;
    const finest = width(64) * rho;
    // The region above half is counted in pixels: its edge moves the fit by less than a part in 10³ from 20 pixels on.
    for (const pixels of [20, 32, 48]) expect(Math.abs((width(pixels) * rho) / finest - 1)).toBeLessThan(1e-3);
  });

  it("is undefined where the half level does not close inside the image", () => {
    expect(fitLobe(squarePlane(64, 1e-6, gaussianBeam(1e-3, 1e-5, 0.3)))).toBeUndefined();
  });
});

describe("the ellipse of the peak's curvature", () => {
  it("is the Gaussian's own for a Gaussian uv distribution", () => {
    const [major, minor, angle] = [3e-5, 1e-5, 0.6];
    // Source: σ_uv σ_lm = 1/(2π) for a Fourier pair of Gaussians; FWHM = √(8 ln 2) σ.
    const sigma = (fwhm: number) => Math.sqrt(8 * Math.LN2) / (2 * Math.PI * fwhm);
    const along = sigma(major) ** 2;
    const across = sigma(minor) ** 2;
    const [s, c] = [Math.sin(angle), Math.cos(angle)];
    const got = curvatureEllipse(along * s * s + across * c * c, (along - across) * s * c, along * c * c + across * s * s);
    expect(got.majorRad / major).toBeCloseTo(1, 12);
    expect(got.minorRad / minor).toBeCloseTo(1, 12);
    expect(angleGap(got.positionAngleRad, angle)).toBeLessThan(1e-12);
  });

  it("has no major axis for samples in one line", () => {
    expect(curvatureEllipse(4, 0, 0).majorRad).toBe(Number.POSITIVE_INFINITY);
    expect(angleGap(curvatureEllipse(4, 0, 0).positionAngleRad, 0)).toBeLessThan(1e-12); // u only: the beam is long to the north
    expect(angleGap(curvatureEllipse(0, 0, 4).positionAngleRad, Math.PI / 2)).toBeLessThan(1e-12);
  });
});

describe("position angles", () => {
  it("lie in [0, π), −0 and whole turns included", () => {
    expect(wrapAngle(Math.PI)).toBe(0);
    expect(wrapAngle(-0)).toBe(0);
    expect(wrapAngle(-Number.MIN_VALUE)).toBe(0);
    expect(wrapAngle(-0.1)).toBeCloseTo(Math.PI - 0.1, 15);
  });
});
