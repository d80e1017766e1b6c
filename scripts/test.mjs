/**
 * `npm test`: every check in turn, up to the first that fails. Its last line is always `N passed, N failed`: the tests vitest
 * counted in its own reports; a step that failed without counting any is one failed.
 */
import { mkdirSync, readFileSync, rmSync } from "node:fs";
import { join } from "node:path";
import { build, library, page, terminal } from "./built.mjs";
import { root, runNode } from "./node.mjs";
import { tallyOf } from "./tally.mjs";

const bin = (path) => join(root, "node_modules", path);
const reports = join(root, ".cache/test");
const total = { passed: 0, failed: 0, skipped: 0 };

async function vitest(project) {
  const report = join(reports, `${project}.json`);
  rmSync(report, { force: true });
  const reporters = ["--reporter=default", "--reporter=json", `--outputFile.json=${report}`];
  const code = await runNode([bin("vitest/vitest.mjs"), "run", "--project", project, ...reporters]);
  try {
    const counted = tallyOf(JSON.parse(readFileSync(report, "utf8")));
    for (const key of Object.keys(total)) total[key] += counted[key];
  } catch {
    console.error(`vitest left no report of the ${project} project.`);
    return code || 1;
  }
  return code;
}

const steps = {
  types: () => runNode([bin("typescript/bin/tsc"), "-p", "."]),
  lint: () => runNode([bin("@biomejs/biome/bin/biome"), "check", "--error-on-warnings"]),
  "folder rules": () => runNode(["scripts/rules.mjs"]),
  // Before the tests: some look at what was built.
  build: async () => (await build(page)) || (await build(terminal)) || (await build(library)),
  "library types": () => runNode([bin("typescript/bin/tsc"), "-p", "tsconfig.library.json"]),
  "library docs": () => runNode([bin("typedoc/bin/typedoc"), "--logLevel", "Warn"]),
  "unit tests": () => vitest("unit"),
  "outside checks": () => vitest("outside"),
  "page in a browser": () => vitest("browser"),
};

mkdirSync(reports, { recursive: true });
let exitCode = 0;
for (const [name, step] of Object.entries(steps)) {
  console.log(`\n── ${name}`);
  exitCode = await step().catch((error) => {
    console.error(error);
    return 1;
  });
  if (exitCode !== 0) {
    console.error(`\nStopped: ${name} did not pass.`);
    total.failed = Math.max(total.failed, 1);
    break;
  }
}
if (total.skipped > 0) console.log(`\n${total.skipped} skipped`);
console.log(`\n${total.passed} passed, ${total.failed} failed`);
process.exitCode = exitCode;
