import * as v from "valibot";
import { crossFaults, crossWarnings } from "./cross.ts";
import { MOST_FAULTS, PlanFaults } from "./faults.ts";
import { issueFault } from "./issue.ts";
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
  // One place has one fault: what is not finite is not also told to be out of range.
  const result = v.safeParse(planSchema, current, { abortPipeEarly: true });
  // Where a field is wrong the output still holds the others, with defaults: what is wrong between fields is told as well.
  const single = (result.issues ?? []).map(issueFault);
  const faults = [...single, ...crossFaults(result.output, MOST_FAULTS - single.length)];
  if (!result.success || faults.length > 0) throw new PlanFaults(faults);
  return { plan: result.output, warnings: [...unknownKeys(current), ...crossWarnings(result.output)] };
}
