import { toJsonSchema } from "@valibot/to-json-schema";
import { planSchema } from "../src/plan/schema.ts";

/** The plan file's JSON Schema (draft 7): what an editor can check. Names that must exist elsewhere in the plan are not in it. */
export function planJsonSchema(): object {
  return { title: "Spanwright plan, version 1", ...toJsonSchema(planSchema, { errorMode: "ignore", typeMode: "input" }) };
}
