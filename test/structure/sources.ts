import { existsSync, readdirSync, readFileSync } from "node:fs";
import { dirname, join, posix, sep } from "node:path";
import { fileURLToPath } from "node:url";
import { type Import, importsOf } from "./imports.ts";

export const root = dirname(dirname(dirname(fileURLToPath(import.meta.url))));

export interface Source {
  /** From the project's folder, with forward slashes: `src/base/errors.ts`. */
  readonly path: string;
  readonly text: string;
  readonly imports: readonly Import[];
}

/** Every source file of a folder of the project, its own folders included. */
export function sourcesIn(folder: string): readonly Source[] {
  const all = existsSync(join(root, folder)) ? readdirSync(join(root, folder), { recursive: true, encoding: "utf8" }) : [];
  return all
    .map((name) => `${folder}/${name.split(sep).join("/")}`)
    .filter((path) => /\.(ts|mts|css|html)$/.test(path) && !path.includes("node_modules/"))
    .sort()
    .map((path) => {
      const text = readFileSync(join(root, path), "utf8");
      return { path, text, imports: importsOf(path, text) };
    });
}

/** The project file a path import means, or nothing for a package. A page's `/x` counts from the page's own folder. */
export function fileOf(importer: string, specifier: string): string | undefined {
  const folder = posix.dirname(importer);
  if (specifier.startsWith("/")) return posix.join(folder, specifier);
  if (specifier.startsWith(".")) return posix.join(folder, specifier);
  return importer.endsWith(".html") ? posix.join(folder, specifier) : undefined;
}
