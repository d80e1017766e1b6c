import { readdirSync, readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { sections } from "../outside/sections.ts";

const checks = sections.flatMap((section) => section.checks);

describe("the outside checks", () => {
  it("each have a section in the list, and a test file", () => {
    const files = (folder: string, ending: string): readonly string[] =>
      readdirSync(folder)
        .filter((name) => name.endsWith(ending))
        .map((name) => name.slice(0, -ending.length));
    const subjects = files("test/outside/checks", ".ts").filter((name) => name !== "stations");
    expect(sections).toHaveLength(subjects.length);
    expect(files("test/outside", ".test.ts")).toEqual(expect.arrayContaining(subjects));
  });

  it("have an id each, a source, a reason for the tolerance, and one of three states", () => {
    const ids = checks.map(({ id }) => id);
    expect(new Set(ids).size).toBe(ids.length);
    for (const { source, toleranceReason, status } of checks) {
      expect(source.length).toBeGreaterThan(0);
      expect(toleranceReason.length).toBeGreaterThan(0);
      expect(["verified", "common practice", "from memory"]).toContain(status);
    }
  });

  it("do not say of a row that it is left out and answer it all the same", () => {
    const ids = new Set(checks.map(({ id }) => id));
    expect(sections.flatMap(({ left }) => Object.keys(left)).filter((id) => ids.has(id))).toEqual([]);
  });

  it("number at least two hundred", () => {
    expect(checks.length).toBeGreaterThanOrEqual(200);
  });

  it("stand as they are in the printed copy the README links to", () => {
    const printed = readFileSync("assets/checks.txt", "utf8");
    for (const { id, source } of checks) expect(printed.includes(`  ${id} `) && printed.includes(source), id).toBe(true);
    expect(printed.trimEnd()).toMatch(
      new RegExp(`\\n${checks.length} rows, ${checks.length} within tolerance, 0 outside, \\d+ left out$`),
    );
  });
});
