import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { toHorizontal } from "../../../src/engine/sky/direction.ts";
import { halfArcAbove } from "../../../src/engine/sky/riseset.ts";
import { arbQuarter, SEED } from "../../support/arbitrary.ts";

const HALF = Math.PI / 2;

describe("how long a source stays above an elevation", () => {
  it("ends where the elevation is the limit, and holds on one side only", () => {
    fc.assert(
      fc.property(arbQuarter, arbQuarter, arbQuarter, (limit, dec, lat) => {
        const arc = halfArcAbove(limit, dec, lat);
        const at = (h: number): number => toHorizontal(h, dec, lat).elevationRad;
        // An elevation near ±90° moves as the square root of what is rounded: 2e-16 becomes 3e-8 rad.
        const fuzz = 1e-7;
        if (arc.kind === "always") expect(at(Math.PI)).toBeGreaterThanOrEqual(limit - fuzz);
        if (arc.kind === "never") expect(at(0)).toBeLessThanOrEqual(limit + fuzz);
        if (arc.kind === "rises") {
          expect(Math.abs(at(arc.halfArcRad) - limit)).toBeLessThanOrEqual(fuzz);
          expect(at(arc.halfArcRad * 0.9)).toBeGreaterThanOrEqual(limit - fuzz);
          expect(at(arc.halfArcRad + (Math.PI - arc.halfArcRad) * 0.1)).toBeLessThanOrEqual(limit + fuzz);
          expect(arc.halfArcRad).toBeGreaterThanOrEqual(0);
          expect(arc.halfArcRad).toBeLessThanOrEqual(Math.PI);
        }
      }),
      { ...SEED, numRuns: 1000 },
    );
  });

  it("is the textbook's arccosine where that keeps its digits", () => {
    fc.assert(
      fc.property(
        fc.double({ min: -1.2, max: 1.2, noNaN: true }),
        fc.double({ min: -1.2, max: 1.2, noNaN: true }),
        fc.double({ min: -0.3, max: 1, noNaN: true }),
        (dec, lat, limit) => {
          const cosH = (Math.sin(limit) - Math.sin(lat) * Math.sin(dec)) / (Math.cos(lat) * Math.cos(dec));
          fc.pre(Math.abs(cosH) < 0.99);
          const arc = halfArcAbove(limit, dec, lat);
          expect(arc.kind).toBe("rises");
          // cos φ cos δ ≥ 0.13 and sin H ≥ 0.14 magnify 3e-16 of rounding by 55.
          if (arc.kind === "rises") expect(Math.abs(arc.halfArcRad - Math.acos(cosH))).toBeLessThanOrEqual(2e-14);
        },
      ),
      SEED,
    );
  });

  it("keeps its digits where a source only grazes the limit", () => {
    // Near transit the elevation falls by cos φ cos δ / cos e · H²/2 from its highest, to fourth order in H.
    const [lat, dec, dip] = [0.6, -0.2, 1e-12];
    const highest = HALF - (lat - dec);
    const arc = halfArcAbove(highest - dip, dec, lat);
    const expected = Math.sqrt((2 * dip * Math.cos(highest)) / (Math.cos(lat) * Math.cos(dec)));
    if (arc.kind !== "rises") throw new Error(`it ${arc.kind} rises`);
    // The limit itself is rounded at 1e-16 of 1e-12: half of 2e-4 relative, where the arccosine would be off by a hundredth.
    expect(Math.abs(arc.halfArcRad / expected - 1)).toBeLessThanOrEqual(2e-4);
  });

  it("meets its limits: at the highest the arc is 0, at the lowest it is always", () => {
    expect(halfArcAbove(HALF, 0.5, 0.5)).toEqual({ kind: "rises", halfArcRad: 0 });
    expect(halfArcAbove(Math.abs(0.9 + 1.1) - HALF, 1.1, 0.9)).toEqual({ kind: "always" });
    expect(halfArcAbove(-HALF, -1.1, 0.9)).toEqual({ kind: "always" });
    expect(halfArcAbove(0, 0, 0)).toEqual({ kind: "rises", halfArcRad: HALF });
  });

  it("is the same in the other hemisphere", () => {
    fc.assert(
      fc.property(arbQuarter, arbQuarter, arbQuarter, (limit, dec, lat) => {
        expect(halfArcAbove(limit, -dec, -lat)).toEqual(halfArcAbove(limit, dec, lat));
      }),
      SEED,
    );
  });

  it("refuses degrees", () => {
    expect(() => halfArcAbove(15, 0, 0)).toThrow("elevationRad is 15; expected radians in [-π/2, π/2]. Were degrees passed?");
    expect(() => halfArcAbove(0, Number.NaN, 0)).toThrow("decRad");
  });
});
