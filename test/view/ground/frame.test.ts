import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { localFrame } from "../../../src/view/ground/frame.ts";

describe("localFrame", () => {
  // A degree of longitude on the equator is π/180 of the semi-major axis, 6 378 137 m (NGA.STND.0036). A degree of latitude
  // there is 110 574 m as tabled in geodesy texts (common value, from memory); tolerance its rounding.
  it("agrees with the lengths of a degree at the equator", () => {
    const frame = localFrame({ latitudeDeg: 0, longitudeDeg: 0, heightM: 0 });
    expect(Math.abs(frame.point(0.001, 0, 0).northM - 110.574)).toBeLessThan(5e-4);
    // The plane shortens an arc of 0.001° by 6e-9 m.
    expect(Math.abs(frame.point(0, 0.001, 0).eastM - (Math.PI * 6_378_137) / 180_000)).toBeLessThan(1e-8);
  });

  it("has its origin at zero and counts east and north positive", () => {
    const frame = localFrame({ latitudeDeg: -31, longitudeDeg: 24, heightM: 1000 });
    const there = frame.point(-31, 24, 1000);
    expect(Math.hypot(there.eastM, there.northM)).toBeLessThan(1e-9);
    expect(frame.point(-30.9, 24, 1000).northM).toBeGreaterThan(0);
    expect(frame.point(-31, 24.1, 1000).eastM).toBeGreaterThan(0);
  });

  it("finds the place again from east, north and height, out to 70° from the origin", () => {
    const angle = (most: number) => fc.double({ min: -most, max: most, noNaN: true });
    fc.assert(
      fc.property(
        angle(80),
        angle(180),
        angle(45),
        angle(45),
        fc.double({ min: -400, max: 5000, noNaN: true }),
        (lat0, lon0, dLat, dLon, h) => {
          const frame = localFrame({ latitudeDeg: lat0, longitudeDeg: lon0, heightM: 1200 });
          const lat = Math.max(-89, Math.min(89, lat0 + dLat));
          const place = frame.point(lat, lon0 + dLon, h);
          const again = frame.at(place.eastM, place.northM, h);
          expect(again).toBeDefined();
          if (!again) return;
          const back = frame.point(again.latitudeDeg, again.longitudeDeg, h);
          // The height is met to 1e-6 m; where the ground stands at 70° that is 3e-6 m sideways.
          expect(Math.hypot(back.eastM - place.eastM, back.northM - place.northM)).toBeLessThan(1e-5);
        },
      ),
      { seed: 20260101, numRuns: 300 },
    );
  });

  it("knows no place past the limb", () => {
    const frame = localFrame({ latitudeDeg: 10, longitudeDeg: 20, heightM: 0 });
    expect(frame.at(6_380_000, 0, 0)).toBeUndefined();
    expect(frame.at(1e9, 0, 0)).toBeUndefined();
  });
});
