/** `node scripts/run.mjs FILE.ts …`: bundles one TypeScript file of the project and runs it with the arguments that follow. */
import { existsSync } from "node:fs";
import { join, relative, resolve } from "node:path";
import { build } from "vite";
import { root, runNode } from "./node.mjs";
import { versionDefine } from "./version.mjs";

const [file, ...args] = process.argv.slice(2);
if (!file || !existsSync(file)) {
  console.error(`FILE is ${file === undefined ? "missing" : JSON.stringify(file)}; expected a TypeScript file.`);
  process.exit(2);
}
const entry = resolve(file);
// Packages stay outside the bundle: Node finds them from here in the project's own node_modules.
const outDir = join(root, ".cache/run", relative(root, entry).replaceAll(/[^\w]+/g, "-"));
await build({
  root,
  configFile: false,
  publicDir: false,
  logLevel: "warn",
  define: versionDefine,
  build: {
    ssr: entry,
    outDir,
    emptyOutDir: true,
    target: "node20.19",
    rolldownOptions: { output: { entryFileNames: "main.mjs" } },
  },
});
process.exitCode = await runNode([join(outDir, "main.mjs"), ...args], { cwd: process.cwd() });
