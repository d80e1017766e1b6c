import { Command, Option } from "commander";
import { type AssessCall, assessVerb } from "./assess.ts";
import { type BeamCall, beamVerb } from "./beam.ts";
import { DONE, ending } from "./faults.ts";
import type { Io } from "./io.ts";
import { once, pairOption, repeated, varyOption, workersOption } from "./options.ts";
import { type SweepCall, sweepVerb } from "./sweep.ts";
import { type TracksCall, tracksVerb } from "./tracks.ts";
import { version } from "./version.ts";

/**
 * The terminal program.
 *
 * @param argv - What was typed after the program's name.
 * @returns The exit code: 0 done, 1 a requirement is not met, 2 input or call is wrong, 130 stopped.
 */
export async function run(argv: readonly string[], io: Io): Promise<number> {
  let code = DONE;
  const texts: Promise<void>[] = [];
  try {
    const spanwright = commands(io, texts, (given) => {
      code = given;
    });
    await spanwright.parseAsync(argv, { from: "user" });
    await Promise.all(texts);
    return code;
  } catch (error) {
    const end = ending(error);
    for (const line of end.lines) io.err(`spanwright: ${oneLine(line)}\n`);
    await Promise.allSettled(texts);
    return end.code;
  }
}

function commands(io: Io, texts: Promise<void>[], ended: (code: number) => void): Command {
  const spanwright = new Command("spanwright")
    .description("Stations on the ground to baselines, uv tracks, synthesized beam and resolution.")
    .version(version, "-V, --version", "print the version")
    .helpOption("-h, --help", "print this help")
    .commandsGroup("Verbs:")
    .helpCommand("help [verb]", "print the help of a verb")
    .usage("VERB PLAN [options]")
    .exitOverride()
    .configureHelp({ helpWidth: 100 })
    .configureOutput({
      writeOut: (text) => {
        texts.push(io.out(text));
      },
      writeErr: (text) => io.err(text),
      outputError: (text, write) => write(`spanwright: ${oneLine(inOurWords(text))}\n`),
    })
    .addHelpText(
      "after",
      "\nPLAN is a *.plan.json file. Results go to stdout, progress and warnings to stderr. `spanwright VERB --help` tells more.",
    )
    .addHelpText(
      "after",
      "Exit codes: 0 done, 1 a requirement is not met (assess --require), 2 the input or the call is wrong, 130 stopped.",
    );

  const verb = (name: string, description: string, example: string): Command =>
    spanwright
      .command(name)
      .description(description)
      .argument("<plan>", "plan file")
      .usage("PLAN [options]")
      .addHelpText("after", `\nExample:\n  ${example}`);
  const layout = (): Option => once("--layout <id>", "layout; the plan's first when none is named");
  const observation = (): Option => once("--observation <id>", "observation; the plan's first when none is named");

  verb(
    "assess",
    "All results for each layout and observation, as a table.",
    "spanwright assess ridge.plan.json --layout wide --require",
  )
    .addOption(repeated("--layout <id>", "only this layout; may be repeated"))
    .addOption(repeated("--observation <id>", "only this observation; may be repeated"))
    .option("--json", "print the results as JSON")
    .option("--require", "judge the plan's requirements and print the ledger (on stderr with --json); exit 1 when one is not met")
    .addOption(pairOption())
    .addOption(workersOption())
    .action(async (path: string, call: AssessCall) => ended(await assessVerb(io, path, call)));

  verb(
    "beam",
    "The synthesized beam of one layout and observation, in files.",
    "spanwright beam ridge.plan.json --layout wide --fits beam.fits --png beam.png",
  )
    .addOption(layout())
    .addOption(observation())
    .addOption(once("--fits <file>", "image with sky coordinates (FITS)"))
    .addOption(once("--png <file>", "picture, north up, east left"))
    .addOption(once("--csv <file>", "cuts along the fitted major and minor axes"))
    .addOption(new Option("--theme <name>", "colours of the picture").choices(["light", "dark"]).default("light"))
    .action(async (path: string, call: BeamCall) => ended(await beamVerb(io, path, call)));

  verb(
    "tracks",
    "The uv samples at the centre frequency, as CSV.",
    "spanwright tracks ridge.plan.json --observation south --csv tracks.csv",
  )
    .addOption(layout())
    .addOption(observation())
    .addOption(once("--csv <file>", "where to write; stdout when left out"))
    .option("--raw", "also the samples that do not count, with the reason in a column of its own")
    .action(async (path: string, call: TracksCall) => ended(await tracksVerb(io, path, call)));

  verb(
    "sweep",
    "The results of one layout and observation along one axis, as CSV.",
    "spanwright sweep ridge.plan.json --vary declination=-60:30:5 --out sweep.csv",
  )
    .addOption(layout())
    .addOption(observation())
    .addOption(varyOption())
    .addOption(pairOption())
    .addOption(workersOption())
    .option("--json", "JSON in place of CSV")
    .addOption(once("--out <file>", "where to write; stdout when left out"))
    .addHelpText(
      "after",
      `  spanwright sweep ridge.plan.json --vary frequency=1GHz:2GHz:100MHz

Axes: declination in degrees (-60, -45d30m); wavelength and frequency with their units (21cm, 1.42GHz), the bandwidth
keeping its ratio to the frequency; hours, the length of the window about its middle (8, 3h30m).`,
    )
    .action(async (path: string, call: SweepCall) => ended(await sweepVerb(io, path, call)));

  return spanwright;
}

/** Commander's messages, with our word for a command and the verbs there are. */
const inOurWords = (text: string): string =>
  text
    .trim()
    .replace(/^error: /, "")
    .replace(/^unknown command ('.*')/, "unknown verb $1; expected one of assess, beam, tracks, sweep.")
    .replace(/^missing required argument 'plan'$/, "the plan file is missing: spanwright VERB PLAN [options]");

/** A message on one line: whatever would break it or move the cursor is escaped. */
const oneLine = (text: string): string =>
  text.replaceAll("\n", " ").replace(/\p{Cc}/gu, (c) => `\\u${c.charCodeAt(0).toString(16).padStart(4, "0")}`);
