import { expect, it } from "vitest";

/** One row of a data file: a quantity somebody else has computed or published. */
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
  it("has an answer, or a reason why not, for every row", () => {
    const known = [...Object.keys(answers), ...Object.keys(left)];
    expect(known.sort()).toEqual(rows.map((row) => row.id).sort());
  });
  for (const row of rows) {
    const answer = answers[row.id];
    if (!answer) continue;
    it(`${row.id} ${row.quantity} (${row.status}: ${row.source}; within ${row.tolerance}: ${answer.why})`, () => {
      const theirs = answer.theirs ?? figures(row.numeric);
      const ours = answer.ours();
      expect(ours.length).toBe(theirs.length);
      for (const [k, x] of ours.entries()) {
        const within = typeof answer.within === "number" ? answer.within : answer.within[k];
        expect(Math.abs(x - theirs[k]), `figure ${k}: ours ${x}, theirs ${theirs[k]}`).toBeLessThanOrEqual(within);
      }
    });
  }
}

function figures(numeric: OutsideRow["numeric"]): readonly number[] {
  if (typeof numeric === "number") return [numeric];
  if (Array.isArray(numeric) && numeric.length > 0) return (numeric as unknown[]).flat() as number[];
  throw new Error("the row has no figures: give `theirs`");
}
