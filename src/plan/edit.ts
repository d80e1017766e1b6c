import { DomainError } from "../base/errors.ts";
import { someOf } from "./find.ts";

type Named = { readonly id: string };

/** A list with one row changed; the others are the same objects. */
export function changed<T extends Named>(kind: string, rows: readonly T[], id: string, change: Partial<Omit<T, "id">>): T[] {
  const at = placeOf(kind, rows, id);
  return rows.with(at, { ...rows[at], ...change });
}

/** A list with one row more, last unless a place is given. */
export function withNew<T extends Named>(kind: string, rows: readonly T[], row: T, at = rows.length): T[] {
  if (rows.some(({ id }) => id === row.id)) throw new DomainError(kind, row.id, "an id that no other has");
  return rows.toSpliced(at, 0, row);
}

/** A list with one row less. @param last - What is wanted instead of the only row, where one must stay. */
export function without<T extends Named>(kind: string, rows: readonly T[], id: string, last?: string): T[] {
  const at = placeOf(kind, rows, id);
  if (last !== undefined && rows.length === 1) throw new DomainError(kind, id, last);
  return rows.toSpliced(at, 1);
}

/** The first of stem + 2, stem + 3 … that is not taken. */
export function freeId(taken: ReadonlySet<string>, stem: string): string {
  for (let k = 2; ; k++) if (!taken.has(`${stem}${k}`)) return `${stem}${k}`;
}

function placeOf(kind: string, rows: readonly Named[], id: string): number {
  const at = rows.findIndex((row) => row.id === id);
  if (at < 0)
    throw new DomainError(kind, id, rows.length === 0 ? "nothing: the plan has none" : `one of ${someOf(rows.map((r) => r.id))}`);
  return at;
}
