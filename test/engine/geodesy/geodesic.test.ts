import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { direct, inverse, polygonArea } from "../../../src/engine/geodesy/geodesic.ts";
import { geodeticToEcef } from "../../../src/engine/geodesy/wgs84.ts";
import { apart, SEED } from "../../support/arbitrary.ts";

const RAD = Math.PI / 180;
const arbPlace = fc.tuple(fc.double({ min: -90, max: 90, noNaN: true }), fc.double({ min: -180, max: 180, noNaN: true }));
const onEllipsoid = (lat: number, lon: number) => geodeticToEcef(lat * RAD, lon * RAD, 0);

describe("geodesics", () => {
  it("arrive where they were measured to", () => {
    fc.assert(
      fc.property(arbPlace, arbPlace, ([latA, lonA], [latB, lonB]) => {
        const { distanceM, azimuthADeg } = inverse(latA, lonA, latB, lonB);
        const end = direct(latA, lonA, azimuthADeg, distanceM);
        // Twice the library's 15 nm, and the azimuth's own rounding over half the Earth.
        expect(apart(onEllipsoid(end.latitudeDeg, end.longitudeDeg), onEllipsoid(latB, lonB))).toBeLessThanOrEqual(1e-7);
      }),
      SEED,
    );
  });

  it("are as long one way as the other, no shorter than the chord, and back the way they came", () => {
    fc.assert(
      fc.property(arbPlace, arbPlace, ([latA, lonA], [latB, lonB]) => {
        const there = inverse(latA, lonA, latB, lonB);
        const back = inverse(latB, lonB, latA, lonA);
        expect(Math.abs(there.distanceM - back.distanceM)).toBeLessThanOrEqual(3e-8); // 15 nm each
        const chord = apart(onEllipsoid(latA, lonA), onEllipsoid(latB, lonB));
        expect(there.distanceM).toBeGreaterThanOrEqual(chord - 3e-8);
      }),
      SEED,
    );
    const [there, back] = [inverse(10, 20, -35, 80), inverse(-35, 80, 10, 20)];
    expect(Math.abs(there.azimuthBDeg - (back.azimuthADeg + 180))).toBeLessThanOrEqual(1e-12);
  });

  it("cross the antimeridian, pass the poles, and stay put where there is nowhere to go", () => {
    expect(inverse(10, 179, 10, -179).distanceM).toBeCloseTo(inverse(10, -1, 10, 1).distanceM, 6);
    expect(inverse(10, 179, 10, -181).distanceM).toBe(0);
    for (const lat of [-90, -31, 0, 31]) {
      expect(inverse(lat, 20, lat, 20)).toEqual({ distanceM: 0, azimuthADeg: 0, azimuthBDeg: 0 });
    }
    expect(inverse(90, 20, 90, -75)).toEqual({ distanceM: 0, azimuthADeg: 0, azimuthBDeg: 0 });
    const over = direct(89, 0, 0, inverse(89, 0, 90, 0).distanceM * 2);
    expect(over.latitudeDeg).toBeCloseTo(89, 9);
    expect(Math.abs(over.longitudeDeg)).toBeCloseTo(180, 9);
  });

  it("refuse what is no place", () => {
    expect(() => inverse(91, 0, 0, 0)).toThrow("latADeg is 91; expected a latitude in [-90, 90] degrees");
    expect(() => inverse(0, 0, 0, Number.NaN)).toThrow("lonBDeg");
    expect(() => direct(0, 0, Number.NaN, 1)).toThrow("azimuthDeg");
    expect(() => direct(0, 0, 0, Number.POSITIVE_INFINITY)).toThrow("distanceM");
    expect(() =>
      polygonArea([
        [0, 0],
        [200, -95],
        [1, 1],
      ]),
    ).toThrow("lat[1]Deg is -95");
  });
});

describe("polygons of geodesics", () => {
  const ring = [
    [20, -31],
    [20.4, -31.1],
    [20.3, -30.6],
    [19.9, -30.7],
  ];

  it("have one area whichever way round, wherever they start, closed or open", () => {
    const { areaM2, perimeterM } = polygonArea(ring);
    for (const same of [ring.toReversed(), [...ring.slice(1), ring[0]], [...ring, ring[0]]]) {
      expect(polygonArea(same).areaM2 / areaM2).toBeCloseTo(1, 12);
      expect(polygonArea(same).perimeterM / perimeterM).toBeCloseTo(1, 13);
    }
  });

  it("add up: a ring is the sum of the two halves a chord cuts it into", () => {
    const halves = [ring.slice(0, 3), [ring[2], ring[3], ring[0]]].map((half) => polygonArea(half).areaM2);
    expect((halves[0] + halves[1]) / polygonArea(ring).areaM2).toBeCloseTo(1, 11);
  });

  it("do not mind the antimeridian", () => {
    const there = ring.map(([lon, lat]) => [((lon + 160 + 180) % 360) - 180, lat]);
    expect(Math.max(...there.map(([lon]) => lon)) - Math.min(...there.map(([lon]) => lon))).toBeGreaterThan(300);
    expect(polygonArea(there).areaM2 / polygonArea(ring).areaM2).toBeCloseTo(1, 12);
  });

  it("are nothing below three corners", () => {
    expect(polygonArea([])).toEqual({ areaM2: 0, perimeterM: 0 });
    expect(polygonArea([[1, 1]])).toEqual({ areaM2: 0, perimeterM: 0 });
    expect(
      polygonArea([
        [0, 0],
        [0, 1],
      ]).areaM2,
    ).toBe(0);
  });
});
