import { spawnSync } from "node:child_process";
import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import fc from "fast-check";
import { afterAll, describe, expect, it } from "vitest";
import { type BeamFits, beamFits } from "../../src/formats/beam-fits.ts";
import { fitsBytes } from "../../src/formats/fits.ts";
import { fitsCards } from "../../src/formats/fits-cards.ts";
import { readFits, sinSky } from "./fits-reader.ts";

const ARCMIN = Math.PI / 10_800;

/** A beam of a shape that tells the axes apart: larger to the east than to the west, to the north than to the south. */
function someBeam(change: Partial<BeamFits> = {}): BeamFits {
  const size = change.size ?? 16;
  const values = new Float64Array(size * size);
  for (let y = 0; y < size; y++) {
    for (let x = 0; x < size; x++) {
      const [dx, dy] = [x - size / 2, y - size / 2];
      values[size * y + x] = Math.exp(-(dx * dx + dy * dy) / 8) * (1 + 0.01 * dx + 0.003 * dy);
    }
  }
  return {
    values,
    size,
    pixelRad: ARCMIN,
    program: "Spanwright 0.0.0",
    title: "Fenwick Ridge",
    layout: "wide",
    observation: "south",
    rightAscensionDeg: 45,
    declinationDeg: 30,
    startUtc: null,
    frequencyHz: 1.42e9,
    bandwidthHz: 1e6,
    fitted: { majorArcsec: 180, minorArcsec: 120, positionAngleDeg: 33 },
    remarks: [],
    ...change,
  };
}

describe("FITS cards", () => {
  const one = (key: string, value: string | number | bigint | boolean, comment?: string): string => {
    const cards = fitsCards({ key, value, comment });
    expect(cards).toHaveLength(1);
    return cards[0];
  };

  // Source: FITS Standard 4.0, §4.2: strings from column 11 and at least 8 long, logical in column 30, numbers end in column 30.
  it("stand in the fixed format of the standard", () => {
    expect(one("SIMPLE", true)).toBe("SIMPLE  =                    T".padEnd(80));
    expect(one("NAXIS1", 4096n)).toBe("NAXIS1  =                 4096".padEnd(80));
    expect(one("BITPIX", -32n, "bits")).toBe("BITPIX  =                  -32 / bits".padEnd(80));
    expect(one("CRPIX1", 8)).toBe("CRPIX1  =                  8.0".padEnd(80));
    expect(one("OBJECT", "a")).toBe("OBJECT  = 'a       '".padEnd(80));
    expect(one("TINY", 1e-300)).toBe("TINY    =             1.0E-300".padEnd(80));
    expect(one("BIG", 1.42e21)).toBe("BIG     =              1.42E21".padEnd(80));
  });

  it("double an apostrophe and spell other characters in ASCII", () => {
    expect(one("OBJECT", "Drover’s “é” 2″ ≤ 3°, −4 µm 中")).toBe(`OBJECT  = 'Drover''s "e" 2" <= 3 deg, -4 um ?'`.padEnd(80));
    expect(one("OBJECT", "a\nb\tc\u0007")).toBe("OBJECT  = 'a b c?  '".padEnd(80));
  });

  it("keep every digit a card has room for: within 5e-13 for any real", () => {
    const real = fc.double({ noNaN: true, noDefaultInfinity: true });
    fc.assert(
      fc.property(real, (x) => {
        const card = one("X", x);
        expect(card).toHaveLength(80);
        const got = Number(card.slice(10, 30));
        // The longest is -d.ddddddddddddE-ddd, 13 digits: half a unit in the last is 5e-13 of the value. Subnormals have fewer.
        expect(Math.abs(got - x)).toBeLessThanOrEqual(5e-13 * Math.abs(x) + 5e-324);
      }),
      { seed: 20260101 },
    );
  });

  it("continue any long string so that a reader gets it whole, and are 80 characters each", () => {
    const text = fc.string({ unit: fc.constantFrom("'", "&", " ", "a", "é", "−"), maxLength: 300 });
    fc.assert(
      fc.property(text, (x) => {
        const cards = fitsCards({ key: "OBJECT", value: x, comment: "title" });
        for (const card of cards) expect(card).toMatch(/^[\x20-\x7e]{80}$/);
        const bytes = fitsBytes({ bitpix: -32, axes: [1], header: [{ key: "OBJECT", value: x }], values: [0] });
        const plain = x.replaceAll("é", "e").replaceAll("−", "-").trimEnd();
        expect(readFits(bytes).values.get("OBJECT")).toBe(plain);
      }),
      { seed: 20260101 },
    );
  });

  it("break commentary between words and lose none", () => {
    const text = "North up, east left. ".repeat(20).trimEnd();
    const cards = fitsCards({ key: "COMMENT", text });
    expect(cards.length).toBeGreaterThan(5);
    expect(cards.map((card) => card.slice(8).trim()).join(" ")).toBe(text);
    expect(fitsCards({ key: "COMMENT", text: "x".repeat(150) }).map((card) => card.trimEnd().length)).toEqual([80, 80, 14]);
  });

  it("refuse what a header cannot hold", () => {
    expect(() => fitsCards({ key: "too long a key", value: 1 })).toThrow("key is");
    expect(() => fitsCards({ key: "CRVAL1", value: Number.NaN })).toThrow("CRVAL1 is NaN; expected a finite number");
    expect(() => fitsBytes({ bitpix: -32, axes: [2, 2], header: [], values: [1] })).toThrow("values.length is 1; expected 4");
  });
});

describe("a FITS image", () => {
  it("comes back as it was, in both widths", () => {
    const values = Float64Array.from({ length: 1200 }, (_, k) => Math.sin(k) / 3);
    for (const bitpix of [-32, -64] as const) {
      const got = readFits(fitsBytes({ bitpix, axes: [40, 30], header: [], values }));
      expect(got.axes).toEqual([40, 30]);
      expect(got.pixels).toEqual(bitpix === -64 ? values : Float64Array.from(values, Math.fround));
    }
  });

  it("fills whole blocks when header or data end on an edge", () => {
    // 36 cards a block: SIMPLE, BITPIX, NAXIS, NAXIS1, END and 31 more; 720 pixels of 4 bytes are one block.
    const header = Array.from({ length: 31 }, (_, k) => ({ key: `K${k}`, value: k }));
    const bytes = fitsBytes({ bitpix: -32, axes: [720], header, values: new Float32Array(720) });
    expect(bytes.length).toBe(2 * 2880);
    expect(readFits(bytes).dataStart).toBe(2880);
  });
});

describe("the FITS file of a beam", () => {
  it("has east left, north up and its peak at the reference pixel", () => {
    const beam = someBeam();
    const { values, axes, pixels } = readFits(beamFits(beam));
    expect(axes).toEqual([16, 16, 1, 1]);
    expect([values.get("CRPIX1"), values.get("CRPIX2")]).toEqual([8, 9]);
    const at = (i: number, j: number): number => pixels[16 * (j - 1) + i - 1];
    expect(at(8, 9)).toBe(1);
    // Three pixels east of the peak, one south.
    expect(at(5, 8)).toBe(Math.fround(beam.values[16 * (8 - 1) + 8 + 3]));
    expect(at(5, 9)).toBeGreaterThan(at(11, 9));
    expect(at(8, 11)).toBeGreaterThan(at(8, 7));
    expect(values.get("CDELT1")).toBeLessThan(0);
    expect(values.get("CDELT2")).toBe(-(values.get("CDELT1") as number));
  });

  it("says what the axes are", () => {
    const { values } = readFits(beamFits(someBeam()));
    expect([1, 2, 3, 4].map((n) => values.get(`CTYPE${n}`))).toEqual(["RA---SIN", "DEC--SIN", "FREQ", "STOKES"]);
    expect([1, 2, 3].map((n) => values.get(`CUNIT${n}`))).toEqual(["deg", "deg", "Hz"]);
    expect(values.get("CRVAL3")).toBe(1.42e9);
    expect(values.get("CDELT3")).toBe(1e6);
    expect(values.get("RESTFRQ")).toBe(1.42e9);
    // Source: FITS Standard 4.0, table 29: Stokes I is 1.
    expect(values.get("CRVAL4")).toBe(1);
    expect(values.get("BMAJ")).toBe(0.05);
    expect(values.get("BMIN")).toBeCloseTo(120 / 3600, 15);
    expect(values.get("BPA")).toBe(33);
    expect(values.has("BUNIT")).toBe(false);
    expect([values.get("OBJECT"), values.get("LAYOUT"), values.get("OBSERVTN")]).toEqual(["Fenwick Ridge", "wide", "south"]);
    expect([values.get("ORIGIN"), values.get("CREATOR")]).toEqual(["Spanwright 0.0.0", "Spanwright 0.0.0"]);
  });

  it("claims an equinox only where there is a date, and never the time of writing", () => {
    const dated = readFits(beamFits(someBeam({ startUtc: "2027-03-21T20:00:00+02:00" }))).values;
    expect([dated.get("RADESYS"), dated.get("DATE-OBS"), dated.get("TIMESYS")]).toEqual(["FK5", "2027-03-21T18:00:00", "UTC"]);
    // JD of 2027-03-21 18 h is 2461486.25 (counted from J2000.0 = 2451545.0): 9941.25 days, 27.2177 Julian years.
    expect(dated.get("EQUINOX")).toBeCloseTo(2000 + 9941.25 / 365.25, 6);
    // Source: wcslib's datfix, as called by astropy 5.2.1, sets this from the same DATE-OBS.
    expect(dated.get("MJD-OBS")).toBe(61485.75);
    const undated = readFits(beamFits(someBeam())).values;
    expect(undated.get("RADESYS")).toBe("GAPPT");
    for (const key of ["EQUINOX", "DATE", "DATE-OBS"]) expect(undated.has(key)).toBe(false);
    expect(beamFits(someBeam())).toEqual(beamFits(someBeam()));
  });

  it("says so where a right ascension or an ellipse is missing", () => {
    const { values, comments } = readFits(beamFits(someBeam({ rightAscensionDeg: null, fitted: null })));
    expect(values.get("CRVAL1")).toBe(0);
    expect(values.has("BMAJ")).toBe(false);
    expect(comments.join(" ")).toContain("no right ascension: CRVAL1 is 0");
    expect(comments.join(" ")).toContain("no fitted ellipse");
  });

  it("carries a title of 200 characters whole", () => {
    const title = "It’s the Long Title of a Plan, ".repeat(7).slice(0, 200).trimEnd();
    expect(readFits(beamFits(someBeam({ title }))).values.get("OBJECT")).toBe(title.replaceAll("’", "'"));
  });

  // Source: orthographic closed form and astropy.wcs 5.2.1, which agree to 2e-14 degrees on these five pixels
  // (CRVAL 45, 30; CRPIX 129, 129; CDELT -1/60, 1/60). The projection is that of Calabretta & Greisen 2002, A&A 395, 1077.
  it.each([
    [129, 129, 45.0, 30.0],
    [1, 129, 47.46355117761217, 29.97706469016138],
    [129, 257, 45.0, 32.13382656473607],
    [257, 257, 42.48057166550065, 32.11035478403319],
    [1, 1, 47.41337226017713, 27.84368966879142],
  ])("F01: pixel (%i, %i) of the outside header is at %f, %f", (i, j, ra, dec) => {
    const { values } = readFits(beamFits(someBeam({ size: 256 })));
    // Our own reference pixel is (128, 129); the outside one is shifted by one column.
    const [gotRa, gotDec] = sinSky(values, i - 1, j);
    // CDELT is written with 13 digits, which moves a pixel 128 away by at most 1e-13 degrees; 1e-12 is the check's own tolerance.
    expect(Math.abs(gotRa - ra)).toBeLessThan(1e-12);
    expect(Math.abs(gotDec - dec)).toBeLessThan(1e-12);
  });
});

/** Other people's readers, where this machine has them. */
const python = "/usr/bin/python3";
const hasAstropy = spawnSync(python, ["-c", "import astropy.io.fits, astropy.wcs"]).status === 0;
const hasFitsverify = spawnSync("fitsverify", ["-h"]).error === undefined;
const folder = mkdtempSync(join(tmpdir(), "spanwright-fits-"));
afterAll(() => rmSync(folder, { recursive: true }));

describe("other readers", () => {
  const path = join(folder, "beam.fits");
  const write = (beam: BeamFits): void => writeFileSync(path, beamFits(beam));
  const title = "It’s the Long Title of a Plan, ".repeat(7).slice(0, 200).trimEnd();

  it.skipIf(!hasAstropy)(
    `astropy finds nothing to mend, and the same sky${hasAstropy ? "" : " (skipped: no python3 with astropy)"}`,
    () => {
      const beam = someBeam({ size: 256, title, startUtc: "2027-03-21T18:00:00Z" });
      write(beam);
      const script = `
import json, sys, warnings
warnings.simplefilter("error")
from astropy.io import fits
from astropy.wcs import WCS
with fits.open(sys.argv[1]) as f:
    f.verify("exception")
    h = f[0].header; d = f[0].data
    w = WCS(h).celestial
    sky = w.wcs_pix2world([[128,129],[0,129],[128,257],[256,257],[0,1]], 1).tolist()
    print(json.dumps(dict(shape=d.shape, kind=d.dtype.str, title=h["OBJECT"], sky=sky, peak=float(d[0,0,128,127]),
        east=float(d[0,0,128,124]), frame=WCS(h).wcs.radesys, equinox=WCS(h).wcs.equinox, axes=[str(t) for t in WCS(h).wcs.ctype])))
`;
      const run = spawnSync(python, ["-c", script, path], { encoding: "utf8" });
      expect(run.stderr).toBe("");
      const got = JSON.parse(run.stdout);
      expect(got).toMatchObject({ shape: [1, 1, 256, 256], kind: ">f4", title: title.replaceAll("’", "'"), peak: 1, frame: "FK5" });
      expect(got.axes).toEqual(["RA---SIN", "DEC--SIN", "FREQ", "STOKES"]);
      expect(got.east).toBe(Math.fround(beam.values[256 * 128 + 128 + 3]));
      const { values } = readFits(beamFits(beam));
      const pixels = [
        [128, 129],
        [0, 129],
        [128, 257],
        [256, 257],
        [0, 1],
      ];
      for (const [k, [i, j]] of pixels.entries()) {
        const [ra, dec] = sinSky(values, i, j);
        expect(Math.abs(got.sky[k][0] - ra)).toBeLessThan(1e-12);
        expect(Math.abs(got.sky[k][1] - dec)).toBeLessThan(1e-12);
      }
    },
  );

  it.skipIf(!hasFitsverify)(`fitsverify finds no fault${hasFitsverify ? "" : " (skipped: no fitsverify)"}`, () => {
    for (const beam of [
      someBeam({ title }),
      someBeam({ title, startUtc: "2027-03-21T18:00:00Z", fitted: null, rightAscensionDeg: null }),
    ]) {
      write(beam);
      const run = spawnSync("fitsverify", ["-q", path], { encoding: "utf8" });
      expect(run.stdout).toMatch(/^verification OK/);
    }
  });
});
