import FFT from "fft.js";
import { countArc, sharedRuns } from "../../src/engine/synthesis/cells.ts";
import { addToDensity, densityField, emptyDensity, naturalWeight } from "../../src/engine/synthesis/density.ts";
import { exactBeam } from "../../src/engine/synthesis/exact.ts";
import { extent, wavelengthsPerMetre } from "../../src/engine/synthesis/extent.ts";
import { squareAxes } from "../../src/engine/synthesis/plane.ts";
import { PreviewGrid } from "../../src/engine/synthesis/preview.ts";
import { SettledBeam } from "../../src/engine/synthesis/settled.ts";
import { addToSums, emptySums } from "../../src/engine/synthesis/sums.ts";
import type { Track } from "../../src/engine/synthesis/track.ts";
import { SymmetricTransform } from "../../src/engine/synthesis/transform.ts";
import { visibility } from "../../src/engine/synthesis/visibility.ts";
import { Walk } from "../../src/engine/synthesis/walk.ts";
import { sampleWeights } from "../../src/engine/synthesis/weights.ts";
import { parkMiller } from "../support/random.ts";
import { madeUpTrack } from "../support/track.ts";
import type { Comparison } from "./ratio.ts";

const G = 1024;
const STATIONS = 64;
/** 240 samples of a baseline: 8 h of hour angle. */
const track = (): Track => madeUpTrack({ stations: STATIONS, integrationS: 119.67, lowestDeg: 5 });

/** Plain complex two-dimensional transform with fft.js: rows, then columns. */
class PlainTransform {
  private readonly fft = new FFT(G);
  private readonly line: number[] = this.fft.createComplexArray();
  private readonly out: number[] = this.fft.createComplexArray();

  run(re: Float64Array, image: Float64Array): void {
    const { fft, line, out } = this;
    const middle = new Float64Array(2 * G * G);
    for (let y = 0; y < G; y++) {
      for (let x = 0; x < G; x++) {
        line[2 * x] = re[G * y + x];
        line[2 * x + 1] = 0;
      }
      fft.transform(out, line);
      for (let x = 0; x < 2 * G; x++) middle[2 * G * y + x] = out[x];
    }
    for (let x = 0; x < G; x++) {
      for (let y = 0; y < G; y++) {
        line[2 * y] = middle[2 * (G * y + x)];
        line[2 * y + 1] = middle[2 * (G * y + x) + 1];
      }
      fft.transform(out, line);
      for (let y = 0; y < G; y++) image[G * y + x] = out[2 * y];
    }
  }
}

const transform: Comparison = {
  name: "beam transform, G 1024, against plain complex 2-D fft.js",
  goal: 12,
  make: async () => {
    const lastColumn = Math.floor(0.45 * (G / 2));
    const random = parkMiller(3);
    const half = new Float64Array(G * (lastColumn + 1));
    const full = new Float64Array(G * G);
    for (let a = 0; a <= lastColumn; a++) {
      for (let b = -lastColumn; b <= lastColumn; b++) {
        const row = (b + G) % G;
        if (a === 0 && b < 0) continue;
        const w = random();
        half[G * a + row] = w;
        full[G * row + a] = w;
        full[G * ((G - row) % G) + ((G - a) % G)] = w;
        if (a === 0) half[(G - row) % G] = w;
      }
    }
    const symmetric = new SymmetricTransform(G);
    const plain = new PlainTransform();
    const image = new Float64Array(G * G);
    const plainImage = new Float64Array(G * G);
    return {
      fast: () => symmetric.image({ size: G, lastColumn, cells: half, start: (a) => G * a }, G, image),
      plain: () => plain.run(full, plainImage),
      plainTimes: 1,
      note: "uv occupied to 0.45 of the half width",
    };
  },
};

const gridding: Comparison = {
  name: "nearest-cell gridding, 64 × 240, against the straightforward loop",
  goal: 6,
  make: async () => {
    const given = track();
    const seen = visibility(given);
    const spans = extent(new Walk(given, seen));
    const cellsPerMetre = (0.45 * (G / 2)) / Math.max(spans.maxUM, spans.maxVM);
    const counts = new Int32Array(G * G);
    const grid = new Float64Array(G * G);
    const { stationXyzM, hourAngleRad, decRad } = given;
    const times = hourAngleRad.length;
    const runs: { i: number; j: number; from: number; to: number }[] = [];
    for (let i = 0; i < STATIONS; i++) {
      for (let j = i + 1; j < STATIONS; j++)
        for (const [from, to] of sharedRuns(seen.flags, times, i, j)) runs.push({ i, j, from, to });
    }
    const xyz = (i: number, j: number, axis: number): number => stationXyzM[3 * j + axis] - stationXyzM[3 * i + axis];
    const stepRad = hourAngleRad[1] - hourAngleRad[0];
    return {
      fast: () => {
        for (const { i, j, from, to } of runs) {
          const arc = {
            xM: xyz(i, j, 0),
            yM: xyz(i, j, 1),
            zM: xyz(i, j, 2),
            startRad: hourAngleRad[from],
            stepRad,
            count: to - from,
          };
          countArc(counts, G, cellsPerMetre, decRad, arc, 1);
        }
      },
      plain: () => {
        for (const { i, j, from, to } of runs) {
          for (let t = from; t < to; t++) {
            const sinH = Math.sin(hourAngleRad[t]);
            const cosH = Math.cos(hourAngleRad[t]);
            const u = xyz(i, j, 0) * sinH + xyz(i, j, 1) * cosH;
            const v =
              -xyz(i, j, 0) * Math.sin(decRad) * cosH + xyz(i, j, 1) * Math.sin(decRad) * sinH + xyz(i, j, 2) * Math.cos(decRad);
            const x = Math.round(u * cellsPerMetre);
            const y = Math.round(v * cellsPerMetre);
            grid[G * (y + G / 2) + x + G / 2] += 1;
            grid[G * (G / 2 - y) + G / 2 - x] += 1;
          }
        }
      },
      plainTimes: 1,
    };
  },
};

const preview: Comparison = {
  name: "preview frame, one of 64 stations moved, 240 times, G 1024, against plain recomputation",
  goal: 14,
  make: async () => {
    const given = track();
    const seen = visibility(given);
    const spans = extent(new Walk(given, seen));
    const reach = Math.max(spans.maxUM, spans.maxVM);
    const pixelRad = 0.225 / (reach * wavelengthsPerMetre(given.frequencyHz));
    const weighting = { scheme: "robust", robustness: 0, taperRad: null } as const;
    const grid = new PreviewGrid(given, seen, naturalWeight(null), weighting, G * pixelRad, reach, G, G / 2, pixelRad, {
      size: 512,
      cellsPerMetre: 512 / (2.6 * reach),
    });
    const moves = [20, -20].map((east) => {
      const stationXyzM = given.stationXyzM.slice();
      stationXyzM[3 * 5 + 1] += east;
      return { ...given, stationXyzM };
    });
    let turn = 0;
    const plain = new PlainTransform();
    const counts = new Float64Array(G * G);
    const image = new Float64Array(G * G);
    const cellsPerMetre = wavelengthsPerMetre(given.frequencyHz) * G * pixelRad;
    return {
      fast: () => {
        grid.moveTo(moves[turn++ % 2]);
        grid.image();
      },
      plain: () => {
        counts.fill(0);
        new Walk(given, seen).baselines(0, STATIONS, ({ count, uM, vM }) => {
          for (let k = 0; k < count; k++) {
            const x = Math.round(uM[k] * cellsPerMetre);
            const y = Math.round(vM[k] * cellsPerMetre);
            counts[G * ((y + G) % G) + ((x + G) % G)] += 1;
            counts[G * ((G - y) % G) + ((G - x) % G)] += 1;
          }
        });
        let squares = 0;
        let sum = 0;
        for (const w of counts) {
          squares += w * w;
          sum += w;
        }
        for (let k = 0; k < counts.length; k++) counts[k] /= 1 + (counts[k] * 25 * sum) / squares;
        plain.run(counts, image);
      },
      plainTimes: 1,
      note: "robust 0, the middle 512² shown",
    };
  },
};

const settled: Comparison = {
  name: "settled beam, 64 × 240, G 1024, against the direct sum a pixel × pixels",
  goal: 2000,
  make: async () => {
    const given = track();
    const seen = visibility(given);
    const walk = new Walk(given, seen);
    const spans = extent(walk);
    const perMetre = wavelengthsPerMetre(given.frequencyHz);
    const maxUv = Math.max(spans.maxUM, spans.maxVM) * perMetre;
    const pixelRad = 0.12 / maxUv;
    const natural = naturalWeight(null);
    const scratch = new Float64Array(given.hourAngleRad.length);
    const u: number[] = [];
    const v: number[] = [];
    walk.baselines(0, STATIONS, (run) => {
      for (let k = 0; k < run.count; k++) {
        u.push(run.uM[k] * perMetre);
        v.push(run.vM[k] * perMetre);
      }
    });
    const list = { u: Float64Array.from(u), v: Float64Array.from(v), weight: new Float64Array(u.length).fill(1) };
    const pixels = 16;
    return {
      fast: () => {
        const density = emptyDensity(densityField(G * pixelRad, maxUv), maxUv);
        addToDensity(density, walk, natural, 0, STATIONS);
        const weights = sampleWeights({ scheme: "robust", robustness: 0, taperRad: null }, natural, density);
        const sums = emptySums();
        addToSums(sums, walk, natural, weights, 0, STATIONS);
        const beam = new SettledBeam(squareAxes(G, pixelRad), spans.maxUM * perMetre, spans.maxVM * perMetre);
        walk.baselines(0, STATIONS, (run) => {
          weights(run, given.frequencyHz, scratch);
          beam.add(run, given.frequencyHz, scratch);
        });
        return beam.finish(sums.weight);
      },
      plain: () => {
        let sum = 0;
        for (let k = 0; k < pixels; k++) sum += exactBeam(list, k * 7 * pixelRad, -k * 5 * pixelRad);
        return sum;
      },
      plainTimes: (G * G) / pixels,
      note: `${u.length} samples, robust 0; the plain way timed on ${pixels} pixels`,
    };
  },
};

export const comparisons: readonly Comparison[] = [transform, gridding, preview, settled];
