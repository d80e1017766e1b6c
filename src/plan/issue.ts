import type * as v from "valibot";
import type { Fault } from "./faults.ts";

/** One fault of the schema's, in the project's form. The schema words what is allowed. */
export function issueFault(issue: v.BaseIssue<unknown>): Fault {
  return { path: pathText(issue.path ?? []), value: issue.input, found: lengthFound(issue), expected: issue.message };
}

/** Such as `stations[3].latitudeDeg`. */
function pathText(path: readonly { readonly key?: unknown }[]): string {
  let text = "";
  for (const { key } of path) {
    if (typeof key === "number") text += `[${key}]`;
    else text += text === "" ? String(key) : `.${String(key)}`;
  }
  return text;
}

/** Of what is too long or too short the length is told: quoting a list of thousands would not help. */
function lengthFound({ type, input }: v.BaseIssue<unknown>): string | undefined {
  if (type !== "max_length" && type !== "min_length") return undefined;
  if (Array.isArray(input)) return input.length === 0 ? "empty" : `a list of ${input.length}`;
  return typeof input === "string" ? (input === "" ? "empty" : `${input.length} characters long`) : undefined;
}
