import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { sourceDirection } from "../../../src/engine/sky/direction.ts";
import { uvwM } from "../../../src/engine/synthesis/uvw.ts";
import { arbAngle, arbQuarter, arbXyzM, SEED } from "../../support/arbitrary.ts";

const length = (xyz: Float64Array, b: number): number => Math.hypot(xyz[3 * b], xyz[3 * b + 1], xyz[3 * b + 2]);

/** Of each row, the largest it may be off by: rounding in units of the baseline's length. */
function eachRow(xyz: Float64Array, check: (b: number, lengthM: number) => void): void {
  for (let b = 0; b < xyz.length / 3; b++) check(b, length(xyz, b));
}

describe("u, v, w", () => {
  it("are a rotation: keep the length of every baseline", () => {
    fc.assert(
      fc.property(arbXyzM, arbAngle, arbQuarter, (xyz, h, dec) => {
        const uvw = uvwM(xyz, h, dec);
        eachRow(xyz, (b, lengthM) => {
          expect(Math.abs(length(uvw, b) - lengthM)).toBeLessThanOrEqual(8 * Number.EPSILON * lengthM); // √3 axes × 4 ε, two norms
        });
      }),
      SEED,
    );
  });

  it("have w along the direction of the source, u level with the equator", () => {
    fc.assert(
      fc.property(arbXyzM, arbAngle, arbQuarter, (xyz, h, dec) => {
        const uvw = uvwM(xyz, h, dec);
        const s = sourceDirection(h, dec);
        eachRow(xyz, (b, lengthM) => {
          const along = xyz[3 * b] * s[0] + xyz[3 * b + 1] * s[1] + xyz[3 * b + 2] * s[2];
          expect(Math.abs(uvw[3 * b + 2] - along)).toBeLessThanOrEqual(8 * Number.EPSILON * lengthM);
        });
        // A baseline along the pole has no u whatever the direction.
        expect(Math.abs(uvwM(Float64Array.of(0, 0, 1000), h, dec)[0])).toBe(0);
      }),
      SEED,
    );
  });

  it("flip every sign when the stations change places", () => {
    fc.assert(
      fc.property(arbXyzM, arbAngle, arbQuarter, (xyz, h, dec) => {
        const [there, back] = [
          uvwM(xyz, h, dec),
          uvwM(
            xyz.map((x) => -x),
            h,
            dec,
          ),
        ];
        for (const [k, x] of there.entries()) expect(x + back[k]).toBe(0);
      }),
      SEED,
    );
  });

  it("are linear: around a triangle they close", () => {
    fc.assert(
      fc.property(arbXyzM, arbXyzM, arbAngle, arbQuarter, (a, b, h, dec) => {
        const [p, q] = [a.slice(0, 3), b.slice(0, 3)];
        const third = p.map((x, k) => x + q[k]);
        const [up, uq, ur] = [p, q, third].map((side) => uvwM(side, h, dec));
        const open = Math.hypot(...ur.map((x, k) => x - up[k] - uq[k]));
        expect(open).toBeLessThanOrEqual(16 * Number.EPSILON * (Math.hypot(...p) + Math.hypot(...q)));
      }),
      SEED,
    );
  });

  it("come back after a turn, and half a turn later u is reversed", () => {
    fc.assert(
      fc.property(arbXyzM, arbAngle, arbQuarter, (xyz, h, dec) => {
        const [now, later, half] = [0, 2 * Math.PI, Math.PI].map((turn) => uvwM(xyz, h + turn, dec));
        eachRow(xyz, (b, lengthM) => {
          const fuzz = 1e-14 * lengthM; // hour angles up to 26 rad are themselves rounded at 4e-15
          for (const axis of [0, 1, 2]) expect(Math.abs(later[3 * b + axis] - now[3 * b + axis])).toBeLessThanOrEqual(fuzz);
          expect(Math.abs(half[3 * b] + now[3 * b])).toBeLessThanOrEqual(fuzz);
        });
      }),
      SEED,
    );
  });

  it("at a pole turn in a plane, with w the height along the axis", () => {
    const [u, v, w] = uvwM(Float64Array.of(300, 400, 120), 0, Math.PI / 2);
    expect(u).toBe(400);
    expect(v).toBeCloseTo(-300, 12);
    expect(w).toBeCloseTo(120, 12);
    expect(uvwM(Float64Array.of(300, 400, 120), 0, -Math.PI / 2)[2]).toBeCloseTo(-120, 12);
  });

  it("are the same numbers for −0 as for 0", () => {
    const xyz = Float64Array.of(3, -4, 5);
    const values = (h: number, dec: number): number[] => [...uvwM(xyz, h, dec)].map((x) => x + 0);
    expect(values(-0, -0)).toEqual(values(0, 0));
    expect(values(0, 0)).toEqual([-4, 5, 3]);
  });

  it("write where they are told, in place too, and else leave the input as it was", () => {
    fc.assert(
      fc.property(arbXyzM, arbAngle, arbQuarter, (xyz, h, dec) => {
        const before = [...xyz];
        const fresh = uvwM(xyz, h, dec);
        expect([...xyz]).toEqual(before);
        const copy = xyz.slice();
        expect(uvwM(copy, h, dec, copy)).toBe(copy);
        expect([...copy]).toEqual([...fresh]);
      }),
      SEED,
    );
  });

  it("refuse degrees and halves of vectors", () => {
    expect(() => uvwM(new Float64Array(3), 0, 45)).toThrow("decRad is 45; expected radians in [-π/2, π/2]. Were degrees passed?");
    expect(() => uvwM(new Float64Array(3), Number.NaN, 0)).toThrow("hourAngleRad");
    expect(() => uvwM(new Float64Array(4), 0, 0)).toThrow("baselineXyzM.length is 4; expected a multiple of 3.");
    expect(() => uvwM(new Float64Array(6), 0, 0, new Float64Array(3))).toThrow("out.length is 3; expected 6");
  });
});
