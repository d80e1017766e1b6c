import { describe, expect, it } from "vitest";
import { SymmetricTransform } from "../../../src/engine/synthesis/transform.ts";
import { parkMiller } from "../../support/random.ts";

/** A made-up point-symmetric grid: its half for the transform, and the whole for the plain sum. */
function grid(size: number, lastColumn: number, seed: number) {
  const random = parkMiller(seed);
  const half = new Float64Array(size * (lastColumn + 1));
  const whole = new Float64Array(size * size);
  for (let a = 0; a <= lastColumn; a++) {
    for (let y = 0; y < size; y++) {
      const mirror = (size - y) % size;
      const lone = a === 0 || 2 * a === size;
      const w = lone && mirror < y ? half[size * a + mirror] : random();
      half[size * a + y] = w;
      whole[size * y + a] = w;
      whole[size * mirror + ((size - a) % size)] = w;
    }
  }
  return { half, whole };
}

describe("the symmetric transform", () => {
  it.each([
    [16, 8, 16],
    [16, 3, 8],
    [32, 16, 32],
    [32, 0, 16],
    [64, 20, 64],
    [64, 7, 34],
  ])("agrees with the plain double sum: size %i, columns to %i, %i shown", (size, lastColumn, shown) => {
    const { half, whole } = grid(size, lastColumn, size + lastColumn);
    const got = new SymmetricTransform(size).image({ size, lastColumn, cells: half, start: (a) => size * a }, shown);
    const total = whole.reduce((sum, w) => sum + w, 0);
    for (let y = 0; y < shown; y++) {
      for (let x = 0; x < shown; x++) {
        let want = 0;
        for (let b = 0; b < size; b++) {
          for (let a = 0; a < size; a++) {
            if (whole[size * b + a] === 0) continue;
            want += whole[size * b + a] * Math.cos((2 * Math.PI * (a * (x - shown / 2) + b * (y - shown / 2))) / size);
          }
        }
        // Rounding of log2(size) butterflies on sums of this size.
        expect(Math.abs(got[shown * y + x] - want)).toBeLessThanOrEqual(1e-13 * total);
      }
    }
  });

  it("gives the same image again after an image of another grid", () => {
    const transform = new SymmetricTransform(32);
    const wide = grid(32, 16, 5);
    const narrow = grid(32, 4, 6);
    const image = (g: { half: Float64Array }, lastColumn: number) =>
      transform.image({ size: 32, lastColumn, cells: g.half, start: (a) => 32 * a }, 32);
    const first = image(narrow, 4);
    image(wide, 16);
    expect(image(narrow, 4)).toEqual(first);
  });
});
