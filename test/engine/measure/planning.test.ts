import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { DomainError } from "../../../src/base/errors.ts";
import { correlatorLoad, fieldNeeds } from "../../../src/engine/measure/load.ts";
import {
  besselJ1,
  betaOfLoss,
  discVisibility,
  erf,
  gaussianOfVisibility,
  gaussianVisibility,
  squareBandPeak,
} from "../../../src/engine/measure/loss.ts";
import { fraunhoferM } from "../../../src/engine/measure/nearfield.ts";
import { effectiveAreaM2, planckFactor, ruzeFactor, sefdJy } from "../../../src/engine/measure/sefd.ts";
import { hiddenPart, shadeElevationRad } from "../../../src/engine/measure/shade.ts";
import { positionTolerance } from "../../../src/engine/measure/tolerance.ts";
import { besselJ } from "../../support/analytic.ts";

describe("losses", () => {
  it("invert: the β of a loss has that loss", () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-6, max: 0.95, noNaN: true }), (loss) => {
        expect(squareBandPeak(betaOfLoss(loss))).toBeCloseTo(1 - loss, 9);
      }),
      { seed: 31 },
    );
    expect(() => betaOfLoss(1)).toThrow(DomainError);
    expect(() => squareBandPeak(-1)).toThrow(DomainError);
  });

  it("join their series and closed forms smoothly", () => {
    expect(squareBandPeak(1e-4 * (1 - 1e-9))).toBeCloseTo(squareBandPeak(1e-4), 14);
    expect(erf(3 - 1e-9)).toBeCloseTo(erf(3), 8);
    // Abramowitz & Stegun table 7.1: erf 0.5, 1, 2; erfc 3 from its continued fraction.
    expect(erf(0.5)).toBeCloseTo(0.5204998778, 10);
    expect(erf(1)).toBeCloseTo(0.8427007929, 10);
    expect(erf(-2)).toBeCloseTo(-0.995322265, 9);
    expect(1 - erf(3)).toBeCloseTo(2.2090497e-5, 12);
  });

  it("have a J₁ that agrees with another way of computing it", () => {
    for (const x of [0.1, 1, 2.5, 3.83, 7, 15]) expect(besselJ1(x)).toBeCloseTo(besselJ(1, x), 12);
    expect(discVisibility(0, 1)).toBe(1);
  });

  it("turn visibilities into sizes and back", () => {
    fc.assert(
      fc.property(fc.double({ min: 0.01, max: 1, noNaN: true }), (v) => {
        expect(gaussianVisibility(gaussianOfVisibility(v), 1)).toBeCloseTo(v, 12);
      }),
      { seed: 32 },
    );
    expect(() => gaussianOfVisibility(0)).toThrow(DomainError);
  });
});

describe("sensitivity of a dish", () => {
  it("scales as it must: SEFD with temperature, inversely with area and efficiency", () => {
    expect(sefdJy(50, 12, 0.7)).toBeCloseTo(2 * sefdJy(25, 12, 0.7), 9);
    expect(sefdJy(25, 24, 0.7)).toBeCloseTo(sefdJy(25, 12, 0.7) / 4, 9);
    expect(sefdJy(25, 12, 0.35)).toBeCloseTo(2 * sefdJy(25, 12, 0.7), 9);
    expect(() => sefdJy(0, 12, 0.7)).toThrow("systemK is 0; expected a temperature above 0 K");
    expect(() => effectiveAreaM2(12, 1.1)).toThrow(DomainError);
    expect(() => effectiveAreaM2(-1, 1)).toThrow(DomainError);
  });

  it("loses nothing with a perfect surface, and Planck joins Rayleigh–Jeans at long waves", () => {
    expect(ruzeFactor(0, 0.01)).toBe(1);
    expect(planckFactor(1e6, 300)).toBeCloseTo(1, 6);
    expect(planckFactor(0, 300)).toBe(1);
  });
});

describe("dishes in each other's way", () => {
  it("hide all, half or nothing", () => {
    expect(hiddenPart(0, 12)).toBe(1);
    expect(hiddenPart(12, 12)).toBe(0);
    expect(hiddenPart(40, 12)).toBe(0);
    expect(() => hiddenPart(-1, 12)).toThrow(DomainError);
    expect(shadeElevationRad(12, 12)).toBeCloseTo(Math.PI / 2, 12);
    expect(shadeElevationRad(12, 6)).toBeCloseTo(Math.PI / 2, 12);
    expect(() => shadeElevationRad(12, 0)).toThrow(DomainError);
  });
});

describe("what a wanted field asks for", () => {
  it("loses at its edge what was allowed", () => {
    const needs = fieldNeeds(10, 1, 1.42e9, 0.1);
    // Ten widths off with a channel of β·ν/10.
    expect(squareBandPeak((needs.channelWidthHz / 1.42e9) * 10)).toBeCloseTo(0.9, 9);
    expect(() => fieldNeeds(0, 1, 1e9, 0.1)).toThrow(DomainError);
    expect(() => fieldNeeds(1, 1, 1e9, 1)).toThrow(DomainError);
  });

  it("counts visibilities, bytes and operations by the stated formulas", () => {
    const load = correlatorLoad(4, 8e6, { channelWidthHz: 1e6, sampleS: 2 }, 4);
    expect(load).toEqual({
      channels: 8,
      visibilitiesPerS: (10 * 8 * 4) / 2,
      bytesPerS: 8 * 160,
      crossPerS: 10 * 4 * 8e6,
      transformPerS: 5 * 4 * 2 * 8e6 * 3,
    });
    expect(() => correlatorLoad(0, 1, { channelWidthHz: 1, sampleS: 1 }, 1)).toThrow(DomainError);
  });
});

describe("positions that are off", () => {
  it("cost nothing at no error, and phase in proportion", () => {
    expect(positionTolerance(0, 0.21, 1000)).toEqual({ phaseRad: 0, coherence: 1, widthFraction: 0 });
    const { phaseRad, coherence } = positionTolerance(0.01, 0.21, 1000);
    expect(phaseRad).toBeCloseTo(2 * Math.PI * Math.SQRT2 * (0.01 / 0.21), 12);
    expect(coherence).toBeLessThan(1);
    expect(() => positionTolerance(-1, 0.21, 1000)).toThrow(DomainError);
  });

  it("have no far field of no aperture", () => {
    expect(fraunhoferM(0, 0.21)).toBe(0);
    expect(() => fraunhoferM(1, 0)).toThrow(DomainError);
  });
});
