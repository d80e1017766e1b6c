import { addToDensity, densityField, emptyDensity, naturalWeight } from "../../src/engine/synthesis/density.ts";
import { extent, wavelengthsPerMetre } from "../../src/engine/synthesis/extent.ts";
import { squareAxes } from "../../src/engine/synthesis/plane.ts";
import { SettledBeam } from "../../src/engine/synthesis/settled.ts";
import { addToSums, emptySums } from "../../src/engine/synthesis/sums.ts";
import type { Track } from "../../src/engine/synthesis/track.ts";
import { SymmetricTransform } from "../../src/engine/synthesis/transform.ts";
import { visibility } from "../../src/engine/synthesis/visibility.ts";
import { Walk } from "../../src/engine/synthesis/walk.ts";
import { sampleWeights } from "../../src/engine/synthesis/weights.ts";
import { madeUpTrack } from "../support/track.ts";
import { medianOf, type Outcome, peakMiB, type Row, timeMs } from "./outcome.ts";

const ROUNDS = 5;

/** Least-squares slope of log time over log size. */
function exponent(sizes: readonly number[], timesMs: readonly number[]): number {
  const xs = sizes.map(Math.log);
  const ys = timesMs.map(Math.log);
  const [mx, my] = [xs, ys].map((list) => list.reduce((a, b) => a + b, 0) / list.length);
  return xs.reduce((sum, x, k) => sum + (x - mx) * (ys[k] - my), 0) / xs.reduce((sum, x) => sum + (x - mx) ** 2, 0);
}

/** How time grows with size: each size once a round, minima fitted; rounds fitted by themselves give the range. */
function growth(name: string, sizes: readonly number[], runs: readonly (() => unknown)[], detail: string): Outcome {
  for (const run of runs) run();
  const rounds = Array.from({ length: ROUNDS }, () => runs.map(timeMs));
  const fitted = rounds.map((times) => exponent(sizes, times));
  const minima = runs.map((_, k) => Math.min(...rounds.map((times) => times[k])));
  return {
    name,
    value: exponent(sizes, minima),
    unit: "exponent",
    goal: 1.1,
    sense: "at most",
    median: medianOf(fitted),
    low: Math.min(...fitted),
    high: Math.max(...fitted),
    peakMiB: peakMiB(),
    detail: `${detail}: ${minima.map((ms) => `${ms.toPrecision(3)} ms`).join(", ")}`,
  };
}

/** Every pass over the samples of the first stations: density, sums, spreading. */
function passes(track: Track, stations: number) {
  const seen = visibility(track);
  const walk = new Walk(track, seen);
  const spans = extent(walk);
  const perMetre = wavelengthsPerMetre(track.channelHz[track.channelHz.length - 1]);
  const maxUv = Math.max(spans.maxUM, spans.maxVM) * perMetre;
  const pixelRad = 0.12 / maxUv;
  const natural = naturalWeight(null);
  const scratch = new Float64Array(track.hourAngleRad.length);
  const density = emptyDensity(densityField(1024 * pixelRad, maxUv), maxUv);
  const beam = new SettledBeam(squareAxes(1024, pixelRad), spans.maxUM * perMetre, spans.maxVM * perMetre);
  let samples = 0;
  walk.baselines(0, stations, ({ count }) => {
    samples += count * track.channelHz.length;
  });
  const run = (): void => {
    addToDensity(density, walk, natural, 0, stations);
    const weights = sampleWeights({ scheme: "robust", robustness: 0, taperRad: null }, natural, density);
    addToSums(emptySums(), walk, natural, weights, 0, stations);
    walk.baselines(0, stations, (of) => {
      for (const hz of track.channelHz) {
        weights(of, hz, scratch);
        beam.add(of, hz, scratch);
      }
    });
  };
  return { samples, run };
}

const bySamples: Row = {
  name: "growth with samples: density, sums and spreading of 48 stations",
  measure: async () => {
    const parts = [480, 240, 120, 60].map((integrationS) => passes(madeUpTrack({ stations: 48, integrationS, lowestDeg: 5 }), 48));
    return growth(
      bySamples.name,
      parts.map(({ samples }) => samples),
      parts.map(({ run }) => run),
      parts.map(({ samples }) => samples).join(", "),
    );
  },
};

const byCells: Row = {
  name: "growth with grid cells: the beam transform",
  measure: async () => {
    const sizes = [256, 512, 1024, 2048];
    const runs = sizes.map((size) => {
      const lastColumn = Math.floor(0.225 * size);
      const transform = new SymmetricTransform(size);
      const cells = new Float64Array(size * (lastColumn + 1)).fill(1);
      const out = new Float64Array(size * size);
      return () => transform.image({ size, lastColumn, cells, start: (a) => size * a }, size, out);
    });
    return growth(
      byCells.name,
      sizes.map((size) => size * size),
      runs,
      `G ${sizes.join(", ")}`,
    );
  },
};

/** Baselines of these first stations stand for all 512: with all of them a round takes minutes. */
const PART = 4;

const billion: Row = {
  name: "cost a sample, 512 stations × 480 hour angles × 16 channels, against 64 × 240 × 1",
  measure: async () => {
    const large = passes(
      madeUpTrack({ stations: 512, integrationS: 59.83, channels: 16, bandwidthHz: 1e8, lowestDeg: 5, diameterM: 1 }),
      PART,
    );
    const small = passes(madeUpTrack({ stations: 64, integrationS: 119.67, lowestDeg: 5 }), 64);
    for (const { run } of [small, large]) run();
    const rounds = Array.from({ length: ROUNDS }, () => ({
      small: timeMs(small.run) / small.samples,
      large: timeMs(large.run) / large.samples,
    }));
    const ratios = rounds.map((round) => round.large / round.small);
    const least = (which: "small" | "large"): number => Math.min(...rounds.map((round) => round[which]));
    const all = (512 * 511 * 480 * 16) / 2;
    return {
      name: billion.name,
      value: least("large") / least("small"),
      unit: "× the cost",
      goal: 1.3,
      sense: "at most",
      median: medianOf(ratios),
      low: Math.min(...ratios),
      high: Math.max(...ratios),
      peakMiB: peakMiB(),
      detail: `${(1e6 * least("large")).toFixed(0)} ns a sample against ${(1e6 * least("small")).toFixed(0)}; timed on ${large.samples} of ${all.toExponential(2)} samples, whose baselines pass one by one: memory holds one baseline's track, the grids and nothing of the rest`,
    };
  },
};

export const growthRows: readonly Row[] = [bySamples, byCells, billion];
