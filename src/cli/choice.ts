import { layoutById, observationById } from "../plan/find.ts";
import type { Layout, Observation, Plan } from "../plan/schema.ts";
import type { Io } from "./io.ts";

/** One layout and one observation. */
export interface Choice {
  readonly layout: Layout;
  readonly observation: Observation;
}

/**
 * The layout and observation asked for; the plan's first of each where none is named, which is said.
 *
 * @throws {@link DomainError} for an id the plan does not have, naming those it has.
 */
export function oneOf(plan: Plan, asked: { readonly layout?: string; readonly observation?: string }, io: Io): Choice {
  const layout = asked.layout === undefined ? plan.layouts[0] : layoutById(plan, asked.layout);
  const observation = asked.observation === undefined ? plan.observations[0] : observationById(plan, asked.observation);
  const taken = [
    ...(asked.layout === undefined ? [`layout ${layout.id}`] : []),
    ...(asked.observation === undefined ? [`observation ${observation.id}`] : []),
  ];
  if (taken.length > 0) io.err(`${taken.join(", ")}: the first of the plan, as none is named\n`);
  return { layout, observation };
}

/**
 * Those asked for, in the plan's order; all where none is named.
 *
 * @throws {@link DomainError} for an id the plan does not have.
 */
export function someOf(
  plan: Plan,
  asked: { readonly layout: readonly string[]; readonly observation: readonly string[] },
): { readonly layouts: readonly Layout[]; readonly observations: readonly Observation[] } {
  const layouts = new Set(asked.layout.map((id) => layoutById(plan, id)));
  const observations = new Set(asked.observation.map((id) => observationById(plan, id)));
  return {
    layouts: layouts.size === 0 ? plan.layouts : plan.layouts.filter((layout) => layouts.has(layout)),
    observations: observations.size === 0 ? plan.observations : plan.observations.filter((o) => observations.has(o)),
  };
}
