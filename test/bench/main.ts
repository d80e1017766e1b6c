import { spawnSync } from "node:child_process";
import { growthRows } from "./growth.ts";
import { isMet, type Outcome } from "./outcome.ts";
import { ratioRow } from "./ratio.ts";
import { comparisons } from "./rows.ts";

/** `npm run bench [-- --json]`: every row measured in a process of its own. */
const rows = [...comparisons.map(ratioRow), ...growthRows];
/** Goals whose subject is not built. */
const UNBUILT = ["search moves against full recomputation", "all single losses of 64 stations"];
const args = process.argv.slice(2);
const one = args.indexOf("--row");
if (one >= 0) {
  console.log(JSON.stringify(await rows[Number(args[one + 1])].measure()));
} else {
  const outcomes = rows.map(({ name }, k) => {
    const child = spawnSync(process.execPath, [process.argv[1], "--row", String(k)], {
      encoding: "utf8",
      stdio: ["ignore", "pipe", "inherit"],
    });
    if (child.status !== 0) throw new Error(`"${name}" ended with ${child.status ?? child.signal}`);
    const outcome = JSON.parse(child.stdout) as Outcome;
    if (!args.includes("--json")) console.log(lines(outcome));
    return outcome;
  });
  if (args.includes("--json")) {
    console.log(JSON.stringify({ rows: outcomes.map((o) => ({ ...o, met: isMet(o) })), unbuilt: UNBUILT }, null, 2));
  } else for (const name of UNBUILT) console.log(`${name}\n  not built yet: nothing to measure`);
}

function lines(o: Outcome): string {
  const shown = (x: number): string => (x >= 100 ? x.toFixed(0) : x.toPrecision(3));
  const goal = `goal ${o.sense === "at least" ? "≥" : "≤"} ${o.goal}: ${isMet(o) ? "met" : "not met"}`;
  return [
    o.name,
    `  ${shown(o.value)} ${o.unit}, ${goal} (rounds: median ${shown(o.median)}, ${shown(o.low)} to ${shown(o.high)})`,
    `  ${o.detail}; peak ${o.peakMiB.toFixed(0)} MiB`,
  ].join("\n");
}
