import { DomainError } from "../base/errors.ts";
import type { Plan } from "./schema.ts";
import { entryOf, planShape, type Shape, shapeOf } from "./shape.ts";

/**
 * A plan as the text of its file: keys in the order of the schema whatever order they came in, unknown ones after them, two
 * spaces, a newline at the end. Equal plans give equal bytes.
 *
 * @throws {@link DomainError} for a number that JSON cannot hold: it would be read back as another plan.
 */
export function writePlan(plan: Plan): string {
  return `${JSON.stringify(ordered(plan, planShape, ""), null, 2)}\n`;
}

function ordered(value: unknown, schema: Shape | undefined, path: string): unknown {
  if (typeof value === "number" && !Number.isFinite(value)) throw new DomainError(path, value, "a finite number");
  if (value === null || typeof value !== "object") return value;
  const shape = shapeOf(value, schema);
  if (Array.isArray(value)) return value.map((item, k) => ordered(item, shape?.item, `${path}[${k}]`));
  const known = Object.keys(shape?.entries ?? {}).filter((key) => Object.hasOwn(value, key));
  const keys = [...known, ...Object.keys(value).filter((key) => !entryOf(shape, key))];
  const at = (key: string): string => (path === "" ? key : `${path}.${key}`);
  return Object.fromEntries(
    keys.map((key) => [key, ordered((value as { readonly [key: string]: unknown })[key], entryOf(shape, key), at(key))]),
  );
}
