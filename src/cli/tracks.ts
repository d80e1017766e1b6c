import { tracks } from "../assess/tracks.ts";
import type { Checkpoint } from "../base/checkpoint.ts";
import { sampleTimes } from "../engine/synthesis/track.ts";
import { type Cell, csvLines } from "../formats/csv.ts";
import type { Plan } from "../plan/schema.ts";
import { type Choice, oneOf } from "./choice.ts";
import { DONE } from "./faults.ts";
import type { Io } from "./io.ts";
import { OutputFiles } from "./output.ts";
import { readPlanFile } from "./planfile.ts";
import { progress } from "./progress.ts";
import { warnOfPlan } from "./warnings.ts";

export interface TracksCall {
  readonly layout?: string;
  readonly observation?: string;
  readonly csv?: string;
  readonly raw?: boolean;
}

const ROWS = 4096;
const columns = ["stationA", "stationB", "hourAngleH", "uM", "vM", "wM", "uWavelengths", "vWavelengths", "wWavelengths"];

/** `tracks`: the samples as CSV, on stdout or in a file. They are written as they come: none is held. */
export async function tracksVerb(io: Io, path: string, call: TracksCall): Promise<number> {
  const { plan, warnings } = await readPlanFile(path);
  warnOfPlan(io, path, warnings);
  const choice = oneOf(plan, call, io);
  const files = await OutputFiles.at({ "--csv": call.csv }, path);
  const running = progress(io, "tracks");
  const found = { kept: 0, dropped: 0 };
  try {
    const chunks = csvChunks(plan, choice, call.raw ?? false, found, running.checkpoint);
    if (files.has("--csv")) {
      await files.write("--csv", chunks);
      await files.commit();
    } else for await (const chunk of chunks) await io.out(chunk);
  } finally {
    running.end();
    await files.discard();
  }
  if (found.kept === 0) io.err(`warning: ${choice.layout.id} / ${choice.observation.id}: no sample counts; --raw shows why\n`);
  return DONE;
}

async function* csvChunks(
  plan: Plan,
  { layout, observation }: Choice,
  raw: boolean,
  found: { kept: number; dropped: number },
  checkpoint: Checkpoint,
): AsyncGenerator<string> {
  const { hourAngle, integrationS } = observation;
  const times = sampleTimes(hourAngle.fromH, hourAngle.toH, integrationS).hourAngleRad.length;
  const total = (times * layout.stations.length * (layout.stations.length - 1)) / 2;
  yield csvLines([raw ? [...columns, "reason"] : columns]);
  let rows: Cell[][] = [];
  for (const s of tracks(plan, layout.id, observation.id)) {
    if (s.reason === null) found.kept++;
    else found.dropped++;
    if (s.reason === null || raw) {
      const row = [s.stationA, s.stationB, s.hourAngleH, s.uM, s.vM, s.wM, s.uWavelengths, s.vWavelengths, s.wWavelengths];
      rows.push(raw ? [...row, s.reason] : row);
    }
    if ((found.kept + found.dropped) % ROWS === 0) {
      await checkpoint((found.kept + found.dropped) / total);
      if (rows.length > 0) yield csvLines(rows);
      rows = [];
    }
  }
  if (rows.length > 0) yield csvLines(rows);
  await checkpoint(1);
}
