import { DomainError } from "../base/errors.ts";
import type { Antenna, Layout, Observation, Plan, Station } from "./schema.ts";

/** @throws {@link DomainError} naming the ids that exist. */
export function layoutById(plan: Plan, id: string): Layout {
  return found("layout", id, plan.layouts);
}

/** @throws {@link DomainError} naming the ids that exist. */
export function observationById(plan: Plan, id: string): Observation {
  return found("observation", id, plan.observations);
}

/** @throws {@link DomainError} naming the ids that exist. */
export function stationById(plan: Plan, id: string): Station {
  return found("station", id, plan.stations);
}

/** @throws {@link DomainError} naming the ids that exist. */
export function antennaById(plan: Plan, id: string): Antenna {
  return found("antenna", id, plan.antennas);
}

/** Rows by id, kept as long as the list of a plan is: layouts name up to 4096 stations each. */
const indexes = new WeakMap<readonly object[], Map<string, unknown>>();

function found<T extends { readonly id: string }>(kind: string, id: string, rows: readonly T[]): T {
  let index = indexes.get(rows) as Map<string, T> | undefined;
  if (!index) {
    index = new Map(rows.map((row) => [row.id, row]));
    indexes.set(rows, index);
  }
  const row = index.get(id);
  if (!row) throw new DomainError(kind, id, `one of ${someOf(rows.map((r) => r.id))}`);
  return row;
}

/** A list for a message, cut short. */
export function someOf(ids: readonly string[]): string {
  return ids.length > 12 ? `${ids.slice(0, 12).join(", ")} and ${ids.length - 12} more` : ids.join(", ");
}
