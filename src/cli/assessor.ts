import { type Assessor, inTurn } from "../assess/jobs.ts";
import { Pool } from "../tasks/pool.ts";
import type { Io } from "./io.ts";

/** Threads for a job of so many points, unless somebody says how many. A thread costs more than one short point saves. */
const threadsFor = (io: Io, jobs: number): number => Math.min(io.cores, Math.floor(jobs / 2));

/**
 * Lends whoever assesses many points as many threads as help, and takes them back. The results are the same for any number.
 *
 * @param wanted - Threads asked for; undefined: one a processor, where there are points enough. One: no thread beside this.
 */
export async function withAssessor<T>(
  io: Io,
  wanted: number | undefined,
  jobs: number,
  use: (run: Assessor) => Promise<T>,
): Promise<T> {
  const count = wanted ?? threadsFor(io, jobs);
  if (!io.spawn || count < 2) return use(inTurn);
  const pool = new Pool(io.spawn, Math.min(count, jobs));
  try {
    return await use((requests, checkpoint) => pool.map("assess", requests, checkpoint));
  } finally {
    pool.close();
  }
}
