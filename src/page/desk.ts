import type { Desk, TaskName } from "../tasks/protocol.ts";
import { Host, type WorkerLike } from "./host.ts";

/** One worker for settled answers, one for previews: a drag never waits for a settled answer that is under way. */
export function desk(spawn: () => WorkerLike): Desk {
  const settling = new Host(spawn, ["picture", "ledger", "sweep"]);
  const preview = new Host(spawn, ["preview"], true);
  const host = (task: TaskName): Host => (task === "preview" ? preview : settling);
  return {
    ask: (task, request, progress) => host(task).ask(task, request, progress),
    drop: (task) => host(task).drop(task),
  };
}
