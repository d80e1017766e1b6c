import { describe, expect, it } from "vitest";
import { baselineXyzM } from "../../src/engine/array/baselines.ts";
import { ecefToEnu, enuFrame } from "../../src/engine/geodesy/enu.ts";
import { stationXyzM } from "../../src/engine/geodesy/originframe.ts";
import { geodeticToEcef } from "../../src/engine/geodesy/wgs84.ts";
import { toHorizontal } from "../../src/engine/sky/direction.ts";
import { uvwM } from "../../src/engine/synthesis/uvw.ts";
import rows from "./data/baselines.json";
import vectors from "./data/uvw-vectors.json";
import { type Answer, compare, type OutsideRow } from "./table.ts";

const DEG = Math.PI / 180;
const HOUR = 15 * DEG;
const stations = Object.values(vectors.stations);
const ecef = Float64Array.from(stations.flatMap(({ lat, lon, h }) => [...geodeticToEcef(lat * DEG, lon * DEG, h)]));
const xyz = stationXyzM(ecef, vectors.reference.lon * DEG);
const baselines = baselineXyzM(xyz);
const named = (name: string): number => vectors.baseline_order.indexOf(name);
const seen = (name: string, dec: number, h: number): number[] => [
  ...uvwM(baselines.slice(3 * named(name), 3 * named(name) + 3), h * HOUR, dec * DEG),
];

/** A baseline of given east, north, up at latitude 40°, seen at a declination and hour angle. */
function enuSeen(east: number, north: number, up: number, dec: number, h: number): number[] {
  const lat = 40 * DEG;
  const b = Float64Array.of(-Math.sin(lat) * north + Math.cos(lat) * up, east, Math.cos(lat) * north + Math.sin(lat) * up);
  return [...uvwM(b, h * HOUR, dec * DEG)];
}

const closed = "closed form, printed to a nanometre";
const answers: { [id: string]: Answer } = {
  U02: {
    ours: () => {
      const [X, Y, Z] = baselines.slice(3 * named("P3-P7"));
      return [-4, -1.3, 2, 5].map((h) => {
        const [u, v] = seen("P3-P7", 33, h);
        return (u ** 2 + ((v - Z * Math.cos(33 * DEG)) / Math.sin(33 * DEG)) ** 2) / (X ** 2 + Y ** 2);
      });
    },
    theirs: [1, 1, 1, 1],
    within: 1e-12,
    why: "identity, relative",
  },
  U03: {
    ours: () => {
      const [d, e, a, lat] = [1000, 0.3, 1.1, 40 * DEG];
      const b = Float64Array.of(0, 0, 0);
      const [east, north, up] = [d * Math.cos(e) * Math.sin(a), d * Math.cos(e) * Math.cos(a), d * Math.sin(e)];
      b.set([-Math.sin(lat) * north + Math.cos(lat) * up, east, Math.cos(lat) * north + Math.sin(lat) * up]);
      // Seen from hour angle −6 h on the equator w is Y, from 0 h it is X, from the pole it is Z.
      return [uvwM(b, 0, 0)[2], uvwM(b, -6 * HOUR, 0)[2], uvwM(b, 0, Math.PI / 2)[2]];
    },
    theirs: (() => {
      const [d, e, a, lat] = [1000, 0.3, 1.1, 40 * DEG];
      return [
        d * (Math.cos(lat) * Math.sin(e) - Math.sin(lat) * Math.cos(e) * Math.cos(a)),
        d * Math.cos(e) * Math.sin(a),
        d * (Math.sin(lat) * Math.sin(e) + Math.cos(lat) * Math.cos(e) * Math.cos(a)),
      ];
    })(),
    within: 1e-9,
    why: "the source's formula, evaluated beside",
  },
  U05: {
    ours: () => ["P1-P2", "P1-P3", "P1-P4"].flatMap((name) => seen(name, 20, 1.75)),
    within: 1e-6,
    why: "four routes agree to 3e-12 m",
  },
  U06: {
    ours: () => [...baselines.slice(3 * named("P3-P7"), 3 * named("P3-P7") + 3)],
    within: 1e-6,
    why: "computed from the same coordinates",
  },
  U07: {
    ours: () => enuSeen(300, -700, 40, 25, 0),
    theirs: [300, -700 * Math.cos(15 * DEG) + 40 * Math.sin(15 * DEG), 700 * Math.sin(15 * DEG) + 40 * Math.cos(15 * DEG)],
    within: 1e-9,
    why: "identity at transit",
  },
  U08: {
    ours: () => [0, 3, 6].flatMap((h) => enuSeen(1000, 0, 0, 90, h)),
    theirs: [1000, 0, 0, 707.106781187, 707.106781187, 0, 0, 1000, 0],
    within: 1e-9,
    why: closed,
  },
  U09: { ours: () => enuSeen(1000, 0, 0, 0, 3), theirs: [707.106781187, 0, -707.106781187], within: 1e-9, why: closed },
  U10: { ours: () => enuSeen(1000, 0, 0, 30, 3), within: 1e-9, why: closed },
  U11: {
    ours: () => [0, 3, 6].flatMap((h) => enuSeen(0, 1000, 0, 30, h)),
    theirs: [
      0, 984.807753012, -173.648177667, -454.519477672, 890.673687005, -10.603192619, -642.787609687, 663.413948169, 383.022221559,
    ],
    within: 1e-9,
    why: closed,
  },
  U12: {
    ours: () => [-5, -2, 0, 4].map((h) => enuSeen(0, 1000, 0, 0, h)[1]),
    theirs: [766.044443119, 766.044443119, 766.044443119, 766.044443119],
    within: 1e-9,
    why: closed,
  },
  U13: { ours: () => enuSeen(0, 0, 1000, 30, 3), within: 1e-9, why: closed },
  U14: {
    ours: () => {
      const step = 1e-5;
      const [dec, h] = [20, 1.75];
      const [u, v, w] = seen("P1-P4", dec, h);
      const [before, after] = [seen("P1-P4", dec, h - step / HOUR), seen("P1-P4", dec, h + step / HOUR)];
      const slope = [0, 1, 2].map((k) => (after[k] - before[k]) / (2 * step));
      return [
        slope[0] - (w * Math.cos(dec * DEG) - v * Math.sin(dec * DEG)),
        slope[1] - u * Math.sin(dec * DEG),
        slope[2] + u * Math.cos(dec * DEG),
      ];
    },
    theirs: [0, 0, 0],
    within: 5e-7,
    why: "central differences over 1e-5 rad: b·h²/6 = 3e-8 m and rounding 1e-7",
  },
  U15: {
    ours: () =>
      vectors.baseline_order.map((name, k) => Math.hypot(...seen(name, -35, 2.2)) - Math.hypot(...vectors.baseline_xyz_m[k])),
    theirs: vectors.baseline_order.map(() => 0),
    within: 2e-9,
    why: "the lengths beside are printed to 1e-9 m",
  },
};

describe("baselines and (u, v, w) against outside figures", () => {
  compare(rows as readonly OutsideRow[], answers, {
    U04: "below",
    U16: "a note on signs, kept by the rows above",
  });

  it(`U04 seven irregular stations, ECEF and ENU (${vectors.source})`, () => {
    for (const [k, station] of stations.entries()) {
      const here = [...ecef.slice(3 * k, 3 * k + 3)] as [number, number, number];
      for (const axis of [0, 1, 2]) expect(Math.abs(here[axis] - station.ecef[axis])).toBeLessThanOrEqual(1e-6); // printed digits
      const { lat, lon, h } = vectors.reference;
      const enu = ecefToEnu(enuFrame(lat * DEG, lon * DEG, h), here);
      for (const axis of [0, 1, 2]) expect(Math.abs(enu[axis] - station.enu[axis])).toBeLessThanOrEqual(1e-6);
    }
    for (const [k, b] of vectors.baseline_xyz_m.entries()) {
      for (const axis of [0, 1, 2]) expect(Math.abs(baselines[3 * k + axis] - b[axis])).toBeLessThanOrEqual(1e-8);
    }
  });

  it.each(vectors.vectors)(
    "U04 21 baselines at declination $dec_deg°, hour angle $ha_h h",
    ({ dec_deg, ha_h, az_deg, el_deg, uvw_m }) => {
      const got = uvwM(baselines, ha_h * HOUR, dec_deg * DEG);
      for (const [k, uvw] of uvw_m.entries()) {
        for (const axis of [0, 1, 2]) expect(Math.abs(got[3 * k + axis] - uvw[axis])).toBeLessThanOrEqual(1e-6); // the row's own
      }
      const { azimuthRad, elevationRad } = toHorizontal(ha_h * HOUR, dec_deg * DEG, vectors.reference.lat * DEG);
      expect(Math.abs(elevationRad / DEG - el_deg)).toBeLessThanOrEqual(1e-6);
      // At the zenith azimuth has no meaning (T19).
      if (el_deg < 89.99) expect(Math.abs(azimuthRad / DEG - ((az_deg + 360) % 360))).toBeLessThanOrEqual(1e-6);
    },
  );

  it.each(Object.entries(vectors.special))("U08–U13 %s", (name, uvw) => {
    const match = /^(EW|NS|Up) 1000 m lat40 dec(-?\d+) H(\d)h$/.exec(name);
    if (!match) throw new Error(`an unknown row, ${name}`);
    const [, kind, dec, h] = match;
    const got = enuSeen(kind === "EW" ? 1000 : 0, kind === "NS" ? 1000 : 0, kind === "Up" ? 1000 : 0, Number(dec), Number(h));
    for (const axis of [0, 1, 2]) expect(Math.abs(got[axis] - uvw[axis])).toBeLessThanOrEqual(1e-9);
  });
});
