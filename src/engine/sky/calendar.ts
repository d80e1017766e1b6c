import { DomainError } from "../../base/errors.ts";

/** A Julian date in two parts whose sum it is. `isoToJulian` puts the first at midnight and the second in [0, 1). */
export interface JulianDate {
  readonly day: number;
  readonly frac: number;
}

const ISO = /^(\d{4})-(\d\d)-(\d\d)[T ](\d\d):(\d\d)(?::(\d\d(?:\.\d+)?))?(?:Z|([+-])(\d\d)(?::?(\d\d))?)?$/;
const WANTED = "a UTC time such as 2027-03-21T18:00:00Z";

/**
 * A time written after ISO 8601 as a Julian date UTC.
 *
 * @param text - Date and time of the Gregorian calendar, years 0000 to 9999, seconds optional; UTC unless an offset follows.
 * @returns Days of 86 400 s: a leap second, 23:59:60 UTC, is read as the start of the next day.
 * @throws {@link DomainError} for a text that is no time, or a date or time the calendar does not have.
 */
export function isoToJulian(text: string): JulianDate {
  const match = ISO.exec(text);
  if (!match) throw new DomainError("time", text, WANTED);
  const [year, month, day, hour, minute, second, , offsetHour, offsetMinute] = match.slice(1).map((part) => Number(part ?? 0));
  if (month < 1 || month > 12 || day < 1 || day > daysIn(year, month)) {
    throw new DomainError("time", text, "a date the calendar has", "Is the order year, month, day?");
  }
  if (hour > 23 || minute > 59 || offsetHour > 23 || offsetMinute > 59) throw new DomainError("time", text, WANTED);
  const minutes = hour * 60 + minute - (match[7] === "-" ? -1 : 1) * (offsetHour * 60 + offsetMinute);
  const lastOfDay = (minutes + 1) % 1440 === 0;
  if (!(second < (lastOfDay ? 61 : 60))) throw new DomainError("time", text, "seconds below 60, or below 61 at 23:59 UTC");
  const shift = Math.floor(minutes / 1440);
  const inDay = (minutes - 1440 * shift) * 60 + second;
  const spill = inDay >= 86_400 ? 1 : 0;
  return { day: dayNumber(year, month, day) - 0.5 + shift + spill, frac: (inDay - 86_400 * spill) / 86_400 };
}

/**
 * A Julian date UTC written after ISO 8601, as `2027-03-21T18:00:00Z`.
 *
 * @param decimals - Of the seconds, 0 to 9; rounded to nearest.
 * @throws {@link DomainError} for a date outside the years 0000 to 9999.
 */
export function julianToIso({ day, frac }: JulianDate, decimals = 0): string {
  const unitsPerDay = 86_400 * 10 ** decimals;
  const start = Math.floor(day + 0.5);
  const units = Math.round((day + 0.5 - start + frac) * unitsPerDay);
  const shift = Math.floor(units / unitsPerDay);
  const inDay = units - shift * unitsPerDay;
  const [year, month, date] = calendarDate(start + shift);
  if (!(year >= 0 && year <= 9999)) throw new DomainError("day", day, "a Julian date in the years 0000 to 9999");
  const seconds = Math.floor(inDay / 10 ** decimals);
  const fraction = decimals > 0 ? `.${padded(inDay - seconds * 10 ** decimals, decimals)}` : "";
  const clock = [Math.floor(seconds / 3600), Math.floor(seconds / 60) % 60, seconds % 60].map((x) => padded(x, 2)).join(":");
  return `${padded(year, 4)}-${padded(month, 2)}-${padded(date, 2)}T${clock}${fraction}Z`;
}

/** Julian day number of a date of the Gregorian calendar (Fliegel & Van Flandern, Comm. ACM 11 (1968) 657): JD at its noon. */
function dayNumber(year: number, month: number, day: number): number {
  const a = Math.trunc((month - 14) / 12);
  const years = Math.trunc((1461 * (year + 4800 + a)) / 4);
  const months = Math.trunc((367 * (month - 2 - 12 * a)) / 12);
  const leaps = Math.trunc((3 * Math.trunc((year + 4900 + a) / 100)) / 4);
  return day - 32_075 + years + months - leaps;
}

/** The date of a Julian day number: the inverse of `dayNumber`, from the same note. */
function calendarDate(number: number): readonly [year: number, month: number, day: number] {
  let l = number + 68_569;
  const n = Math.trunc((4 * l) / 146_097);
  l -= Math.trunc((146_097 * n + 3) / 4);
  const i = Math.trunc((4000 * (l + 1)) / 1_461_001);
  l += 31 - Math.trunc((1461 * i) / 4);
  const j = Math.trunc((80 * l) / 2447);
  const k = Math.trunc(j / 11);
  return [100 * (n - 49) + i + k, j + 2 - 12 * k, l - Math.trunc((2447 * j) / 80)];
}

function daysIn(year: number, month: number): number {
  const [nextYear, nextMonth] = month === 12 ? [year + 1, 1] : [year, month + 1];
  return dayNumber(nextYear, nextMonth, 1) - dayNumber(year, month, 1);
}

function padded(x: number, width: number): string {
  return String(x).padStart(width, "0");
}
