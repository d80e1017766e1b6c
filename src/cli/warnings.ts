import type { AssessResult } from "../assess/result.ts";
import type { SweepAxis, SweepPoint } from "../assess/sweep.ts";
import { rounded } from "../base/json.ts";
import { named } from "./faults.ts";
import type { Io } from "./io.ts";

/** Says what is dubious about a plan, a line each. */
export function warnOfPlan(io: Io, path: string, warnings: readonly string[]): void {
  for (const text of warnings) io.err(`warning: ${named(path)}: ${text}\n`);
}

/** Says what is dubious about results: a line for each warning, with the layouts and observations it is about. */
export function warnOfResults(io: Io, results: readonly AssessResult[]): void {
  for (const line of warningLines(results)) io.err(`warning: ${line}\n`);
}

/** "trident, ring / south: …". Layouts with the same warning for the same observation share a line. */
export function warningLines(results: readonly AssessResult[]): readonly string[] {
  const grouped = new Map<string, { readonly observation: string; readonly text: string; readonly layouts: string[] }>();
  for (const { layout, observation, warnings } of results) {
    for (const text of new Set(warnings)) {
      const key = JSON.stringify([observation, text]);
      const group = grouped.get(key);
      if (group) group.layouts.push(layout);
      else grouped.set(key, { observation, text, layouts: [layout] });
    }
  }
  return [...grouped.values()].map(({ observation, text, layouts }) => `${layouts.join(", ")} / ${observation}: ${text}`);
}

/** Points of a sweep named one by one in a warning; more are counted. */
const MOST_NAMED = 4;

/** Says what is dubious about the points of a sweep: warnings that differ only in their figures share a line. */
export function warnOfSweep(io: Io, axis: SweepAxis, points: readonly SweepPoint[]): void {
  const grouped = new Map<string, { readonly text: string; readonly at: number[] }>();
  for (const { at, result } of points) {
    for (const text of new Set(result.warnings)) {
      const key = text.replace(/\d+(\.\d+)?/g, "#");
      const group = grouped.get(key);
      if (!group) grouped.set(key, { text, at: [at] });
      else if (group.at.at(-1) !== at) group.at.push(at);
    }
  }
  for (const { text, at } of grouped.values()) {
    const all =
      at.length === points.length
        ? `all ${at.length} points`
        : `${at.length} of ${points.length} points, the first at ${axis} ${rounded(at[0])}`;
    const where = at.length <= MOST_NAMED && at.length < points.length ? `${axis} ${at.map(rounded).join(", ")}` : all;
    io.err(`warning: ${where}: ${text}\n`);
  }
}
