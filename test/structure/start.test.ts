import { mkdirSync, mkdtempSync, rmSync, utimesSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll, describe, expect, it } from "vitest";
import { isStale } from "../../scripts/built.mjs";
import { isInstalled } from "../../scripts/installed.mjs";
import { defaultPort, portFrom } from "../../scripts/port.mjs";
import { tallyOf } from "../../scripts/tally.mjs";

const folder = mkdtempSync(join(tmpdir(), "spanwright-start-"));
afterAll(() => rmSync(folder, { recursive: true }));

describe("portFrom", () => {
  it.each([
    [undefined, defaultPort],
    ["", defaultPort],
    ["0", 0],
    ["8080", 8080],
    ["65535", 65535],
  ])("reads %s as %s", (text, port) => expect(portFrom(text)).toBe(port));

  it.each(["65536", "-1", "80.5", "8e3", "0x50", " 80", "eighty", "999999"])("refuses %s", (text) => {
    expect(portFrom(text)).toBeUndefined();
  });
});

describe("isInstalled", () => {
  const write = (path: string, value: unknown): void => {
    const file = join(folder, "project", path);
    mkdirSync(join(file, ".."), { recursive: true });
    writeFileSync(file, JSON.stringify(value));
  };
  const kept = { version: "1.0.0", integrity: "sha512-a" };

  it("wants every package at the lock's version, but for those of other machines", () => {
    const project = join(folder, "project");
    write("package-lock.json", {
      packages: { "": {}, "node_modules/a": kept, "node_modules/elsewhere": { ...kept, optional: true } },
    });
    expect(isInstalled(project)).toBe(false);
    write("node_modules/.package-lock.json", { packages: { "node_modules/a": kept } });
    expect(isInstalled(project)).toBe(false); // listed, but its folder is gone
    write("node_modules/a/package.json", {});
    expect(isInstalled(project)).toBe(true);
    write("package-lock.json", { packages: { "": {}, "node_modules/a": { ...kept, version: "1.0.1" } } });
    expect(isInstalled(project)).toBe(false);
  });
});

describe("isStale", () => {
  it("is so without an output, or with an input, folder or configuration newer than it", () => {
    const [output, input, config] = ["output", "input", "config"].map((name) => join(folder, name));
    const part = { output, inputs: [input], config };
    const touch = (path: string, seconds: number): void => utimesSync(path, seconds, seconds);
    mkdirSync(input);
    for (const path of [config, join(input, "file")]) writeFileSync(path, "");
    expect(isStale(part)).toBe(true);
    writeFileSync(output, "");
    for (const path of [input, join(input, "file"), config]) touch(path, 1000);
    touch(output, 2000);
    expect(isStale(part)).toBe(false);
    for (const newer of [input, join(input, "file"), config]) {
      touch(newer, 3000);
      expect(isStale(part)).toBe(true);
      touch(newer, 1000);
    }
  });
});

describe("tallyOf", () => {
  it("counts a file that broke before its tests as one failed", () => {
    const broken = { status: "failed", assertionResults: [] };
    const failing = { status: "failed", assertionResults: [{ status: "failed" }, { status: "passed" }] };
    const report = { numPassedTests: 1, numFailedTests: 1, numPendingTests: 2, testResults: [broken, failing] };
    expect(tallyOf(report)).toEqual({ passed: 1, failed: 2, skipped: 2 });
  });
});
