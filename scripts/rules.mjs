/** `npm run rules`: folders import one way. Reads the rules of .dependency-cruiser.cjs; having read no file is a failure too. */
import { spawnSync } from "node:child_process";
import { join } from "node:path";
import { root } from "./node.mjs";

const cruiser = join(root, "node_modules/dependency-cruiser/bin/dependency-cruise.mjs");
const args = [cruiser, "src", "--config", ".dependency-cruiser.cjs", "--output-type", "json"];
const { stdout, stderr } = spawnSync(process.execPath, args, { cwd: root, encoding: "utf8", maxBuffer: 2 ** 28 });

let summary;
try {
  ({ summary } = JSON.parse(stdout));
} catch {
  console.error(`dependency-cruiser gave no result.\n${stderr}`);
  process.exit(1);
}
for (const { from, to, rule, cycle } of summary.violations) {
  console.error(`${from} imports ${cycle?.map(({ name }) => name).join(" → ") ?? to}: ${rule.name}`);
}
console.log(`${summary.totalCruised} files read, ${summary.violations.length} imports against the rules`);
if (summary.totalCruised === 0) console.error("No file was read, so nothing was checked.");
process.exitCode = summary.totalCruised === 0 || summary.violations.length > 0 ? 1 : 0;
