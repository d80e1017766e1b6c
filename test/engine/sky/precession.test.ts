import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { sourceDirection } from "../../../src/engine/sky/direction.ts";
import { precessFromJ2000 } from "../../../src/engine/sky/precession.ts";
import { apart, arbAngle, arbQuarter, SEED, turnApart } from "../../support/arbitrary.ts";

const DEG = Math.PI / 180;
const J2000 = 2_451_545;

describe("precession", () => {
  // Source: ERFA 2.0.0, matrix rp of bp06 (IAU 2006, four-angle form) on the same directions; computed outside this program.
  it.each([
    [2_415_020, 10, 20, 0.15161334664331236, 0.33947632405482264],
    [2_415_020, 200, -45, 3.4651267877106107, -0.7762241113724276],
    [2_415_020, 300, 89.5, 5.774234133884239, 1.5548663068743744],
    [2_488_070, 10, 20, 0.19756403356098548, 0.3586125039694824],
    [2_488_070, 200, -45, 3.5164974808336225, -0.7944829297434286],
    [2_488_070, 300, 89.5, 4.111875859912788, 1.5616252475922878],
  ])("agrees with the four-angle form on JD %d for %d°, %d°", (day, ra, dec, wantRa, wantDec) => {
    const { raRad, decRad } = precessFromJ2000(ra * DEG, dec * DEG, day, 0);
    // The two published sets of polynomials differ by 0.4 µas a century; right ascension is magnified toward the pole.
    expect(turnApart(raRad, wantRa) * Math.cos(wantDec)).toBeLessThanOrEqual(5e-12);
    expect(Math.abs(decRad - wantDec)).toBeLessThanOrEqual(5e-12);
  });

  it("does next to nothing at J2000", () => {
    fc.assert(
      fc.property(arbAngle, arbQuarter, (ra, dec) => {
        const { raRad, decRad } = precessFromJ2000(ra, dec, J2000, 0);
        expect(apart(sourceDirection(raRad, decRad), sourceDirection(ra, dec))).toBeLessThanOrEqual(1e-14); // turns up to 20 rad
      }),
      SEED,
    );
  });

  it("is a rotation: keeps the angle between any two directions", () => {
    fc.assert(
      fc.property(
        arbAngle,
        arbQuarter,
        arbAngle,
        arbQuarter,
        fc.double({ min: -73_000, max: 73_000, noNaN: true }),
        (a, b, c, d, days) => {
          const [p, q] = [precessFromJ2000(a, b, J2000, days), precessFromJ2000(c, d, J2000, days)];
          const before = apart(sourceDirection(a, b), sourceDirection(c, d));
          const after = apart(sourceDirection(p.raRad, p.decRad), sourceDirection(q.raRad, q.decRad));
          expect(Math.abs(after - before)).toBeLessThanOrEqual(2e-14);
        },
      ),
      SEED,
    );
  });

  it("moves the pole of J2000 along the equinox, 2004″ a century", () => {
    const { decRad } = precessFromJ2000(1, Math.PI / 2, J2000, 36_525);
    // θ_A of IAU 2006 after one century: 2004.191903 − 0.4294934 − 0.04182264 − 0.000007089 − 0.0000001274 arcsec.
    expect((Math.PI / 2 - decRad) / (DEG / 3600)).toBeCloseTo(2003.72058, 4);
  });

  it("refuses a declination past a pole and a date that is none", () => {
    expect(() => precessFromJ2000(0, 45, J2000, 0)).toThrow("decRad is 45; expected radians in [-π/2, π/2]. Were degrees passed?");
    expect(() => precessFromJ2000(0, 0, Number.NaN, 0)).toThrow("ttDay");
  });
});
