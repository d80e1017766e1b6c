import { describe, expect, it } from "vitest";
import { SPEED_OF_LIGHT } from "../../../src/base/constants.ts";
import { DomainError } from "../../../src/base/errors.ts";
import { exactBeam, exactSamples } from "../../../src/engine/synthesis/exact.ts";
import { kernelFor, WIDTHS } from "../../../src/engine/synthesis/kernel.ts";
import type { BeamPlane } from "../../../src/engine/synthesis/plane.ts";
import { squareAxes } from "../../../src/engine/synthesis/plane.ts";
import { SETTLED_TOLERANCE, SettledBeam } from "../../../src/engine/synthesis/settled.ts";
import { settle } from "../../support/settle.ts";
import { madeUpTrack } from "../../support/track.ts";

/** The promise of a settled beam, as a fraction of the peak. */
const PROMISE = SETTLED_TOLERANCE;

function worstError(plane: BeamPlane, exact: Parameters<typeof exactBeam>[0], stride: number): number {
  const { size, values, xl, xm, yl, ym } = plane;
  let worst = 0;
  const places = new Set([0, size - 1, size / 2]);
  for (let k = 1; k < size; k += stride) places.add(k);
  for (const y of places) {
    for (const x of places) {
      const [a, b] = [x - size / 2, y - size / 2];
      worst = Math.max(worst, Math.abs(values[size * y + x] - exactBeam(exact, a * xl + b * yl, a * xm + b * ym)));
    }
  }
  return worst;
}

describe("the settled beam against the direct sum", () => {
  const schemes = [
    { scheme: "natural", robustness: 0, taperRad: null },
    { scheme: "uniform", robustness: 0, taperRad: null },
    { scheme: "robust", robustness: 0.5, taperRad: null },
    { scheme: "robust", robustness: -2, taperRad: 3e-5 },
  ] as const;
  it.each(schemes)("agrees everywhere in the image: $scheme, robustness $robustness, taper $taperRad", (weighting) => {
    const track = madeUpTrack({
      stations: 12,
      channels: 3,
      bandwidthHz: 2e8,
      integrationS: 900,
      sefdJy: [300, 420, 700],
      seed: 11,
    });
    const { plane, fieldRad } = settle(track, weighting, 2e-3);
    const exact = exactSamples(track, { ...weighting, fieldRad });
    expect(worstError(plane(squareAxes(64, 3e-6)), exact, 5)).toBeLessThanOrEqual(PROMISE);
  });

  it.each([
    [34, 1e-6],
    [64, 8e-6],
    [128, 3e-5], // The uv samples reach past the period of the pixels and wrap.
    [100, 2e-4],
  ])("agrees for any size and pixel: %i px of %f rad", (size, pixelRad) => {
    const track = madeUpTrack({ stations: 7, integrationS: 1800, seed: 5 });
    const weighting = { scheme: "natural", robustness: 0, taperRad: null } as const;
    const { plane, fieldRad } = settle(track, weighting, 2e-3);
    const exact = exactSamples(track, { ...weighting, fieldRad });
    expect(worstError(plane(squareAxes(size, pixelRad)), exact, 9)).toBeLessThanOrEqual(PROMISE);
  });

  it("agrees on turned and stretched axes", () => {
    const track = madeUpTrack({ stations: 9, integrationS: 1200, seed: 3, decDeg: 12 });
    const weighting = { scheme: "uniform", robustness: 0, taperRad: null } as const;
    const { plane, fieldRad } = settle(track, weighting, 1e-3);
    const exact = exactSamples(track, { ...weighting, fieldRad });
    expect(worstError(plane({ size: 64, xl: 2e-6, xm: -1e-6, yl: 3e-6, ym: 6e-6 }), exact, 7)).toBeLessThanOrEqual(PROMISE);
  });

  it("is point-symmetric, with its peak of 1 at the centre", () => {
    const track = madeUpTrack({ stations: 8, seed: 21 });
    const { size, values } = settle(track, { scheme: "natural", robustness: 0, taperRad: null }, 1e-3).plane(squareAxes(64, 4e-6));
    // Spreading error alone: the weights cancel exactly at the centre but for it.
    expect(Math.abs(values[size * 32 + 32] - 1)).toBeLessThan(1e-7);
    for (let k = 1; k < 32; k++) expect(values[size * (32 + k) + 32 - k]).toBe(values[size * (32 - k) + 32 + k]);
  });

  it.each([4, 5, 6, 7, 8, 9])("keeps to the bound of its kernel where it is hardest, one sample alone: width %i", (width) => {
    const bound = WIDTHS.find(([w]) => w === width)?.[1] as number;
    const hz = SPEED_OF_LIGHT; // a metre of wavelength: metres are wavelengths
    let worst = 0;
    for (let k = 0; k < 48; k++) {
      // Places all over a cell, along the axes and off them.
      const [u, v] = [10 + k / 48 / 0.256, k % 3 === 0 ? 0 : 5 + k / 37 / 0.256];
      const beam = new SettledBeam(squareAxes(64, 0.002), 40, 40, bound);
      const run = { i: 0, j: 1, count: 1, uM: Float64Array.of(u), vM: Float64Array.of(v), wM: Float64Array.of(0) };
      beam.add(run, hz, Float64Array.of(1));
      const sample = { u: run.uM, v: run.vM, weight: Float64Array.of(1) };
      worst = Math.max(worst, worstError(beam.finish(1), sample, 3));
    }
    expect(worst).toBeLessThanOrEqual(bound);
    // A bound that is never nearly reached would cost cells for nothing.
    expect(worst).toBeGreaterThan(bound / 4);
  });

  it("keeps to its promise where samples err alike: all on one axis, evenly spaced", () => {
    const lengths = Float64Array.from({ length: 20 }, (_, k) => k + 1);
    const none = new Float64Array(20);
    const beam = new SettledBeam(squareAxes(128, 0.002), 20, 20);
    for (const [uM, vM] of [
      [lengths, none],
      [none, lengths],
    ]) {
      beam.add({ i: 0, j: 1, count: 20, uM, vM, wM: none }, SPEED_OF_LIGHT, new Float64Array(20).fill(1));
    }
    const both = {
      u: Float64Array.of(...lengths, ...none),
      v: Float64Array.of(...none, ...lengths),
      weight: new Float64Array(40).fill(1),
    };
    expect(worstError(beam.finish(40), both, 3)).toBeLessThanOrEqual(PROMISE);
  });

  it("refuses a tolerance that no kernel here keeps", () => {
    expect(() => kernelFor(1e-9)).toThrow(DomainError);
  });
});

describe("the settled beam over fields, sizes and plans", () => {
  // Every size with every weighting on arrays of another shape each: compact, wide, nearly in a line, few stations.
  const arrays = [
    { stations: 5, spanM: 300, decDeg: 60, latitudeDeg: 45 },
    { stations: 16, spanM: 40_000, decDeg: -70 },
    { stations: 9, spanM: 5000, decDeg: 0, latitudeDeg: 0 },
    { stations: 3, spanM: 1000, decDeg: -89 },
  ];
  const sizes = [16, 34, 128, 256] as const;
  const weightings = [
    { scheme: "natural", robustness: 0, taperRad: null },
    { scheme: "uniform", robustness: 0, taperRad: null },
    { scheme: "robust", robustness: 0, taperRad: null },
  ] as const;
  const cases = arrays.flatMap((array, a) =>
    sizes.flatMap((size) => weightings.map((weighting) => ({ a, array, size, weighting }))),
  );
  it.each(cases)("errs by no more than promised: array $a, $size px, $weighting.scheme", ({ a, array, size, weighting }) => {
    const track = madeUpTrack({ ...array, integrationS: 2400, lowestDeg: 0, seed: 40 + a });
    const { plane, fieldRad, maxUv } = settle(track, weighting, 1e-3);
    const exact = exactSamples(track, { ...weighting, fieldRad });
    // From a pixel far finer than the beam to one past which the samples wrap.
    for (const pixelRad of [0.02 / maxUv, 0.2 / maxUv, 0.8 / maxUv]) {
      expect(worstError(plane(squareAxes(size, pixelRad)), exact, Math.ceil(size / 5))).toBeLessThanOrEqual(PROMISE);
    }
  });
});
