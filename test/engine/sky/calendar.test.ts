import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { DomainError } from "../../../src/base/errors.ts";
import { isoToJulian, julianToIso } from "../../../src/engine/sky/calendar.ts";
import { SEED } from "../../support/arbitrary.ts";

describe("the calendar", () => {
  // Source: ERFA 2.0.0, dtf2d for UTC outside leap seconds; the first is the definition of J2000, the last two proleptic.
  it.each([
    ["2000-01-01T12:00:00Z", 2_451_544.5, 0.5],
    ["1987-04-10T19:21:00Z", 2_446_895.5, 0.80625],
    ["2024-02-29T06:00:00Z", 2_460_369.5, 0.25],
    ["1900-02-28T00:00:00Z", 2_415_078.5, 0],
    ["1900-03-01T00:00:00Z", 2_415_079.5, 0],
    ["2100-12-31T18:00:00Z", 2_488_433.5, 0.75],
    ["1600-02-29T00:00:00Z", 2_305_506.5, 0],
    ["0000-01-01T00:00:00Z", 1_721_059.5, 0],
  ])("reads %s", (text, day, frac) => {
    expect(isoToJulian(text)).toEqual({ day, frac });
    expect(julianToIso({ day, frac })).toBe(text);
  });

  it("reads offsets, a blank for the T, and times without seconds or zone, which are UTC", () => {
    const noon = isoToJulian("2027-03-21T12:00:00Z");
    for (const same of ["2027-03-21T12:00Z", "2027-03-21 12:00", "2027-03-21T14:00:00+02:00", "2027-03-21T06:30-0530"]) {
      expect(isoToJulian(same)).toEqual(noon);
    }
    expect(isoToJulian("2027-03-21T13:00:00+01")).toEqual(noon);
    expect(isoToJulian("2027-01-01T00:30:00+01:00")).toEqual(isoToJulian("2026-12-31T23:30:00Z"));
    expect(isoToJulian("2026-12-31T23:30:00-01:00")).toEqual(isoToJulian("2027-01-01T00:30:00Z"));
  });

  it("reads a leap second as the start of the next day, wherever on Earth it is written", () => {
    const next = isoToJulian("2017-01-01T00:00:00Z");
    expect(isoToJulian("2016-12-31T23:59:60Z")).toEqual(next);
    expect(isoToJulian("2017-01-01T09:59:60+10:00")).toEqual(next);
    expect(isoToJulian("2016-12-31T23:59:60.5Z").frac).toBeCloseTo(0.5 / 86_400, 15);
    expect(() => isoToJulian("2016-12-31T22:59:60Z")).toThrow("seconds below 60, or below 61 at 23:59 UTC");
  });

  it("comes back from a round trip, to the nanosecond", () => {
    const arbUnits = fc.bigInt({ min: 0n, max: 86_400_000_000_000n - 1n });
    fc.assert(
      fc.property(fc.integer({ min: -700_000, max: 2_900_000 }), arbUnits, (days, nanoseconds) => {
        const [day, frac] = [2_440_587.5 + days, Number(nanoseconds) / 86_400e9];
        const text = julianToIso({ day, frac }, 9);
        const back = isoToJulian(text);
        expect(julianToIso(back, 9)).toBe(text);
        expect(back.day).toBe(day);
        expect(Math.abs(back.frac - frac)).toBeLessThanOrEqual(1e-15); // a nanosecond is 1.2e-14 d; printing rounds to it
      }),
      SEED,
    );
  });

  it("agrees with the platform's calendar on every seventh day of four centuries", () => {
    for (let days = -73_000; days < 73_000; days += 7) {
      const text = `${new Date(days * 86_400_000).toISOString().slice(0, 19)}Z`;
      expect(isoToJulian(text)).toEqual({ day: 2_440_587.5 + days, frac: 0 });
    }
  });

  it("does not mind where a date is cut, and rounds up into the next day", () => {
    expect(julianToIso({ day: 2_451_545, frac: 0 })).toBe("2000-01-01T12:00:00Z");
    expect(julianToIso({ day: 2_451_545, frac: -0.75 })).toBe("1999-12-31T18:00:00Z");
    expect(julianToIso({ day: 2_451_544.5, frac: 3.25 })).toBe("2000-01-04T06:00:00Z");
    expect(julianToIso({ day: 2_451_543.5, frac: 1 - 1e-7 })).toBe("2000-01-01T00:00:00Z");
    expect(julianToIso({ day: 2_451_543.5, frac: 1 - 1e-7 }, 3)).toBe("1999-12-31T23:59:59.991Z");
  });

  it.each(["", "now", "2027-3-1T00:00:00Z", "2027-02-29T00:00:00Z", "1900-02-29T00:00Z", "2027-13-01T00:00Z", "2027-00-10T00:00Z"])(
    "refuses %j",
    (text) => {
      expect(() => isoToJulian(text)).toThrow(DomainError);
    },
  );

  it.each([
    "2027-04-31T00:00Z",
    "2027-04-00T00:00Z",
    "2027-04-01T24:00Z",
    "2027-04-01T23:60Z",
    "2027-04-01T23:00+25:00",
    "2027-04-01",
  ])("refuses %j", (text) => {
    expect(() => isoToJulian(text)).toThrow(DomainError);
  });

  it("refuses a date outside four digits of years", () => {
    expect(() => julianToIso({ day: 0, frac: 0 })).toThrow("day is 0; expected a Julian date in the years 0000 to 9999.");
    expect(() => julianToIso({ day: Number.NaN, frac: 0 })).toThrow(DomainError);
  });
});
