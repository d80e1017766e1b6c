import { chmodSync, linkSync, readFileSync, symlinkSync, truncateSync } from "node:fs";
import { basename, join } from "node:path";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { smallPlan } from "./small-plan.ts";
import { Desk, ran } from "./terminal.ts";

let desk: Desk;
let plan: string;
beforeEach(() => {
  desk = new Desk();
  plan = desk.put("ridge.plan.json", smallPlan());
});
afterEach(() => desk.clear());

/** Exit 2, nothing on stdout, these lines on stderr (without "spanwright: "), and no file that was not there. */
async function refused(argv: readonly string[], ...lines: readonly (string | RegExp)[]): Promise<void> {
  const before = desk.list();
  const { code, out, err } = await ran(...argv);
  const said = err.split("\n").slice(0, -1);
  const faults = said.filter((line) => line.startsWith("spanwright: ")).map((line) => line.slice("spanwright: ".length));
  expect({ code, out, faults: faults.length }).toEqual({ code: 2, out: "", faults: lines.length });
  for (const [k, line] of lines.entries()) {
    if (typeof line === "string") expect(faults[k]).toBe(line);
    else expect(faults[k]).toMatch(line);
  }
  expect(desk.list()).toEqual(before);
}

describe("a call that is wrong", () => {
  it("has no verb: the help is on stderr", async () => {
    const { code, out, err } = await ran();
    expect([code, out]).toEqual([2, ""]);
    expect(err).toContain("Usage: spanwright VERB PLAN [options]");
  });

  it("has a verb or option that does not exist", async () => {
    await refused(["frob", plan], "unknown verb 'frob'; expected one of assess, beam, tracks, sweep.");
    for (const verb of ["compare", "place", "report", "convert"]) await refused([verb, plan], /^unknown verb/);
    await refused(["assess", plan, "--frob"], "unknown option '--frob'");
    await refused(["tracks", plan, "--json"], "unknown option '--json'");
    await refused(["assess", plan, "--jsn"], "unknown option '--jsn' (Did you mean --json?)");
  });

  it("has too few or too many words", async () => {
    await refused(["assess"], "the plan file is missing: spanwright VERB PLAN [options]");
    await refused(["assess", plan, plan], /^too many arguments/);
    await refused(["beam", plan, "--fits"], "option '--fits <file>' argument missing");
    await refused(["beam", plan, "--fits", "a", "--fits", "b"], /is given twice/);
    await refused(["beam", plan], "nothing to write: name at least one of --fits FILE, --png FILE, --csv FILE");
    await refused(["sweep", plan], /^required option '--vary/);
  });

  it("names a layout or observation the plan does not have: those it has are named", async () => {
    for (const argv of [
      ["assess", plan],
      ["beam", plan, "--png", desk.path("x")],
      ["tracks", plan],
      ["sweep", plan, "--vary", "hours=1:2:1"],
    ]) {
      await refused([...argv, "--layout", "wid"], 'layout is "wid"; expected one of wide, close.');
      await refused([...argv, "--observation", "east"], 'observation is "east"; expected one of south, north.');
    }
  });

  it.each([
    ["2,30,1.5", 'flux ratio is "1.5"; expected a ratio above 0 and at most 1.'],
    ["2,30,0", 'flux ratio is "0"; expected a ratio above 0 and at most 1.'],
    ["0", 'separation is "0"; expected an angle above 0, such as 2.5 or 20mas.'],
    ["-2", 'separation is "-2"; expected an angle above 0, such as 2.5 or 20mas.'],
    ["2,north", 'position angle is "north"; expected an angle'],
    ["2,400", 'position angle is "400"; expected an angle in [-360, 360] degrees.'],
    ["1,2,1,4", 'pair is "1,2,1,4"; expected SEP, SEP,PA or SEP,PA,RATIO'],
    ["", 'separation is ""; expected an angle'],
  ])("has --pair %s", async (pair, reason) => {
    await refused(["assess", plan, "--pair", pair], new RegExp(reason.replace(/[.[\]]/g, "\\$&")));
  });

  it.each([
    ["declination", "range is"],
    ["declination=1:2", 'range is "1:2"; expected FROM:TO:STEP'],
    ["dec=1:2:1", 'axis is "dec"; expected one of declination, wavelength, frequency, hours.'],
    ["toString=1:2:1", 'axis is "toString"'],
    ["declination=a:2:1", 'from is "a"'],
    ["declination=1:2:0", "step is 0"],
    ["declination=1:2:-1", "step is -1"],
    ["declination=0:90:0.001", "at most 10000 points"],
    ["wavelength=1:2:1", "expected a wavelength or frequency with its unit"],
    ["frequency=1GHz:2GHz:1", "expected a frequency or wavelength with its unit"],
    ["hours=1:2:1:1", "expected FROM:TO:STEP"],
    ["declination=1:2:1=3", "expected FROM:TO:STEP"],
  ])("has --vary %s", async (vary, reason) => {
    await refused(["sweep", plan, "--vary", vary], new RegExp(reason.replace(/[.[\]]/g, "\\$&")));
  });

  it("varies past what can be observed: found out before anything is computed", async () => {
    await refused(
      ["sweep", plan, "--vary", "declination=80:100:10"],
      "declination is 100; expected a declination in [-90, 90] degrees.",
    );
    await refused(["sweep", plan, "--vary", "hours=20:30:10"], /^hours is 30; expected/);
  });
});

describe("a plan that cannot be read", () => {
  it("is missing, a folder, or no file at all", async () => {
    await refused(["assess", desk.path("none.json")], /none\.json: cannot be read: there is no such file or folder$/);
    await refused(["assess", desk.folder], /: cannot be read: it is a folder$/);
    await refused(["assess", ""], '"": cannot be read: there is no such file or folder');
    await refused(["assess", "two\nlines\u001b[1m"], '"two\\nlines\\u001b[1m": cannot be read: there is no such file or folder');
  });

  it("is larger than 64 MiB: it is not read", async () => {
    const big = desk.put("big.json", "{");
    truncateSync(big, 70 * 1024 * 1024);
    await refused(["assess", big], /big\.json: cannot be read: it is larger than 64 MiB/);
  });

  it("is not UTF-8, or not JSON", async () => {
    await refused(
      ["assess", desk.put("a.json", new Uint8Array([0xff, 0xfe, 0x7b]))],
      /a\.json: cannot be read: it is not UTF-8 text$/,
    );
    await refused(["assess", desk.put("b.json", "{\n  nope")], /b\.json: the file is not JSON/);
    await refused(["assess", desk.put("c.json", "")], /c\.json: the file is not JSON/);
  });

  it("is malformed: every fault has its line, with path, value and what is allowed", async () => {
    const bad = smallPlan() as { stations: Record<string, unknown>[]; layouts: unknown[] };
    bad.stations[3].latitudeDeg = 533.2;
    bad.stations[4].heightM = "high";
    const path = desk.put("bad.json", bad);
    await refused(
      ["assess", path],
      `${path}: stations[3].latitudeDeg is 533.2; expected a latitude in [-90, 90] degrees.`,
      `${path}: stations[4].heightM is "high"; expected a height in [-11000, 100000] metres.`,
    );
  });

  it("names more than 50 faults: the rest are counted", async () => {
    const bad = smallPlan() as { stations: unknown[]; layouts: unknown[] };
    bad.layouts = [{ id: "wide", stations: ["S0"] }];
    bad.stations = Array.from({ length: 60 }, (_, k) => ({ id: `S${k}`, latitudeDeg: 200, longitudeDeg: 0, antenna: "d12" }));
    const { code, err } = await ran("assess", desk.put("bad.json", bad));
    expect(code).toBe(2);
    const lines = err.trimEnd().split("\n");
    expect(lines).toHaveLength(51);
    expect(lines[50]).toMatch(/and 10 more faults/);
  });

  it("is of a newer version: refused by its number", async () => {
    await refused(["assess", desk.put("new.json", { ...smallPlan(), version: 7 })], /version.*7/);
  });
});

describe("a place that cannot be written to", () => {
  const outputs = (path: string): readonly (readonly string[])[] => [
    ["beam", plan, "--fits", path],
    ["beam", plan, "--png", path],
    ["beam", plan, "--csv", path],
    ["tracks", plan, "--csv", path],
    ["sweep", plan, "--vary", "hours=1:2:1", "--out", path],
  ];

  it("is in no folder, is a folder, or has no name", async () => {
    for (const argv of outputs(desk.path("none/x"))) await refused(argv, /cannot be written: there is no such file or folder$/);
    for (const argv of outputs(desk.folder)) await refused(argv, /cannot be written: it is a folder$/);
    for (const argv of outputs(desk.path("x/"))) await refused(argv, /cannot be written: a file name is needed$/);
    for (const argv of outputs("")) await refused(argv, /"": cannot be written: a file name is needed$/);
    for (const argv of outputs(`${plan}/x`)) await refused(argv, /cannot be written: a part of the path is not a folder$/);
  });

  it("is the plan, by any of its names", async () => {
    linkSync(plan, desk.path("hard"));
    symlinkSync(plan, desk.path("soft"));
    const before = readFileSync(plan, "utf8");
    for (const name of [
      plan,
      desk.path("hard"),
      desk.path("soft"),
      join(desk.folder, "..", basename(desk.folder), ".", "ridge.plan.json").replace(/ridge/, "./ridge"),
    ]) {
      for (const argv of outputs(name)) await refused(argv, /this is the plan itself; name another file$/);
    }
    expect(readFileSync(plan, "utf8")).toBe(before);
  });

  it("is named by two options", async () => {
    const [a, b] = [desk.path("a"), `${desk.folder}/./a`];
    await refused(["beam", plan, "--fits", a, "--png", b], /--fits names the same file$/);
  });

  const isRoot = process.getuid?.() === 0;
  it.skipIf(isRoot)(`may not be written to${isRoot ? " (skipped: root may write anywhere)" : ""}`, async () => {
    const path = desk.put("kept", "as it was");
    chmodSync(path, 0o444);
    for (const argv of outputs(path)) await refused(argv, /cannot be written: permission is denied$/);
    expect(readFileSync(path, "utf8")).toBe("as it was");
  });
});
