import { type GeoGeometryObjects, geoGraticule } from "d3-geo";
import { fixed } from "../numbers.ts";
import { shortWay } from "./areas.ts";
import { niceAtLeast } from "./nice.ts";
import { EARTH_RADIUS_M, type Sheet } from "./sheet.ts";

const DEG = 180 / Math.PI;
const STEPS = [1, 2, 5, 10, 15, 30];

/** Degrees between the lines of a graticule: lines at least `leastPx` apart in the middle of the view. */
export function graticuleStepDeg(metresPerPx: number, leastPx = 110): number {
  const least = ((metresPerPx * leastPx) / EARTH_RADIUS_M) * DEG;
  return least > 0.5 ? (STEPS.find((step) => step >= least) ?? 30) : niceAtLeast(least);
}

/** Meridians and parallels of the part in view. */
export function graticule(sheet: Sheet, stepDeg: number): GeoGeometryObjects {
  const { camera, width, height } = sheet;
  const seen = (Math.hypot(width, height) / 2) * (camera.metresPerPx / EARTH_RADIUS_M);
  const reach = sheet.kind === "world" || seen >= 1 ? 180 : Math.asin(seen) * DEG + stepDeg;
  const floor = (deg: number): number => Math.floor(deg / stepDeg) * stepDeg;
  const south = Math.max(-90, floor(camera.latitudeDeg - reach));
  const north = Math.min(90, floor(camera.latitudeDeg + reach) + stepDeg);
  const narrowest = Math.cos(Math.min(90, Math.max(Math.abs(south), Math.abs(north))) / DEG);
  const across = Math.min(180, reach / Math.max(narrowest, 1e-3));
  const west = across >= 170 ? -180 : floor(camera.longitudeDeg - across);
  const east = across >= 170 ? 180 : floor(camera.longitudeDeg + across) + stepDeg;
  const lines = geoGraticule()
    .step([stepDeg, stepDeg])
    .extent([
      [west, Math.max(south, -90 + 1e-6)],
      [east + 1e-6, Math.min(north, 90 - 1e-6) + 1e-6],
    ])
    .precision(Math.min(2.5, stepDeg));
  return lines();
}

/** Where a line of the graticule meets the edge of the map. */
export interface EdgeTick {
  readonly px: number;
  readonly text: string;
}

/** Meridians along the top edge and parallels along the left, where the ground reaches the edge. */
export function edgeTicks(
  sheet: Sheet,
  stepDeg: number,
  insetPx: number,
): { readonly top: readonly EdgeTick[]; readonly left: readonly EdgeTick[] } {
  const decimals = Math.max(0, -Math.floor(Math.log10(stepDeg) + 1e-9));
  const name = (deg: number, letters: string): string => {
    const rounded = Math.abs(deg) < stepDeg / 2 ? 0 : deg;
    const letter = rounded === 0 || Math.abs(Math.abs(rounded) - 180) < 1e-9 ? "" : ` ${letters[rounded > 0 ? 0 : 1]}`;
    return `${fixed(Math.abs(rounded), decimals)}°${letter}`;
  };
  const along = (length: number, value: (px: number) => number | undefined, letters: string): readonly EdgeTick[] => {
    const found: EdgeTick[] = [];
    let before: { px: number; deg: number } | undefined;
    for (let px = 0; px <= length; px += 8) {
      const raw = value(px);
      if (raw === undefined) {
        before = undefined;
        continue;
      }
      const deg = before ? before.deg + shortWay(raw - before.deg) : raw;
      if (before) {
        const [low, high] = deg > before.deg ? [before.deg, deg] : [deg, before.deg];
        for (let k = Math.floor(low / stepDeg) + 1; k * stepDeg <= high; k++) {
          const line = k * stepDeg;
          found.push({
            px: before.px + ((line - before.deg) / (deg - before.deg)) * 8,
            text: name(letters === "EW" ? shortWay(line) : line, letters),
          });
        }
      }
      before = { px, deg };
    }
    return found;
  };
  return {
    top: along(sheet.width, (x) => sheet.place(x, insetPx)?.longitudeDeg, "EW"),
    left: along(sheet.height, (y) => sheet.place(insetPx, y)?.latitudeDeg, "NS"),
  };
}
