import { spawnSync } from "node:child_process";
import { measure, type Outcome } from "./ratio.ts";
import { rows } from "./rows.ts";

/** `npm run bench [-- --json]`: every ratio measured in a process of its own. */
const args = process.argv.slice(2);
const one = args.indexOf("--row");
if (one >= 0) {
  console.log(JSON.stringify(await measure(rows[Number(args[one + 1])])));
} else {
  const outcomes = rows.map((_, k) => {
    const child = spawnSync(process.execPath, [process.argv[1], "--row", String(k)], {
      encoding: "utf8",
      stdio: ["ignore", "pipe", "inherit"],
    });
    if (child.status !== 0) throw new Error(`row ${k} ended with ${child.status ?? child.signal}`);
    return JSON.parse(child.stdout) as Outcome;
  });
  if (args.includes("--json")) console.log(JSON.stringify(outcomes, null, 2));
  else for (const outcome of outcomes) console.log(line(outcome));
}

function line(o: Outcome): string {
  const times = (x: number): string => (x >= 100 ? x.toFixed(0) : x.toFixed(1));
  const verdict = o.ratio >= o.goal ? "met" : "not met";
  return [
    `${o.name}`,
    `  ${times(o.ratio)} × faster (rounds ${times(o.low)} to ${times(o.high)}), goal ≥ ${o.goal} ×: ${verdict}`,
    `  ${o.fastMs.toFixed(2)} ms against ${times(o.plainMs)} ms, minima of ${o.rounds} interleaved rounds; peak ${o.peakMiB.toFixed(0)} MiB${o.note ? `; ${o.note}` : ""}`,
  ].join("\n");
}
