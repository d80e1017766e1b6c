import { planSchema } from "./schema.ts";

/** What walking a document along its schema needs of a schema node: fields that valibot documents. */
export interface Shape {
  readonly type: string;
  /** Of an object. */
  readonly entries?: { readonly [key: string]: Shape };
  /** Of a list. */
  readonly item?: Shape;
  /** Of something that may be null or left out. */
  readonly wrapped?: Shape;
  /** Of a choice: the key that tells which, and the objects to choose from. */
  readonly key?: string;
  readonly options?: readonly Shape[];
  readonly literal?: unknown;
}

export const planShape = planSchema as unknown as Shape;

/** The node that describes a value, without wrappings; for a choice, the one the value has made. */
export function shapeOf(value: object, shape: Shape | undefined): Shape | undefined {
  if (!shape) return undefined;
  if (shape.wrapped) return shapeOf(value, shape.wrapped);
  const { key } = shape;
  if (shape.type !== "variant" || key === undefined) return shape;
  const chosen = (value as { readonly [key: string]: unknown })[key];
  return shape.options?.find(({ entries }) => entries?.[key].literal === chosen);
}

/** The node of a key, where the schema knows it. */
export function entryOf(shape: Shape | undefined, key: string): Shape | undefined {
  return shape?.entries && Object.hasOwn(shape.entries, key) ? shape.entries[key] : undefined;
}
