import { Pool } from "../tasks/pool.ts";
import type { Desk, TaskName, WorkerLike } from "../tasks/protocol.ts";
import type { Tasks } from "../tasks/table.ts";
import { Host } from "./host.ts";
import { Sweeps } from "./sweeps.ts";

/** Workers a sweep may have: what the machine has beside the two below and the page itself, one to four. */
const sweepers = (cores: number): number => Math.max(1, Math.min(4, cores - 2));

/** One worker for settled answers, one for previews, so that a drag never waits for a settled answer; some for sweeps. */
export function desk(spawn: () => WorkerLike, cores: number): Desk {
  const settling = new Host(spawn, ["picture", "ledger"]);
  const preview = new Host(spawn, ["preview"], true);
  const sweeps = new Sweeps(new Pool(spawn, sweepers(cores)));
  const host = (task: TaskName): Host => (task === "preview" ? preview : settling);
  return {
    ask: <K extends TaskName>(task: K, request: Tasks[K][0], progress?: (done: number) => void) =>
      (task === "sweep"
        ? sweeps.ask(request as Tasks["sweep"][0], progress)
        : host(task).ask(task, request, progress)) as ReturnType<Desk["ask"]> as never,
    drop: (task) => (task === "sweep" ? sweeps.drop() : host(task).drop(task)),
  };
}
