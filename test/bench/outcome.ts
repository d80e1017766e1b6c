/** What a row of the bench found. */
export interface Outcome {
  readonly name: string;
  readonly value: number;
  /** What the value counts: "× faster", "exponent". */
  readonly unit: string;
  readonly goal: number;
  readonly sense: "at least" | "at most";
  /** Median, least and largest over rounds. */
  readonly median: number;
  readonly low: number;
  readonly high: number;
  readonly peakMiB: number;
  readonly detail: string;
}

/** A row, measured in a process of its own. */
export interface Row {
  readonly name: string;
  readonly measure: () => Promise<Outcome>;
}

export const isMet = ({ value, goal, sense }: Outcome): boolean => (sense === "at least" ? value >= goal : value <= goal);

export const medianOf = (values: readonly number[]): number => {
  const sorted = [...values].sort((a, b) => a - b);
  const middle = sorted.length >> 1;
  return sorted.length % 2 === 1 ? sorted[middle] : (sorted[middle - 1] + sorted[middle]) / 2;
};

export const timeMs = (run: () => unknown): number => {
  const start = performance.now();
  run();
  return performance.now() - start;
};

export const peakMiB = (): number => process.resourceUsage().maxRSS / 1024;
