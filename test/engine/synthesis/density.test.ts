import { describe, expect, it } from "vitest";
import { densityField, densityIndex, densityMoments, emptyDensity } from "../../../src/engine/synthesis/density.ts";
import { exactSamples } from "../../../src/engine/synthesis/exact.ts";
import { noiseFactor } from "../../../src/engine/synthesis/sums.ts";
import { settle } from "../../support/settle.ts";
import { madeUpTrack } from "../../support/track.ts";

describe("density cells", () => {
  it("index the sample itself, halves away from zero, and give its conjugate the same stored cell", () => {
    const grid = emptyDensity(1, 10);
    const stored = (ku: number, kv: number) => (2 * grid.reach + 1) * ku + kv + grid.reach;
    expect(densityIndex(grid, 2.5, 0.4)).toBe(stored(3, 0));
    expect(densityIndex(grid, -2.5, 0.4)).toBe(stored(3, 0));
    expect(densityIndex(grid, -2.5, -3.5)).toBe(stored(3, 4));
    expect(densityIndex(grid, -0.2, -3.5)).toBe(stored(0, 4));
    for (const [u, v] of [
      [3.3, -7.7],
      [0.5, 0.5],
      [-0.5, 9.2],
      [0, 0],
      [0.1, -0.2],
    ]) {
      expect(densityIndex(grid, -u, -v)).toBe(densityIndex(grid, u, v));
    }
  });

  it("shrink the field so that at most 4096 cells span twice the largest |u| or |v|", () => {
    expect(densityField(0.01, 1e5)).toBe(0.01);
    expect(densityField(0.1, 1e5)).toBe(2048 / 1e5);
    expect(densityField(0.1, 0)).toBe(0.1);
  });

  it("sum over both halves for ΣW² and Σw, the cell at the origin once", () => {
    const grid = emptyDensity(1, 3);
    grid.weight[densityIndex(grid, 2, 1)] = 3;
    grid.weight[densityIndex(grid, 0, 0)] = 4; // two samples and their conjugates
    expect(densityMoments(grid)).toEqual({ squares: 2 * 9 + 16, sum: 2 * 3 + 4 });
  });
});

describe("weights", () => {
  const track = madeUpTrack({ stations: 9, integrationS: 240, channels: 2, bandwidthHz: 1e8, sefdJy: [300, 500], seed: 4 });
  const field = 4e-4;

  it.each(["natural", "uniform", "robust"] as const)("agree with the definition over a list of samples: %s", (scheme) => {
    const weighting = { scheme, robustness: -0.5, taperRad: 5e-5 };
    const { sums, fieldRad } = settle(track, weighting, field);
    const exact = exactSamples(track, { ...weighting, fieldRad });
    const natural = exactSamples(track, { scheme: "natural", robustness: 0, taperRad: null, fieldRad });
    const total = (a: Float64Array) => a.reduce((sum, w) => sum + w, 0);
    let squares = 0;
    for (let k = 0; k < exact.weight.length; k++) squares += exact.weight[k] ** 2 / natural.weight[k];
    const want = Math.sqrt(squares * total(natural.weight)) / total(exact.weight);
    expect(noiseFactor(sums)).toBeCloseTo(want, 11); // rounding of 10⁴ terms
    let uu = 0;
    for (let k = 0; k < exact.weight.length; k++) uu += exact.weight[k] * exact.u[k] ** 2;
    expect(sums.uu / sums.weight / (uu / total(exact.weight))).toBeCloseTo(1, 11);
  });

  it("raise the noise steadily from natural over robust to uniform", () => {
    const factor = (robustness: number) => noiseFactor(settle(track, { scheme: "robust", robustness, taperRad: null }, field).sums);
    const factors = [2, 1, 0.5, 0, -0.5, -1, -2].map(factor);
    const natural = noiseFactor(settle(track, { scheme: "natural", robustness: 0, taperRad: null }, field).sums);
    const uniform = noiseFactor(settle(track, { scheme: "uniform", robustness: 0, taperRad: null }, field).sums);
    expect(natural).toBeCloseTo(1, 12);
    for (const [k, f] of factors.entries()) expect(f).toBeGreaterThanOrEqual(k === 0 ? natural - 1e-12 : factors[k - 1]);
    expect(uniform).toBeGreaterThanOrEqual(factors[factors.length - 1]);
  });

  it("refuse a robustness outside −2 to 2", () => {
    expect(() => settle(track, { scheme: "robust", robustness: 2.1, taperRad: null }, field)).toThrow(
      "weighting.robustness is 2.1; expected a robustness in [-2, 2].",
    );
  });
});
