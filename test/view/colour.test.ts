import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  beamColour,
  beamTable,
  densityColour,
  densityPlace,
  densityTable,
  oklabOf,
  type Rgb,
  rgbOf,
  rgbOfOklab,
  stretch,
} from "../../src/view/colour.ts";

const hexOf = (rgb: Rgb): string => `#${rgb.map((x) => x.toString(16).padStart(2, "0")).join("")}`;
const themes = ["light", "dark"] as const;
const lightness = (rgb: Rgb): number => oklabOf(rgb)[0];

describe("OKLab", () => {
  // Source: CSS Color 4 (W3C), sRGB primaries in oklab(), values from memory and rounded there to five places.
  it.each([
    ["#ffffff", 1, 0, 0],
    ["#000000", 0, 0, 0],
    ["#ff0000", 0.62796, 0.22486, 0.12585],
    ["#00ff00", 0.86644, -0.23389, 0.1795],
    ["#0000ff", 0.45201, -0.03246, -0.31153],
  ])("of %s is that of the standard", (hex, ...want) => {
    const got = oklabOf(rgbOf(hex));
    // Half a unit of the fifth place, and the six-digit matrices of either side.
    for (const k of [0, 1, 2]) expect(Math.abs(got[k] - want[k])).toBeLessThan(2e-5);
  });

  it("goes there and back without moving any 8-bit colour", () => {
    const channel = fc.integer({ min: 0, max: 255 });
    fc.assert(
      fc.property(channel, channel, channel, (r, g, b) => {
        expect(rgbOfOklab(oklabOf([r, g, b]))).toEqual([r, g, b]);
      }),
      { seed: 20260101, numRuns: 2000 },
    );
  });
});

describe("the beam map", () => {
  // Source: the design's control points.
  it("passes through its control points", () => {
    const at = (theme: "light" | "dark", sign: number): string[] =>
      [0.25, 0.5, 0.75, 1].map((s) => hexOf(beamColour(sign * s, theme)).toUpperCase());
    expect(at("dark", 1)).toEqual(["#134E34", "#559247", "#B5CA4E", "#FDF8BE"]);
    expect(at("dark", -1)).toEqual(["#602569", "#B553B4", "#EDA0DE", "#FFEEFD"]);
    expect(at("light", 1)).toEqual(["#D6DC85", "#80AB50", "#2E6D3F", "#072E21"]);
    expect(at("light", -1)).toEqual(["#F2C3EA", "#D173CA", "#8F2697", "#3B0C48"]);
  });

  it.each(themes)("%s: zero, and what is no number, is the page", (theme) => {
    const page = { light: "#f9fbf6", dark: "#0d1412" }[theme];
    for (const s of [0, -0, Number.NaN]) expect(hexOf(beamColour(s, theme))).toBe(page);
  });

  it.each(themes)("%s: lightness moves one way along each arm, and equally for equal size", (theme) => {
    const way = theme === "light" ? -1 : 1;
    for (let k = 1; k <= 100; k++) {
      for (const sign of [1, -1]) {
        const step = lightness(beamColour((sign * k) / 100, theme)) - lightness(beamColour((sign * (k - 1)) / 100, theme));
        expect(way * step).toBeGreaterThan(0);
      }
      // Control points are 8-bit: the two arms differ by up to two units of the last bit, 0.006 in lightness.
      expect(Math.abs(lightness(beamColour(k / 100, theme)) - lightness(beamColour(-k / 100, theme)))).toBeLessThan(0.006);
    }
  });

  it("is clamped past the ends", () => {
    expect(beamColour(7, "light")).toEqual(beamColour(1, "light"));
    expect(beamColour(Number.NEGATIVE_INFINITY, "light")).toEqual(beamColour(-1, "light"));
  });

  it("stretches as asinh, odd, ±1 at ±1", () => {
    // Computed by hand: asinh(1)/asinh(25) = 0.881374/3.912423.
    expect(stretch(0.04)).toBeCloseTo(0.225275, 5);
    expect(stretch(-0.04)).toBe(-stretch(0.04));
    expect([stretch(1), stretch(-1), stretch(0)]).toEqual([1, -1, 0]);
  });

  it("has a table with the page in the middle", () => {
    const table = beamTable("dark", 8);
    expect(table).toHaveLength(3 * 17);
    expect([...table.subarray(24, 27)]).toEqual([...rgbOf("#0D1412")]);
    expect([...table.subarray(0, 3)]).toEqual([...rgbOf("#FFEEFD")]);
    expect([...table.subarray(48, 51)]).toEqual([...rgbOf("#FDF8BE")]);
  });
});

describe("the density map", () => {
  it.each(themes)("%s: empty is the page, and lightness moves one way", (theme) => {
    expect(hexOf(densityColour(0, theme))).toBe({ light: "#f6fbfc", dark: "#0d1414" }[theme]);
    expect(hexOf(densityColour(1, theme))).toBe({ light: "#10234f", dark: "#dffcfd" }[theme]);
    const way = theme === "light" ? -1 : 1;
    for (let k = 1; k <= 100; k++) {
      expect(way * (lightness(densityColour(k / 100, theme)) - lightness(densityColour((k - 1) / 100, theme)))).toBeGreaterThan(0);
    }
    expect([...densityTable(theme, 4).subarray(0, 3)]).toEqual([...densityColour(0, theme)]);
  });

  it("places counts on a log scale that starts at 0.16", () => {
    expect([0, 1, 10, 100].map((n) => densityPlace(n, 100))).toEqual([0, 0.16, 0.58, 1]);
    expect(densityPlace(1, 1)).toBe(1);
    expect(densityPlace(Number.NaN, 5)).toBe(0);
  });
});
