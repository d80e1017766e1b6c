import { DomainError } from "../../base/errors.ts";

/** A Julian date in two parts: midnight, and the fraction of the day since. */
export interface JulianDate {
  readonly day: number;
  readonly frac: number;
}

const ISO = /^(\d{4})-(\d{2})-(\d{2})[T ](\d{2}):(\d{2})(?::(\d{2}(?:\.\d+)?))?(Z|[+-]\d{2}:?\d{2})?$/;

/**
 * A UTC time as a Julian date. Without a zone it is UTC. Leap seconds are not counted: a day has 86 400 s.
 *
 * @throws {@link DomainError} for a text that is no time or a date the calendar does not have.
 */
export function isoToJulian(text: string): JulianDate {
  const match = ISO.exec(text.trim());
  const parts = match?.slice(1, 7).map((x) => Number(x ?? 0)) ?? [];
  const [year, month, day, hour, minute, second] = parts;
  const days = match ? Date.UTC(year, month - 1, day) / 86_400_000 : Number.NaN;
  const real = match !== null && new Date(days * 86_400_000).getUTCDate() === day && month >= 1 && month <= 12;
  if (!real || hour > 23 || minute > 59 || !(second < 61))
    throw new DomainError("time", text, "a UTC time such as 2027-03-21T18:00:00Z");
  const zone = match[7];
  const minutes = zone && zone !== "Z" ? Number(`${zone[0]}1`) * (Number(zone.slice(1, 3)) * 60 + Number(zone.slice(-2))) : 0;
  const frac = (hour * 3600 + (minute - minutes) * 60 + second) / 86_400;
  const whole = Math.floor(frac);
  // 1970 January 1, 0 h is JD 2440587.5.
  return { day: 2_440_587.5 + days + whole, frac: frac - whole };
}
