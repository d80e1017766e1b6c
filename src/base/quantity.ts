import { SPEED_OF_LIGHT } from "./constants.ts";
import { DomainError } from "./errors.ts";

/*
 * Quantities as people type them. Signs may be + - or −. A comma is a decimal comma, except before exactly three digits, where
 * it might part thousands and is refused. Every function throws a DomainError that names the field, the text and what is
 * allowed, with an example.
 */

// Maps, not objects: `constructor` is no unit.
const LENGTHS: ReadonlyMap<string, number> = new Map([
  ["nm", 1e-9],
  ["um", 1e-6],
  ["µm", 1e-6],
  ["μm", 1e-6],
  ["mm", 1e-3],
  ["cm", 1e-2],
  ["dm", 0.1],
  ["m", 1],
  ["km", 1e3],
]);
const FREQUENCIES: ReadonlyMap<string, number> = new Map([
  ["hz", 1],
  ["khz", 1e3],
  ["mhz", 1e6],
  ["ghz", 1e9],
  ["thz", 1e12],
]);
/** Units in one degree. Marks that keyboards and word processors put in the place of primes are made primes before. */
const PARTS_OF_DEGREE: ReadonlyMap<string, number> = new Map([
  ["uas", 3.6e9],
  ["µas", 3.6e9],
  ["μas", 3.6e9],
  ["mas", 3.6e6],
  ["arcsec", 3600],
  ["″", 3600],
  ["arcmin", 60],
  ["′", 60],
  ["°", 1],
  ["d", 1],
  ["deg", 1],
  ["degree", 1],
  ["degrees", 1],
  ["rad", Math.PI / 180],
]);

/** A bare number. */
export function parseNumber(text: string, field = "number"): number {
  const { sign, rest } = signed(text);
  return sign * (numeric(rest) ?? refuse(field, text, "a number such as 1.5"));
}

/** A frequency in hertz, from `1.42GHz` or from a wavelength such as `21cm`. A bare number has no meaning here. */
export function parseFrequencyHz(text: string, field = "frequency"): number {
  const expected = "a frequency or wavelength with its unit, such as 1.42GHz or 21cm";
  const { value, unit } = withUnit(text) ?? refuse(field, text, expected);
  const metres = lengthUnit(unit);
  return positive(
    metres === undefined ? value * (frequencyUnit(unit) ?? Number.NaN) : SPEED_OF_LIGHT / (value * metres),
    field,
    text,
    expected,
  );
}

/** A wavelength in metres, from `21cm` or from a frequency such as `1.42GHz`. */
export function parseWavelengthM(text: string, field = "wavelength"): number {
  const expected = "a wavelength or frequency with its unit, such as 21cm or 1.42GHz";
  const { value, unit } = withUnit(text) ?? refuse(field, text, expected);
  const metres = lengthUnit(unit);
  return positive(
    metres === undefined ? SPEED_OF_LIGHT / (value * (frequencyUnit(unit) ?? Number.NaN)) : value * metres,
    field,
    text,
    expected,
  );
}

/** A bandwidth in hertz, such as `160MHz`: a width of band has no wavelength. */
export function parseBandwidthHz(text: string, field = "bandwidth"): number {
  const expected = "a bandwidth with its unit, such as 160MHz";
  const { value, unit } = withUnit(text) ?? refuse(field, text, expected);
  return positive(value * (frequencyUnit(unit) ?? Number.NaN), field, text, expected);
}

/** A length in metres, from `35m`, `1.2 km` or `-0.5km`. */
export function parseLengthM(text: string, field = "length"): number {
  const expected = "a length with its unit, such as 35m or 1.2km";
  const { value, unit } = withUnit(text) ?? refuse(field, text, expected);
  return value * (lengthUnit(unit) ?? refuse(field, text, expected));
}

/**
 * An angle in degrees: `-45`, `-45deg`, `-45°`, `-45d12m`, `-45d12m30s`, `-30:15`, `-30:15:20`, `-30° 15′ 20″`, `1.2arcsec`,
 * `3arcmin`, `20mas`. The sign stands before the whole of it, so that −0d15m is negative.
 */
export function parseAngleDeg(text: string, field = "angle"): number {
  const expected = "an angle such as -45, -45d12m, -30:15:20 or 1.2arcsec";
  const { sign, rest } = signed(text.replaceAll(/''|["”]/g, "″").replaceAll(/['’]/g, "′"));
  const single = /^([\d.,]+(?:e[+-]?\d+)?)\s*([a-zµμ″′°]+)?$/i.exec(rest);
  const value = single ? numeric(single[1]) : undefined;
  const parts = PARTS_OF_DEGREE.get(single?.[2]?.toLowerCase() ?? "°");
  if (value !== undefined && parts !== undefined) return (sign * value) / parts;
  const found =
    /^(\d+):(\d+(?:\.\d+)?)(?::(\d+(?:\.\d+)?))?$/.exec(rest) ??
    /^(\d+)\s*[d°]\s*(\d+(?:\.\d+)?)\s*(?:[m′]\s*(?:(\d+(?:\.\d+)?)\s*[s″]?)?)?$/i.exec(rest);
  return sign * sixtieths(found, field, text, expected);
}

/** An angle in arcseconds; a bare number is taken as degrees, as in `parseAngleDeg`. */
export function parseAngleArcsec(text: string, field = "angle"): number {
  return parseAngleDeg(text, field) * 3600;
}

/** Hours: `3.5`, `3.5h`, `3h30m`, `4h30m15s`, `-4h`, `3:30`, `3:30:15`. The sign stands before the whole of it. */
export function parseHours(text: string, field = "hours"): number {
  const { sign, rest } = signed(text);
  const value = numeric(rest.replace(/\s*h$/i, ""));
  if (value !== undefined) return sign * value;
  const found =
    /^(\d+):(\d+(?:\.\d+)?)(?::(\d+(?:\.\d+)?))?$/.exec(rest) ??
    /^(\d+)\s*h\s*(\d+(?:\.\d+)?)\s*(?:m(?:in)?\s*(?:(\d+(?:\.\d+)?)\s*s?)?)?$/i.exec(rest);
  return sign * sixtieths(found, field, text, "hours such as 3.5, 3h30m or -4h");
}

/** Whole, sixtieths and their sixtieths; only the last one given may have a fraction. */
function sixtieths(found: RegExpExecArray | null, field: string, text: string, expected: string): number {
  const [, whole, minutes, seconds] = found ?? refuse(field, text, expected);
  if (seconds !== undefined && minutes.includes(".")) return refuse(field, text, `${expected}, with whole minutes before seconds`);
  if (!(Number(minutes) < 60 && Number(seconds ?? 0) < 60))
    return refuse(field, text, `${expected}, with minutes and seconds below 60`);
  // One division, so that 6 minutes are 0.1.
  return (Number(whole) * 3600 + Number(minutes) * 60 + Number(seconds ?? 0)) / 3600;
}

function signed(text: string): { readonly sign: 1 | -1; readonly rest: string } {
  const trimmed = text.trim();
  const match = /^[+\-−]\s*/.exec(trimmed);
  return { sign: match && match[0][0] !== "+" ? -1 : 1, rest: match ? trimmed.slice(match[0].length) : trimmed };
}

/** A number without a sign. */
function numeric(text: string): number | undefined {
  if (!/^(\d+([.,]\d*)?|[.,]\d+)(e[+-]?\d+)?$/i.test(text) || /^[1-9]\d{0,2},\d{3}$/.test(text)) return undefined;
  const value = Number(text.replace(",", "."));
  return Number.isFinite(value) ? value : undefined;
}

function withUnit(text: string): { readonly value: number; readonly unit: string } | undefined {
  const { sign, rest } = signed(text);
  const match = /^(.*?\d[.,]?)\s*([a-zµμ]+)$/i.exec(rest);
  const value = match ? numeric(match[1]) : undefined;
  return match && value !== undefined ? { value: sign * value, unit: match[2] } : undefined;
}

/** Any mixture of cases, but for the two where case makes a unit a billion times another. */
const lengthUnit = (unit: string): number | undefined => (unit === "Mm" ? undefined : LENGTHS.get(unit.toLowerCase()));
const frequencyUnit = (unit: string): number | undefined => (unit === "mHz" ? undefined : FREQUENCIES.get(unit.toLowerCase()));

function positive(value: number, field: string, text: string, expected: string): number {
  return value > 0 && Number.isFinite(value) ? value : refuse(field, text, expected);
}

function refuse(field: string, text: string, expected: string): never {
  throw new DomainError(field, text, expected);
}
