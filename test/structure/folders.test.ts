import { existsSync } from "node:fs";
import { join } from "node:path";
import { describe, expect, it } from "vitest";
import { effectsIn } from "./effects.ts";
import { folderFaults, isWithin, table } from "./folderrules.ts";
import { importsOf } from "./imports.ts";
import { reachedFrom } from "./reach.ts";
import { fileOf, root, sourcesIn } from "./sources.ts";

const sources = sourcesIn("src");
const program = sources.filter(({ path }) => !path.endsWith(".d.ts"));

describe("the folders of src", () => {
  it("hold sources at all", () => {
    expect(sources.length).toBeGreaterThan(50);
  });

  it("import one way, as the table says", () => {
    expect(sources.flatMap(folderFaults)).toEqual([]);
  });

  it("import files that are there", () => {
    const lost = sources.flatMap(({ path, imports }) =>
      imports
        .map(({ specifier }) => fileOf(path, specifier))
        .filter((file) => file !== undefined && !existsSync(join(root, file)))
        .map((file) => `${path} imports ${file}`),
    );
    expect(lost).toEqual([]);
  });

  it("have no index.ts that only passes on", () => {
    expect(program.map(({ path }) => path).filter((path) => path.endsWith("/index.ts"))).toEqual([]);
  });

  it("leave clock, chance, storage and network to the entry points", () => {
    const found = program
      .filter(({ path }) => path.endsWith(".ts") && !isWithin(path, table.effectsOnlyIn))
      .flatMap(({ path, text }) => effectsIn(path, text).map((effect) => `${path} ${effect}`));
    expect(found).toEqual([]);
  });

  it("hold no file that nothing reaches", () => {
    const helpers = sourcesIn("scripts");
    const starts = [
      ...table.entries,
      ...table.twins,
      ...helpers.map(({ path }) => path),
      ...program.map(({ path }) => path).filter((path) => table.entryFolders.some((folder) => path.startsWith(`${folder}/`))),
    ];
    const reached = reachedFrom(starts, [...sources, ...helpers]);
    expect(program.map(({ path }) => path).filter((path) => !reached.has(path))).toEqual([]);
  });

  it("hold only twins that a test compares with", () => {
    const tests = sourcesIn("test");
    const used = new Set(tests.flatMap(({ path, imports }) => imports.map(({ specifier }) => fileOf(path, specifier))));
    expect(table.twins.filter((twin) => !used.has(twin))).toEqual([]);
  });
});

describe("the check itself", () => {
  const faults = (path: string, text: string): readonly string[] => folderFaults({ path, imports: importsOf(path, text) });

  it("names file and import of an upward import, types included", () => {
    const upward = "src/engine/sky/a.ts imports src/plan/schema.ts: engine/sky may import base";
    expect(faults("src/engine/sky/a.ts", 'import { x } from "../../plan/schema.ts";')).toEqual([upward]);
    expect(faults("src/engine/sky/a.ts", 'import type { X } from "../../plan/schema.ts";')).toEqual([upward]);
    expect(faults("src/engine/sky/a.ts", 'export type { X } from "../../plan/schema.ts";')).toEqual([upward]);
    expect(faults("src/engine/sky/a.ts", 'type X = import("../../plan/schema.ts").X;')).toEqual([upward]);
    expect(faults("src/engine/sky/a.ts", 'const x = await import("../../plan/schema.ts");')).toEqual([upward]);
    expect(faults("src/engine/sky/a.ts", 'new URL("../../plan/schema.ts?worker", import.meta.url);')).toEqual([upward]);
  });

  it("lets a folder import itself and what the table gives it", () => {
    expect(faults("src/engine/sky/a.ts", 'import "./b.ts"; import "../../base/errors.ts"; import "d3-array";')).toEqual([]);
    expect(faults("src/engine/search/a.ts", 'import "../imaging/b.ts";')).toEqual([]);
    expect(faults("src/screen/scene/a.ts", 'import "three"; import "three/addons/x.js"; import "lit";')).toEqual([]);
  });

  it("keeps packages and neighbouring files to their owners", () => {
    expect(faults("src/screen/place/a.ts", 'import type { Vector3 } from "three";')).toEqual([
      "src/screen/place/a.ts imports three: only screen/scene may",
    ]);
    expect(faults("src/plan/a.ts", 'import "node:fs";')).toEqual(["src/plan/a.ts imports node:fs: only cli, tasks may"]);
    expect(faults("src/plan/a.ts", 'import "../../test/support/track.ts";')).toEqual([
      "src/plan/a.ts imports test/support/track.ts: only nobody may",
    ]);
  });

  it("sees an effect read, and only that", () => {
    const text =
      'const a = Date.now(), b = new Date(0), c = x.fetch("y");\nMath.random(); fetch("z"); self.localStorage; new Date();';
    expect(effectsIn("a.ts", text)).toEqual([
      "line 1: Date.now",
      "line 2: Math.random",
      "line 2: self.localStorage",
      "line 2: new Date()",
      "line 2: fetch",
    ]);
    expect(effectsIn("a.ts", "// Date.now()\nexport const load = (fetch: Fetch) => fetch({ fetch: 1 });")).toEqual([]);
  });

  it("follows pages and style sheets", () => {
    expect(importsOf("src/page/index.html", '<script type="module" src="/main.ts"></script><a href="#x"></a>')).toEqual([
      { specifier: "/main.ts", typeOnly: false },
    ]);
    expect(fileOf("src/page/index.html", "/main.ts")).toBe("src/page/main.ts");
    expect(importsOf("a.css", '@import "pkg/wght.css"; a { src: url("./a.woff2"); mask: url("#m"); }')).toEqual([
      { specifier: "pkg/wght.css", typeOnly: false },
      { specifier: "./a.woff2", typeOnly: false },
    ]);
  });
});
