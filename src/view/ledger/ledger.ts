import type { RequirementOutcome } from "../../assess/requirements.ts";
import type { Plan, Requirement } from "../../plan/schema.ts";
import { joined } from "../numbers.ts";
import { quantityWords } from "../quantities.ts";
import { figure, type Unit, unitFor, withUnit } from "../units.ts";
import { conditionText } from "./condition.ts";

export type LineState = "met" | "at risk" | "not met" | "cannot be computed" | "working";

/** One line of the ledger, decided without a DOM. */
export interface LedgerLine {
  readonly id: string;
  readonly title: string;
  readonly short: string;
  /** What the line was written as, where that says more than the title. */
  readonly text: string;
  readonly condition: string;
  /** Figure and unit apart, because they are set in two sizes. */
  readonly value: { readonly figure: string; readonly unit: string } | null;
  readonly limit: string;
  readonly state: LineState;
  /** "At risk, 0.05″ in hand". */
  readonly words: string;
  /** "At risk, 0.05″". */
  readonly shortWords: string;
  /** Fraction of the limit in hand; null: no bar. */
  readonly margin: number | null;
  /** Margin before the change that is under way; null where it is the same. */
  readonly wasMargin: number | null;
  /** Why it cannot be computed, or at which point of a range it is worst. */
  readonly note: string | null;
}

export interface LedgerModel {
  readonly lines: readonly LedgerLine[];
  readonly tally: readonly { readonly state: "met" | "at risk" | "not met"; readonly count: number }[];
  /** Lines that cannot be computed. */
  readonly open: number;
}

export interface LedgerInput {
  readonly plan: Plan;
  readonly layout: string;
  /** Settled outcomes, of this plan or, while it is being computed, of the one before. */
  readonly settled: readonly RequirementOutcome[];
  /** What a preview says while a station moves. */
  readonly live: readonly RequirementOutcome[];
  /** A settled answer is on its way and has taken longer than a moment. */
  readonly working: boolean;
  /** Something is held: lines a preview cannot answer show their last value as such. */
  readonly dragging: boolean;
}

/** The ledger of one layout. */
export function ledgerModel({ plan, layout, settled, live, working, dragging }: LedgerInput): LedgerModel {
  const lines = plan.requirements
    .filter((line) => !line.when.layouts || line.when.layouts.includes(layout))
    .map((line) => {
      const before = settled.find((o) => o.id === line.id);
      const now = live.find((o) => o.id === line.id);
      return ledgerLine(plan, line, now ?? before, now ? before : undefined, (working || dragging) && !now);
    });
  const count = (state: LineState): number => lines.filter((line) => line.state === state).length;
  return {
    lines,
    tally: (["met", "at risk", "not met"] as const).map((state) => ({ state, count: count(state) })),
    open: count("cannot be computed"),
  };
}

function ledgerLine(
  plan: Plan,
  line: Requirement,
  outcome: RequirementOutcome | undefined,
  before: RequirementOutcome | undefined,
  working: boolean,
): LedgerLine {
  const { title, short, kind } = quantityWords(line.quantity);
  const limit = line.atMost ?? line.atLeast ?? 0;
  const unit = unitFor(kind, limit);
  const sign = line.atMost === null ? "≥" : "≤";
  const value = outcome?.value ?? null;
  const was = before?.value ?? null;
  const changed = value !== null && was !== null && figure(was, unit) !== figure(value, unit);
  // What cannot be computed stays so while the rest is worked on.
  const state: LineState = !outcome || (working && value !== null) ? "working" : outcome.state;
  const named = line.text && line.text.length <= 22 ? line.text : title;
  const base = {
    id: line.id,
    title: named,
    short,
    text: line.text && line.text !== named ? line.text : "",
    condition: conditionText(plan, line),
    value: value === null ? null : { figure: figure(value, unit), unit: unit.word },
    limit: `${sign} ${withUnit(limit, unit)}`,
    state,
    margin: outcome?.margin ?? null,
    wasMargin: changed ? (before?.margin ?? null) : null,
    note: outcome?.note?.replace(line.quantity, `“${title}”`) ?? null,
  };
  const said = stateWords(state, value, limit, unit, changed ? was : null);
  return { ...base, ...said };
}

function stateWords(
  state: LineState,
  value: number | null,
  limit: number,
  unit: Unit,
  was: number | null,
): { readonly words: string; readonly shortWords: string } {
  if (state === "working") {
    const words = value === null ? "Working" : "Working, last value shown";
    return { words, shortWords: "Working" };
  }
  if (state === "cannot be computed" || value === null) return { words: "Cannot be computed", shortWords: "Not computed" };
  const name = { met: "Met", "at risk": "At risk", "not met": "Not met" }[state];
  if (was !== null) return { words: `${name}, was ${withUnit(was, unit)}`, shortWords: `${name}, was ${withUnit(was, unit)}` };
  // The margin is taken from the figures as they are shown, so that the three numbers of a line add up.
  const shown = (x: number): number => Number((x / unit.size).toFixed(unit.decimals));
  const spare = joined(Math.abs(shown(value) - shown(limit)).toFixed(unit.decimals), unit.word);
  const side = state !== "not met" ? "in hand" : value > limit ? "over" : "short";
  return { words: `${name}, ${spare} ${side}`, shortWords: `${name}, ${spare}` };
}
