import { existsSync, readdirSync, statSync } from "node:fs";
import { join, resolve } from "node:path";
import { root, runNode } from "./node.mjs";

const vite = join(root, "node_modules/vite/bin/vite.js");
const shared = ["src", "assets", "scenarios", "scripts/version.mjs", "package.json", "package-lock.json"];

/** What is built: the file that shows it is, the configuration that builds it, what it is built from. */
export const page = {
  output: join(root, "dist/page/index.html"),
  config: "vite.config.ts",
  inputs: [...shared, "scripts/policy.mjs"],
};
export const terminal = { output: join(root, "dist/terminal/spanwright.js"), config: "vite.terminal.config.ts", inputs: shared };

export const library = {
  output: join(root, "dist/library/assess.js"),
  config: "vite.library.config.ts",
  inputs: [...shared, "scripts/library.mjs"],
};

/** Whether anything that goes into it (a file, or a folder something left) is newer than what was built. */
export function isStale({ output, config, inputs }) {
  if (!existsSync(output)) return true;
  const builtMs = statSync(output).mtimeMs;
  return [...inputs, config].some((path) => newestMs(resolve(root, path)) > builtMs);
}

/**
 * @param {typeof page} part
 * @param {readonly ["ignore", "inherit" | number, "inherit"]} [stdio] - Where the builder may write.
 * @returns {Promise<number>} The builder's exit code.
 */
export function build({ config }, stdio = ["ignore", "inherit", "inherit"]) {
  return runNode([vite, "build", "--config", config, "--logLevel", "warn"], { stdio });
}

function newestMs(path) {
  const found = statSync(path, { throwIfNoEntry: false });
  if (!found?.isDirectory()) return found?.mtimeMs ?? 0;
  return readdirSync(path).reduce((newest, name) => Math.max(newest, newestMs(join(path, name))), found.mtimeMs);
}
