import { PlanFaults } from "./faults.ts";
import { jsonFault } from "./jsonfault.ts";

/** Largest plan file, bytes. */
export const MOST_BYTES = 64 * 1024 * 1024;
/** Deeper nesting than any plan has: JSON.parse recurses, and a file of brackets would exhaust its stack. */
const DEEPEST = 64;

/** @throws {@link PlanFaults} for a file that is too large to be a plan. */
export function checkPlanSize(bytes: number): void {
  if (bytes > MOST_BYTES) fault(`${bytes} bytes long`, "at most 64 MiB");
}

/**
 * JSON text to plain values.
 *
 * @throws {@link PlanFaults} with one fault: too large, nested too deeply, or not JSON, with line and column.
 */
export function parseJson(text: string): unknown {
  checkPlanSize(text.length);
  const body = text.charCodeAt(0) === 0xfeff ? text.slice(1) : text;
  const depth = nesting(body);
  if (depth > DEEPEST) fault(`nested ${depth} deep`, `at most ${DEEPEST} levels of brackets`);
  try {
    return JSON.parse(body);
  } catch (error) {
    const wrong = jsonFault(body);
    if (!wrong) throw error;
    return fault(`not JSON: ${place(body, wrong.offset)}`, wrong.expected);
  }
}

function fault(found: string, expected: string): never {
  throw new PlanFaults([{ path: "the file", value: undefined, found, expected }]);
}

/** Deepest nesting of brackets outside strings; counts no further than it must. */
function nesting(text: string): number {
  let depth = 0;
  let deepest = 0;
  let inString = false;
  for (let k = 0; k < text.length; k++) {
    const c = text.charCodeAt(k);
    if (inString) {
      if (c === 92) k++;
      else if (c === 34) inString = false;
    } else if (c === 34) inString = true;
    else if (c === 91 || c === 123) deepest = Math.max(deepest, ++depth);
    else if (c === 93 || c === 125) depth--;
  }
  return deepest;
}

/** `line 2, column 15, at ","`, or `…, where it ends`. Columns count characters from 1. */
function place(text: string, offset: number): string {
  let line = 1;
  let column = 1;
  for (let k = 0; k < offset; k++) {
    const c = text.charCodeAt(k);
    if (c === 10 || (c === 13 && text.charCodeAt(k + 1) !== 10)) {
      line++;
      column = 1;
    } else if (c !== 13 && (c & 0xfc00) !== 0xdc00) column++; // the second half of a surrogate pair is no character of its own
  }
  const here = text.codePointAt(offset);
  const at = here === undefined ? "where it ends" : `at ${JSON.stringify(String.fromCodePoint(here))}`;
  return `line ${line}, column ${column}, ${at}`;
}
