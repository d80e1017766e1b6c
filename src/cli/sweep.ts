import type { AssessResult } from "../assess/result.ts";
import { type SweepPoint, type SweepSpec, sweep, varied } from "../assess/sweep.ts";
import { roundedJson } from "../base/json.ts";
import { type Cell, csvLines } from "../formats/csv.ts";
import type { Pair } from "../plan/schema.ts";
import { withAssessor } from "./assessor.ts";
import { oneOf } from "./choice.ts";
import { DONE } from "./faults.ts";
import type { Io } from "./io.ts";
import { axes } from "./options.ts";
import { OutputFiles } from "./output.ts";
import { readPlanFile } from "./planfile.ts";
import { progress } from "./progress.ts";
import { warnOfPlan, warnOfSweep } from "./warnings.ts";

export interface SweepCall {
  readonly layout?: string;
  readonly observation?: string;
  readonly vary: SweepSpec;
  readonly pair?: Pair;
  readonly json?: boolean;
  readonly out?: string;
  readonly workers?: number;
}

/** `sweep`: the results of `assess` along one axis, a row or an object for each point. */
export async function sweepVerb(io: Io, path: string, call: SweepCall): Promise<number> {
  const { plan, warnings } = await readPlanFile(path);
  warnOfPlan(io, path, warnings);
  const { layout, observation } = oneOf(plan, call, io);
  const { vary } = call;
  // Every point is looked at first: one out of range at the end is not found out after an hour.
  for (const at of vary.values) varied(observation, vary.axis, at);
  const files = await OutputFiles.at({ "--out": call.out }, path);
  const running = progress(io, "sweep");
  let points: readonly SweepPoint[];
  try {
    const options = { pair: call.pair ?? null };
    points = await withAssessor(io, call.workers, vary.values.length, (run) =>
      sweep(plan, layout.id, observation.id, vary, running.checkpoint, options, run),
    );
  } finally {
    running.end();
  }
  warnOfSweep(io, vary.axis, points);
  const { key } = axes[vary.axis];
  const text = call.json
    ? `${roundedJson(
        points.map(({ at, result }) => ({ [key]: at, ...result })),
        2,
      )}\n`
    : pointsCsv(key, points);
  try {
    if (files.has("--out")) {
      await files.write("--out", [text]);
      await files.commit();
    } else await io.out(text);
  } finally {
    await files.discard();
  }
  return DONE;
}

/** One row a point; columns are the paths of the results. */
function pointsCsv(key: string, points: readonly SweepPoint[]): string {
  const rows = points.map(({ at, result }) => new Map<string, Cell>([[key, at], ...flat(result)]));
  const columns = [...new Set(rows.flatMap((row) => [...row.keys()]))];
  return csvLines([columns, ...rows.map((row) => columns.map((column) => row.get(column) ?? null))]);
}

/** A result as path → value, such as `beam.majorArcsec`; warnings in one cell. */
function flat(result: AssessResult): readonly (readonly [string, Cell])[] {
  const cells: (readonly [string, Cell])[] = [];
  const add = (path: string, value: unknown): void => {
    if (Array.isArray(value)) cells.push([path, value.join("; ")]);
    else if (value !== null && typeof value === "object") {
      for (const [name, inner] of Object.entries(value)) add(`${path}.${name}`, inner);
    } else cells.push([path, value as Cell]);
  };
  for (const [name, value] of Object.entries(result)) add(name, value);
  return cells;
}
