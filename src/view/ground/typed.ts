import { DomainError } from "../../base/errors.ts";

const NUMBER = String.raw`[-−]?\d*\.?\d+(?:[eE][-+]?\d+)?`;
const LENGTH = new RegExp(String.raw`^(\+)?\s*(${NUMBER})\s*(km|m)?$`, "i");

/**
 * A typed length in metres. A plain number is in the field's unit; `m` and `km` may follow. A leading plus moves from the
 * current value: `+0.5km`, and `+-0.5km` the other way; a leading minus is a negative value.
 *
 * @throws {@link DomainError} for what is no length.
 */
export function typedLength(text: string, currentM: number, unit: "km" | "m", name: string): number {
  const match = LENGTH.exec(text.trim());
  const figure = match ? Number(match[2].replace("−", "-")) : Number.NaN;
  const size = (match?.[3]?.toLowerCase() ?? unit) === "km" ? 1000 : 1;
  const metres = figure * size + (match?.[1] ? currentM : 0);
  if (Number.isFinite(metres)) return metres;
  throw new DomainError(
    name,
    text,
    unit === "km" ? "kilometres such as 16.149, 850 m or +0.5km" : "metres such as 2402, 1.2 km or +10",
  );
}

// Small d, m and s are units, capital S is south: `12 S` and `12s` mean different things.
const PARTS =
  /^([-+−]?)\s*(\d*\.?\d+)(?:\s*[°d:\s]\s*(\d*\.?\d+)(?:\s*[′'m:\s]\s*(\d*\.?\d+))?\s*(?:[′'m″"s]|'')?)?\s*[°d]?\s*([NSEWnew])?$/;

/**
 * A typed latitude or longitude in degrees: decimal (`-31.62`, `31.62 S`) or with minutes and seconds (`-31:37:12`,
 * `31°37′12″ S`, `31d37m12s`). Longitudes past 180° come back as the same meridian in (−180, 180].
 *
 * @throws {@link DomainError} for what is no such angle or out of its range.
 */
export function typedAngle(text: string, axis: "Latitude" | "Longitude"): number {
  const [limit, letters, example] =
    axis === "Latitude"
      ? [90, "NS", "degrees in [−90, 90] such as −31.62 or 31:37:12 S"]
      : [360, "EW", "degrees in [−180, 180] such as −66.94 or 66:56:24 W"];
  const match = PARTS.exec(text.trim());
  const [, sign = "", whole = "", minutes = "0", seconds = "0", letter = ""] = match ?? [];
  const side = letter.toUpperCase();
  const size = Number(whole) + Number(minutes) / 60 + Number(seconds) / 3600;
  const sided = side === "" || (letters.includes(side) && sign === "");
  if (!match || !sided || !(Number(minutes) < 60) || !(Number(seconds) < 60) || !(size <= limit))
    throw new DomainError(axis, text, example);
  const value = sign === "-" || sign === "−" || side === "S" || side === "W" ? -size : size;
  return axis === "Longitude" && (value > 180 || value <= -180) ? value - Math.ceil((value - 180) / 360) * 360 : value;
}
