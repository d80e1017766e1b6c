import { type Comparison, evaluate, type Figure, type Outcome } from "../test/outside/check.ts";
import { sections } from "../test/outside/sections.ts";

const difference = ({ ours, theirs, difference: d }: Comparison): string =>
  typeof ours === "number" && typeof theirs === "number" ? d.toExponential(1) : d === 0 ? "same" : "other";
const shown = (figure: Figure): string => (typeof figure === "number" ? String(Number(figure.toPrecision(10))) : figure);
const shortened = (text: string, most: number): string => (text.length > most ? `${text.slice(0, most - 1)}…` : text);

/** Prints every outside check: quantity, ours, theirs, difference, tolerance, source; or `--json`. Exit 1 when one is outside. */
const results = sections.map(({ title, checks, left }) => ({ title, left, outcomes: checks.map(evaluate) }));
const outcomes = results.flatMap((result) => result.outcomes);
const within = outcomes.filter(({ passes }) => passes).length;
const leftOut = results.reduce((sum, { left }) => sum + Object.keys(left).length, 0);

if (process.argv.includes("--json")) {
  const rows = results.flatMap(({ title, outcomes: of }) =>
    of.map(({ check, comparisons, passes }) => {
      const { id, quantity, tolerance, toleranceReason, source, status } = check;
      return { section: title, id, quantity, comparisons, tolerance, toleranceReason, source, status, passes };
    }),
  );
  process.stdout.write(
    `${JSON.stringify({ rows, left: results.map(({ title, left }) => ({ section: title, left })) }, null, 1)}\n`,
  );
} else {
  for (const { title, left, outcomes: of } of results) {
    process.stdout.write(`\n${title}\n`);
    for (const line of table(of)) process.stdout.write(`${line}\n`);
    for (const [id, why] of Object.entries(left)) process.stdout.write(`  ${id}: left out, ${why}\n`);
  }
  process.stdout.write(
    `\n${outcomes.length} rows, ${within} within tolerance, ${outcomes.length - within} outside, ${leftOut} left out\n`,
  );
}
process.exitCode = within === outcomes.length ? 0 : 1;

/** The worst figure of each check; rows with several say which. */
function table(of: readonly Outcome[]): readonly string[] {
  const cells = of.map(({ check, comparisons, worst, passes }) => [
    passes ? "" : "OUTSIDE",
    check.id,
    shortened(check.quantity, 64) +
      (comparisons.length > 1 ? `, figure ${comparisons.indexOf(worst) + 1} of ${comparisons.length}` : ""),
    shown(worst.ours),
    shown(worst.theirs),
    difference(worst),
    shown(worst.tolerance),
    check.status,
    check.source,
  ]);
  const head = ["", "id", "quantity", "ours", "theirs", "difference", "tolerance", "status", "source"];
  const widths = head.map((_, k) => Math.max(...[head, ...cells].map((row) => row[k].length)));
  return [head, ...cells].map((row) =>
    row
      .map((cell, k) => cell.padEnd(widths[k]))
      .join("  ")
      .trimEnd(),
  );
}
