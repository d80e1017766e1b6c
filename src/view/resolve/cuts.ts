import type { Picture } from "../../assess/result.ts";
import type { Plan } from "../../plan/schema.ts";
import { observationsOf } from "../ledger/condition.ts";
import { fixed, plain } from "../numbers.ts";
import { unitFor } from "../units.ts";
import { type Box, multiples, niceBelow, pathThrough, type Size, type TextEquivalent, type Tick } from "./figure.ts";

/** Profiles of the beam along its two axes. */
export interface CutsModel {
  readonly box: Box;
  readonly xTicks: readonly Tick[];
  readonly yTicks: readonly Tick[];
  readonly zeroY: number;
  readonly major: string;
  readonly minor: string;
  readonly labels: readonly [major: string, minor: string];
  /** Sidelobe limit of the ledger, top and bottom in px. */
  readonly band: { readonly top: number; readonly bottom: number; readonly label: string; readonly lower: boolean } | null;
  readonly text: TextEquivalent;
}

/** The tightest sidelobe limit that speaks of a layout and observation. */
export function sidelobeLimit(
  plan: Plan,
  layout: string,
  observation: string,
): { readonly limit: number; readonly bothSigns: boolean } | null {
  const limits = plan.requirements
    .filter((r) => (r.quantity === "beam.peakAbsoluteSidelobe" || r.quantity === "beam.peakSidelobe") && r.atMost !== null)
    .filter((r) => !r.when.layouts || r.when.layouts.includes(layout))
    .filter((r) => observationsOf(plan, r).some((o) => o.id === observation))
    .map((r) => ({ limit: r.atMost as number, bothSigns: r.quantity === "beam.peakAbsoluteSidelobe" }));
  return limits.sort((a, b) => a.limit - b.limit)[0] ?? null;
}

/**
 * @param halfWidthArcsec - Offsets shown either side of the peak.
 * @param magnified - ±10 % instead of −10 % to 100 %.
 */
export function cutsModel(
  picture: Picture,
  halfWidthArcsec: number,
  magnified: boolean,
  limit: ReturnType<typeof sidelobeLimit>,
  { width, height }: Size,
): CutsModel | null {
  const { cuts } = picture;
  if (!cuts || width < 120 || height < 60) return null;
  const box: Box = { x: 34, y: 8, width: width - 34 - 10, height: height - 8 - 24 };
  const [low, high] = magnified ? [-0.1, 0.1] : [-0.12, 1];
  const x = (arcsec: number): number => box.x + (box.width * (arcsec + halfWidthArcsec)) / (2 * halfWidthArcsec);
  const y = (value: number): number => box.y + (box.height * (high - value)) / (high - low);
  const draw = (cut: typeof cuts.major): string => {
    const inside = (k: number): boolean => Math.abs(cut.offsetArcsec[k]) <= halfWidthArcsec * 1.0001;
    return pathThrough(
      cut.value.length,
      (k) => (inside(k) ? x(cut.offsetArcsec[k]) : Number.NaN),
      (k) => y(cut.value[k]),
    );
  };
  const unit = unitFor("angle", halfWidthArcsec);
  const step = niceBelow(halfWidthArcsec / unit.size / 1.9);
  const levels = magnified ? [-0.1, -0.05, 0, 0.05, 0.1] : [0, 0.5, 1];
  const angle = (deg: number): string => `PA ${fixed(deg, 0)}°`;
  return {
    box,
    xTicks: multiples(-halfWidthArcsec / unit.size, halfWidthArcsec / unit.size, step).map((t) => ({
      at: x(t * unit.size),
      label: t === 0 ? "0" : `${plain(t)}${unit.word}`,
    })),
    yTicks: levels.map((v) => ({ at: y(v), label: fixed(100 * v, 0) })),
    zeroY: y(0),
    major: draw(cuts.major),
    minor: draw(cuts.minor),
    labels:
      width < 330
        ? [`major, ${angle(cuts.major.positionAngleDeg)}`, `minor, ${angle(cuts.minor.positionAngleDeg)}`]
        : [`major axis, ${angle(cuts.major.positionAngleDeg)}`, `minor axis, ${angle(cuts.minor.positionAngleDeg)}`],
    band: limit && limit.limit < high ? band(limit, y, low) : null,
    text: {
      summary: `Beam profiles along the major axis, position angle ${fixed(cuts.major.positionAngleDeg, 0)}°, and the minor axis, out to ${plain(halfWidthArcsec)}″.`,
      columns: ["Offset, ″", "Major, % of peak", "Minor, % of peak"],
      rows: multiples(0, halfWidthArcsec, halfWidthArcsec / 10).map((r) => [
        plain(r),
        percentAt(cuts.major, r),
        percentAt(cuts.minor, r),
      ]),
    },
  };
}

function band(limit: { limit: number; bothSigns: boolean }, y: (v: number) => number, low: number): NonNullable<CutsModel["band"]> {
  const bottom = limit.bothSigns ? Math.max(-limit.limit, low) : 0;
  return {
    top: y(limit.limit),
    bottom: y(bottom),
    label: `limit ${limit.bothSigns ? "±" : ""}${plain(100 * limit.limit)}\u00a0%`,
    lower: limit.bothSigns,
  };
}

function percentAt(cut: { readonly offsetArcsec: Float64Array; readonly value: Float64Array }, offset: number): string {
  const k = cut.offsetArcsec.findIndex((x) => x >= offset - 1e-9);
  return k < 0 ? "outside" : fixed(100 * cut.value[k], 1);
}
