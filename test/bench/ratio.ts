import { medianOf, type Outcome, peakMiB, type Row, timeMs } from "./outcome.ts";

/** One comparison: how many times faster `fast` is than `plain`. */
export interface Comparison {
  readonly name: string;
  readonly goal: number;
  readonly make: () => Promise<{
    readonly fast: () => unknown;
    readonly plain: () => unknown;
    readonly plainTimes: number;
    readonly note?: string;
  }>;
}

const ROUNDS = 6;

/**
 * Interleaves the two, swapping who goes first. The ratio is of the minima over all rounds; median, low and high are those of
 * single rounds. `plainTimes` multiplies a plain run that covers only part of the work.
 */
export const ratioRow = (comparison: Comparison): Row => ({ name: comparison.name, measure: () => measured(comparison) });

async function measured({ name, goal, make }: Comparison): Promise<Outcome> {
  const { fast, plain, plainTimes, note } = await make();
  for (let k = 0; k < 3; k++) fast();
  plain();
  const pairs = Array.from({ length: ROUNDS }, (_, k) => {
    const first = k % 2 === 0;
    const a = first ? timeMs(fast) : 0;
    const b = timeMs(plain) * plainTimes;
    return { fast: first ? a : timeMs(fast), plain: b };
  });
  const fastMs = Math.min(...pairs.map((p) => p.fast));
  const plainMs = Math.min(...pairs.map((p) => p.plain));
  const ratios = pairs.map((p) => p.plain / p.fast);
  return {
    name,
    value: plainMs / fastMs,
    unit: "× faster",
    goal,
    sense: "at least",
    median: medianOf(ratios),
    low: Math.min(...ratios),
    high: Math.max(...ratios),
    peakMiB: peakMiB(),
    detail: `${fastMs.toFixed(2)} ms against ${plainMs.toPrecision(4)} ms, minima of ${ROUNDS} interleaved rounds${note ? `; ${note}` : ""}`,
  };
}
