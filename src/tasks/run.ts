import type { Checkpoint } from "../base/checkpoint.ts";
import { DomainError } from "../base/errors.ts";
import { Cancelled, type FromWorker, type TaskName, type ToWorker } from "./protocol.ts";
import type { Tasks } from "./table.ts";
import { buffersOf } from "./transfer.ts";

/** The functions a worker runs, by name. `transfer` false where the task keeps the arrays of its answer. */
export type Runners = {
  readonly [K in TaskName]?: {
    readonly run: (request: Tasks[K][0], checkpoint: Checkpoint) => Tasks[K][1] | Promise<Tasks[K][1]>;
    readonly transfer: boolean;
  };
};

type Post = (message: FromWorker, transfer: readonly ArrayBuffer[]) => void;

/**
 * Handles the messages of a page: runs what is asked, reports progress at checkpoints and stops at the next one when cancelled.
 *
 * @param pause - Lets waiting messages in; a cancel cannot reach a worker that never yields.
 */
export function dispatcher(runners: Runners, post: Post, pause: () => Promise<void>): (message: ToWorker) => Promise<void> {
  const wanted = new Set<number>();
  return async (message) => {
    if (message.kind === "cancel") {
      wanted.delete(message.id);
      return;
    }
    const { id } = message;
    wanted.add(id);
    const checkpoint: Checkpoint = async (done) => {
      post({ kind: "progress", id, done }, []);
      await pause();
      if (!wanted.has(id)) throw new Cancelled();
    };
    try {
      const runner = runners[message.task];
      if (!runner) throw new DomainError("task", message.task, `one of ${Object.keys(runners).join(", ")}`);
      const result = await (runner.run as (request: unknown, checkpoint: Checkpoint) => Tasks[TaskName][1])(
        message.request,
        checkpoint,
      );
      post({ kind: "done", id, result }, runner.transfer ? buffersOf(result) : []);
    } catch (error) {
      if (error instanceof Cancelled) post({ kind: "cancelled", id }, []);
      else {
        const text = error instanceof Error ? error.message : String(error);
        post({ kind: "fault", id, message: text, field: error instanceof DomainError ? error.field : null }, []);
      }
    } finally {
      wanted.delete(id);
    }
  };
}
