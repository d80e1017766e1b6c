import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { DomainError } from "../../src/base/errors.ts";
import {
  parseAngleArcsec,
  parseAngleDeg,
  parseBandwidthHz,
  parseFrequencyHz,
  parseHours,
  parseLengthM,
  parseNumber,
  parseWavelengthM,
} from "../../src/base/quantity.ts";
import { declinationText } from "../../src/view/observation.ts";
import { frequencyText, shownAs, wavelengthText } from "../../src/view/units.ts";

const SEED = { seed: 20260101 };
const C = 299_792_458; // m/s, exact (SI)
/** One or two roundings to the nearest double. */
const near = (want: number): [number, number] => [want - 4e-16 * Math.abs(want), want + 4e-16 * Math.abs(want)];

function expectNear(got: number, want: number): void {
  const [low, high] = near(want);
  expect(got).toBeGreaterThanOrEqual(low);
  expect(got).toBeLessThanOrEqual(high);
}

function expectRefused(parse: (text: string, field?: string) => number, text: string): void {
  let error: unknown;
  try {
    parse(text, "the field");
  } catch (thrown) {
    error = thrown;
  }
  expect(error, `${parse.name}(${JSON.stringify(text)})`).toBeInstanceOf(DomainError);
  const { message, field, value } = error as DomainError;
  expect({ field, value }).toEqual({ field: "the field", value: text });
  expect(message).toMatch(/^the field is ".*"; expected .*such as .*\.$/);
}

describe("frequencies and wavelengths", () => {
  it.each([
    ["1.42GHz", 1.42e9],
    ["1.42 GHz", 1.42e9],
    ["  1420.4 MHz ", 1.4204e9],
    ["1420 mhz", 1.42e9],
    ["50kHz", 5e4],
    ["1.42e9 Hz", 1.42e9],
    ["0.3THz", 3e11],
    ["1,42 GHz", 1.42e9],
    ["21cm", C / 0.21],
    ["1.3 mm", C / 1.3e-3],
    ["10km", C / 1e4],
    ["2 m", C / 2],
    ["850 µm", C / 850e-6],
    ["850 μm", C / 850e-6],
    ["850um", C / 850e-6],
    ["21 CM", C / 0.21],
  ])("%s as a frequency", (text, want) => expectNear(parseFrequencyHz(text), want));

  it.each([
    ["21cm", 0.21],
    ["1.3 mm", 1.3e-3],
    ["10km", 1e4],
    ["10 KM", 1e4],
    ["1.42GHz", C / 1.42e9],
  ])("%s as a wavelength", (text, want) => expectNear(parseWavelengthM(text), want));

  it.each([
    "",
    " ",
    "1.42",
    "GHz",
    "-1.42GHz",
    "0 GHz",
    "0cm",
    "1.42 GHzz",
    "1.42 constructor",
    "1 toString",
    "21 furlongs",
    "1e999 Hz",
  ])("refuses %j as either", (text) => {
    expectRefused(parseFrequencyHz, text);
    expectRefused(parseWavelengthM, text);
  });

  it("refuses what may be meant in two ways", () => {
    for (const text of ["1,420 MHz", "5 mHz", "5 Mm"]) expectRefused(parseFrequencyHz, text);
  });

  it("a bandwidth is no wavelength", () => {
    expect(parseBandwidthHz("160MHz")).toBe(1.6e8);
    for (const text of ["21cm", "160", "-1 MHz", "0Hz"]) expectRefused(parseBandwidthHz, text);
  });
});

describe("lengths", () => {
  it.each([
    ["35m", 35],
    ["1.2 km", 1200],
    ["-0.5km", -500],
    ["−0.5km", -500],
    ["12 mm", 0.012],
    ["0 m", 0],
  ])("%s", (text, want) => expectNear(parseLengthM(text), want));

  it.each(["35", "m", "1.2 GHz", "5 constructor", "--5m", "1 000 m"])("refuses %j", (text) => expectRefused(parseLengthM, text));
});

describe("angles", () => {
  it.each([
    ["-45", -45],
    ["−45", -45],
    ["+45", 45],
    ["- 45", -45],
    ["-45deg", -45],
    ["45 degrees", 45],
    ["-45°", -45],
    ["-45d", -45],
    ["-45d12m", -45.2],
    ["-45d12m30s", -(45 + 12 / 60 + 30 / 3600)],
    ["-45d 12m 30.5s", -(45 + 12 / 60 + 30.5 / 3600)],
    ["-30:15", -30.25],
    ["-30:15:20", -(30 + 920 / 3600)],
    ["-30° 15′ 20″", -(30 + 920 / 3600)],
    ["−30° 15′ 20″", -(30 + 920 / 3600)],
    ["-30°15'20\"", -(30 + 920 / 3600)],
    ["-30° 15’ 20”", -(30 + 920 / 3600)],
    ["-30°15'20''", -(30 + 920 / 3600)],
    ["-30° 15.5′", -(30 + 15.5 / 60)],
    ["-0d15m", -0.25],
    ["−0:15", -0.25],
    ["0:06", 0.1],
    ["1.2arcsec", 1.2 / 3600],
    ["1,2″", 1.2 / 3600],
    ["3arcmin", 0.05],
    ["3′", 0.05],
    ["20mas", 20 / 3.6e6],
    ["20 µas", 20 / 3.6e9],
    ["1e-3 arcsec", 1e-3 / 3600],
    ["-1.5 rad", (-1.5 * 180) / Math.PI],
  ])("%s", (text, want) => expectNear(parseAngleDeg(text), want));

  it.each([
    "",
    "-",
    "--4",
    "+-4",
    "abc",
    "30:60",
    "30:15:60",
    "30:15.5:20",
    "30.5:15",
    "30d15:20",
    "1e999",
    "45x",
    "NaN",
    "Infinity",
    "1 2",
  ])("refuses %j", (text) => expectRefused(parseAngleDeg, text));

  it("in arcseconds", () => {
    expectNear(parseAngleArcsec("1.2arcsec"), 1.2);
    expectNear(parseAngleArcsec("1"), 3600);
  });
});

describe("hours", () => {
  it.each([
    ["3.5", 3.5],
    ["3.5h", 3.5],
    ["4h", 4],
    ["-4h", -4],
    ["−4 h", -4],
    ["+4", 4],
    ["3h30m", 3.5],
    ["3h 30min", 3.5],
    ["4h30m15s", 4 + 30 / 60 + 15 / 3600],
    ["3:30", 3.5],
    ["-0:30", -0.5],
    ["-0h30m", -0.5],
    ["3:30:36", 3.51],
  ])("%s", (text, want) => expectNear(parseHours(text), want));

  it.each(["", "h", "--4", "3h60m", "3:60", "3h30.5m10s", "4d", "3 30", "1,500"])("refuses %j", (text) =>
    expectRefused(parseHours, text),
  );
});

describe("numbers", () => {
  it.each([
    ["1.5", 1.5],
    ["-1,5", -1.5],
    ["0,125", 0.125],
    ["−2e-3", -2e-3],
    [".5", 0.5],
    ["5.", 5],
  ])("%s", (text, want) => expect(parseNumber(text)).toBe(want));

  it.each(["", "--1", "1.2.3", "0x10", "1,420", "1e", "one", "1e999"])("refuses %j", (text) => expectRefused(parseNumber, text));
});

describe("what is shown can be typed back", () => {
  // Each bound is half a unit of the last digit shown.
  it("a declination with seconds, to half a second", () => {
    fc.assert(
      fc.property(fc.double({ min: -90, max: 90, noNaN: true }), (deg) => {
        expect(Math.abs(parseAngleDeg(declinationText(deg, true)) - deg)).toBeLessThanOrEqual(0.5 / 3600 + 1e-12);
      }),
      SEED,
    );
  });

  it("a declination with minutes, to half a minute", () => {
    fc.assert(
      fc.property(fc.double({ min: -90, max: 90, noNaN: true }), (deg) => {
        expect(Math.abs(parseAngleDeg(declinationText(deg, false)) - deg)).toBeLessThanOrEqual(0.5 / 60 + 1e-12);
      }),
      SEED,
    );
  });

  it("a frequency and a wavelength, to half a unit of their last figure", () => {
    fc.assert(
      fc.property(fc.double({ min: 3, max: 13, noNaN: true }), (decade) => {
        const hertz = 10 ** decade;
        expect(Math.abs(parseFrequencyHz(frequencyText(hertz, 6)) / hertz - 1)).toBeLessThanOrEqual(0.5e-5 * (1 + 1e-9));
        const metres = C / hertz;
        expect(Math.abs(parseWavelengthM(wavelengthText(metres, 6)) / metres - 1)).toBeLessThanOrEqual(0.5e-5 * (1 + 1e-9));
      }),
      SEED,
    );
  });

  it("an angle and a length of at least three figures, to one in two hundred", () => {
    fc.assert(
      fc.property(fc.double({ min: -3, max: 5, noNaN: true }), fc.boolean(), (decade, negative) => {
        const size = negative ? -(10 ** decade) : 10 ** decade;
        expect(Math.abs(parseAngleArcsec(shownAs("angle", size)) / size - 1)).toBeLessThanOrEqual(1 / 200 + 1e-9);
        expect(Math.abs(parseLengthM(shownAs("length", size)) / size - 1)).toBeLessThanOrEqual(1 / 200 + 1e-9);
      }),
      SEED,
    );
  });

  it("hours, to half a tenth", () => {
    fc.assert(
      fc.property(fc.double({ min: -12, max: 12, noNaN: true }), (hours) => {
        expect(Math.abs(parseHours(shownAs("hours", hours)) - hours)).toBeLessThanOrEqual(0.05 + 1e-9);
      }),
      SEED,
    );
  });

  it("and anything at all is read or refused, never a NaN", () => {
    const text = fc.oneof(fc.string(), fc.stringMatching(/^[-+−0-9.,:dhms°′″ eGMkHzc]{0,14}$/));
    fc.assert(
      fc.property(text, (typed) => {
        for (const parse of [
          parseAngleDeg,
          parseHours,
          parseFrequencyHz,
          parseWavelengthM,
          parseLengthM,
          parseBandwidthHz,
          parseNumber,
        ]) {
          try {
            expect(Number.isFinite(parse(typed))).toBe(true);
          } catch (error) {
            if (!(error instanceof DomainError)) throw error;
          }
        }
      }),
      { ...SEED, numRuns: 500 },
    );
  });
});
