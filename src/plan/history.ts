import type { Plan } from "./schema.ts";

/** A plan and the steps that led to it. Plans share what did not change, so a step costs what it changed. */
export interface History {
  readonly past: readonly Step[];
  readonly present: Plan;
  readonly future: readonly Step[];
}

/** A named change between two plans. */
export interface Step {
  readonly label: string;
  readonly before: Plan;
  readonly after: Plan;
  /** Steps in a row with the same key are one: a drag is one step. */
  readonly squashKey: string | null;
}

export function begin(plan: Plan): History {
  return { past: [], present: plan, future: [] };
}

/** Records a change; what had been undone is gone. */
export function record(history: History, label: string, plan: Plan, squashKey: string | null = null): History {
  if (plan === history.present) return history;
  const last = history.past[history.past.length - 1];
  const joins = squashKey !== null && last?.squashKey === squashKey && history.future.length === 0;
  const step: Step = { label, before: joins ? last.before : history.present, after: plan, squashKey };
  return { past: [...(joins ? history.past.slice(0, -1) : history.past), step], present: plan, future: [] };
}

export function undo(history: History): History {
  const step = history.past[history.past.length - 1];
  if (!step) return history;
  return { past: history.past.slice(0, -1), present: step.before, future: [step, ...history.future] };
}

export function redo(history: History): History {
  const [step, ...future] = history.future;
  if (!step) return history;
  return { past: [...history.past, step], present: step.after, future };
}

export function canUndo(history: History): boolean {
  return history.past.length > 0;
}

export function canRedo(history: History): boolean {
  return history.future.length > 0;
}

/** What undo would take back, and redo bring again; undefined when there is nothing. */
export function undoLabel(history: History): string | undefined {
  return history.past[history.past.length - 1]?.label;
}

export function redoLabel(history: History): string | undefined {
  return history.future[0]?.label;
}
