import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { barEnd } from "../../../src/view/ledger/bar.ts";

const room = { left: 30, right: 75 };

describe("barEnd", () => {
  it("stands on the plumb line at the limit and fills each side at its end of the scale", () => {
    expect(barEnd(0, room)).toEqual({ x: 0, off: false });
    expect(barEnd(0.4, room)).toEqual({ x: 75, off: false });
    expect(barEnd(-0.2, room)).toEqual({ x: -30, off: false });
  });

  it("is a square root: a quarter of the margin, half of the bar", () => {
    expect(barEnd(0.1, room).x).toBeCloseTo(37.5, 12);
    expect(barEnd(-0.05, room).x).toBeCloseTo(-15, 12);
  });

  it("never leaves its room, and says when it would", () => {
    fc.assert(
      fc.property(fc.double({ min: -10, max: 10, noNaN: true }), (margin) => {
        const { x, off } = barEnd(margin, room);
        expect(x).toBeGreaterThanOrEqual(-30);
        expect(x).toBeLessThanOrEqual(75);
        expect(off).toBe(margin < -0.2 || margin > 0.4);
      }),
      { seed: 20260301 },
    );
  });
});
