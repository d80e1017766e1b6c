import * as v from "valibot";
import { MOST_FAULTS } from "./faults.ts";

/*
 * The kinds of field a plan has. Each says in words what it allows, once, and gives the same words for every way of being wrong:
 * a value of another type, one that is out of range, one that is missing. The words go on from "expected".
 */

/** A finite number in [least, most]. */
export const ranged = (least: number, most: number, what: string) =>
  v.pipe(v.number(what), v.finite(what), v.minValue(least, what), v.maxValue(most, what));

/** A finite number above 0 and at most `most`. */
export function positive(most: number, what: string, unit = "") {
  const words = `${what} above 0 and at most ${most}${unit === "" ? "" : ` ${unit}`}`;
  return v.pipe(v.number(words), v.finite(words), v.gtValue(0, words), v.maxValue(most, words));
}

/** A whole number in [least, most]. */
export function whole(least: number, most: number) {
  const words = `a whole number in [${least}, ${most}]`;
  return v.pipe(v.number(words), v.integer(words), v.minValue(least, words), v.maxValue(most, words));
}

/** A text of at most so many characters. */
export function text(most: number) {
  const words = `a text of at most ${most} characters`;
  return v.pipe(v.string(words), v.maxLength(most, words));
}

/** One of a few values. */
export const oneOf = <const T extends readonly (string | number)[]>(values: T) =>
  v.picklist(values, values.map((value) => JSON.stringify(value)).join(" or "));

/** A list of anything but plain numbers. Once there are as many faults as are looked for, the rest of it is not looked at. */
export function list<T extends v.GenericSchema>(item: T, what: string) {
  const schema = v.array(item, what);
  type Run = (typeof schema)["~run"];
  const run: Run = (dataset, config) => {
    const given = dataset.value;
    if (!Array.isArray(given)) return schema["~run"](dataset, config);
    const items: unknown[] = [];
    const issues: v.BaseIssue<unknown>[] = [];
    let typed = true;
    for (let key = 0; key < given.length && issues.length < MOST_FAULTS; key++) {
      const one = item["~run"]({ value: given[key] }, config);
      const at = { type: "array", origin: "value", input: given, key, value: given[key] } as const;
      for (const issue of one.issues ?? []) issues.push({ ...issue, path: [at, ...(issue.path ?? [])] });
      typed &&= one.typed === true;
      items.push(one.value);
    }
    return { typed, value: items, issues: issues.length > 0 ? issues : undefined } as ReturnType<Run>;
  };
  return { ...schema, "~run": run };
}

/** Something that may be null or left out, which is the same: the program chooses. */
export const orNull = <T extends v.GenericSchema>(schema: T) => v.optional(v.nullable(schema), null);

/** An object. Keys it does not know are kept. */
export function record<T extends v.ObjectEntries>(entries: T) {
  const schema = v.looseObject(entries, (issue) => {
    // An object that lacks a key is reported with the key as path, one that is none with no path.
    const key = issue.path?.[0].key;
    return typeof key === "string" && Object.hasOwn(entries, key) ? wordsOf(entries[key]) : "an object";
  });
  type Run = (typeof schema)["~run"];
  const run: Run = (dataset, config) =>
    // valibot takes a list for an object without keys, and would fill the defaults in.
    Array.isArray(dataset.value) ? (noObject["~run"](dataset, config) as ReturnType<Run>) : schema["~run"](dataset, config);
  return { ...schema, "~run": run };
}

const noObject: v.GenericSchema<unknown> = v.custom<unknown>(() => false, "an object");

/** What a schema allows: the words it has for a value that is missing. */
function wordsOf(schema: v.ObjectEntries[string]): string {
  const result = v.safeParse(schema as v.GenericSchema, undefined);
  return result.success ? "a value" : result.issues[0].message;
}
