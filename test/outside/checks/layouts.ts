import { ARCSEC_PER_RAD, RAD_PER_DEG, SPEED_OF_LIGHT } from "../../../src/base/constants.ts";
import { baselineCount, baselineLengthsM, baselineXyzM } from "../../../src/engine/array/baselines.ts";
import { beamAt, curvatureEllipse } from "../../../src/engine/measure/lobe.ts";
import { halfPowerWidths, walkRays } from "../../../src/engine/measure/rays.ts";
import { squareAxes } from "../../../src/engine/synthesis/plane.ts";
import { noiseFactor } from "../../../src/engine/synthesis/sums.ts";
import type { Weighting } from "../../../src/engine/synthesis/weights.ts";
import { settle } from "../../support/settle.ts";
import { trackOf } from "../../support/track.ts";
import { checksOf, type Figure, type Left } from "../check.ts";
import rows from "../data/layouts.json" with { type: "json" };
import rulers from "../data/rulers.json" with { type: "json" };

/** Baselines of stations in a plane, metres. */
function baselinesOf(places: readonly (readonly number[])[]): Float64Array {
  return baselineXyzM(Float64Array.from(places.flatMap(([x, y]) => [x, y, 0])));
}

/** Vectors that are alike to a millionth, a vector and its negative counted as two. */
function different(xyzM: Float64Array): number {
  const seen = new Set<string>();
  for (let k = 0; k < xyzM.length; k += 3) {
    for (const sign of [1, -1]) seen.add(`${Math.round(1e6 * sign * xyzM[k]) + 0},${Math.round(1e6 * sign * xyzM[k + 1]) + 0}`);
  }
  return seen.size;
}

const longest = (places: readonly (readonly number[])[]): number => Math.max(...baselineLengthsM(baselinesOf(places)));
const line = (marks: readonly number[]): readonly (readonly number[])[] => marks.map((mark) => [mark, 0]);
function marksOf(spacings: string): readonly number[] {
  let mark = 0;
  return [0, ...spacings.split("-").map((step) => (mark += Number(step)))];
}
const spacingsOf = (places: readonly (readonly number[])[]): number => different(baselinesOf(places)) / 2;

/** The source's north arm lies 5° west of north: so its position angle of 175° and its noise factors come out to their last digit. */
const NORTH_DEG = -5;

/** The ideal Y: three arms 120° apart, nine stations each at n^1.716 (Chow 1972), the north arm 0.9 as long where `short`. */
function yEnu(farthestM: number, short: boolean): readonly (readonly number[])[] {
  return [
    [NORTH_DEG, short ? 0.9 : 1],
    [NORTH_DEG + 120, 1],
    [NORTH_DEG + 240, 1],
  ].flatMap(([azimuthDeg, k]) =>
    Array.from({ length: 9 }, (_, n) => {
      const r = k * farthestM * ((n + 1) / 9) ** 1.716;
      return [r * Math.sin(azimuthDeg * RAD_PER_DEG), r * Math.cos(azimuthDeg * RAD_PER_DEG), 0];
    }),
  );
}

const LATITUDE = 34.0787492;
const FREQUENCY_HZ = 1.5e9;
/** Longest baselines of the four published sizes, metres, by their letters there. */
const SIZES = { A: 36_400, B: 11_100, C: 3_400, D: 1_030 } as const;

/** The Y over twelve hours at its zenith: half-power widths, radians, and the noise factor. */
function yBeam(weighting: Weighting, fieldRad: number, lengthM: number = SIZES.D, snapshot = false, frequencyHz = FREQUENCY_HZ) {
  const track = trackOf(yEnu(lengthM / Math.sqrt(3), true), {
    latitudeDeg: LATITUDE,
    decDeg: LATITUDE,
    fromH: snapshot ? 0 : -6,
    toH: snapshot ? 0 : 6,
    integrationS: 20,
    frequencyHz,
    diameterM: 0.1,
    lowestDeg: 0,
  });
  const { sums, plane } = settle(track, weighting, fieldRad);
  const about = curvatureEllipse(sums.uu / sums.weight, sums.uv / sums.weight, sums.vv / sums.weight);
  const image = plane(squareAxes(256, about.minorRad / 16));
  const widths = halfPowerWidths(walkRays(beamAt([image]), about));
  if (!widths) throw new Error("no half-power contour");
  return { ...widths, factor: noiseFactor(sums) };
}
const unit = (lengthM: number = SIZES.D): number => SPEED_OF_LIGHT / FREQUENCY_HZ / lengthM;
const mean = ({ majorRad, minorRad }: { majorRad: number; minorRad: number }): number => Math.sqrt(majorRad * minorRad);
const uniform: Weighting = { scheme: "uniform", robustness: 0, taperRad: null };
const natural: Weighting = { scheme: "natural", robustness: 0, taperRad: null };
/** Cells of Bmax/K wavelengths. */
const fieldOf = (k: number): number => k * unit();

const answers: { [id: string]: () => readonly Figure[] } = {
  L09: () => {
    const sorted = [...baselineLengthsM(baselinesOf(yEnu(1, false)))].sort((a, b) => a - b);
    const at = (part: number): number => {
      const place = part * (sorted.length - 1);
      const k = Math.floor(place);
      return sorted[k] + (place - k) * ((sorted[k + 1] ?? sorted[k]) - sorted[k]);
    };
    const sum = (f: (b: number) => number): number => sorted.reduce((total, b) => total + f(b), 0) / sorted.length;
    return [at(1), at(0), at(0.5), sum((b) => b), Math.sqrt(sum((b) => b * b)), at(0.05), at(0.8)];
  },
  L15: () => {
    const { majorRad, minorRad } = yBeam(natural, fieldOf(256));
    return [majorRad / unit(), minorRad / unit()];
  },
  L16: () => {
    const { majorRad, minorRad, factor } = yBeam({ scheme: "robust", robustness: 0.5, taperRad: null }, fieldOf(256));
    return [majorRad / unit(), minorRad / unit(), factor];
  },
  L17: () => {
    const { majorRad, minorRad } = yBeam(natural, fieldOf(256), SIZES.D, true);
    return [majorRad * ARCSEC_PER_RAD, minorRad * ARCSEC_PER_RAD];
  },
  L20: () => [13, 27, 50].map(baselineCount),
  L21: () => {
    const [low, middle, high] = [85e9, 115e9, 230e9].map((hz) => mean(yBeam(natural, fieldOf(256), SIZES.D, true, hz)));
    return [middle / low, high / low];
  },
};
for (let n = 3; n <= 11; n++) {
  answers[`L01-${n}`] = () => {
    // Every published solution has to do, not one of them.
    const all = (rulers as unknown as { [id: string]: readonly string[] })[`L01-${n}`].map((spacings) => line(marksOf(spacings)));
    const lengths = new Set(all.map(longest));
    const different = new Set(all.map(spacingsOf));
    if (lengths.size > 1 || different.size > 1) return [Number.NaN, Number.NaN, Number.NaN];
    return [[...lengths][0], [...different][0], baselineCount(n) / [...different][0]];
  };
}
for (let n = 4; n <= 11; n++) {
  const marks = line((rulers as unknown as { [id: string]: readonly number[] })[`L03-${n}`]);
  answers[`L03-${n}`] = () => [longest(marks), spacingsOf(marks)];
}
for (let n = 2; n <= 6; n++) {
  const places = (rulers as unknown as { [id: string]: readonly (readonly number[])[] })[`L05-${n}`];
  answers[`L05-${n}`] = () => [different(baselinesOf(places))];
}
for (const n of [3, 6, 9, 12]) {
  const lattice = (rulers as unknown as { [id: string]: readonly (readonly number[])[] })[`L06-${n}`];
  const places = lattice.map(([a, b]) => [(a + b / 2) / 3, (b * Math.sqrt(3)) / 6]);
  answers[`L06-${n}`] = () => [
    Math.max(...places.map(([x, y]) => Math.hypot(x, y))),
    longest(places),
    different(baselinesOf(places)),
  ];
}
for (const k of [64, 128, 256, 512, 1024]) {
  answers[`L14-${k}`] = () => {
    const beam = yBeam(uniform, fieldOf(k));
    return [mean(beam) / unit(), beam.factor];
  };
}
for (const size of ["D", "C", "B", "A"] as const) {
  answers[`L14b-${size}`] = () => [mean(yBeam(uniform, (28 / 60) * RAD_PER_DEG, SIZES[size])) / unit(SIZES[size])];
}

/** Section 5: layouts that others have published, laid out and looked at by this program. */
export const layoutChecks = checksOf(rows, answers);

const handbook = "printed for a uniform weighting whose cell and step are not stated: no number to hold to (compare L14b)";
export const layoutsLeft: Left = {
  L02: "a limit for many stations",
  L04: "the marks of the longest line are not at hand",
  L07: "no pattern generator yet",
  "L10 to L13": handbook,
  L18: "a demonstration of a trap",
  L19: "no pattern generator yet",
};
