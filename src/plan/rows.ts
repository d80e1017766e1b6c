/** An object of a document that may not have been found right: each key is looked at before it is used. */
export type Row = { readonly [key: string]: unknown };

export const isRow = (value: unknown): value is Row => value !== null && typeof value === "object" && !Array.isArray(value);

/** The objects of a list, each with its path; none where it is no list. */
export function* rows(parent: unknown, key: string, path = ""): Generator<readonly [path: string, row: Row]> {
  const list = isRow(parent) ? parent[key] : undefined;
  if (!Array.isArray(list)) return;
  const at = path === "" ? key : `${path}.${key}`;
  for (const [k, row] of list.entries()) if (isRow(row)) yield [`${at}[${k}]`, row];
}

/** A finite number, else undefined: what is wrong with the others is said elsewhere. */
export const number = (value: unknown): number | undefined =>
  typeof value === "number" && Number.isFinite(value) ? value : undefined;
