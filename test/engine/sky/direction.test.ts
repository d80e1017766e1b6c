import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { fromHorizontal, parallacticAngle, sourceDirection, toHorizontal } from "../../../src/engine/sky/direction.ts";
import { apart, arbAngle, arbQuarter, SEED, turnApart } from "../../support/arbitrary.ts";

const HALF = Math.PI / 2;

describe("directions", () => {
  it("are unit vectors, X at the meridian, Y at −6 h, Z at the pole", () => {
    fc.assert(
      fc.property(arbAngle, arbQuarter, (h, dec) => {
        expect(Math.abs(Math.hypot(...sourceDirection(h, dec)) - 1)).toBeLessThanOrEqual(2 * Number.EPSILON);
      }),
      SEED,
    );
    // The nearest double to π/2 has a cosine of 6e-17.
    expect(apart(sourceDirection(0, 0), [1, 0, 0])).toBe(0);
    expect(apart(sourceDirection(-HALF, 0), [0, 1, 0])).toBeLessThanOrEqual(1e-16);
    expect(apart(sourceDirection(2, HALF), [0, 0, 1])).toBeLessThanOrEqual(1e-16);
  });

  it("come back from the horizon, poles and zeniths included", () => {
    fc.assert(
      fc.property(arbAngle, arbQuarter, arbQuarter, (h, dec, lat) => {
        const { azimuthRad, elevationRad } = toHorizontal(h, dec, lat);
        const back = fromHorizontal(azimuthRad, elevationRad, lat);
        // As directions, for an hour angle means nothing at a pole: a dozen roundings, and a turn of up to 20 rad.
        expect(apart(sourceDirection(back.hourAngleRad, back.decRad), sourceDirection(h, dec))).toBeLessThanOrEqual(1e-14);
        expect(Math.abs(elevationRad)).toBeLessThanOrEqual(HALF);
        expect(azimuthRad >= 0 && azimuthRad < 2 * Math.PI && !Object.is(azimuthRad, -0)).toBe(true);
      }),
      { ...SEED, numRuns: 500 },
    );
  });

  it("have an elevation that obeys the spherical law of cosines", () => {
    fc.assert(
      fc.property(arbAngle, arbQuarter, arbQuarter, (h, dec, lat) => {
        const law = Math.sin(lat) * Math.sin(dec) + Math.cos(lat) * Math.cos(dec) * Math.cos(h);
        expect(Math.abs(Math.sin(toHorizontal(h, dec, lat).elevationRad) - law)).toBeLessThanOrEqual(4 * Number.EPSILON);
      }),
      SEED,
    );
  });

  it("mirror about the meridian: what is west at H is as far east at −H", () => {
    fc.assert(
      fc.property(arbAngle, arbQuarter, arbQuarter, (h, dec, lat) => {
        const [west, east] = [toHorizontal(h, dec, lat), toHorizontal(-h, dec, lat)];
        expect(west.elevationRad).toBe(east.elevationRad);
        // An azimuth of π is its own mirror; the last digit of π is not.
        expect(turnApart(west.azimuthRad, -east.azimuthRad)).toBeLessThanOrEqual(4 * Number.EPSILON * Math.PI);
        expect(Math.abs(parallacticAngle(h, dec, lat) + parallacticAngle(-h, dec, lat)) % (2 * Math.PI)).toBe(0);
      }),
      SEED,
    );
  });

  it("rise in the east and set in the west", () => {
    expect(toHorizontal(-HALF, 0, -0.5).azimuthRad).toBeCloseTo(HALF, 14);
    expect(toHorizontal(HALF, 0, -0.5).azimuthRad).toBeCloseTo(3 * HALF, 14);
    expect(toHorizontal(0, 0, -0.5)).toEqual({ azimuthRad: 0, elevationRad: HALF - 0.5 }); // north, from the south
  });

  it("have a parallactic angle that obeys the law of sines, and is 0 at transit on the equator's side", () => {
    fc.assert(
      fc.property(arbAngle, arbQuarter, arbQuarter, (h, dec, lat) => {
        const { azimuthRad, elevationRad } = toHorizontal(h, dec, lat);
        const pa = parallacticAngle(h, dec, lat);
        // sin q cos e = sin H cos φ, also where q means nothing, for then cos e is 0.
        const off = Math.sin(pa) * Math.cos(elevationRad) - Math.sin(h) * Math.cos(lat);
        expect(Math.abs(off)).toBeLessThanOrEqual(1e-15);
        expect(Number.isFinite(azimuthRad)).toBe(true);
      }),
      SEED,
    );
    expect(parallacticAngle(0, 0.1, 0.8)).toBe(0);
    expect(Math.abs(parallacticAngle(0, 1.2, 0.8))).toBe(Math.PI);
    expect(parallacticAngle(0, 0, 0)).toBe(0);
  });

  it("refuse degrees", () => {
    const wanted = "expected radians in [-π/2, π/2]. Were degrees passed?";
    expect(() => sourceDirection(0, -45)).toThrow(`decRad is -45; ${wanted}`);
    expect(() => toHorizontal(0, 0, 52)).toThrow(`latRad is 52; ${wanted}`);
    expect(() => fromHorizontal(0, 30, 0)).toThrow(`elevationRad is 30; ${wanted}`);
    expect(() => parallacticAngle(Number.NaN, 0, 0)).toThrow("hourAngleRad is NaN; expected a finite number.");
  });
});
