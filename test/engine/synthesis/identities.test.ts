import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { imageNoiseJy } from "../../../src/engine/measure/noise.ts";
import { squareAxes } from "../../../src/engine/synthesis/plane.ts";
import { noiseFactor } from "../../../src/engine/synthesis/sums.ts";
import type { Track } from "../../../src/engine/synthesis/track.ts";
import { SymmetricTransform } from "../../../src/engine/synthesis/transform.ts";
import type { Weighting } from "../../../src/engine/synthesis/weights.ts";
import { parkMiller } from "../../support/random.ts";
import { settle } from "../../support/settle.ts";
import { madeUpTrack } from "../../support/track.ts";

const natural: Weighting = { scheme: "natural", robustness: 0, taperRad: null };
const AXES = squareAxes(64, 4e-6);
const FIELD = 1e-3;
const beamOf = (track: Track, weighting: Weighting, field = FIELD, axes = AXES): Float64Array =>
  settle(track, weighting, field).plane(axes).values;
const apart = (a: Float64Array, b: Float64Array): number => a.reduce((most, v, k) => Math.max(most, Math.abs(v - b[k])), 0);
const seeds = fc.integer({ min: 1, max: 1000 });
const made = (seed: number, stations = 6): Track =>
  madeUpTrack({ stations, integrationS: 2400, spanM: 5000, lowestDeg: 5, diameterM: 1, seed });
/** All antennas far enough apart not to shade each other: then a shift changes nothing that is seen. */
const runs = { numRuns: 15, seed: 41 };

describe("identities of samples and beams", () => {
  it("shifting every station alike leaves the natural beam", () => {
    fc.assert(
      fc.property(seeds, fc.tuple(...[0, 1, 2].map(() => fc.double({ min: -1e4, max: 1e4, noNaN: true }))), (seed, by) => {
        const track = made(seed);
        const moved = { ...track, stationXyzM: track.stationXyzM.map((x, k) => x + by[k % 3]) };
        // Positions of 15 km lose 2e-12 m; the beam moves by less than 1e-9.
        expect(apart(beamOf(track, natural), beamOf(moved, natural))).toBeLessThan(1e-9);
      }),
      runs,
    );
  });

  it("scaling wavelength, positions and dishes together leaves every beam", () => {
    fc.assert(
      fc.property(
        seeds,
        fc.constantFrom(0.25, 2, 8),
        fc.constantFrom(natural, { ...natural, scheme: "uniform" } as const),
        (seed, by, weighting) => {
          const track = made(seed);
          // Powers of two: every length in wavelengths comes out the same to the last bit, so no sample changes its cell.
          const scaled = {
            ...track,
            stationXyzM: track.stationXyzM.map((x) => x * by),
            diameterM: track.diameterM.map((d) => d * by),
            frequencyHz: track.frequencyHz / by,
            channelHz: track.channelHz.map((hz) => hz / by),
          };
          expect(apart(beamOf(track, weighting), beamOf(scaled, weighting))).toBeLessThan(1e-12);
        },
      ),
      runs,
    );
  });

  it("taking every sample twice leaves natural, uniform and robust beams", () => {
    fc.assert(
      fc.property(seeds, fc.constantFrom("natural", "uniform", "robust" as const), (seed, scheme) => {
        const track = made(seed);
        const twice = { ...track, channelHz: Float64Array.of(track.channelHz[0], track.channelHz[0]) };
        const weighting = { scheme, robustness: 0.3, taperRad: null } as Weighting;
        expect(apart(beamOf(track, weighting), beamOf(twice, weighting))).toBeLessThan(1e-12);
      }),
      runs,
    );
  });

  it("the noise factor runs steadily in R from uniform to natural", () => {
    fc.assert(
      fc.property(seeds, (seed) => {
        const track = made(seed, 10);
        const factor = (weighting: Weighting): number => noiseFactor(settle(track, weighting, FIELD).sums);
        const factors = [
          factor({ ...natural, scheme: "uniform" }),
          ...[-2, -1, 0, 0.5, 1, 2].map((robustness) => factor({ ...natural, scheme: "robust", robustness })),
          factor(natural),
        ];
        // Rounding alone where two are alike.
        for (let k = 1; k < factors.length; k++) expect(factors[k]).toBeLessThanOrEqual(factors[k - 1] + 1e-12);
        expect(factors[factors.length - 1]).toBeCloseTo(1, 12);
      }),
      runs,
    );
  });

  it("a station more never raises the natural noise, as long as it shades none", () => {
    fc.assert(
      fc.property(seeds, fc.double({ min: 50, max: 5000, noNaN: true }), (seed, sefd) => {
        const noise = (stations: number): number => {
          const track = madeUpTrack({ stations, integrationS: 2400, spanM: 5000, diameterM: 0.001, lowestDeg: 5, seed });
          const sefdJy = Float64Array.from({ length: stations }, (_, k) => (k < 6 ? 400 : sefd));
          let inverse = 0;
          settle(track, natural, FIELD).walk.baselines(0, stations, ({ i, j, count }) => {
            inverse += count / (sefdJy[i] * sefdJy[j]);
          });
          return imageNoiseJy({
            inverseSefdSquares: inverse,
            channelWidthHz: 1e6,
            sampleS: 1,
            polarizations: 2,
            efficiency: 1,
            repeats: 1,
            weightingFactor: 1,
          });
        };
        expect(noise(7)).toBeLessThan(noise(6));
      }),
      runs,
    );
  });

  it("keeps Parseval: the squares of the image over its pixels are those of the grid", () => {
    fc.assert(
      fc.property(seeds, fc.constantFrom(16, 64, 128), (seed, size) => {
        const random = parkMiller(seed);
        const lastColumn = size / 4;
        const cells = new Float64Array(size * (lastColumn + 1));
        let squares = 0;
        for (let a = 1; a <= lastColumn; a++) {
          for (let y = 0; y < size; y++) {
            const w = random() - 0.5;
            cells[size * a + y] = w;
            squares += 2 * w * w; // and its conjugate
          }
        }
        const image = new SymmetricTransform(size).image({ size, lastColumn, cells, start: (a) => size * a }, size);
        const sum = image.reduce((total, v) => total + v * v, 0);
        expect(sum / size / size / squares).toBeCloseTo(1, 12);
      }),
      runs,
    );
  });
});
