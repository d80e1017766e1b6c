import { baselineLengthsM, baselineXyzM } from "../../../src/engine/array/baselines.ts";
import { ecefToEnu, enuFrame } from "../../../src/engine/geodesy/enu.ts";
import { direct, inverse, polygonArea } from "../../../src/engine/geodesy/geodesic.ts";
import { type Ellipsoid, ecefToGeodetic, geodeticToEcef, WGS84 } from "../../../src/engine/geodesy/wgs84.ts";
import { parkMiller } from "../../support/random.ts";
import { derivative } from "../../support/slope.ts";
import { checksOf, type Figure } from "../check.ts";
import rows from "../data/geodesy.json" with { type: "json" };

const DEG = Math.PI / 180;
const { aM, f } = WGS84;
const e2 = f * (2 - f);
const GRS80: Ellipsoid = { aM: 6_378_137, f: 1 / 298.257222101 };
const WGS72: Ellipsoid = { aM: 6_378_135, f: 1 / 298.26 };

type Reals = readonly number[];
type LatLon = readonly [latDeg: number, lonDeg: number];

const ecef = (lonDeg: number, latDeg: number, heightM: number): Reals => geodeticToEcef(latDeg * DEG, lonDeg * DEG, heightM);
const geodetic = (ellipsoid: Ellipsoid): Reals => {
  const { lonRad, latRad, heightM } = ecefToGeodetic([2e6, 3e6, 5.244e6], ellipsoid);
  return [lonRad, latRad, heightM];
};
const line = ([a, b]: LatLon, [c, d]: LatLon, ellipsoid = WGS84): Reals => {
  const { distanceM, azimuthADeg, azimuthBDeg } = inverse(a, b, c, d, ellipsoid);
  return [distanceM, azimuthADeg, azimuthBDeg];
};
const length = (a: LatLon, b: LatLon): number => line(a, b)[0];
const end = ([lat, lon]: LatLon, azimuthDeg: number, distanceM: number): Reals => {
  const { latitudeDeg, longitudeDeg, azimuthDeg: onArrival } = direct(lat, lon, azimuthDeg, distanceM);
  return [latitudeDeg, longitudeDeg, onArrival];
};
const ring = (...corners: readonly LatLon[]): Reals => {
  const { areaM2, perimeterM } = polygonArea(corners.map(([lat, lon]) => [lon, lat]));
  return [areaM2, perimeterM];
};
const octants = (): number => 8 * ring([0, 0], [0, 90], [90, 0])[0];
const semiMinor = (): number => ecef(0, 90, 0)[2];
const dms = (text: string): number => {
  const [d, m, s] = text.split(" ").map(Number);
  return (text.startsWith("-") ? -1 : 1) * (Math.abs(d) + m / 60 + s / 3600);
};
const rowOf = (id: string) => rows.find((row) => row.id === id);

/** Radii of curvature read off the conversion: N from the distance to the axis, M from how fast the meridian goes by. */
function curvature(latDeg: number): Reals {
  const lat = latDeg * DEG;
  const place = (latRad: number): Reals => {
    // Over the pole the meridian goes on, down the other side.
    const over = latRad > Math.PI / 2;
    const [x, , z] = geodeticToEcef(over ? Math.PI - latRad : latRad, 0, 0);
    return [over ? -x : x, z];
  };
  const [x, z] = place(lat);
  const speed = [0, 1].map((axis) => derivative((latRad) => place(latRad)[axis], lat, 0.02));
  return [x / Math.cos(lat), Math.hypot(...speed), Math.atan2(z, x) / DEG];
}

/** Worst angle and height of 20 000 places there and back. */
function roundTrip(): Reals {
  const random = parkMiller(20);
  let [angle, height] = [0, 0];
  for (let k = 0; k < 20_000; k++) {
    const lat = Math.asin(2 * random() - 1);
    const lon = (2 * random() - 1) * Math.PI;
    const h = -500 + 9500 * random();
    const back = ecefToGeodetic(geodeticToEcef(lat, lon, h));
    angle = Math.max(angle, Math.abs(back.latRad - lat), Math.abs(back.lonRad - lon));
    height = Math.max(height, Math.abs(back.heightM - h));
  }
  return [angle, height];
}

function chordsKm(): Reals {
  const stations = rowOf("G38")?.stations ?? [];
  const places = stations.flatMap(({ northDms, westDms, heightM }) => ecef(-dms(westDms), dms(northDms), heightM));
  return [...baselineLengthsM(baselineXyzM(Float64Array.from(places)))].map((m) => m / 1000);
}

const answers: { [id: string]: () => readonly Figure[] } = {
  G01: () => [aM, 1 / f],
  G02: () => [semiMinor()],
  G03: () => [e2, e2 / (1 - e2), Math.sqrt(e2)],
  G04: () => [f / (2 - f)],
  G05: () => [(2 * aM + semiMinor()) / 3, Math.sqrt(octants() / (4 * Math.PI)), Math.cbrt(aM * aM * semiMinor())],
  G06: () => [octants() / 1e6],
  G07: () => [length([0, 0], [90, 0])],
  G08: () => [length([0, 0], [0, 1]), length([0, 0], [1, 0])],
  "G09-0": () => curvature(0),
  "G09-30": () => curvature(30),
  "G09-45": () => curvature(45),
  "G09-60": () => curvature(60),
  "G09-90": () => curvature(90),
  G10: () => geodeticToEcef(-0.5, 3.1, 2500),
  G11: () => geodeticToEcef(-0.5, 3.1, 2500, GRS80),
  G12: () => geodeticToEcef(-0.5, 3.1, 2500, WGS72),
  G13: () => geodetic(WGS84),
  G14: () => geodetic({ aM: 6_378_136, f: 0.0033528 }),
  G15: () => [...ecef(0, 0, 0), ...ecef(0, 90, 0), ...ecef(45, 45, 0)],
  G16: () => ecef(-60, 30, 1000),
  G17: () => ecef(-67.7551, -23.0229, 5000),
  G18: () => ecef(-107.6177275, 34.0787492, 2124),
  G19: () => ecefToEnu(enuFrame(34.0787492 * DEG, -107.6177275 * DEG, 2124), geodeticToEcef(34.2 * DEG, -107.5 * DEG, 2200)),
  G20: roundTrip,
  G21: () => {
    const [x, , z] = ecef(0, dms("33 21 22"), 1706);
    return [z / aM, x / aM];
  },
  G22: () => line([-41.32, 174.81], [40.96, -5.5]),
  G23: () => line([40.6, -73.8], [49.01666667, 2.55]),
  G24: () => end([40.63972222, -73.77888889], 53.5, 5850e3),
  G25: () => end([40, 0], 30, 10e6),
  G26: () => line([-30, 0], [29.9, 179.8]),
  G27: () => line([-30.12345, 0], [-30.12344, 0.00005]).slice(0, 2),
  G28: () => [...line([0, 0], [0, 179]).slice(0, 2), ...line([0, 0], [0, 179.5]), ...line([0, 0], [0, 180])],
  G29: () => [...line([0, 0], [0.5, 179.5]).slice(0, 2), ...line([0, 0], [0.5, 179.7]).slice(0, 2)],
  G30: () => [length([0, 0], [1, 180])],
  G31: () => line([35.60777, -139.44815], [-11.17491, -69.95921]).slice(0, 2),
  G32: () => {
    const [latA, lonA, latB, lonB] = (rowOf("G32")?.coordinatesDms ?? []).map(dms);
    return line([latA, lonA], [latB, lonB], GRS80);
  },
  G33: () => [length([dms("48 50 11"), dms("2 20 14")], [dms("38 55 17"), dms("-77 3 56")]) / 1000],
  G34: () => ring([0, 0], [0, 90], [90, 0]),
  G35: () => ring([89, 0], [89, 90], [89, 180], [89, 270]),
  G36: () => ring([0, 0], [0, 1], [1, 1], [1, 0]),
  G37: () => ring([0, -1], [-1, 0], [0, 1], [1, 0]),
  G38: chordsKm,
  G38b: chordsKm,
};

/** Section 1: ellipsoid, frames, geodesics, areas. */
export const geodesyChecks = checksOf(rows, answers);
