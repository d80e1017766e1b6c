import { ecefToEnu, enuFrame } from "../../../src/engine/geodesy/enu.ts";
import { stationXyzM } from "../../../src/engine/geodesy/originframe.ts";
import type { Vec3 } from "../../../src/engine/geodesy/vec3.ts";
import { parallacticAngle, toHorizontal } from "../../../src/engine/sky/direction.ts";
import { uvwM } from "../../../src/engine/synthesis/uvw.ts";
import { derivative } from "../../support/slope.ts";
import { checksOf, type Figure } from "../check.ts";
import rows from "../data/baselines.json" with { type: "json" };
import vectors from "../data/uvw-vectors.json" with { type: "json" };
import { baselineNamed, baselines, ecefM, lengthsM } from "./stations.ts";

const DEG = Math.PI / 180;
const HOUR = 15 * DEG;
const { reference } = vectors;
const range = (n: number): readonly number[] => Array.from({ length: n }, (_, k) => k);

const seen = (name: string, decDeg: number, h: number): number[] => [...uvwM(baselineNamed(name), h * HOUR, decDeg * DEG)];

/** X, Y, Z of a vector given east, north, up at a latitude: along the axes of that frame, turned to its own meridian. */
function xyzOf(enu: readonly number[], latDeg: number): Float64Array {
  const lonRad = 0.4;
  const { east, north, up } = enuFrame(latDeg * DEG, lonRad, 0);
  const ecef = range(3).map((axis) => enu[0] * east[axis] + enu[1] * north[axis] + enu[2] * up[axis]);
  return stationXyzM(Float64Array.from(ecef), lonRad);
}
const enuSeen = (enu: readonly number[], decDeg: number, h: number): number[] => [...uvwM(xyzOf(enu, 40), h * HOUR, decDeg * DEG)];
const alongAxis: { readonly [name: string]: readonly number[] } = { EW: [1000, 0, 0], NS: [0, 1000, 0], Up: [0, 0, 1000] };
const hours = (enu: readonly number[], decDeg: number): number[] => [0, 3, 6].flatMap((h) => enuSeen(enu, decDeg, h));

/** Names such as "EW 1000 m lat40 dec-30 H3h". */
function special(name: string): number[] {
  const match = /^(EW|NS|Up) 1000 m lat40 dec(-?\d+) H(\d)h$/.exec(name);
  if (!match) throw new Error(`an unknown vector, ${name}`);
  return enuSeen(alongAxis[match[1]], Number(match[2]), Number(match[3]));
}

/** At the zenith itself azimuth and parallactic angle have no meaning. */
const offZenith = vectors.vectors.filter(({ el_deg }) => el_deg < 89.99);
const fullTurn = (deg: number): number => (deg + 360) % 360;

const inVectors: { readonly [id: string]: readonly number[] } = {
  U04: Object.values(vectors.stations).flatMap(({ ecef, enu }) => [...ecef, ...enu]),
  U04b: vectors.baseline_xyz_m.flat(),
  U04c: vectors.vectors.flatMap(({ uvw_m }) => uvw_m.flat()),
  U04d: offZenith.flatMap(({ az_deg, el_deg, pa_deg }) => [fullTurn(az_deg), el_deg, pa_deg]),
  U08b: Object.values(vectors.special).flat(),
};

const answers: { [id: string]: () => readonly Figure[] } = {
  U02: () =>
    [-20, 20, 75].flatMap((dec) =>
      [-4, -1.3, 2, 5].map((h) => {
        const [x, y, z] = baselineNamed("P3-P7");
        const [u, v] = seen("P3-P7", dec, h);
        return (u ** 2 + ((v - z * Math.cos(dec * DEG)) / Math.sin(dec * DEG)) ** 2) / (x ** 2 + y ** 2);
      }),
    ),
  U03: () => {
    const [east, north, up] = [Math.cos(0.3) * Math.sin(1.1), Math.cos(0.3) * Math.cos(1.1), Math.sin(0.3)];
    return [...xyzOf([1000 * east, 1000 * north, 1000 * up], 40)];
  },
  U04: () =>
    range(7).flatMap((k) => {
      const here = [...ecefM.slice(3 * k, 3 * k + 3)] as unknown as Vec3;
      return [...here, ...ecefToEnu(enuFrame(reference.lat * DEG, reference.lon * DEG, reference.h), here)];
    }),
  U04b: () => [...baselines],
  U04c: () => vectors.vectors.flatMap(({ dec_deg, ha_h }) => [...uvwM(baselines, ha_h * HOUR, dec_deg * DEG)]),
  U04d: () =>
    offZenith.flatMap(({ dec_deg, ha_h }) => {
      const { azimuthRad, elevationRad } = toHorizontal(ha_h * HOUR, dec_deg * DEG, reference.lat * DEG);
      return [azimuthRad, elevationRad, parallacticAngle(ha_h * HOUR, dec_deg * DEG, reference.lat * DEG)].map((x) => x / DEG);
    }),
  U05: () => ["P1-P2", "P1-P3", "P1-P4"].flatMap((name) => seen(name, 20, 1.75)),
  U06: () => {
    const xyz = baselineNamed("P3-P7");
    // The ellipse by its extremes: the half axes from u and v a quarter turn apart, the centre halfway.
    const alongX = Math.atan2(xyz[0], xyz[1]) / HOUR;
    const [u, v] = seen("P3-P7", 20, alongX);
    const [top, foot] = [6, -6].map((h) => seen("P3-P7", 20, alongX + h)[1]);
    return [...xyz, ...lengthsM(xyz), u, Math.abs(top - foot) / 2, v];
  },
  U07: () => enuSeen([300, -700, 40], 25, 0),
  U08: () => hours(alongAxis.EW, 90),
  U08b: () => Object.keys(vectors.special).flatMap(special),
  U09: () => enuSeen(alongAxis.EW, 0, 3),
  U10: () => enuSeen(alongAxis.EW, 30, 3),
  U11: () => hours(alongAxis.NS, 30),
  U12: () => [...[-5, -2, 0, 4].map((h) => enuSeen(alongAxis.NS, 0, h)[1]), Math.abs(enuSeen(alongAxis.NS, 0, 6)[0])],
  U13: () => enuSeen(alongAxis.Up, 30, 3),
  U14: () =>
    [
      [20, 1.75],
      [-35, -4],
      [80, 0],
    ].flatMap(([dec, h]) => {
      const [u, v, w] = seen("P1-P4", dec, h);
      const [du, dv, dw] = range(3).map((axis) => derivative((rad) => seen("P1-P4", dec, rad / HOUR)[axis], h * HOUR, 0.01));
      const [sin, cos] = [Math.sin(dec * DEG), Math.cos(dec * DEG)];
      return [du - (w * cos - v * sin), dv - u * sin, dw + u * cos];
    }),
  U15: () => {
    const lengths = lengthsM(baselines);
    const worst = vectors.vectors.map(({ dec_deg, ha_h }) =>
      Math.max(...lengthsM(uvwM(baselines, ha_h * HOUR, dec_deg * DEG)).map((m, b) => Math.abs(m - lengths[b]))),
    );
    return [Math.max(...worst)];
  },
};

/** Section 3: baselines and (u, v, w). Its note on signs, U16, is held by the rows above and by the tests of `uvwM`. */
export const baselineChecks = checksOf(
  rows.map((row) => ({ ...row, expected: inVectors[row.id] ?? row.expected })),
  answers,
);
