import { it } from "vitest";
import type { OutsideCheck } from "./check.ts";
import { testOf } from "./section.ts";

/** One row of a data file whose figures and tolerance stand as its source words them. */
export interface OutsideRow {
  readonly id: string;
  readonly quantity: string;
  readonly value: string;
  readonly numeric: number | string | readonly unknown[] | null;
  readonly tolerance: string;
  readonly source: string;
  readonly status: string;
  readonly confirmed: string;
}

/** How the program answers one row. */
export interface Answer {
  readonly ours: () => readonly number[];
  /** The outside figures, where the row gives them in words or holds more than is compared. */
  readonly theirs?: readonly number[];
  /** Largest absolute difference, one for all figures or one each. */
  readonly within: number | readonly number[];
  readonly why: string;
}

/** Makes one test of every row that has an answer; a row without one must stand in `left` with the reason. */
export function compare(
  rows: readonly OutsideRow[],
  answers: { readonly [id: string]: Answer },
  left: { readonly [id: string]: string },
): void {
  it("has an answer, or a reason why not, for every row", ({ expect }) => {
    const known = [...Object.keys(answers), ...Object.keys(left)];
    expect(known.sort()).toEqual(rows.map((row) => row.id).sort());
  });
  for (const row of rows) if (answers[row.id]) testOf(checkOf(row, answers[row.id]));
}

/** The check that a row and its answer make. */
export function checkOf({ id, quantity, numeric, source, status, confirmed }: OutsideRow, answer: Answer): OutsideCheck {
  const { ours, theirs, within: tolerance, why: toleranceReason } = answer;
  return { id, quantity, expected: theirs ?? figures(numeric), tolerance, toleranceReason, source, status, confirmed, ours };
}

function figures(numeric: OutsideRow["numeric"]): readonly number[] {
  if (typeof numeric === "number") return [numeric];
  if (Array.isArray(numeric) && numeric.length > 0) return (numeric as unknown[]).flat() as number[];
  throw new Error("the row has no figures: give `theirs`");
}
