import { describe, expect, it } from "vitest";
import { nearestPoint, pointInDirection } from "../../../src/view/ground/pick.ts";

const points = (...rows: readonly (readonly [number, number])[]) => ({
  x: Float64Array.from(rows, ([x]) => x),
  y: Float64Array.from(rows, ([, y]) => y),
  count: rows.length,
});

describe("nearestPoint", () => {
  it("takes the nearest within reach and skips what is out of sight", () => {
    const some = points([10, 10], [14, 10], [Number.NaN, Number.NaN]);
    expect(nearestPoint(some, 13, 10, 12)).toBe(1);
    expect(nearestPoint(some, 11, 10, 12)).toBe(0);
    expect(nearestPoint(some, 40, 10, 12)).toBe(-1);
  });
});

describe("pointInDirection", () => {
  const cross = points([100, 100], [150, 100], [220, 100], [100, 40], [100, 160], [30, 110]);

  it("goes to the next one that way", () => {
    expect(pointInDirection(cross, 100, 100, "right", 0)).toBe(1);
    expect(pointInDirection(cross, 150, 100, "right", 1)).toBe(2);
    expect(pointInDirection(cross, 100, 100, "up", 0)).toBe(3);
    expect(pointInDirection(cross, 100, 100, "down", 0)).toBe(4);
    expect(pointInDirection(cross, 100, 100, "left", 0)).toBe(5);
  });

  it("prefers straight ahead to nearer but aslant, and takes aslant before nothing", () => {
    const two = points([0, 0], [60, 5], [40, 35]);
    expect(pointInDirection(two, 0, 0, "right", 0)).toBe(1);
    const steep = points([0, 0], [10, 40]);
    expect(pointInDirection(steep, 0, 0, "right", 0)).toBe(1);
    expect(pointInDirection(steep, 0, 0, "left", 0)).toBe(-1);
  });
});
