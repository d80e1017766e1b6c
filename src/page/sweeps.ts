import { sweep } from "../assess/sweep.ts";
import type { Pool } from "../tasks/pool.ts";
import { Cancelled, STALE } from "../tasks/protocol.ts";
import type { Tasks } from "../tasks/table.ts";

/** Sweeps on a pool of workers, the newest alone: one asked for while another runs takes its place. */
export class Sweeps {
  readonly #pool: Pool;

  constructor(pool: Pool) {
    this.#pool = pool;
  }

  async ask(
    { plan, layout, observation, spec }: Tasks["sweep"][0],
    progress?: (done: number) => void,
  ): Promise<Tasks["sweep"][1] | typeof STALE> {
    try {
      return await sweep(plan, layout, observation, spec, progress, {}, (jobs, checkpoint) =>
        this.#pool.map("assess", jobs, checkpoint),
      );
    } catch (error) {
      if (error instanceof Cancelled) return STALE;
      throw error;
    }
  }

  drop(): void {
    this.#pool.cancel();
  }
}
