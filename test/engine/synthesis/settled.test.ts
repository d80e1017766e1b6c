import { describe, expect, it } from "vitest";
import { exactBeam, exactSamples } from "../../../src/engine/synthesis/exact.ts";
import type { BeamPlane } from "../../../src/engine/synthesis/plane.ts";
import { squareAxes } from "../../../src/engine/synthesis/plane.ts";
import { settle } from "../../support/settle.ts";
import { madeUpTrack } from "../../support/track.ts";

/** The promise of a settled beam, as a fraction of the peak. */
const PROMISE = 1e-6;

function worstError(plane: BeamPlane, exact: ReturnType<typeof exactSamples>, stride: number): number {
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
});
