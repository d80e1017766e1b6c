import type { Plan } from "./schema.ts";

/**
 * A plan as the text of its file: keys in the order of the schema, unknown ones after them, two spaces, a newline at the end.
 * The same plan gives the same bytes.
 */
export function writePlan(plan: Plan): string {
  return `${JSON.stringify(plan, null, 2)}\n`;
}
