import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { stationNormals, stationXyzM } from "../../../src/engine/geodesy/originframe.ts";
import { geodeticToEcef } from "../../../src/engine/geodesy/wgs84.ts";
import { sourceDirection, toHorizontal } from "../../../src/engine/sky/direction.ts";
import { apart, arbAngle, arbHeightM, arbLongitude, arbQuarter, arbXyzM, SEED } from "../../support/arbitrary.ts";

describe("the frame of the origin's meridian", () => {
  it("puts the origin on Y = 0 and X outward, with 90° east along Y", () => {
    fc.assert(
      fc.property(arbQuarter, arbLongitude, arbHeightM, (lat, lon, h) => {
        const [x, y, z] = geodeticToEcef(lat, lon, h);
        const [X, Y, Z] = stationXyzM(Float64Array.of(x, y, z), lon);
        expect(Math.abs(Y)).toBeLessThanOrEqual(2e-9); // two products of 6e6 m cancel
        expect(Math.abs(X - Math.hypot(x, y))).toBeLessThanOrEqual(3e-9);
        expect(Z).toBe(z);
      }),
      SEED,
    );
    const [X, Y] = stationXyzM(Float64Array.from(geodeticToEcef(0, 0.3 + Math.PI / 2, 0)), 0.3);
    expect(X).toBeCloseTo(0, 8);
    expect(Y).toBeCloseTo(6_378_137, 8);
  });

  it("is a rotation about the pole: lengths stay, and turning back restores", () => {
    fc.assert(
      fc.property(arbXyzM, arbAngle, (xyz, lon) => {
        const turned = stationXyzM(xyz, lon);
        const back = stationXyzM(turned, -lon);
        for (let k = 0; k < xyz.length; k += 3) {
          const length = Math.hypot(...xyz.subarray(k, k + 3));
          const off = Math.abs(Math.hypot(...turned.subarray(k, k + 3)) - length);
          expect(off).toBeLessThanOrEqual(4 * Number.EPSILON * length);
          expect(apart(back.subarray(k, k + 3), xyz.subarray(k, k + 3))).toBeLessThanOrEqual(8 * Number.EPSILON * length);
        }
      }),
      SEED,
    );
  });

  it("leaves its input as it was", () => {
    const xyz = Float64Array.of(1, 2, 3);
    stationXyzM(xyz, 1);
    expect([...xyz]).toEqual([1, 2, 3]);
  });

  it("turns normals as positions, so that a source's height over a station is its elevation there", () => {
    // A station at longitude λ sees the local hour angle H + (λ − λ0); elevation and the dot product are two roads to one figure.
    fc.assert(
      fc.property(arbQuarter, arbLongitude, arbLongitude, arbAngle, arbQuarter, (lat, lon, origin, hourAngle, dec) => {
        const [x, y, z] = stationNormals([lat], [lon], origin);
        const s = sourceDirection(hourAngle, dec);
        const { elevationRad } = toHorizontal(hourAngle + (lon - origin), dec, lat);
        const up = x * s[0] + y * s[1] + z * s[2];
        expect(Math.abs(up - Math.sin(elevationRad))).toBeLessThanOrEqual(1e-14); // angles up to 26 rad carry 4e-15 of rounding
        expect(Math.abs(Math.hypot(x, y, z) - 1)).toBeLessThanOrEqual(4 * Number.EPSILON);
      }),
      SEED,
    );
  });

  it("refuses halves of vectors and unlike lengths", () => {
    expect(() => stationXyzM(new Float64Array(4), 0)).toThrow("ecefXyzM.length is 4; expected a multiple of 3");
    expect(() => stationXyzM(new Float64Array(3), Number.NaN)).toThrow("originLonRad");
    expect(() => stationNormals([0, 1], [0], 0)).toThrow("lonRad.length is 1; expected 2");
  });
});
