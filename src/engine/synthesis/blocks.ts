import type { Checkpoint } from "../../base/checkpoint.ts";

/** Stations are taken in blocks of about this many baselines, so that a long job can report and be stopped. */
const BASELINES_A_BLOCK = 256;

/**
 * Runs a step over all baselines in fixed blocks of first stations, in a fixed order whatever calls it.
 *
 * @param fromDone - The fractions of the whole job that this step covers, for the checkpoint.
 * @param toDone - Goes with fromDone.
 */
export async function inBlocks(
  stationCount: number,
  step: (fromStation: number, toStation: number) => void,
  checkpoint: Checkpoint | undefined,
  fromDone: number,
  toDone: number,
): Promise<void> {
  const total = (stationCount * (stationCount - 1)) / 2;
  let done = 0;
  for (let from = 0; from < stationCount - 1; ) {
    let to = from;
    let baselines = 0;
    while (to < stationCount - 1 && baselines < BASELINES_A_BLOCK) baselines += stationCount - 1 - to++;
    step(from, to);
    done += baselines;
    await checkpoint?.(fromDone + ((toDone - fromDone) * done) / total);
    from = to;
  }
}
