import { describe, expect, it } from "vitest";
import { DomainError } from "../../../src/base/errors.ts";
import { PROTECTED_BANDS, protectionOf } from "../../../src/engine/sky/bands.ts";
import { airFactor, gasAttenuation, referenceAir, zenithOpacity } from "../../../src/engine/sky/opacity.ts";

describe("the reference atmosphere", () => {
  it("has the standard's values at sea level and is continuous over its layers", () => {
    const sea = referenceAir(0);
    expect(sea.temperatureK).toBeCloseTo(288.15, 9);
    expect(sea.dryHPa + sea.vapourHPa).toBeCloseTo(1013.25, 9);
    // 7.5 g/m³ at 288.15 K, as the line-by-line workbook has it.
    expect(sea.vapourHPa).toBeCloseTo(9.97288879, 6);
    for (const km of [11, 20, 32, 47, 51, 71]) {
      // Geopotential to geometric height.
      const heightM = (1000 * 6356.766 * km) / (6356.766 - km);
      const [below, above] = [referenceAir(heightM - 0.01), referenceAir(heightM + 0.01)];
      expect(above.temperatureK).toBeCloseTo(below.temperatureK, 3);
      // The standard prints the pressure of each base to seven digits.
      expect(above.dryHPa / below.dryHPa).toBeCloseTo(1, 4);
    }
    expect(() => referenceAir(90_000)).toThrow(DomainError);
    expect(() => referenceAir(0, -1)).toThrow(DomainError);
  });
});

describe("opacity", () => {
  it("falls with height, rises with vapour, and is high in the oxygen line", () => {
    expect(zenithOpacity(230e9, 5000)).toBeLessThan(zenithOpacity(230e9, 0));
    expect(zenithOpacity(22.2e9, 0, 15)).toBeGreaterThan(zenithOpacity(22.2e9, 0, 7.5));
    expect(zenithOpacity(60e9, 0)).toBeGreaterThan(10);
    expect(zenithOpacity(80e9, 80_000)).toBe(0);
  });

  it("does not move when its layers are made finer by starting lower", () => {
    // From −0.1 m the layers fall elsewhere; the sum must not care.
    expect(zenithOpacity(43e9, 0) / zenithOpacity(43e9, -0.1)).toBeCloseTo(1, 4);
  });

  it("is none without air, and refuses frequencies the standard does not speak of", () => {
    expect(gasAttenuation(1e11, { dryHPa: 0, vapourHPa: 0, temperatureK: 200 })).toEqual({ dryDbPerKm: 0, vapourDbPerKm: 0 });
    expect(() => gasAttenuation(0, referenceAir(0))).toThrow(DomainError);
    expect(() => gasAttenuation(2e12, referenceAir(0))).toThrow(DomainError);
    expect(() => gasAttenuation(Number.NaN, referenceAir(0))).toThrow(DomainError);
  });

  it("raises the SEFD by nothing where there is none, and more toward the horizon", () => {
    expect(airFactor(0, 1, 30, 260)).toBe(1);
    expect(airFactor(0.1, 0.3, 30, 260)).toBeGreaterThan(airFactor(0.1, 1.5, 30, 260));
    // Hot air of the system's own temperature, opaque to first order: (1 + τ)(1 + τ).
    expect(airFactor(1e-6, Math.PI / 2, 100, 100)).toBeCloseTo(1 + 2e-6, 11);
    expect(() => airFactor(0.1, 0, 30, 260)).toThrow(DomainError);
    expect(() => airFactor(0.1, 1, 0, 260)).toThrow(DomainError);
  });
});

describe("protected bands", () => {
  it("stand in order and do not overlap", () => {
    for (let k = 1; k < PROTECTED_BANDS.length; k++) {
      expect(PROTECTED_BANDS[k].fromHz).toBeGreaterThanOrEqual(PROTECTED_BANDS[k - 1].toHz);
    }
  });

  it("say how much of a band in use they cover", () => {
    expect(protectionOf(1.4e9, 1.427e9)).toMatchObject({ fraction: 1 });
    expect(protectionOf(1.2e9, 1.3e9)).toEqual({ bands: [], fraction: 0 });
    expect(protectionOf(1.413e9, 1.441e9).fraction).toBeCloseTo(0.5, 9);
    expect(() => protectionOf(2e9, 1e9)).toThrow(DomainError);
  });
});
