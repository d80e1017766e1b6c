import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { ecefToEnu, enuFrame, enuToEcef } from "../../../src/engine/geodesy/enu.ts";
import { dot } from "../../../src/engine/geodesy/vec3.ts";
import { geodeticToEcef } from "../../../src/engine/geodesy/wgs84.ts";
import { apart, arbHeightM, arbLengthM, arbLongitude, arbQuarter, SEED } from "../../support/arbitrary.ts";

const arbFrame = fc.tuple(arbQuarter, arbLongitude, arbHeightM).map(([lat, lon, h]) => enuFrame(lat, lon, h));
const arbPoint = fc.tuple(arbLengthM, arbLengthM, arbLengthM);

describe("east, north, up", () => {
  it("come back from a round trip at any distance", () => {
    fc.assert(
      fc.property(arbFrame, arbPoint, (frame, enu) => {
        const back = ecefToEnu(frame, enuToEcef(frame, enu));
        expect(apart(back, enu)).toBeLessThanOrEqual(16 * Number.EPSILON * 4e7); // two rotations of lengths below 4e7 m
      }),
      SEED,
    );
  });

  it("are a right-handed set of unit vectors, at the poles too", () => {
    fc.assert(
      fc.property(arbFrame, ({ east: e, north: n, up }) => {
        const cross = [e[1] * n[2] - e[2] * n[1], e[2] * n[0] - e[0] * n[2], e[0] * n[1] - e[1] * n[0]];
        expect(apart(cross, up)).toBeLessThanOrEqual(4 * Number.EPSILON);
        for (const axis of [e, n, up]) expect(Math.abs(dot(axis, axis) - 1)).toBeLessThanOrEqual(4 * Number.EPSILON);
      }),
      SEED,
    );
  });

  it("keep distances", () => {
    fc.assert(
      fc.property(arbFrame, arbPoint, arbPoint, (frame, a, b) => {
        const turned = apart(ecefToEnu(frame, a), ecefToEnu(frame, b));
        expect(Math.abs(turned - apart(a, b))).toBeLessThanOrEqual(16 * Number.EPSILON * 6e7);
      }),
      SEED,
    );
  });

  it("are zero at the origin, and point where they say", () => {
    fc.assert(
      fc.property(arbQuarter, arbLongitude, arbHeightM, (lat, lon, h) => {
        const frame = enuFrame(lat, lon, h);
        expect(Math.hypot(...ecefToEnu(frame, frame.originEcefM))).toBe(0);
        const above = ecefToEnu(frame, geodeticToEcef(lat, lon, h + 1000));
        expect(apart(above, [0, 0, 1000])).toBeLessThanOrEqual(8e-9); // geocentric metres rounded at 6e6 m
      }),
      SEED,
    );
    const frame = enuFrame(0.8, 2, 500);
    expect(ecefToEnu(frame, geodeticToEcef(0.8, 2.0001, 500))[0]).toBeGreaterThan(400);
    expect(ecefToEnu(frame, geodeticToEcef(0.8001, 2, 500))[1]).toBeGreaterThan(600);
  });

  it("see each other's up end from both ends of a line, with the height curvature takes away", () => {
    // Chord c on a sphere of radius R drops c²/2R below the horizon; on the ellipsoid R lies between its radii of curvature.
    const [a, b] = [enuFrame(-0.4, 0.3, 0), enuFrame(-0.4, 0.31, 0)];
    const [there, back] = [ecefToEnu(a, b.originEcefM), ecefToEnu(b, a.originEcefM)];
    expect(Math.hypot(...there)).toBeCloseTo(Math.hypot(...back), 7);
    const drop = Math.hypot(...there) ** 2 / 2;
    expect(-there[2]).toBeGreaterThan(drop / 6_399_594); // the polar radius of curvature
    expect(-there[2]).toBeLessThan(drop / 6_335_439); // the smallest, at the equator
  });
});
