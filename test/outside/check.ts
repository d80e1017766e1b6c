/** A figure, or a word where the source gives a case instead of a number. */
export type Figure = number | string;

/** One row of a data file: a quantity somebody else has computed or published, its source beside it. */
export interface OutsideRow {
  readonly id: string;
  readonly quantity: string;
  /** In the order `quantity` names them. */
  readonly expected: readonly Figure[];
  /** Largest absolute difference, one for all figures or one each. */
  readonly tolerance: number | readonly number[];
  readonly toleranceReason: string;
  readonly source: string;
  /** `verified`: recomputed elsewhere or read at its source; `common practice`; `from memory`: neither. */
  readonly status: string;
  /** How it was confirmed. */
  readonly confirmed?: string;
}

/** A row and how the program answers it. */
export interface OutsideCheck extends OutsideRow {
  ours(): readonly Figure[];
}

/** Rows of a section that the program does not answer, and why. */
export type Left = { readonly [id: string]: string };

/** One figure of a check beside ours. */
export interface Comparison {
  readonly ours: Figure;
  readonly theirs: Figure;
  /** Absolute; 0 or infinite between words. */
  readonly difference: number;
  readonly tolerance: number;
}

/** What came of a check. */
export interface Outcome {
  readonly check: OutsideCheck;
  readonly comparisons: readonly Comparison[];
  /** The figure with the largest difference for its tolerance. */
  readonly worst: Comparison;
  readonly passes: boolean;
}

/**
 * Joins the rows of a data file with the program's answers.
 *
 * @throws Error for a row without an answer, an answer without a row, an id twice, or a row without source, reason or figures.
 */
export function checksOf(
  rows: readonly OutsideRow[],
  answers: { readonly [id: string]: () => readonly Figure[] },
): readonly OutsideCheck[] {
  const ids = rows.map((row) => row.id);
  const lost = [...ids.filter((id) => !answers[id]), ...Object.keys(answers).filter((id) => !ids.includes(id))];
  if (lost.length > 0) throw new Error(`a row without an answer or an answer without a row: ${lost.join(", ")}`);
  if (new Set(ids).size < ids.length) throw new Error("an id stands twice");
  for (const { id, source, status, toleranceReason, expected } of rows) {
    if (!source || !status || !toleranceReason || expected.length === 0) throw new Error(`row ${id} lacks what a reader needs`);
  }
  return rows.map((row) => ({ ...row, ours: answers[row.id] }));
}

/** @throws Error where the program gives more or fewer figures than the source. */
export function evaluate(check: OutsideCheck): Outcome {
  const ours = check.ours();
  const { expected, tolerance } = check;
  const fits = ours.length === expected.length && (typeof tolerance === "number" || tolerance.length === expected.length);
  if (!fits) throw new Error(`${check.id}: ${ours.length} figures of ours beside ${expected.length}`);
  const comparisons = ours.map((mine, k) => ({
    ours: mine,
    theirs: expected[k],
    difference: difference(mine, expected[k]),
    tolerance: typeof tolerance === "number" ? tolerance : tolerance[k],
  }));
  const worst = comparisons.reduce((most, c) => (excess(c) > excess(most) ? c : most));
  return { check, comparisons, worst, passes: comparisons.every((c) => c.difference <= c.tolerance) };
}

function difference(ours: Figure, theirs: Figure): number {
  if (typeof ours === "number" && typeof theirs === "number") return Math.abs(ours - theirs);
  return ours === theirs ? 0 : Number.POSITIVE_INFINITY;
}

/** NaN counts as infinitely wrong. */
function excess({ difference: d, tolerance }: Comparison): number {
  return d === 0 ? 0 : d / tolerance >= 0 ? d / tolerance : Number.POSITIVE_INFINITY;
}
