import { describe, expect, it } from "vitest";
import { coverage } from "../../../src/engine/measure/coverage.ts";
import { densityIndex, emptyDensity } from "../../../src/engine/synthesis/density.ts";

const filledBy = (reach: number, wanted: (ku: number, kv: number) => boolean) => {
  const grid = emptyDensity(1, reach);
  for (let ku = 0; ku <= reach; ku++)
    for (let kv = -reach; kv <= reach; kv++) if (wanted(ku, kv)) grid.weight[densityIndex(grid, ku, kv)] = 1;
  return grid;
};

describe("coverage", () => {
  it("of a full disc is whole and even", () => {
    const got = coverage(
      filledBy(60, () => true),
      60,
    );
    expect(got.filledFraction).toBe(1);
    expect(got.azimuthalUniformity).toBeCloseTo(1, 12);
  });

  it("of one quadrant and its mirror is half filled, and as even as 18 of 36 sectors: ln 18/ln 36", () => {
    const got = coverage(
      filledBy(400, (ku, kv) => ku > 0 && kv > 0),
      400,
    );
    expect(got.filledFraction).toBeCloseTo(0.5, 2); // the axes are left out
    expect(got.azimuthalUniformity).toBeCloseTo(Math.log(18) / Math.log(36), 2);
  });

  it("of one direction is not even at all", () => {
    const got = coverage(
      filledBy(50, (ku, kv) => ku === 0 && kv > 0),
      50,
    );
    expect(got.azimuthalUniformity).toBe(0);
  });
});
