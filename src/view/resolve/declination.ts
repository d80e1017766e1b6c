import type { SweepPoint } from "../../assess/sweep.ts";
import type { Observation, Plan } from "../../plan/schema.ts";
import { observationsOf } from "../ledger/condition.ts";
import { fixed, plain } from "../numbers.ts";
import { windowText } from "../observation.ts";
import { shownAs, unitFor, withUnit } from "../units.ts";
import { type Box, multiples, niceBelow, pathThrough, type Size, type TextEquivalent, type Tick } from "./figure.ts";

/** Beam width against declination, all else of the observation kept. */
export interface DeclinationModel {
  readonly box: Box;
  readonly xTicks: readonly Tick[];
  readonly yTicks: readonly Tick[];
  readonly major: string;
  readonly minor: string;
  /** Between the two, closed. */
  readonly between: string;
  readonly labels: readonly { readonly x: number; readonly y: number; readonly text: string; readonly kind: "major" | "minor" }[];
  /** Declinations with no beam, px from and to. */
  readonly never: readonly { readonly x: number; readonly width: number }[];
  readonly target: { readonly x: number; readonly y: number | null; readonly text: string };
  readonly limit: { readonly y: number; readonly text: string } | null;
  readonly aside: string;
  readonly text: TextEquivalent;
}

/** The tightest limit on the major axis that speaks of a layout and observation, arcsec. */
export function majorLimit(plan: Plan, layout: string, observation: string): number | null {
  const limits = plan.requirements
    .filter((r) => r.quantity === "beam.majorArcsec" && r.atMost !== null)
    .filter((r) => !r.when.layouts || r.when.layouts.includes(layout))
    .filter((r) => observationsOf(plan, r).some((o) => o.id === observation))
    .map((r) => r.atMost as number);
  return limits.length > 0 ? Math.min(...limits) : null;
}

/** @param nowArcsec - The settled major axis at the observation's own declination. */
export function declinationModel(
  points: readonly SweepPoint[],
  observation: Observation,
  nowArcsec: number | null,
  limitArcsec: number | null,
  { width, height }: Size,
): DeclinationModel | null {
  if (points.length < 2 || width < 160 || height < 90) return null;
  const box: Box = { x: 38, y: 8, width: width - 38 - 14, height: height - 8 - 24 };
  const majors = points.map((p) => p.result.beam.majorArcsec);
  const minors = points.map((p) => p.result.beam.minorArcsec);
  const known = [...majors, ...minors].filter((v): v is number => v !== null);
  if (known.length === 0) return null;
  // Near the horizon the beam grows without bound; past three times its median it leaves the figure.
  const sorted = majors.filter((v): v is number => v !== null).sort((a, b) => a - b);
  const ceiling = Math.min(sorted[sorted.length - 1], 3 * sorted[Math.floor(sorted.length / 2)]);
  const unit = unitFor("angle", sorted[0]);
  const top = Math.max(ceiling, limitArcsec ?? 0, nowArcsec ?? 0) * 1.06;
  const floor = Math.min(...known) * 0.9;
  const step = niceBelow((top - floor) / unit.size / 2);
  const low = Math.max(0, Math.floor(floor / unit.size / step) * step * unit.size);
  const x = (deg: number): number => box.x + (box.width * (deg + 90)) / 180;
  const y = (arcsec: number): number => box.y + (box.height * (top - arcsec)) / (top - low);
  const at = (k: number): number => x(points[k].at);
  const value =
    (list: readonly (number | null)[]) =>
    (k: number): number => {
      const v = list[k];
      return v === null ? Number.NaN : y(Math.min(v, top));
    };
  const has = points.map((_, k) => majors[k] !== null);
  const shape = points.flatMap((_, k) => (has[k] ? [k] : []));
  const between =
    shape.length < 2
      ? ""
      : `M${shape.map((k) => `${at(k).toFixed(1)} ${value(majors)(k).toFixed(1)}`).join("L")}L${[...shape]
          .reverse()
          .map((k) => `${at(k).toFixed(1)} ${value(minors)(k).toFixed(1)}`)
          .join("L")}Z`;
  const first = shape[0];
  const middle = shape[Math.floor(shape.length * 0.62)];
  const limitY = limitArcsec === null ? null : y(limitArcsec);
  // The name stands over the curve as near the middle as the limit's line leaves it room.
  const roomy = (k: number): boolean => limitY === null || Math.abs(value(majors)(k) - 12 - limitY) >= 12;
  const named = [...shape].sort((a, b) => Math.abs(a - middle) - Math.abs(b - middle)).find(roomy) ?? middle;
  return {
    box,
    xTicks: [-90, -60, -30, 0, 30, 60, 90].map((d) => ({ at: x(d), label: `${plain(d)}°` })),
    yTicks: multiples(low / unit.size, top / unit.size, step).map((v) => ({
      at: y(v * unit.size),
      label: `${plain(v)}${unit.word}`,
    })),
    major: pathThrough(points.length, at, value(majors)),
    minor: pathThrough(points.length, at, value(minors)),
    between,
    labels:
      first === undefined
        ? []
        : [
            { x: at(named), y: value(majors)(named) - 8, text: "major", kind: "major" },
            { x: at(middle), y: value(minors)(middle) + 14, text: "minor", kind: "minor" },
          ],
    never: neverUp(points, has, x),
    target: {
      x: x(observation.declinationDeg),
      y: nowArcsec === null ? null : y(Math.min(nowArcsec, top)),
      text: `target ${plain(observation.declinationDeg, 4)}°`,
    },
    limit:
      limitArcsec === null ? null : { y: y(limitArcsec), text: `limit ${withUnit(limitArcsec, unitFor("angle", limitArcsec))}` },
    aside: tracksText(observation),
    text: {
      summary: `Beam against declination for a window of ${windowText(observation)}: major axis from ${shownAs("angle", sorted[0])} to ${shownAs("angle", sorted[sorted.length - 1])} where the source is up.`,
      columns: ["Declination", "Major axis", "Minor axis"],
      rows: points.map((p, k) => [`${fixed(p.at, 1)}°`, orNone(majors[k]), orNone(minors[k])]),
    },
  };
}

/** Where the source is up for less than the window, its track is shorter. */
const tracksText = ({ hourAngle: { fromH, toH } }: Observation): string =>
  toH > fromH ? `up to ${plain(toH - fromH)}\u00a0h` : "snapshots";

/** Runs of points without a beam; each reaches half way to its neighbour that has one. */
function neverUp(points: readonly SweepPoint[], has: readonly boolean[], x: (deg: number) => number): DeclinationModel["never"] {
  const runs: { x: number; width: number }[] = [];
  for (let k = 0; k < points.length; k++) {
    if (has[k]) continue;
    let end = k;
    while (end + 1 < points.length && !has[end + 1]) end++;
    const from = k === 0 ? points[0].at : (points[k - 1].at + points[k].at) / 2;
    const to = end === points.length - 1 ? points[end].at : (points[end].at + points[end + 1].at) / 2;
    runs.push({ x: x(from), width: x(to) - x(from) });
    k = end;
  }
  return runs;
}

const orNone = (arcsec: number | null): string => (arcsec === null ? "not up" : shownAs("angle", arcsec));
