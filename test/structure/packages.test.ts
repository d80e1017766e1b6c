import { readFileSync } from "node:fs";
import { join } from "node:path";
import { describe, expect, it } from "vitest";
import { importsOf, packageOf } from "./imports.ts";
import { fileOf, root, sourcesIn } from "./sources.ts";

const {
  name: own,
  dependencies,
  devDependencies,
} = JSON.parse(readFileSync(join(root, "package.json"), "utf8")) as Record<
  "dependencies" | "devDependencies",
  Record<string, string>
> & { readonly name: string };

/** Packages of path → its imports, Node's and the package's own left out. */
const packagesOf = (folder: string) =>
  sourcesIn(folder).flatMap(({ path, imports }) =>
    imports.flatMap(({ specifier, typeOnly }) => {
      const name = fileOf(path, specifier) === undefined ? packageOf(specifier) : undefined;
      return name === undefined || name === "node" || name === own ? [] : [{ path, name, typeOnly }];
    }),
  );

describe("the packages of package.json", () => {
  const used = packagesOf("src");

  it("list everything the sources import", () => {
    const unlisted = used
      .filter(({ name, typeOnly }) => !(name in dependencies) && !(typeOnly && `@types/${name}` in devDependencies))
      .map(({ path, name }) => `${path} imports ${name}`);
    expect(unlisted).toEqual([]);
  });

  it("list nothing the program does without", () => {
    const server = importsOf("serve.ts", readFileSync(join(root, "scripts/serve.mjs"), "utf8")).map(({ specifier }) => specifier);
    const names = new Set([...used.map(({ name }) => name), ...server]);
    expect(Object.keys(dependencies).filter((name) => !names.has(name))).toEqual([]);
  });
});
