import { chmodSync, existsSync, lstatSync, readFileSync, statSync, symlinkSync } from "node:fs";
import { decode } from "fast-png";
import Papa from "papaparse";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { readFits } from "../formats/fits-reader.ts";
import { beamLine, smallPlan } from "./small-plan.ts";
import { Desk, ran, ranWith } from "./terminal.ts";

let desk: Desk;
let plan: string;
beforeEach(() => {
  desk = new Desk();
  plan = desk.put("ridge.plan.json", smallPlan());
});
afterEach(() => desk.clear());

const csv = (text: string): { [column: string]: string }[] =>
  Papa.parse<{ [column: string]: string }>(text.trimEnd(), { header: true }).data;

describe("help and version", () => {
  it("go to stdout, with an example for each verb, and name only verbs that are there", async () => {
    const top = await ran("--help");
    expect([top.code, top.err]).toEqual([0, ""]);
    expect([...top.out.matchAll(/^ {2}(\w+) \[options\] <plan>/gm)].map((m) => m[1])).toEqual([
      "assess",
      "beam",
      "tracks",
      "sweep",
    ]);
    for (const verb of ["assess", "beam", "tracks", "sweep"]) {
      const { code, out, err } = await ran(verb, "--help");
      expect([code, err]).toEqual([0, ""]);
      expect(out).toMatch(new RegExp(`Example:\\n {2}spanwright ${verb} `));
      expect((await ran("help", verb)).out).toBe(out);
    }
    expect(top.out).not.toMatch(/compare|place|report|convert/);
  });

  it("say the version", async () => {
    const { version } = JSON.parse(readFileSync(new URL("../../package.json", import.meta.url), "utf8"));
    expect(await ran("--version")).toEqual({ code: 0, out: `${version}\n`, err: "" });
  });
});

describe("assess", () => {
  it("gives every pair as JSON, an object each, figures of 9 digits", async () => {
    const { code, out, err } = await ran("assess", plan, "--json");
    expect(code).toBe(0);
    expect(err).not.toContain("spanwright:");
    const results = JSON.parse(out);
    expect(results.map((r: { layout: string; observation: string }) => `${r.layout} ${r.observation}`)).toEqual([
      "wide south",
      "close south",
      "wide north",
      "close north",
    ]);
    const digits = [...out.matchAll(/\d+(?:\.\d+)?/g)].map(([x]) => x.replace(".", "").replace(/^0+|0+$/g, "").length);
    expect(Math.max(...digits)).toBe(9);
    expect((await ran("assess", plan, "--json")).out).toBe(out);
  });

  it("keeps to the layouts and observations that are named, in the plan's order", async () => {
    const { out } = await ran("assess", plan, "--json", "--layout", "close", "--layout", "wide", "--observation", "north");
    expect(JSON.parse(out).map((r: { layout: string }) => r.layout)).toEqual(["wide", "close"]);
    expect(JSON.parse(out).every((r: { observation: string }) => r.observation === "north")).toBe(true);
  });

  it("prints a table that fits a letter: figures of the JSON with unit and settings, no terminal codes", async () => {
    const { code, out } = await ran("assess", plan, "--pair", "30,40,0.5");
    const [wide] = JSON.parse((await ran("assess", plan, "--json", "--pair", "30,40,0.5")).out);
    expect(code).toBe(0);
    for (const line of out.split("\n")) expect(line.length).toBeLessThanOrEqual(100);
    // biome-ignore lint/suspicious/noControlCharactersInRegex: these are what must not be there.
    expect(out).not.toMatch(/[\u0000-\u0009\u000b-\u001f\u00a0]/);
    expect(out).toContain("Fenwick Ridge\n");
    expect(out).toContain("natural weights, no taper");
    expect(out).toContain("24 samples a baseline");
    expect(out).toContain("pair: two sources 30.0″ apart at PA 40°, fluxes 1 : 0.5");
    const first = (label: string): string => new RegExp(`^ +${label} +(\\S* )│ +(\\S+)`, "m").exec(out)?.[2] ?? "";
    expect(first("stations")).toBe("5");
    expect(first("beam major axis, FWHM of the fit")).toBe(wide.beam.majorArcsec.toFixed(1));
    expect(first("highest sidelobe")).toBe(`+${(100 * wide.beam.peakSidelobe).toFixed(1)}`);
    expect(first("deepest sidelobe")).toBe(`−${(-100 * wide.beam.deepestSidelobe).toFixed(1)}`);
    expect(first("pair")).toBe(wide.pair.verdict);
  });

  it("warns on stderr, one line a warning with the layouts it is about, and exits 0", async () => {
    const low = smallPlan() as { observations: { declinationDeg: number }[] };
    low.observations[1].declinationDeg = 80;
    const { code, err } = await ran("assess", desk.put("low.json", low));
    expect(code).toBe(0);
    expect(err).toMatch(/^warning: wide, close \/ north: the source never rises/m);
    expect(err.split("\n").filter((line) => line.includes("never rises"))).toHaveLength(1);
  });

  it("names unknown keys of the plan", async () => {
    const { code, err } = await ran("assess", desk.put("more.json", { ...smallPlan(), colour: "blue" }), "--layout", "close");
    expect(code).toBe(0);
    expect(err).toMatch(/^warning: .*more\.json: .*colour/m);
  });
});

describe("assess --require", () => {
  const withLines = (...lines: object[]): string => desk.put("lines.json", { ...smallPlan(), requirements: lines });

  it("exits 0 when every line is met, and prints the ledger under the tables", async () => {
    const { code, out } = await ran("assess", withLines(beamLine("R1", 1000)), "--require");
    expect(code).toBe(0);
    expect(out).toMatch(/ledger of wide: 1 met\n/);
    expect(out).toMatch(/^ {2}R1 .* │━+» {2}Met, /m);
  });

  it("exits 1 when one is not met", async () => {
    const { code, out } = await ran("assess", withLines(beamLine("R1", 1000), beamLine("R2", 1)), "--require");
    expect(code).toBe(1);
    expect(out).toMatch(/ledger of wide: 1 met, 1 not met\n/);
    expect(out).toMatch(/^ {2}R2 .* «╍+│ +Not met, /m);
  });

  it("exits 0 when a line is only at risk", async () => {
    const [result] = JSON.parse((await ran("assess", plan, "--json", "--layout", "wide", "--observation", "south")).out);
    const { code, out } = await ran(
      "assess",
      withLines(beamLine("R1", 1.02 * result.beam.majorArcsec)),
      "--require",
      "--layout",
      "wide",
    );
    expect(out).toContain("ledger of wide: 1 at risk\n");
    expect(code).toBe(0);
  });

  it("exits 0 when one cannot be computed, and warns of it", async () => {
    const { code, err } = await ran("assess", withLines({ ...beamLine("R1", 1000), quantity: "beam.nonsense" }), "--require");
    expect(code).toBe(0);
    expect(err).toContain("warning: 1 of 1 judgements cannot be computed: nothing is known of them\n");
  });

  it("says which lines were not judged", async () => {
    const path = withLines(beamLine("R1", 1000), beamLine("R2", 1, { when: { observation: "north" } }));
    const { code, err } = await ran("assess", path, "--require", "--observation", "south", "--layout", "wide");
    expect(code).toBe(0);
    expect(err).toContain("warning: 1 of 2 requirements speak of other layouts or observations and were not judged\n");
    expect((await ran("assess", plan, "--require")).err).toContain("warning: the plan has no requirements");
  });

  it("with --json keeps stdout to the results", async () => {
    const path = withLines(beamLine("R1", 1));
    const { code, out, err } = await ran("assess", path, "--require", "--json");
    expect(code).toBe(1);
    expect(out).toBe((await ran("assess", plan, "--json")).out);
    expect(err).toContain("ledger of wide: 1 not met\n");
  });

  it("without it a line that is not met changes nothing", async () => {
    expect((await ran("assess", withLines(beamLine("R1", 1)))).code).toBe(0);
  });
});

describe("beam", () => {
  it("writes an image, a picture and cuts that agree with each other and with assess", async () => {
    const [fits, png, cuts] = ["b.fits", "b.png", "b.csv"].map((name) => desk.path(name));
    const { code, out, err } = await ran("beam", plan, "--fits", fits, "--png", png, "--csv", cuts);
    expect([code, out]).toEqual([0, ""]);
    expect(err).toContain("layout wide, observation south: the first of the plan, as none is named\n");
    expect(desk.list()).toEqual(["b.csv", "b.fits", "b.png", "ridge.plan.json"]);
    const [result] = JSON.parse((await ran("assess", plan, "--json", "--layout", "wide", "--observation", "south")).out);
    const { values, axes, pixels } = readFits(readFileSync(fits));
    const size = result.beam.sizePx;
    expect(axes).toEqual([size, size, 1, 1]);
    // JSON has 9 digits: half a unit in the last is 5e-9 at most.
    expect(Math.abs((values.get("BMAJ") as number) * 3600 - result.beam.majorArcsec)).toBeLessThan(5e-9 * result.beam.majorArcsec);
    expect(values.get("CRVAL2")).toBe(-45);
    expect(pixels[size * (size / 2) + size / 2 - 1]).toBeCloseTo(1, 6);
    const picture = decode(readFileSync(png));
    expect([picture.width, picture.height]).toEqual([size, size]);
    const rows = csv(readFileSync(cuts, "utf8"));
    expect(Object.keys(rows[0])).toEqual(["cut", "positionAngleDeg", "offsetArcsec", "value"]);
    const major = rows.filter((row) => row.cut === "major");
    expect(Number(major.find((row) => Number(row.offsetArcsec) === 0)?.value)).toBeCloseTo(1, 6);
    expect(Number(major[0].positionAngleDeg)).toBeCloseTo(result.beam.positionAngleDeg, 6);
  });

  it("writes the same bytes each time, and other colours for the dark theme", async () => {
    const bytes = async (name: string, ...more: string[]): Promise<Buffer> => {
      await ran("beam", plan, name.endsWith("png") ? "--png" : "--fits", desk.path(name), ...more);
      return readFileSync(desk.path(name));
    };
    expect((await bytes("a.fits")).equals(await bytes("b.fits"))).toBe(true);
    const light = await bytes("a.png");
    expect(light.equals(await bytes("b.png", "--theme", "light"))).toBe(true);
    expect(light.equals(await bytes("c.png", "--theme", "dark"))).toBe(false);
  });

  it("brings a J2000 place to date in the header, as the engine does", async () => {
    const dated = smallPlan() as { observations: object[] };
    dated.observations[0] = { ...dated.observations[0], epoch: "J2000", rightAscensionDeg: 60, startUtc: "2027-03-21T18:00:00Z" };
    await ran("beam", desk.put("dated.json", dated), "--layout", "wide", "--observation", "south", "--fits", desk.path("d.fits"));
    const { values, comments } = readFits(readFileSync(desk.path("d.fits")));
    expect(values.get("RADESYS")).toBe("FK5");
    expect(values.get("EQUINOX")).toBeCloseTo(2027.2177, 4);
    // Annual general precession, m + n sin α tan δ and n cos α (from memory: m 46.1″, n 20.04″ a year), over 27.2 years; to first order.
    const years = 27.2177;
    const rad = Math.PI / 180;
    const ra = 60 + (years * (46.1 + 20.04 * Math.sin(60 * rad) * Math.tan(-45 * rad))) / 3600;
    const dec = -45 + (years * 20.04 * Math.cos(60 * rad)) / 3600;
    expect(Math.abs((values.get("CRVAL1") as number) - ra)).toBeLessThan(2e-3);
    expect(Math.abs((values.get("CRVAL2") as number) - dec)).toBeLessThan(2e-3);
    expect(comments.join(" ")).toContain("RA 60, Dec -45 deg of J2000");
  });

  it("refuses where there is no beam, and writes nothing", async () => {
    const low = smallPlan() as { observations: { declinationDeg: number }[] };
    low.observations[0].declinationDeg = 80;
    const path = desk.put("low.json", low);
    const { code, err } = await ran("beam", path, "--observation", "south", "--fits", desk.path("x"), "--png", desk.path("y"));
    expect(code).toBe(2);
    expect(err).toContain("never rises");
    expect(desk.list()).toEqual(["low.json", "ridge.plan.json"]);
  });
});

describe("tracks", () => {
  const columns = "stationA,stationB,hourAngleH,uM,vM,wM,uWavelengths,vWavelengths,wWavelengths";

  it("writes the samples that count to stdout or a file, the same bytes", async () => {
    const { code, out } = await ran("tracks", plan, "--layout", "wide", "--observation", "south");
    expect(code).toBe(0);
    expect(out.split("\n")[0]).toBe(columns);
    const rows = csv(out);
    // 10 baselines × 24 samples: 4 h of hour angle at 600 s.
    expect(rows).toHaveLength(240);
    for (const row of rows.slice(0, 20)) {
      const wavelength = 299_792_458 / 1.42e9;
      // Nine digits in each of the two figures.
      expect(Math.abs(Number(row.uWavelengths) - Number(row.uM) / wavelength)).toBeLessThan(
        1e-8 * Math.abs(Number(row.uWavelengths)),
      );
    }
    const file = await ran("tracks", plan, "--layout", "wide", "--observation", "south", "--csv", desk.path("t.csv"));
    expect(file).toEqual({ code: 0, out: "", err: "" });
    expect(readFileSync(desk.path("t.csv"), "utf8")).toBe(out);
  });

  it("--raw adds those that do not count, with the reason", async () => {
    const low = smallPlan() as { observations: { elevationLimitDeg: number }[] };
    low.observations[0].elevationLimitDeg = 65;
    const path = desk.put("low.json", low);
    const raw = csv((await ran("tracks", path, "--raw")).out);
    const kept = csv((await ran("tracks", path)).out);
    expect(raw).toHaveLength(240);
    expect(kept.length).toBeGreaterThan(0);
    expect(kept.length).toBeLessThan(240);
    expect(raw.filter((row) => row.reason === "")).toHaveLength(kept.length);
    expect(raw.find((row) => row.reason !== "")?.reason).toMatch(/below its elevation limit/);
  });

  it("says where nothing counts", async () => {
    const low = smallPlan() as { observations: { declinationDeg: number }[] };
    low.observations[0].declinationDeg = 80;
    const { code, out, err } = await ran("tracks", desk.put("low.json", low));
    expect([code, out]).toEqual([0, `${columns}\n`]);
    expect(err).toContain("warning: wide / south: no sample counts; --raw shows why\n");
  });
});

describe("sweep", () => {
  it("gives a row a point, with the columns of the results", async () => {
    const { code, out } = await ran("sweep", plan, "--vary", "declination=-60:-30:15", "--layout", "wide");
    expect(code).toBe(0);
    const rows = csv(out);
    expect(rows.map((row) => row.declinationDeg)).toEqual(["-60", "-45", "-30"]);
    const [plain] = JSON.parse((await ran("assess", plan, "--json", "--layout", "wide", "--observation", "south")).out);
    expect(Number(rows[1]["beam.majorArcsec"])).toBe(plain.beam.majorArcsec);
    expect(Number(rows[1]["primaryBeams.d12"])).toBe(plain.primaryBeams.d12);
    expect(rows[1].warnings).toBe(plain.warnings.join("; "));
  });

  it("takes every axis, with units", async () => {
    const points = async (vary: string, key: string): Promise<number[]> => {
      const { code, out } = await ran("sweep", plan, "--vary", vary, "--layout", "close", "--json");
      expect(code).toBe(0);
      return JSON.parse(out).map((point: { [key: string]: number }) => point[key]);
    };
    expect(await points("wavelength=20cm:0.22m:10mm", "wavelengthM")).toEqual([0.2, 0.21, 0.22]);
    expect(await points("frequency=1.4GHz:1500MHz:100MHz", "frequencyHz")).toEqual([1.4e9, 1.5e9]);
    expect(await points("hours=1h:2h30m:1.5", "hours")).toEqual([1, 2.5]);
    expect(await points("declination=-45d30m:-45:0d30m", "declinationDeg")).toEqual([-45.5, -45]);
  });

  it("writes a file, and groups warnings over its points", async () => {
    const { code, out, err } = await ran(
      "sweep",
      plan,
      "--vary",
      "declination=50:80:10",
      "--out",
      desk.path("s.csv"),
      "--pair",
      "30",
    );
    expect([code, out]).toEqual([0, ""]);
    expect(csv(readFileSync(desk.path("s.csv"), "utf8"))).toHaveLength(4);
    expect(err.split("\n").filter((line) => line.includes("never rises"))).toHaveLength(1);
  });
});

describe("files", () => {
  it("replace an older file, keeping its permissions, and follow a link to it", async () => {
    const old = desk.put("old.csv", "old");
    chmodSync(old, 0o640);
    symlinkSync(old, desk.path("link.csv"));
    expect((await ran("tracks", plan, "--csv", desk.path("link.csv"))).code).toBe(0);
    expect(lstatSync(desk.path("link.csv")).isSymbolicLink()).toBe(true);
    expect(readFileSync(old, "utf8")).toMatch(/^stationA/);
    expect(statSync(old).mode & 0o777).toBe(0o640);
  });

  const hasFull = existsSync("/dev/full");
  it.skipIf(!hasFull)(`say why they cannot be written to the end${hasFull ? "" : " (skipped: no /dev/full)"}`, async () => {
    const { code, out, err } = await ran("tracks", plan, "--csv", "/dev/full");
    expect([code, out]).toEqual([2, ""]);
    expect(err).toContain("spanwright: cannot write /dev/full: no space is left\n");
  });

  it("leave a device in its place", async () => {
    expect((await ran("tracks", plan, "--csv", "/dev/null")).code).toBe(0);
    expect(statSync("/dev/null").isCharacterDevice()).toBe(true);
  });
});

describe("being stopped", () => {
  it("at any moment exits 130 and leaves no file, new or begun", async () => {
    const files = ["--fits", desk.path("x.fits"), "--png", desk.path("x.png"), "--csv", desk.path("x.csv")];
    let stopped = 0;
    for (let after = 1; ; after++) {
      const { code, err } = await ranWith({ stopAfter: after, tickMs: 1 }, "beam", plan, ...files);
      if (code === 0) break;
      stopped++;
      expect(code).toBe(130);
      expect(err).toContain("spanwright: stopped; nothing was written\n");
      expect(desk.list()).toEqual(["ridge.plan.json"]);
    }
    expect(stopped).toBeGreaterThan(3);
  });

  it("also while samples are written, or results are computed", async () => {
    expect((await ranWith({ stopAfter: 2 }, "tracks", plan, "--csv", desk.path("t.csv"))).code).toBe(130);
    expect((await ranWith({ stopAfter: 5 }, "sweep", plan, "--vary", "hours=1:4:1", "--out", desk.path("s.csv"))).code).toBe(130);
    const { code, out } = await ranWith({ stopAfter: 5 }, "assess", plan);
    expect([code, out]).toEqual([130, ""]);
    expect(desk.list()).toEqual(["ridge.plan.json"]);
  });

  it("ends quietly when nobody reads on", async () => {
    const { code, err } = await ranWith({ readerLeavesAfter: 10 }, "tracks", plan, "--layout", "wide", "--observation", "south");
    expect([code, err]).toEqual([0, ""]);
  });
});

describe("progress", () => {
  it("is silent for short work", async () => {
    const { err } = await ranWith({ terminal: true, tickMs: 0.001 }, "assess", plan, "--layout", "wide", "--observation", "south");
    expect(err).not.toMatch(/assessing|\r/);
  });

  it("draws a bar on a terminal and clears it", async () => {
    const { err, out } = await ranWith(
      { terminal: true, tickMs: 300 },
      "assess",
      plan,
      "--layout",
      "wide",
      "--observation",
      "south",
    );
    expect(err).toMatch(/^\rassessing [━┄]{30} +\d+ %/);
    expect(err).toContain("\r\u001b[K");
    expect(out).not.toContain("\r");
  });

  it("is a line now and then elsewhere", async () => {
    const { err } = await ranWith(
      { tickMs: 2000 },
      "sweep",
      plan,
      "--vary",
      "hours=1:4:1",
      "--layout",
      "wide",
      "--observation",
      "south",
    );
    const lines = err.split("\n").filter((line) => line.startsWith("sweep"));
    expect(lines.length).toBeGreaterThan(1);
    for (const line of lines) expect(line).toMatch(/^sweep +\d+ %$/);
  });
});
