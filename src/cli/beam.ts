import { beamImage, type FullBeam } from "../assess/image.ts";
import type { BeamCut } from "../assess/result.ts";
import { DomainError } from "../base/errors.ts";
import { beamFits } from "../formats/beam-fits.ts";
import { csvLines } from "../formats/csv.ts";
import { pngBytes } from "../formats/png.ts";
import type { Theme } from "../view/colour.ts";
import { paintBeam } from "../view/paint.ts";
import { beamHeader } from "./beam-header.ts";
import { oneOf } from "./choice.ts";
import { DONE, Fault } from "./faults.ts";
import type { Io } from "./io.ts";
import { OutputFiles } from "./output.ts";
import { readPlanFile } from "./planfile.ts";
import { progress } from "./progress.ts";
import { program } from "./version.ts";
import { warnOfPlan, warnOfResults } from "./warnings.ts";

export interface BeamCall {
  readonly layout?: string;
  readonly observation?: string;
  readonly fits?: string;
  readonly png?: string;
  readonly csv?: string;
  readonly theme: Theme;
}

/** `beam`: the synthesized beam as FITS, as a picture, and its cuts along the fitted axes as CSV. */
export async function beamVerb(io: Io, path: string, call: BeamCall): Promise<number> {
  if (call.fits === undefined && call.png === undefined && call.csv === undefined) {
    throw new Fault("nothing to write: name at least one of --fits FILE, --png FILE, --csv FILE");
  }
  const { plan, warnings } = await readPlanFile(path);
  warnOfPlan(io, path, warnings);
  const { layout, observation } = oneOf(plan, call, io);
  const files = await OutputFiles.at({ "--fits": call.fits, "--png": call.png, "--csv": call.csv }, path);
  const running = progress(io, "beam");
  let beam: FullBeam;
  try {
    beam = await beamImage(plan, layout.id, observation.id, running.checkpoint);
  } finally {
    running.end();
  }
  warnOfResults(io, [beam.result]);
  const cuts = call.csv === undefined ? "" : cutsCsv(beam);
  try {
    if (files.has("--fits")) await files.write("--fits", [beamFits(beamHeader(plan, layout, observation, beam))]);
    if (files.has("--png")) {
      const text = { Title: `${plan.title}: ${layout.id}, ${observation.id}`, Software: program, Description: pictureText(beam) };
      const rgba = paintBeam(beam.values, beam.size, call.theme, { stretch: "stretched" });
      await files.write("--png", [pngBytes(rgba, beam.size, beam.size, text)]);
    }
    if (files.has("--csv")) await files.write("--csv", [cuts]);
    if (io.signal.aborted) await running.checkpoint(1);
    await files.commit();
  } finally {
    await files.discard();
  }
  return DONE;
}

function pictureText({ size, result }: FullBeam): string {
  return `Synthesized beam, north up, east left, ${size} pixels of ${result.beam.pixelArcsec?.toPrecision(6)} arcsec. Stretch asinh(v/0.04).`;
}

function cutsCsv({ cuts, result }: FullBeam): string {
  if (!cuts)
    throw new DomainError("--csv", "asked for", "a beam with a fitted ellipse, along whose axes to cut", result.warnings[0]);
  const rows = (name: string, { positionAngleDeg, offsetArcsec, value }: BeamCut): (string | number)[][] =>
    Array.from(offsetArcsec, (offset, k) => [name, positionAngleDeg, offset, value[k]]);
  return csvLines([
    ["cut", "positionAngleDeg", "offsetArcsec", "value"],
    ...rows("major", cuts.major),
    ...rows("minor", cuts.minor),
  ]);
}
