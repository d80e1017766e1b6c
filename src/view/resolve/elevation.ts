import { RAD_PER_DEG, RAD_PER_HOUR } from "../../base/constants.ts";
import { toHorizontal } from "../../engine/sky/direction.ts";
import { halfArcAbove } from "../../engine/sky/riseset.ts";
import type { Antenna, Observation, Site } from "../../plan/schema.ts";
import { fixed, joined, plain } from "../numbers.ts";
import { declinationShort } from "../observation.ts";
import { type Box, multiples, pathThrough, type Size, type TextEquivalent, type Tick } from "./figure.ts";

/** Elevation at the plan's origin through a day of hour angle. */
export interface ElevationModel {
  readonly box: Box;
  readonly xTicks: readonly Tick[];
  readonly yTicks: readonly Tick[];
  /** The target's curve, then those of declinations for comparison. */
  readonly curves: readonly {
    readonly d: string;
    readonly target: boolean;
    readonly label: string;
    readonly x: number;
    readonly y: number;
  }[];
  readonly window: { readonly x: number; readonly width: number; readonly label: string };
  /** Below the elevation limit. */
  readonly limit: { readonly y: number; readonly height: number };
  readonly aside: string;
  readonly text: TextEquivalent;
}

const STEPS = 192;
/** Hours shown either side of the meridian. */
const REACH_H = 8;

/** Elevation in degrees against the ellipsoid normal at a latitude; refraction is left out, as everywhere. */
export const elevationDeg = (latitudeDeg: number, declinationDeg: number, hourAngleH: number): number =>
  toHorizontal(hourAngleH * RAD_PER_HOUR, declinationDeg * RAD_PER_DEG, latitudeDeg * RAD_PER_DEG).elevationRad / RAD_PER_DEG;

/** Hours of hour angle in a day above an elevation; 0 or 24 where the source never or always is. */
export function hoursAbove(latitudeDeg: number, declinationDeg: number, limitDeg: number): number {
  const arc = halfArcAbove(limitDeg * RAD_PER_DEG, declinationDeg * RAD_PER_DEG, latitudeDeg * RAD_PER_DEG);
  return arc.kind === "rises" ? (2 * arc.halfArcRad) / RAD_PER_HOUR : arc.kind === "always" ? 24 : 0;
}

/** @param antennas - Of the layout: the highest of their limits and the observation's counts. */
export function elevationModel(
  site: Site,
  observation: Observation,
  antennas: readonly Antenna[],
  { width, height }: Size,
): ElevationModel | null {
  if (width < 160 || height < 90) return null;
  const latitude = site.origin.latitudeDeg;
  const { declinationDeg, hourAngle } = observation;
  const limitDeg = Math.max(observation.elevationLimitDeg, ...antennas.map((a) => a.elevationLimitDeg));
  const reach = Math.max(REACH_H, Math.ceil(Math.abs(hourAngle.fromH)), Math.ceil(Math.abs(hourAngle.toH)));
  const box: Box = { x: 34, y: 8, width: width - 34 - 10, height: height - 8 - 24 };
  const x = (h: number): number => box.x + (box.width * (h + reach)) / (2 * reach);
  const y = (deg: number): number => box.y + (box.height * (92 - deg)) / 92;
  const hour = (k: number): number => reach * ((2 * k) / STEPS - 1);
  const curve = (dec: number): string =>
    pathThrough(
      STEPS + 1,
      (k) => x(hour(k)),
      (k) => {
        const e = elevationDeg(latitude, dec, hour(k));
        return e < -0.5 ? Number.NaN : y(Math.max(0, e));
      },
    );
  const others = compared(latitude, declinationDeg, limitDeg);
  const label = (dec: number, h: number, lift: number): { x: number; y: number } => ({
    x: x(h),
    y: y(Math.max(4, elevationDeg(latitude, dec, h))) - lift,
  });
  const above = hoursAbove(latitude, declinationDeg, limitDeg);
  const transit = elevationDeg(latitude, declinationDeg, 0);
  const hourStep = reach > 8 ? 4 : 2;
  return {
    box,
    xTicks: multiples(-reach + 1, reach - 1, hourStep).map((h) => ({
      at: x(h),
      label: Math.abs(h) >= reach - 2 ? joined(plain(h), "h") : plain(h),
    })),
    yTicks: [0, 20, 45, 90].map((d) => ({ at: y(d), label: `${d}°` })),
    curves: [
      {
        d: curve(declinationDeg),
        target: true,
        label: declinationShort(declinationDeg),
        ...label(declinationDeg, targetLabelH(latitude, declinationDeg, hourAngle.toH, reach), 4),
      },
      ...others.map((d) => ({ d: curve(d), target: false, label: declinationShort(d), ...label(d, 0, 6) })),
    ],
    window: {
      x: x(hourAngle.fromH),
      width: x(hourAngle.toH) - x(hourAngle.fromH),
      label: `window, ${joined(fixed(hourAngle.toH - hourAngle.fromH, 1), "h")}`,
    },
    limit: { y: y(limitDeg), height: Math.max(0, y(0) - y(limitDeg)) },
    aside: `above ${plain(limitDeg)}° for ${joined(fixed(above, 1), "h")}`,
    text: {
      summary: `The source culminates at ${fixed(transit, 1)}° and is above ${plain(limitDeg)}° for ${joined(fixed(above, 1), "h")} of hour angle, seen from the plan's origin.`,
      columns: ["Hour angle", "Elevation"],
      rows: multiples(-reach, reach, 1).map((h) => [
        joined(plain(h), "h"),
        `${fixed(elevationDeg(latitude, declinationDeg, h), 1)}°`,
      ]),
    },
  };
}

/** Up to two round declinations whose curves stand clear of the target's and of each other. */
function compared(latitude: number, declinationDeg: number, limitDeg: number): readonly number[] {
  const transit = (d: number): number => elevationDeg(latitude, d, 0);
  const chosen: number[] = [];
  for (const d of [0, 30, -30, 60, -60]) {
    const clear = [declinationDeg, ...chosen].every((other) => Math.abs(transit(other) - transit(d)) >= 15);
    if (clear && transit(d) > limitDeg + 5 && chosen.length < 2) chosen.push(d);
  }
  return chosen;
}

/** Where the target's name stands: just past the end of the window where the curve is still high, else inside it. */
function targetLabelH(latitude: number, declinationDeg: number, toH: number, reach: number): number {
  const past = toH + 0.02 * reach;
  return past > 0 && past < 0.7 * reach && elevationDeg(latitude, declinationDeg, past) > 12 ? past : 0.2 * reach;
}
