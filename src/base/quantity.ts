import { SPEED_OF_LIGHT } from "./constants.ts";
import { DomainError } from "./errors.ts";

/*
 * Quantities as people type them. Signs may be + - or −; a comma between digits of a plain number is a decimal comma.
 * Every function throws a DomainError that names the field, the text and what is allowed, with an example.
 */

const LENGTHS: { readonly [unit: string]: number } = {
  nm: 1e-9,
  um: 1e-6,
  µm: 1e-6,
  μm: 1e-6,
  mm: 1e-3,
  cm: 1e-2,
  dm: 0.1,
  m: 1,
  km: 1e3,
};
const FREQUENCIES: { readonly [unit: string]: number } = { hz: 1, khz: 1e3, mhz: 1e6, ghz: 1e9, thz: 1e12 };

/** A bare number. */
export function parseNumber(text: string, field = "number"): number {
  return numeric(text) ?? refuse(field, text, "a number such as 1.5");
}

/** A frequency in hertz, from `1.42GHz` or from a wavelength such as `21cm`. A bare number has no meaning here. */
export function parseFrequencyHz(text: string, field = "frequency"): number {
  const expected = "a frequency or wavelength with its unit, such as 1.42GHz or 21cm";
  const { value, unit } = withUnit(text) ?? refuse(field, text, expected);
  const hertz = FREQUENCIES[unit.toLowerCase()];
  const metres = LENGTHS[unit] ?? LENGTHS[unit.toLowerCase()];
  const found = hertz !== undefined ? value * hertz : metres !== undefined ? SPEED_OF_LIGHT / (value * metres) : Number.NaN;
  return found > 0 && Number.isFinite(found) ? found : refuse(field, text, expected);
}

/** A wavelength in metres, from `21cm` or from a frequency such as `1.42GHz`. */
export function parseWavelengthM(text: string, field = "wavelength"): number {
  const { value, unit } = withUnit(text) ?? refuse(field, text, "a wavelength or frequency with its unit, such as 21cm or 1.42GHz");
  const metres = LENGTHS[unit] ?? LENGTHS[unit.toLowerCase()];
  if (metres !== undefined && value > 0) return value * metres;
  return SPEED_OF_LIGHT / parseFrequencyHz(text, field);
}

/** A length in metres, from `35m`, `1.2 km` or `-0.5km`. */
export function parseLengthM(text: string, field = "length"): number {
  const expected = "a length with its unit, such as 35m or 1.2km";
  const { value, unit } = withUnit(text) ?? refuse(field, text, expected);
  const metres = LENGTHS[unit] ?? LENGTHS[unit.toLowerCase()];
  return metres === undefined ? refuse(field, text, expected) : value * metres;
}

/**
 * An angle in degrees: `-45`, `-45deg`, `-45°`, `-45d12m`, `-45d12m30s`, `-30:15`, `-30:15:20`, `-30° 15′ 20″`, `1.2arcsec`,
 * `3arcmin`, `20mas`. The sign stands before the whole of it, so that −0d15m is negative.
 */
export function parseAngleDeg(text: string, field = "angle"): number {
  const expected = "an angle such as -45, -45d12m, -30:15:20 or 1.2arcsec";
  const { sign, rest } = signed(text);
  const plain = numeric(rest);
  if (plain !== undefined) return sign * plain;
  const small = /^([\d.]+(?:e[+-]?\d+)?)\s*(arcsec|"|″|arcmin|'|′|mas|deg|degrees?|°|rad)$/i.exec(rest);
  if (small) {
    const value = numeric(small[1]);
    if (value !== undefined) return sign * value * ANGLES[small[2].toLowerCase()];
  }
  const parts = /^(\d+)\s*(?:d|°|:)\s*(\d+(?:\.\d+)?)\s*(?:(?:m|′|'|:)\s*(?:(\d+(?:\.\d+)?)\s*(?:s|″|")?)?)?$/i.exec(rest);
  if (!parts) return refuse(field, text, expected);
  return sign * sexagesimal(parts, field, text, expected);
}

/** An angle in arcseconds; a bare number is taken as degrees, as in `parseAngleDeg`. */
export function parseAngleArcsec(text: string, field = "angle"): number {
  return parseAngleDeg(text, field) * 3600;
}

/** Hours: `3.5`, `3.5h`, `3h30m`, `4h30m15s`, `-4h`, `3:30`. */
export function parseHours(text: string, field = "hours"): number {
  const expected = "hours such as 3.5, 3h30m or -4h";
  const { sign, rest } = signed(text);
  const plain = numeric(rest.replace(/\s*h$/i, ""));
  if (plain !== undefined) return sign * plain;
  const parts = /^(\d+)\s*(?:h|:)\s*(\d+(?:\.\d+)?)\s*(?:(?:m|:)\s*(?:(\d+(?:\.\d+)?)\s*s?)?)?$/i.exec(rest);
  return parts ? sign * sexagesimal(parts, field, text, expected) : refuse(field, text, expected);
}

const ANGLES: { readonly [unit: string]: number } = {
  mas: 1 / 3.6e6,
  arcsec: 1 / 3600,
  '"': 1 / 3600,
  "″": 1 / 3600,
  arcmin: 1 / 60,
  "'": 1 / 60,
  "′": 1 / 60,
  deg: 1,
  degree: 1,
  degrees: 1,
  "°": 1,
  rad: 180 / Math.PI,
};

function sexagesimal(parts: RegExpExecArray, field: string, text: string, expected: string): number {
  const [whole, minutes, seconds] = parts.slice(1).map((x) => Number(x ?? 0));
  if (!(minutes < 60 && seconds < 60)) return refuse(field, text, `${expected}, with minutes and seconds below 60`);
  return whole + minutes / 60 + seconds / 3600;
}

function signed(text: string): { sign: 1 | -1; rest: string } {
  const trimmed = text.trim();
  const match = /^([+\-−])\s*/.exec(trimmed);
  return { sign: match && match[1] !== "+" ? -1 : 1, rest: match ? trimmed.slice(match[0].length) : trimmed };
}

function numeric(text: string): number | undefined {
  const { sign, rest } = signed(text);
  if (!/^(\d+([.,]\d*)?|[.,]\d+)(e[+-]?\d+)?$/i.test(rest)) return undefined;
  const value = sign * Number(rest.replace(",", "."));
  return Number.isFinite(value) ? value : undefined;
}

function withUnit(text: string): { value: number; unit: string } | undefined {
  const match = /^(.*?\d[.,]?)\s*([a-zµμ]+)$/i.exec(text.trim());
  const value = match ? numeric(match[1]) : undefined;
  return match && value !== undefined ? { value, unit: match[2] } : undefined;
}

function refuse(field: string, text: string, expected: string): never {
  throw new DomainError(field, text, expected);
}
