import { spawnSync } from "node:child_process";
import { existsSync, mkdtempSync, readFileSync, rmSync, symlinkSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join, resolve } from "node:path";
import { describe, expect, it } from "vitest";

const isBuilt = existsSync("dist/library/assess.js") && existsSync("dist/library/types/library/assess.d.ts");
const note = isBuilt ? "" : " (skipped: dist/library is not built)";

/** Runs in a folder of its own, with the package linked in as an importer has it. */
function asImporter(run: (folder: string) => void): void {
  const folder = mkdtempSync(join(tmpdir(), "spanwright-importer-"));
  try {
    writeFileSync(join(folder, "package.json"), JSON.stringify({ type: "module" }));
    symlinkSync(resolve("node_modules"), join(folder, "node_modules"), "junction");
    run(folder);
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

describe("the built library", () => {
  it.skipIf(!isBuilt)(`runs its examples outside the project's sources${note}`, () => {
    // The package names itself: an import of spanwright from within its folder takes the road an importer's takes.
    const example = readFileSync("src/library/examples/plan.ts", "utf8");
    const said = spawnSync(process.execPath, ["--input-type=module", "-e", example], { encoding: "utf8" });
    expect([said.stderr, said.stdout.trim()]).toEqual([
      "",
      [...example.matchAll(/\/\/ prints: (.*)/g)].map(([, line]) => line).join("\n"),
    ]);
  });

  it.skipIf(!isBuilt)(`keeps what an importer does not ask for out of its bundle${note}`, () => {
    // Geometry needs neither the plan's schema nor the beam.
    const reached = new Set<string>();
    const follow = (path: string): void => {
      if (reached.has(path)) return;
      reached.add(path);
      for (const [, from] of readFileSync(path, "utf8").matchAll(/from "(\.[^"]+)"/g)) follow(resolve(path, "..", from));
    };
    follow(resolve("dist/library/geometry.js"));
    const text = [...reached].map((path) => readFileSync(path, "utf8")).join("\n");
    expect(text).not.toMatch(/from "valibot"|fft\.js/);
    expect(text).toContain("geographiclib");
  });

  it.skipIf(!isBuilt)(`has types an importer can use${note}`, () => {
    asImporter((folder) => {
      writeFileSync(
        join(folder, "use.ts"),
        'import { inverse, type GeodesicLine } from "./geometry";\nconst line: GeodesicLine = inverse(0, 0, 0, 1);\nexport const wrong: string = line.distanceM;\n',
      );
      writeFileSync(
        join(folder, "geometry.d.ts"),
        `export * from ${JSON.stringify(resolve("dist/library/types/library/geometry"))};\n`,
      );
      const tsc = [
        resolve("node_modules/typescript/bin/tsc"),
        "--strict",
        "--noEmit",
        "--module",
        "esnext",
        "--moduleResolution",
        "bundler",
      ];
      const said = spawnSync(process.execPath, [...tsc, "--skipLibCheck", "use.ts"], { cwd: folder, encoding: "utf8" });
      expect(said.stdout.trim()).toMatch(/^use\.ts\(3,14\): error TS2322: Type 'number' is not assignable to type 'string'\.$/);
    });
  });
});
