import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { SIDEREAL_RATE } from "../../../src/base/constants.ts";
import { earthRotationAngle, greenwichMeanSiderealTime, hourAngleAt, wrapTurn } from "../../../src/engine/sky/rotation.ts";
import { SEED, turnApart } from "../../support/arbitrary.ts";

const J2000 = 2_451_545;
const arbDay = fc.integer({ min: -36_525, max: 36_525 }).map((days) => J2000 - 0.5 + days);
const arbFrac = fc.double({ min: 0, max: 1, noNaN: true, maxExcluded: true });

describe("the Earth's rotation", () => {
  it("does not depend on how a date is cut in two", () => {
    fc.assert(
      fc.property(arbDay, arbFrac, fc.integer({ min: -1000, max: 1000 }), (day, frac, moved) => {
        const off = turnApart(earthRotationAngle(day, frac), earthRotationAngle(day - moved, frac + moved));
        // The fraction loses what a part of 1000 days costs, 1e-13 turn.
        expect(off).toBeLessThanOrEqual(2e-12);
      }),
      SEED,
    );
  });

  it("keeps an angle in [0, 2π) on both sides of J2000", () => {
    fc.assert(
      fc.property(arbDay, arbFrac, (day, frac) => {
        for (const angle of [earthRotationAngle(day, frac), greenwichMeanSiderealTime(day, frac)]) {
          expect(angle).toBeGreaterThanOrEqual(0);
          expect(angle).toBeLessThan(2 * Math.PI);
        }
      }),
      SEED,
    );
  });

  it("gains on the Sun at the rate the hour-angle windows use", () => {
    fc.assert(
      fc.property(arbDay, (day) => {
        const gained = wrapTurn(greenwichMeanSiderealTime(day, 1) - greenwichMeanSiderealTime(day, 0));
        // The rate drifts by 6e-11 a century (from the t² term of GMST), and the constant is cut at 1e-11.
        expect(Math.abs(gained / (2 * Math.PI) - (SIDEREAL_RATE - 1))).toBeLessThanOrEqual(8e-11);
      }),
      SEED,
    );
  });

  it("barely minds UT1 in the place of TT", () => {
    const day = 2_461_485.5; // 2027 March 21
    const off = turnApart(greenwichMeanSiderealTime(day, 0.25), greenwichMeanSiderealTime(day, 0.25, day, 0.25 + 70 / 86_400));
    expect(off).toBeGreaterThan(1e-10);
    expect(off).toBeLessThan(6e-10); // 70 s of precession in right ascension, 4612″ a century
  });

  it("brings a source to the meridian when sidereal time is its right ascension", () => {
    const gmst = greenwichMeanSiderealTime(J2000, 0.3);
    expect(hourAngleAt(gmst + 0.7, 0.7, J2000, 0.3)).toBeCloseTo(0, 14);
    expect(hourAngleAt(gmst, 0.25, J2000, 0.3)).toBeCloseTo(0.25, 14); // east of Greenwich it is later
    expect(hourAngleAt(gmst + 0.25, 0, J2000, 0.3)).toBeCloseTo(-0.25, 14); // a larger right ascension comes later
    fc.assert(
      fc.property(fc.double({ min: -10, max: 10, noNaN: true }), (ra) => {
        const h = hourAngleAt(ra, 1, J2000, 0);
        expect(h).toBeGreaterThan(-Math.PI - 1e-15);
        expect(h).toBeLessThanOrEqual(Math.PI);
      }),
      SEED,
    );
  });

  it("refuses a date that is none", () => {
    expect(() => earthRotationAngle(Number.NaN, 0)).toThrow("ut1Day is NaN; expected a finite number.");
    expect(() => greenwichMeanSiderealTime(J2000, 0, J2000, Number.POSITIVE_INFINITY)).toThrow("ttFrac");
    expect(() => hourAngleAt(Number.NaN, 0, J2000, 0)).toThrow("raRad");
  });
});

describe("an angle within one turn", () => {
  it("is never negative, never a whole turn, never −0", () => {
    for (const zero of [0, -0, -1e-300, -1e-17, 2 * Math.PI, -2 * Math.PI]) expect(Object.is(wrapTurn(zero), 0)).toBe(true);
    expect(wrapTurn(-1)).toBeCloseTo(2 * Math.PI - 1, 15);
    expect(wrapTurn(7)).toBeCloseTo(7 - 2 * Math.PI, 15);
  });
});
