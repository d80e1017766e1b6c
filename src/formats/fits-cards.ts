import { DomainError } from "../base/errors.ts";
import { asciiText } from "./ascii.ts";

/** One entry of a FITS header. A number that is an integer by nature is given as a bigint; other numbers are written as reals. */
export type FitsEntry =
  | { readonly key: string; readonly value: string | number | bigint | boolean; readonly comment?: string }
  | { readonly key: "COMMENT" | "HISTORY"; readonly text: string };

/** Characters of a card, and of a string value inside its quotes on one card. */
const CARD = 80;
const LONGEST_STRING = 68;
const NUMBER_WIDTH = 20;

/**
 * The cards of one entry, 80 ASCII characters each: one, or several where a string or a comment does not fit.
 *
 * Values stand in fixed format: numbers end in column 30, strings open in column 11 and are at least 8 characters long.
 * Long strings use CONTINUE, commentary is broken between words. Apostrophes are doubled, other characters made ASCII.
 *
 * Source: FITS Standard 4.0 (IAU FITS Working Group, 2018), §4.1, §4.2, §4.2.1.2; Pence et al. 2010, A&A 524, A42.
 *
 * @throws {@link DomainError} for a keyword that is not 1 to 8 of A–Z, 0–9, - and _, or a number that is not finite.
 */
export function fitsCards(entry: FitsEntry): readonly string[] {
  if (!/^[A-Z0-9_-]{1,8}$/.test(entry.key)) throw new DomainError("key", entry.key, "1 to 8 of A-Z, 0-9, - and _");
  const key = entry.key.padEnd(8);
  if ("text" in entry) return wrapped(asciiText(entry.text), CARD - 8).map((line) => (key + line).padEnd(CARD));
  const comment = entry.comment ? ` / ${asciiText(entry.comment)}` : "";
  const { value } = entry;
  if (typeof value === "string") return stringCards(key, asciiText(value).trimEnd(), comment);
  const text =
    typeof value === "boolean" ? (value ? "T" : "F") : typeof value === "bigint" ? String(value) : realText(value, entry.key);
  return [`${key}= ${text.padStart(NUMBER_WIDTH)}${comment}`.slice(0, CARD).padEnd(CARD)];
}

function stringCards(key: string, value: string, comment: string): readonly string[] {
  const pieces = quotedPieces(value);
  if (pieces.length === 1)
    return [`${key}= ${`'${pieces[0].padEnd(8)}'`.padEnd(NUMBER_WIDTH)}${comment}`.slice(0, CARD).padEnd(CARD)];
  const last = pieces.length - 1;
  return pieces.map((piece, k) => {
    const quoted = k < last ? `'${piece}&'` : `'${piece}'${comment}`;
    return `${k === 0 ? `${key}= ` : "CONTINUE  "}${quoted}`.slice(0, CARD).padEnd(CARD);
  });
}

/** The string with apostrophes doubled, cut so that each piece and an ampersand fit on a card. A doubled apostrophe is never cut in two. */
function quotedPieces(value: string): readonly string[] {
  const whole = value.replaceAll("'", "''");
  if (whole.length <= LONGEST_STRING) return [whole];
  const pieces: string[] = [];
  let piece = "";
  for (const character of value) {
    const next = character === "'" ? "''" : character;
    if (piece.length + next.length > LONGEST_STRING - 1) {
      pieces.push(piece);
      piece = "";
    }
    piece += next;
  }
  return [...pieces, piece];
}

/** A real number in at most 20 characters with a decimal point: every digit it has where they fit, at least 13 otherwise. */
function realText(value: number, key: string): string {
  if (!Number.isFinite(value)) throw new DomainError(key, value, "a finite number");
  for (let digits = 17; digits >= 13; digits--) {
    const near = Number(value.toPrecision(digits));
    if (!Number.isFinite(near)) continue;
    const text = [String(near), near.toExponential()].map(withPoint).find((form) => form.length <= NUMBER_WIDTH);
    if (text !== undefined) return text;
  }
  return withPoint(value.toExponential(12));
}

function withPoint(text: string): string {
  const [mantissa, exponent] = text.split("e");
  const pointed = mantissa.includes(".") ? mantissa : `${mantissa}.0`;
  return exponent === undefined ? pointed : `${pointed}E${exponent.replace("+", "")}`;
}

/** Text in lines of at most `width`, broken between words where it can be. */
function wrapped(text: string, width: number): readonly string[] {
  const lines: string[] = [];
  let rest = text.trimEnd();
  while (rest.length > width) {
    const space = rest.lastIndexOf(" ", width);
    const end = space > width / 2 ? space : width;
    lines.push(rest.slice(0, end).trimEnd());
    rest = rest.slice(end).trimStart();
  }
  return [...lines, rest];
}
