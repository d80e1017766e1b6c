import { InvalidArgumentError, Option } from "commander";
import { type SweepAxis, type SweepSpec, sweepValues } from "../assess/sweep.ts";
import { DomainError } from "../base/errors.ts";
import { parseAngleArcsec, parseAngleDeg, parseFrequencyHz, parseHours, parseNumber, parseWavelengthM } from "../base/quantity.ts";
import type { Pair } from "../plan/schema.ts";

/** An option that may stand once. */
export const once = (flags: string, description: string): Option =>
  new Option(flags, description).argParser((value: string, before: string | undefined) => {
    if (before !== undefined) throw new InvalidArgumentError("It is given twice.");
    return value;
  });

/** An option that may stand several times; its values are collected. */
export const repeated = (flags: string, description: string): Option =>
  new Option(flags, description).argParser((value: string, before: readonly string[]) => [...before, value]).default([], "all");

/** `--pair SEP[,PA[,RATIO]]`. */
export const pairOption = (): Option =>
  new Option(
    "--pair <sep,pa,ratio>",
    "two point sources to tell apart: separation (arcsec, or with a unit), position angle (degrees, default 0), flux ratio up to 1 (default 1)",
  ).argParser((text: string) => orInvalid(() => pairOf(text)));

/** `--workers N`. */
export const workersOption = (): Option =>
  new Option("--workers <n>", "threads to work on, 1 to 64; one a processor when left out; the results are the same").argParser(
    (text: string) => {
      const count = Number(text);
      if (!(Number.isInteger(count) && count >= 1 && count <= 64)) {
        throw new InvalidArgumentError("Expected a whole number from 1 to 64.");
      }
      return count;
    },
  );

/** `--vary AXIS=FROM:TO:STEP`. */
export const varyOption = (): Option =>
  new Option("--vary <axis=from:to:step>", "what to vary: declination, wavelength, frequency or hours, both ends included")
    .makeOptionMandatory()
    .argParser((text: string) => orInvalid(() => sweepOf(text)));

/** Commander puts the option and its value in front of the reason. */
function orInvalid<T>(read: () => T): T {
  try {
    return read();
  } catch (error) {
    if (error instanceof DomainError) throw new InvalidArgumentError(error.message);
    throw error;
  }
}

/** @throws {@link DomainError} naming the part that is wrong. */
export function pairOf(text: string): Pair {
  const parts = text.split(",").map((x) => x.trim());
  if (parts.length > 3) throw new DomainError("pair", text, "SEP, SEP,PA or SEP,PA,RATIO, such as 2.5,30,0.5");
  const [separation, angle = "0", ratio = "1"] = parts;
  const plain = /^[+\-−]?[\d.]+(e[+-]?\d+)?$/i.test(separation);
  const separationArcsec = plain ? parseNumber(separation, "separation") : parseAngleArcsec(separation, "separation");
  if (!(separationArcsec > 0)) throw new DomainError("separation", separation, "an angle above 0, such as 2.5 or 20mas");
  const positionAngleDeg = parseAngleDeg(angle, "position angle");
  if (!(Math.abs(positionAngleDeg) <= 360)) throw new DomainError("position angle", angle, "an angle in [-360, 360] degrees");
  const fluxRatio = parseNumber(ratio, "flux ratio");
  if (!(fluxRatio > 0 && fluxRatio <= 1)) throw new DomainError("flux ratio", ratio, "a ratio above 0 and at most 1");
  return { separationArcsec, positionAngleDeg, fluxRatio };
}

interface Axis {
  readonly read: (text: string, field: string) => number;
  /** Column or key that holds the varied value. */
  readonly key: string;
}

export const axes: { readonly [axis in SweepAxis]: Axis } = {
  declination: { read: parseAngleDeg, key: "declinationDeg" },
  wavelength: { read: parseWavelengthM, key: "wavelengthM" },
  frequency: { read: parseFrequencyHz, key: "frequencyHz" },
  hours: { read: parseHours, key: "hours" },
};

/** @throws {@link DomainError} naming the part that is wrong. */
export function sweepOf(text: string): SweepSpec {
  const [axis, range, ...more] = text.split("=");
  if (!Object.hasOwn(axes, axis)) throw new DomainError("axis", axis, `one of ${Object.keys(axes).join(", ")}`);
  const parts = (range ?? "").split(":");
  if (more.length > 0 || parts.length !== 3) {
    throw new DomainError(
      "range",
      range ?? "",
      "FROM:TO:STEP, such as -60:30:5",
      "Write parts of a degree or an hour as -45d12m or 3h30m.",
    );
  }
  const { read } = axes[axis as SweepAxis];
  const [from, to, step] = ["from", "to", "step"].map((field, k) => read(parts[k], field));
  return { axis: axis as SweepAxis, values: sweepValues(from, to, step) };
}
