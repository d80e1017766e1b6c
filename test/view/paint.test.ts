import { describe, expect, it } from "vitest";
import { beamColour, densityColour, stretch } from "../../src/view/colour.ts";
import { paintBeam, paintDensity } from "../../src/view/paint.ts";

const SIZE = 8;
const pixel = (rgba: Uint8ClampedArray, row: number, column: number): number[] => {
  const at = 4 * (SIZE * row + column);
  return [...rgba.subarray(at, at + 4)];
};
const image = (set: { readonly [index: number]: number }): Float32Array => {
  const values = new Float32Array(SIZE * SIZE);
  for (const [at, value] of Object.entries(set)) values[Number(at)] = value;
  return values;
};

describe("a painted beam", () => {
  // Index size * y + x, x to the east, y to the north: (7, 7) is the north-east corner, (0, 0) the south-west one.
  const values = image({ [SIZE * 7 + 7]: 1, [SIZE * 0 + 0]: -1, [SIZE * 7 + 0]: 0.25 });

  it("has north up and east to the left", () => {
    const rgba = paintBeam(values, SIZE, "light", { stretch: "linear" });
    expect(pixel(rgba, 0, 0)).toEqual([...beamColour(1, "light"), 255]);
    expect(pixel(rgba, SIZE - 1, SIZE - 1)).toEqual([...beamColour(-1, "light"), 255]);
    expect(pixel(rgba, 0, SIZE - 1)).toEqual([...beamColour(0.25, "light"), 255]);
    expect(pixel(rgba, 3, 3)).toEqual([...beamColour(0, "light"), 255]);
  });

  it("shows a sidelobe of 1 % only when stretched", () => {
    const faint = image({ 0: 0.01 });
    const corner = (kind: "linear" | "stretched"): number[] =>
      pixel(paintBeam(faint, SIZE, "dark", { stretch: kind }), SIZE - 1, SIZE - 1);
    // The table is read at the nearest of 1024 steps.
    expect(corner("stretched")).toEqual([...beamColour(Math.round(1024 * stretch(0.01)) / 1024, "dark"), 255]);
    expect(corner("linear")).toEqual([...beamColour(Math.round(1024 * Math.fround(0.01)) / 1024, "dark"), 255]);
    expect(corner("stretched")).not.toEqual(corner("linear"));
  });

  it("clamps what lies past the peak, and shows what is no number as the page", () => {
    const odd = image({ 0: 3, 1: -3, 2: Number.NaN });
    const rgba = paintBeam(odd, SIZE, "dark", { stretch: "linear" });
    const bottom = [7, 6, 5].map((column) => pixel(rgba, SIZE - 1, column));
    expect(bottom).toEqual([1, -1, 0].map((s) => [...beamColour(s, "dark"), 255]));
  });
});

describe("a painted uv density", () => {
  it("has u to the right, v up, and empty cells like the page", () => {
    const counts = image({ [SIZE * 7 + 7]: 100, [SIZE * 0 + 7]: 1 });
    const rgba = paintDensity(counts, SIZE, "light");
    expect(pixel(rgba, 0, SIZE - 1)).toEqual([...densityColour(1, "light"), 255]);
    expect(pixel(rgba, SIZE - 1, SIZE - 1)).toEqual([...densityColour(Math.round(1024 * 0.16) / 1024, "light"), 255]);
    expect(pixel(rgba, 0, 0)).toEqual([...densityColour(0, "light"), 255]);
  });

  it("of nothing is the page", () => {
    const rgba = paintDensity(image({}), SIZE, "dark");
    expect(pixel(rgba, 4, 4)).toEqual([...densityColour(0, "dark"), 255]);
  });
});
