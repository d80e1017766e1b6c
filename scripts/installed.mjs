import { spawn } from "node:child_process";
import { existsSync, readFileSync } from "node:fs";
import { basename, join } from "node:path";
import { exitCodeOf, root, runNode } from "./node.mjs";

/**
 * Whether node_modules holds every package of package-lock.json at its version. npm's own list of what it put there
 * is compared entry by entry; optional packages (builds for other machines) may be absent.
 *
 * @param {string} [folder] - The project to look at.
 */
export function isInstalled(folder = root) {
  const listed = join(folder, "node_modules/.package-lock.json");
  if (!existsSync(listed)) return false;
  const { packages: wanted } = JSON.parse(readFileSync(join(folder, "package-lock.json"), "utf8"));
  const { packages: got } = JSON.parse(readFileSync(listed, "utf8"));
  return Object.entries(wanted).every(([path, { version, integrity, optional, devOptional }]) => {
    if (path === "") return true;
    if (!got[path]) return Boolean(optional || devOptional);
    return got[path].version === version && got[path].integrity === integrity && existsSync(join(folder, path, "package.json"));
  });
}

/** Runs `npm ci` with the npm that started this process, else the one on the path. Returns its exit code. */
export function install() {
  // Building needs the development packages, also where npm is set to leave them out.
  const args = ["ci", "--include=dev", "--no-audit", "--no-fund"];
  const npm = process.env.npm_execpath ?? "";
  if (basename(npm) === "npm-cli.js" && existsSync(npm)) return runNode([npm, ...args]);
  // npm is a script on Windows, which only a shell can start. The words are all our own.
  return exitCodeOf(spawn(["npm", ...args].join(" "), { cwd: root, shell: true, stdio: "inherit" }));
}
