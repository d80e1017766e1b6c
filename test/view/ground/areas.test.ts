import { describe, expect, it } from "vitest";
import { areaOf, contains, groundVerdict, shortWay } from "../../../src/view/ground/areas.ts";
import { localFrame } from "../../../src/view/ground/frame.ts";
import { planWith, smallRows, square } from "./plans.ts";

const at = (longitudeDeg: number, latitudeDeg: number) => ({ latitudeDeg, longitudeDeg });

describe("contains", () => {
  it("tells inside from outside, and a hole from both", () => {
    const ring = square(10, 40, 14, 44);
    const hole = square(11, 41, 12, 42).coordinates[0];
    const holed = { type: "Polygon" as const, coordinates: [ring.coordinates[0], hole] };
    expect(contains(ring, at(12, 42))).toBe(true);
    expect(contains(ring, at(15, 42))).toBe(false);
    expect(contains(ring, at(12, 45))).toBe(false);
    expect(contains(holed, at(11.5, 41.5))).toBe(false);
    expect(contains(holed, at(13, 41.5))).toBe(true);
  });

  it("follows a reentrant ring", () => {
    const horseshoe = {
      type: "Polygon" as const,
      coordinates: [
        [
          [0, 0],
          [3, 0],
          [3, 3],
          [2, 3],
          [2, 1],
          [1, 1],
          [1, 3],
          [0, 3],
          [0, 0],
        ],
      ],
    };
    expect(contains(horseshoe, at(0.5, 2))).toBe(true);
    expect(contains(horseshoe, at(1.5, 2))).toBe(false);
    expect(contains(horseshoe, at(2.5, 2))).toBe(true);
  });

  it("works across the antimeridian and for several polygons", () => {
    const across = square(179, -20, -179, -18);
    expect(contains(across, at(179.9, -19))).toBe(true);
    expect(contains(across, at(-179.9, -19))).toBe(true);
    expect(contains(across, at(178, -19))).toBe(false);
    expect(contains(across, at(0, -19))).toBe(false);
    const two = { type: "MultiPolygon" as const, coordinates: [square(0, 0, 1, 1).coordinates, square(5, 5, 6, 6).coordinates] };
    expect(contains(two, at(5.5, 5.5))).toBe(true);
    expect(contains(two, at(3, 3))).toBe(false);
  });
});

describe("shortWay", () => {
  it("lies in (−180, 180]", () => {
    expect([0, 180, -180, 181, 359, -359, 540].map(shortWay)).toEqual([0, 180, 180, -179, -1, 1, 180]);
  });
});

describe("groundVerdict", () => {
  const { site } = planWith(smallRows, {
    allowed: square(23.9, -31.1, 24.1, -30.9),
    keepOut: [
      { label: "Salt pan reserve", geometry: square(24.0, -31.0, 24.02, -30.98) },
      { geometry: square(24.05, -31.0, 24.06, -30.98) },
    ],
  });

  it("names the keep-out, the boundary, or says clear", () => {
    expect(groundVerdict(site, at(24.01, -30.99))).toEqual({ clear: false, text: "inside Salt pan reserve" });
    expect(groundVerdict(site, at(24.055, -30.99))).toEqual({ clear: false, text: "inside a keep-out" });
    expect(groundVerdict(site, at(25, -31))).toEqual({ clear: false, text: "outside the land boundary" });
    expect(groundVerdict(site, at(23.95, -31.05))).toEqual({ clear: true, text: "clear" });
  });

  it("says nothing where the plan draws no ground", () => {
    expect(groundVerdict(planWith(smallRows).site, at(24, -31))).toBeNull();
  });
});

describe("areaOf", () => {
  it("cuts long edges so that drawing them straight stays true", () => {
    const frame = localFrame({ latitudeDeg: -31, longitudeDeg: 24, heightM: 1000 });
    const { rings } = areaOf("land", square(23.9, -31.1, 24.1, -30.9), frame, 1000);
    expect(rings).toHaveLength(1);
    // 0.2° a side in steps of 0.02°.
    expect(rings[0]).toHaveLength(40);
  });
});
