import { spawn } from "node:child_process";
import { constants } from "node:os";
import { dirname } from "node:path";
import { fileURLToPath } from "node:url";

/** The project's own folder, wherever it was called from. */
export const root = dirname(dirname(fileURLToPath(import.meta.url)));

/**
 * Runs a JavaScript file on this Node, in the project's folder and on this terminal unless told otherwise.
 *
 * @param {readonly string[]} args - The file, then its arguments.
 * @param {import("node:child_process").SpawnOptions} [options]
 * @returns {Promise<number>} Its exit code.
 */
export function runNode(args, options = {}) {
  return exitCodeOf(spawn(process.execPath, args, { cwd: root, stdio: "inherit", ...options }));
}

/**
 * @param {import("node:child_process").ChildProcess} child
 * @returns {Promise<number>} Its exit code; 128 plus the signal's number if a signal ended it, as shells count.
 */
export function exitCodeOf(child) {
  return new Promise((done, fail) => {
    child.once("error", fail);
    child.once("exit", (code, signal) => done(code ?? 128 + (constants.signals[signal] ?? 0)));
  });
}
