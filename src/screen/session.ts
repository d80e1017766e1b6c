import type { Pair, Plan } from "../plan/schema.ts";
import type { Theme } from "./tokens.ts";

export const TASKS = ["place", "resolve", "compare", "report"] as const;
export type TaskName = (typeof TASKS)[number];

/** What a person looks at: never in the plan file, never in undo. */
export interface Session {
  readonly task: TaskName;
  readonly layout: string;
  readonly observation: string;
  /** Picked station. */
  readonly station: string | null;
  /** Picked line of the ledger. */
  readonly line: string | null;
  readonly theme: Theme;
  readonly pair: Pair;
  /** Single-letter keys are on. */
  readonly keys: boolean;
}

/** The pair of the first line that asks for one, else two equal sources one round angle apart until a beam is known. */
export function firstPair(plan: Plan): Pair {
  return plan.requirements.find((r) => r.when.pair)?.when.pair ?? { separationArcsec: 1, positionAngleDeg: 0, fluxRatio: 1 };
}

/** Where a plan is opened. */
export function openedSession(plan: Plan, kept: Pick<Session, "task" | "theme" | "keys">): Session {
  return {
    ...kept,
    layout: plan.layouts[0].id,
    observation: plan.observations[0].id,
    station: null,
    line: null,
    pair: firstPair(plan),
  };
}

/** The session with whatever its plan no longer has replaced. */
export function fitted(session: Session, plan: Plan): Session {
  const has = (items: readonly { readonly id: string }[], id: string | null): boolean => items.some((item) => item.id === id);
  return {
    ...session,
    layout: has(plan.layouts, session.layout) ? session.layout : plan.layouts[0].id,
    observation: has(plan.observations, session.observation) ? session.observation : plan.observations[0].id,
    station: has(plan.stations, session.station) ? session.station : null,
    line: has(plan.requirements, session.line) ? session.line : null,
  };
}

export const isTask = (text: string): text is TaskName => (TASKS as readonly string[]).includes(text);
