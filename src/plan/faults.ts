import { shown } from "../base/errors.ts";

/** One thing wrong with a plan file. */
export interface Fault {
  /** Such as `stations[3].latitudeDeg`; empty for the file as a whole. */
  readonly path: string;
  readonly value: unknown;
  /** In place of the value, where quoting it would not help. */
  readonly found?: string;
  readonly expected: string;
}

/** Faults named in full; the rest are counted. */
const NAMED = 50;
/** Faults looked for: a file of 64 MiB may have millions, and no one reads them. */
export const MOST_FAULTS = 1000;

/** A plan that cannot be read, with all that is wrong with it. */
export class PlanFaults extends Error {
  override readonly name = "PlanFaults";
  readonly faults: readonly Fault[];

  constructor(faults: readonly Fault[]) {
    super(faultLines(faults).join("\n"));
    this.faults = faults;
  }
}

/** One line a fault: path, value found and what is allowed. */
export function faultLines(faults: readonly Fault[]): string[] {
  const lines = faults
    .slice(0, NAMED)
    .map(({ path, value, found, expected }) => `${path || "the plan"} is ${found ?? shown(value)}; expected ${expected}.`);
  if (faults.length <= NAMED) return lines;
  const rest = faults.length - NAMED;
  return [...lines, `… and ${faults.length >= MOST_FAULTS ? "at least " : ""}${rest} more fault${rest === 1 ? "" : "s"}.`];
}
