import { SIDEREAL_RATE } from "../../../src/base/constants.ts";
import { isoToJulian } from "../../../src/engine/sky/calendar.ts";
import { fromHorizontal, parallacticAngle, toHorizontal } from "../../../src/engine/sky/direction.ts";
import { precessFromJ2000 } from "../../../src/engine/sky/precession.ts";
import { halfArcAbove } from "../../../src/engine/sky/riseset.ts";
import { earthRotationAngle, greenwichMeanSiderealTime, wrapTurn } from "../../../src/engine/sky/rotation.ts";
import { uvwM } from "../../../src/engine/synthesis/uvw.ts";
import { checksOf, type Figure, type Left } from "../check.ts";
import rows from "../data/time.json" with { type: "json" };
import { baselines, latitudeDeg, lengthsM } from "./stations.ts";

const DEG = Math.PI / 180;
const J2000 = 2_451_545;
const rowOf = (id: string) => rows.find((row) => row.id === id);

const gmstDeg = (iso: string): number => {
  const { day, frac } = isoToJulian(iso);
  return greenwichMeanSiderealTime(day, frac) / DEG;
};
const halfArcH = (latDeg: number, decDeg: number, elevationDeg: number): Figure => {
  const arc = halfArcAbove(elevationDeg * DEG, decDeg * DEG, latDeg * DEG);
  return arc.kind === "rises" ? arc.halfArcRad / (15 * DEG) : arc.kind;
};
const horizon = (hourAngleDeg: number, decDeg: number, latDeg: number): number[] => {
  const { elevationRad, azimuthRad } = toHorizontal(hourAngleDeg * DEG, decDeg * DEG, latDeg * DEG);
  return [elevationRad / DEG, azimuthRad / DEG];
};
const thetaPersei = (): number[] => {
  const { raRad, decRad } = precessFromJ2000(41.054063 * DEG, 49.22775 * DEG, 2_462_088, 0.69);
  return [raRad / DEG, decRad / DEG];
};

/** Radians past whole turns after a hundred days from J2000. */
const turned = (): number => wrapTurn(earthRotationAngle(J2000 + 100, 0) - earthRotationAngle(J2000, 0));

/** Worst difference from a polynomial of the source in seconds of time, a day at a time over fifty years. */
function worstOfPolynomial(inCenturies: boolean): number {
  const [start, perDay, square, cube] = rowOf("T08")?.polynomialDeg ?? [];
  let worst = 0;
  for (let day = 0; day <= 18_263; day++) {
    const t = day / 36_525;
    const deg = start + perDay * day + (inCenturies ? square * t ** 2 - t ** 3 / cube : 0);
    const off = wrapTurn(deg * DEG - greenwichMeanSiderealTime(J2000, day) + Math.PI) - Math.PI;
    worst = Math.max(worst, (Math.abs(off) / DEG) * 240);
  }
  return worst;
}

const halfArcs = Object.fromEntries(
  rows.flatMap(({ id, latDecElevationDeg: asked }) => (asked ? [[id, () => [halfArcH(asked[0], asked[1], asked[2])]]] : [])),
);

const answers: { [id: string]: () => readonly Figure[] } = {
  T01: () => [earthRotationAngle(2_400_000.5, 54_388)],
  T02: () => [earthRotationAngle(J2000, 0), 1 + turned() / (200 * Math.PI)],
  T03: () => [greenwichMeanSiderealTime(2_400_000.5, 53_736)],
  T05: () => [gmstDeg("1987-04-10T00:00:00Z")],
  T06: () => [gmstDeg("1987-04-10T19:21:00Z")],
  T06b: () => [gmstDeg("1987-04-10T19:21:00Z")],
  T07: () => [gmstDeg("2000-01-01T12:00:00Z")],
  T08: () => [worstOfPolynomial(true), worstOfPolynomial(false)],
  T09: () => [SIDEREAL_RATE, 86_400 / SIDEREAL_RATE, 15 * SIDEREAL_RATE],
  T10: () => [(turned() + 200 * Math.PI) / (100 * 86_400)],
  T11: () => {
    const { azimuthRad, elevationRad } = toHorizontal(1.1, 1.2, 0.3);
    return [azimuthRad, elevationRad];
  },
  T12: () => {
    const { hourAngleRad, decRad } = fromHorizontal(5.5, 1.1, 0.7);
    return [hourAngleRad, decRad];
  },
  T13: () => [parallacticAngle(1.1, 1.2, 0.3)],
  T14: () => horizon(64.352133, -(6 + 43 / 60 + 11.61 / 3600), 38 + 55 / 60 + 17 / 3600),
  T15: thetaPersei,
  T15b: thetaPersei,
  T16: () => {
    const degrees = 15 * Number(halfArcH(42.3333, 18.44092, -0.5667));
    return [Math.cos(degrees * DEG), degrees];
  },
  ...halfArcs,
  T18: () => (rowOf("T18")?.latDecDeg ?? []).flatMap(([lat, dec]) => horizon(0, dec, lat)),
  T19: () => {
    const uvw = uvwM(baselines, 0, latitudeDeg * DEG);
    return [
      Math.max(...lengthsM(uvw).map((m, b) => Math.abs(m - lengthsM(baselines)[b]))),
      horizon(0, latitudeDeg, latitudeDeg)[0],
    ];
  },
};

/**
 * Section 2: time, Earth rotation, directions. The section's apparent sidereal time (T04) is not computed by this program,
 * which leaves nutation out, nor are the older GMST of 1982 and 2000 (T03).
 */
export const timeChecks = checksOf(rows, answers);

export const timeLeft: Left = {
  T04: "apparent sidereal time: nutation is left out, and the program says so",
};
