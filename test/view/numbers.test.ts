import { describe, expect, it } from "vitest";
import { decimalsFor, fixed, joined, plain, signed } from "../../src/view/numbers.ts";
import { frequencyText, shownAs, unitFor, wavelengthText, withUnit } from "../../src/view/units.ts";

const NBSP = "\u00a0";

describe("numbers", () => {
  it("writes a true minus, and no sign on what rounds to zero", () => {
    expect(fixed(-1.25, 1)).toBe("\u22121.3");
    expect(fixed(-0.004, 2)).toBe("0.00");
    expect(signed(0.004, 2)).toBe("0.00");
    expect(signed(4, 2)).toBe("+4.00");
    expect(plain(-30)).toBe("\u221230");
    expect(plain(1419.47, 4)).toBe("1419");
  });

  it("gives three figures, never more decimals than asked", () => {
    expect([1.85, 150, 26.5, 0.035, 0].map((x) => decimalsFor(x, 2))).toEqual([2, 0, 1, 2, 0]);
  });

  it("sets a word off by a no-break space, but not the signs of angle", () => {
    expect(joined("3.5", "%")).toBe(`3.5${NBSP}%`);
    expect(joined("1.85", "″")).toBe("1.85″");
    expect(joined("1.2", "")).toBe("1.2");
  });
});

describe("units", () => {
  it.each([
    ["angle", 1.81, "1.81″"],
    ["angle", 199.4, "199″"],
    ["angle", 3301, "55.0′"],
    ["angle", 0.012, `12.0${NBSP}mas`],
    ["angle", 45_000, "12.5°"],
    ["length", 31_987, `32.0${NBSP}km`],
    ["length", 131.2, `131${NBSP}m`],
    ["fraction", 0.0371, `3.7${NBSP}%`],
    ["flux", 1.23e-5, `12.3${NBSP}µJy`],
    ["times", 1.26, `1.26${NBSP}×`],
    ["wavelengths", 151_000, `151${NBSP}kλ`],
  ] as const)("writes a %s of %d as %s", (kind, value, text) => expect(shownAs(kind, value)).toBe(text));

  it("keeps the unit and decimals of a limit for every value beside it", () => {
    const unit = unitFor("angle", 1.85);
    expect([0.9, 1.8, 11].map((v) => withUnit(v, unit))).toEqual(["0.90″", "1.80″", "11.00″"]);
  });

  it("writes frequencies and wavelengths in the unit that suits them", () => {
    expect(frequencyText(1.419e9)).toBe(`1.419${NBSP}GHz`);
    expect(frequencyText(160e6, 3)).toBe(`160${NBSP}MHz`);
    expect(wavelengthText(0.2112)).toBe(`21.1${NBSP}cm`);
    expect(wavelengthText(1e-3)).toBe(`1${NBSP}mm`);
    expect(wavelengthText(1000)).toBe(`1${NBSP}km`);
  });
});
