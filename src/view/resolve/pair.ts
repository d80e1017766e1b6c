import type { BeamImage, Picture } from "../../assess/result.ts";
import type { Pair } from "../../plan/schema.ts";
import { fixed, plain } from "../numbers.ts";
import { shownAs } from "../units.ts";
import { arcLabel } from "./beam.ts";
import { type Box, pathThrough, type Size, type TextEquivalent, type Tick } from "./figure.ts";
import { along, beamAtArcsec, resampled } from "./sample.ts";

/** Two point sources seen through the beam. */
export interface PairModel {
  readonly verdict: {
    readonly state: "met" | "at risk" | "not met" | "cannot be computed";
    readonly words: string;
    readonly why: string;
  };
  readonly halfWidthArcsec: number;
  readonly across: string;
  readonly profile: PairProfile | null;
  readonly text: TextEquivalent;
}

export interface PairProfile {
  readonly box: Box;
  readonly sum: string;
  readonly each: readonly [string, string];
  readonly xTicks: readonly Tick[];
  readonly zeroY: number;
  /** Where the dip is drawn, px, and what it is called; null without one. */
  readonly dip: {
    readonly x: number;
    readonly top: number;
    readonly bottom: number;
    readonly left: number;
    readonly right: number;
    readonly label: string;
  } | null;
}

/** Pairs fill about half of the picture. */
export function pairHalfWidth(pair: Pair, majorArcsec: number | null): number {
  const wanted = Math.max(
    2.1 * pair.separationArcsec,
    1.6 * (majorArcsec ?? 0),
    pair.separationArcsec / 2 + 1.5 * (majorArcsec ?? 0),
  );
  const power = 10 ** Math.floor(Math.log10(wanted));
  return power * ([1, 1.5, 2, 3, 4, 5, 6, 8, 10].find((s) => s >= wanted / power - 1e-9) ?? 10);
}

const STEPS = 240;

/**
 * The verdict and the dip come from the result; the profile is read off the image by interpolation, for drawing only.
 *
 * @param pictureOf - The picture whose result holds the pair's verdict.
 */
export function pairModel(picture: Picture, pair: Pair, { width, height }: Size): PairModel {
  const half = pairHalfWidth(pair, picture.result.beam.majorArcsec);
  const { beam, result } = picture;
  const dip = result.pair?.dip ?? null;
  const profile = beam && width >= 100 && height >= 60 ? pairProfile(beam, pair, half, dip, { width, height }) : null;
  const said = verdictWords(picture, dip);
  return {
    verdict: said,
    halfWidthArcsec: half,
    across: `${arcLabel(2 * half)} across`,
    profile,
    text: {
      summary: `Two sources ${shownAs("angle", pair.separationArcsec)} apart at position angle ${plain(pair.positionAngleDeg)}°, flux ratio ${fixed(pair.fluxRatio, 2)}: ${said.words}. ${said.why}`,
      columns: ["Figure", "Value"],
      rows: [
        ["Separation", shownAs("angle", pair.separationArcsec)],
        ["Dip between", dip === null ? "none" : `${fixed(100 * dip, 1)} %`],
        ["Verdict", result.pair?.verdict ?? "none"],
      ],
    },
  };
}

function verdictWords(picture: Picture, dip: number | null): PairModel["verdict"] {
  const verdict = picture.result.pair?.verdict ?? null;
  if (!picture.settled)
    return { state: "cannot be computed", words: "after the drop", why: "Settled answers alone give a verdict." };
  switch (verdict) {
    case "resolved":
      return {
        state: "met",
        words: `Resolved, dip ${percent(dip)}`,
        why: "They stand at least as far apart as the first minimum of the beam (Rayleigh).",
      };
    case "marginal":
      return {
        state: "at risk",
        words: `Marginal, dip ${percent(dip)}`,
        why: "There is a dip between them, but they stand closer than the first minimum of the beam.",
      };
    case "blended":
      return { state: "not met", words: "Blended, no dip", why: "The profile along both has no minimum between them." };
    case null:
      return { state: "cannot be computed", words: "No verdict", why: "The image does not cover the pair." };
  }
}

const percent = (fraction: number | null): string => `${fixed(100 * (fraction ?? 0), 1)}\u00a0%`;

function pairProfile(image: BeamImage, pair: Pair, half: number, dip: number | null, { width, height }: Size): PairProfile {
  const box: Box = { x: 6, y: 22, width: width - 12, height: height - 22 - 22 };
  const { east, north } = along(pair.positionAngleDeg);
  const offset = Float64Array.from({ length: STEPS + 1 }, (_, k) => half * ((2 * k) / STEPS - 1));
  const at = (s: number, centre: number): number => beamAtArcsec(image, (s - centre) * east, (s - centre) * north);
  const bright = offset.map((s) => at(s, -pair.separationArcsec / 2));
  const faint = offset.map((s) => pair.fluxRatio * at(s, pair.separationArcsec / 2));
  const sum = bright.map((b, k) => b + faint[k]);
  const top = Math.max(1, ...sum.filter(Number.isFinite));
  const bottom = Math.min(-0.05, ...sum.filter(Number.isFinite));
  const x = (k: number): number => box.x + (box.width * k) / STEPS;
  const y = (v: number): number => box.y + (box.height * (top - v)) / (top - bottom);
  const draw = (values: Float64Array): string => pathThrough(values.length, x, (k) => y(values[k]));
  return {
    box,
    sum: draw(sum),
    each: [draw(bright), draw(faint)],
    xTicks: [-half, 0, half].map((s) => ({
      at: box.x + (box.width * (s + half)) / (2 * half),
      label: s === 0 ? "0" : `${s < 0 ? "\u2212" : ""}${arcLabel(half)}`,
    })),
    zeroY: y(0),
    dip: dip === null ? null : dipMark(sum, x, y, pair, half, dip),
  };
}

/** The mark spans from the fainter maximum down to the lowest point between the two. */
function dipMark(
  sum: Float64Array,
  x: (k: number) => number,
  y: (v: number) => number,
  pair: Pair,
  half: number,
  dip: number,
): PairProfile["dip"] {
  const index = (s: number): number => Math.round(((s + half) / (2 * half)) * STEPS);
  const from = index(-pair.separationArcsec);
  const to = index(pair.separationArcsec);
  const middle = index(0);
  const highest = (a: number, b: number): number => {
    let best = a;
    for (let k = a; k <= b; k++) if (sum[k] > sum[best]) best = k;
    return best;
  };
  const left = highest(Math.max(0, from), middle);
  const right = highest(middle, Math.min(STEPS, to));
  let low = left;
  for (let k = left; k <= right; k++) if (sum[k] < sum[low]) low = k;
  if (low === left || low === right) return null;
  const level = Math.min(sum[left], sum[right]);
  return {
    x: x(low),
    top: y(level),
    bottom: y(sum[low]),
    left: x(left) - 8,
    right: x(right) + 8,
    label: `dip ${fixed(100 * dip, 1)}\u00a0%`,
  };
}

/** The image of the pair: the beam twice, half the separation either side of the middle. */
export function pairImage(image: BeamImage, pair: Pair, half: number, size: number): Float32Array {
  const { east, north } = along(pair.positionAngleDeg);
  const wide = half + pair.separationArcsec / 2;
  const perPixel = (2 * half) / size;
  const big = Math.ceil((2 * wide) / perPixel / 2) * 2;
  const field = resampled(image, (big * perPixel) / 2, big);
  const out = new Float32Array(size * size);
  const put = (centre: number, flux: number): void => {
    const dx = (centre * east) / perPixel;
    const dy = (centre * north) / perPixel;
    for (let j = 0; j < size; j++) {
      for (let i = 0; i < size; i++) {
        out[size * j + i] += flux * bilinear(field, big, i - size / 2 + big / 2 - dx, j - size / 2 + big / 2 - dy);
      }
    }
  };
  put(-pair.separationArcsec / 2, 1);
  put(pair.separationArcsec / 2, pair.fluxRatio);
  let peak = 0;
  for (const v of out) if (v > peak) peak = v;
  return peak > 0 ? out.map((v) => v / peak) : out;
}

function bilinear(field: Float32Array, size: number, x: number, y: number): number {
  const i = Math.max(0, Math.min(size - 2, Math.floor(x)));
  const j = Math.max(0, Math.min(size - 2, Math.floor(y)));
  const s = Math.max(0, Math.min(1, x - i));
  const t = Math.max(0, Math.min(1, y - j));
  const at = size * j + i;
  return (1 - t) * ((1 - s) * field[at] + s * field[at + 1]) + t * ((1 - s) * field[at + size] + s * field[at + size + 1]);
}
