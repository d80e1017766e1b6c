/** One comparison: how many times faster `fast` is than `plain`. */
export interface Row {
  readonly name: string;
  readonly goal: number;
  readonly make: () => Promise<{
    readonly fast: () => unknown;
    readonly plain: () => unknown;
    readonly plainTimes: number;
    readonly note?: string;
  }>;
}

export interface Outcome {
  readonly name: string;
  readonly goal: number;
  readonly ratio: number;
  readonly low: number;
  readonly high: number;
  readonly fastMs: number;
  readonly plainMs: number;
  readonly rounds: number;
  readonly peakMiB: number;
  readonly note: string;
}

const ROUNDS = 6;

/**
 * Interleaves the two, swapping who goes first. The ratio is of the minima over all rounds; low and high are the least and
 * the largest ratio of a single round. `plainTimes` multiplies a plain run that covers only part of the work.
 */
export async function measure(row: Row): Promise<Outcome> {
  const { fast, plain, plainTimes, note } = await row.make();
  for (let k = 0; k < 3; k++) fast();
  plain();
  const time = (run: () => unknown): number => {
    const start = performance.now();
    run();
    return performance.now() - start;
  };
  const pairs = Array.from({ length: ROUNDS }, (_, k) => {
    const first = k % 2 === 0;
    const a = first ? time(fast) : 0;
    const b = time(plain) * plainTimes;
    return { fast: first ? a : time(fast), plain: b };
  });
  const fastMs = Math.min(...pairs.map((p) => p.fast));
  const plainMs = Math.min(...pairs.map((p) => p.plain));
  const ratios = pairs.map((p) => p.plain / p.fast);
  return {
    name: row.name,
    goal: row.goal,
    ratio: plainMs / fastMs,
    low: Math.min(...ratios),
    high: Math.max(...ratios),
    fastMs,
    plainMs,
    rounds: ROUNDS,
    peakMiB: process.resourceUsage().maxRSS / 1024,
    note: note ?? "",
  };
}
