import * as v from "valibot";
import { crossFaults, crossWarnings } from "./cross.ts";
import { type Fault, PlanFaults } from "./faults.ts";
import { migrated } from "./migrate.ts";
import { type Plan, planSchema } from "./schema.ts";
import { parseJson } from "./text.ts";
import { unknownKeys } from "./unknown.ts";

export interface ReadPlan {
  readonly plan: Plan;
  readonly warnings: readonly string[];
}

/**
 * A plan file's text to a plan with every default filled in. Keys the program does not know are kept, and named in a warning.
 *
 * @throws {@link PlanFaults} with every fault of the file, not only the first.
 */
export function readPlan(text: string): ReadPlan {
  return checkedPlan(parseJson(text));
}

/** The same for a document already parsed. */
export function checkedPlan(document: unknown): ReadPlan {
  const current = migrated(document);
  const result = v.safeParse(planSchema, current);
  if (!result.success) throw new PlanFaults(firstOfEach(result.issues.map(issueFault)));
  const faults = crossFaults(result.output);
  if (faults.length > 0) throw new PlanFaults(faults);
  return { plan: result.output, warnings: [...unknownKeys(current), ...crossWarnings(result.output)] };
}

/** One fault a place: infinity is not finite and past every bound, but it is one mistake. */
function firstOfEach(faults: readonly Fault[]): Fault[] {
  const seen = new Set<string>();
  return faults.filter(({ path }) => !seen.has(path) && seen.add(path));
}

function issueFault(issue: v.BaseIssue<unknown>): Fault {
  return { path: pathText(issue), value: issue.input, expected: allowed(issue) };
}

function pathText(issue: v.BaseIssue<unknown>): string {
  let text = "";
  for (const { key } of issue.path ?? []) {
    if (typeof key === "number") text += `[${key}]`;
    else text += text === "" ? String(key) : `.${String(key)}`;
  }
  return text;
}

const TYPES: { readonly [expected: string]: string } = {
  Array: "a list",
  Object: "an object",
  number: "a number",
  string: "a text",
  boolean: "true or false",
};

/** What the schema allows, in words: our own where the schema gives them, else the type or bound. */
function allowed(issue: v.BaseIssue<unknown>): string {
  const requirement = issue.requirement as number | undefined;
  // valibot reports a missing key as an issue of the object that lacks it.
  if (issue.received === "undefined" && issue.type.endsWith("object")) return "a value: it has no default";
  switch (issue.type) {
    case "finite":
      return "a finite number";
    case "integer":
      return "a whole number";
    case "min_value":
    case "gt_value":
    case "max_value":
    case "min_length":
    case "max_length":
      if (!issue.message.startsWith("Invalid")) return issue.message;
      return `${BOUNDS[issue.type]} ${requirement}${issue.type.endsWith("length") ? " entries" : ""}`;
    case "variant":
    case "literal":
    case "picklist":
      return `${issue.expected ?? "a known value"}`.replaceAll(" | ", " or ").replace(/^\((.*)\)$/, "$1");
    default:
      if (!issue.message.startsWith("Invalid")) return issue.message;
      return typeWords(issue.expected);
  }
}

const BOUNDS: { readonly [type: string]: string } = {
  min_value: "at least",
  gt_value: "above",
  max_value: "at most",
  min_length: "at least",
  max_length: "at most",
};

function typeWords(expected: string | null): string {
  return (expected ?? "another kind of value")
    .replace(/^\((.*)\)$/, "$1")
    .split(" | ")
    .map((part) => TYPES[part] ?? part)
    .join(" or ");
}
