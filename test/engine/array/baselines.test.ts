import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  baselineCount,
  baselineIndex,
  baselineLengthsM,
  baselineStations,
  baselineXyzM,
} from "../../../src/engine/array/baselines.ts";
import { apart, arbXyzM, SEED } from "../../support/arbitrary.ts";

const row = (xyz: Float64Array, k: number): Float64Array => xyz.subarray(3 * k, 3 * k + 3);

describe("baselines", () => {
  it("go from the earlier station to the later, in the order of pairs", () => {
    const xyz = Float64Array.of(0, 0, 0, 1, 2, 3, 10, 20, 30);
    expect([...baselineXyzM(xyz)]).toEqual([1, 2, 3, 10, 20, 30, 9, 18, 27]);
    expect([...baselineStations(3)]).toEqual([0, 1, 0, 2, 1, 2]);
    expect([...baselineLengthsM(baselineXyzM(Float64Array.of(0, 0, 0, 3, 4, 12)))]).toEqual([13]);
  });

  it("are what their pair says, and found by their index", () => {
    fc.assert(
      fc.property(arbXyzM, (xyz) => {
        const n = xyz.length / 3;
        const [baselines, pairs] = [baselineXyzM(xyz), baselineStations(n)];
        expect(baselines.length).toBe(3 * baselineCount(n));
        for (let b = 0; b < baselineCount(n); b++) {
          const [i, j] = [pairs[2 * b], pairs[2 * b + 1]];
          expect(baselineIndex(i, j, n)).toBe(b);
          expect([...row(baselines, b)]).toEqual([0, 1, 2].map((axis) => xyz[3 * j + axis] - xyz[3 * i + axis]));
          expect(baselineLengthsM(baselines)[b]).toBe(apart(row(xyz, i), row(xyz, j)));
        }
      }),
      SEED,
    );
  });

  it("close: around any three stations they add up to nothing", () => {
    fc.assert(
      fc.property(arbXyzM, (xyz) => {
        const n = xyz.length / 3;
        fc.pre(n >= 3);
        const baselines = baselineXyzM(xyz);
        const side = (i: number, j: number): Float64Array => row(baselines, baselineIndex(i, j, n));
        const [a, b, c] = [side(0, 1), side(1, n - 1), side(0, n - 1)];
        const sum = [0, 1, 2].map((axis) => a[axis] + b[axis] - c[axis]);
        expect(Math.hypot(...sum)).toBeLessThanOrEqual(8 * Number.EPSILON * 2.6e7); // five roundings of at most two diameters
      }),
      SEED,
    );
  });

  it("do not feel where the frame's zero is", () => {
    const xyz = Float64Array.of(1, 2, 3, -4, 5, 6, 7, -8, 9);
    expect([...baselineXyzM(xyz.map((x, k) => x + [1000, -500, 64][k % 3]))]).toEqual([...baselineXyzM(xyz)]);
  });

  it("are none below two stations", () => {
    expect(baselineXyzM(new Float64Array(0)).length).toBe(0);
    expect(baselineXyzM(Float64Array.of(1, 2, 3)).length).toBe(0);
    expect([...baselineStations(1)]).toEqual([]);
  });

  it("refuse what has no row", () => {
    expect(() => baselineXyzM(new Float64Array(5))).toThrow("stationXyzM.length is 5; expected a multiple of 3.");
    expect(() => baselineLengthsM(new Float64Array(4))).toThrow("xyzM.length is 4");
    expect(() => baselineIndex(2, 1, 3)).toThrow("i, j is [2,1]; expected 0 ≤ i < j < 3.");
  });
});
