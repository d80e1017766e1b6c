import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { DomainError } from "../../../src/base/errors.ts";
import { ecefToGeodetic, geodeticToEcef, WGS84 } from "../../../src/engine/geodesy/wgs84.ts";
import { apart, arbHeightM, arbLongitude, arbQuarter, SEED, turnApart } from "../../support/arbitrary.ts";

const polarM = 6_356_752.314245179; // Source: WGS 84 (NGA.STND.0036, 2014), derived from its defining constants

describe("geodetic and geocentric coordinates", () => {
  it("come back from a round trip within rounding, poles and antimeridian included", () => {
    fc.assert(
      fc.property(arbQuarter, arbLongitude, arbHeightM, (lat, lon, height) => {
        const back = ecefToGeodetic(geodeticToEcef(lat, lon, height));
        expect(Math.abs(back.latRad - lat)).toBeLessThanOrEqual(5e-16); // one unit in the last place of 1.6, and the pole's own
        expect(Math.abs(back.heightM - height)).toBeLessThanOrEqual(4e-9); // four roundings of 6e6 m
        // At a pole a longitude moves nothing that can be seen; elsewhere it errs by metres over the distance to the axis.
        const axisM = 6.4e6 * Math.cos(lat);
        expect(turnApart(back.lonRad, lon) * axisM).toBeLessThanOrEqual(4e-9);
      }),
      SEED,
    );
  });

  it("meet the given point from anywhere outside the core to a million kilometres out", () => {
    const arbRadius = fc.double({ min: Math.log(50_001), max: Math.log(1e9), noNaN: true }).map(Math.exp);
    fc.assert(
      fc.property(arbRadius, arbQuarter, arbLongitude, (r, lat, lon) => {
        const point = [r * Math.cos(lat) * Math.cos(lon), r * Math.cos(lat) * Math.sin(lon), r * Math.sin(lat)] as const;
        const { latRad, lonRad, heightM } = ecefToGeodetic(point);
        const again = geodeticToEcef(latRad, lonRad, heightM);
        expect(apart(again, point)).toBeLessThanOrEqual(Math.max(4e-9, 4 * Number.EPSILON * r)); // as its docstring promises
      }),
      { ...SEED, numRuns: 1000 },
    );
  });

  it("put the poles on the axis, and the axis at longitude 0", () => {
    for (const sign of [1, -1]) {
      const [x, y, z] = geodeticToEcef((sign * Math.PI) / 2, 2.5, 100);
      expect(Math.hypot(x, y)).toBeLessThanOrEqual(1e-9); // 6.4e6 m times the cosine of the nearest double to π/2
      expect(z).toBeCloseTo(sign * (polarM + 100), 8);
      const axis = ecefToGeodetic([0, 0, sign * (polarM + 100)]);
      expect(axis.latRad).toBe((sign * Math.PI) / 2);
      expect(axis.lonRad).toBe(0);
      expect(axis.heightM).toBeCloseTo(100, 8);
    }
  });

  it("tell the two sides of the antimeridian apart only by the sign of y", () => {
    expect(ecefToGeodetic([-WGS84.aM, 0, 0])).toEqual({ latRad: 0, lonRad: Math.PI, heightM: 0 });
    expect(ecefToGeodetic([-WGS84.aM, -0, 0])).toEqual({ latRad: 0, lonRad: -Math.PI, heightM: 0 });
    expect(ecefToGeodetic([-WGS84.aM, -1, 0]).lonRad).toBeLessThan(0);
  });

  it("grow along the normal with height", () => {
    fc.assert(
      fc.property(arbQuarter, arbLongitude, arbHeightM, (lat, lon, height) => {
        const [low, high] = [geodeticToEcef(lat, lon, 0), geodeticToEcef(lat, lon, height)];
        expect(Math.abs(apart(low, high) - Math.abs(height))).toBeLessThanOrEqual(8e-9); // both ends rounded at 6e6 m
      }),
      SEED,
    );
  });

  it("refuse what is no place", () => {
    expect(() => geodeticToEcef(45, 0, 0)).toThrow("latRad is 45; expected radians in [-π/2, π/2]. Were degrees passed?");
    expect(() => geodeticToEcef(Number.NaN, 0, 0)).toThrow(DomainError);
    expect(() => geodeticToEcef(0, Number.POSITIVE_INFINITY, 0)).toThrow("lonRad");
    expect(() => geodeticToEcef(0, 0, Number.NaN)).toThrow("heightM");
    expect(() => ecefToGeodetic([0, 0, 0])).toThrow("xyzM is [0,0,0]; expected finite geocentric metres");
    expect(() => ecefToGeodetic([Number.NaN, 7e6, 0])).toThrow(DomainError);
    expect(() => ecefToGeodetic([Number.POSITIVE_INFINITY, 0, 0])).toThrow(DomainError);
  });
});
