import { type Desk, type FromWorker, STALE, TaskFault, type TaskName, type WorkerLike } from "../tasks/protocol.ts";
import type { Tasks } from "../tasks/table.ts";

interface Job {
  readonly id: number;
  readonly task: TaskName;
  readonly request: Tasks[TaskName][0];
  readonly progress?: ((done: number) => void) | undefined;
  readonly resolve: (value: Tasks[TaskName][1] | typeof STALE) => void;
  readonly reject: (reason: Error) => void;
  stale: boolean;
}

/**
 * Runs tasks on one worker, the newest request of each task only: at most one job in flight, at most one waiting a task,
 * tasks served in the order they are named. A worker that dies is started once more, with what was asked of
 * it; when that one dies too, every request is refused in a plain sentence.
 */
export class Host implements Desk {
  readonly #spawn: () => WorkerLike;
  readonly #order: readonly TaskName[];
  readonly #letFinish: boolean;
  readonly #waiting = new Map<TaskName, Job>();
  #worker: WorkerLike | undefined;
  #running: Job | undefined;
  #nextId = 1;
  #deaths = 0;

  /**
   * @param order - Which waiting task goes first.
   * @param letFinish - A running request is answered even when a newer one waits. Requests that come faster than answers
   *   would otherwise never be answered at all, and nothing would be seen to move.
   */
  constructor(spawn: () => WorkerLike, order: readonly TaskName[], letFinish = false) {
    this.#spawn = spawn;
    this.#order = order;
    this.#letFinish = letFinish;
  }

  /**
   * Asks for a task. Resolves to its result, or to {@link STALE} once a newer request of the same task took its place.
   *
   * @throws {@link TaskFault} where the task answers with a fault, or the worker died twice.
   */
  ask<K extends TaskName>(task: K, request: Tasks[K][0], progress?: (done: number) => void): Promise<Tasks[K][1] | typeof STALE> {
    this.#forgetWaiting(task);
    if (!this.#letFinish) this.#cancelRunning(task);
    return new Promise((resolve, reject) => {
      const job: Job = {
        id: this.#nextId++,
        task,
        request,
        progress,
        resolve: resolve as Job["resolve"],
        reject,
        stale: false,
      };
      this.#waiting.set(task, job);
      this.#next();
    });
  }

  /** Forgets what was asked of a task: a waiting request is dropped, a running one is cancelled. */
  drop(task: TaskName): void {
    this.#forgetWaiting(task);
    this.#cancelRunning(task);
  }

  #forgetWaiting(task: TaskName): void {
    this.#waiting.get(task)?.resolve(STALE);
    this.#waiting.delete(task);
  }

  #cancelRunning(task: TaskName): void {
    const running = this.#running;
    if (running?.task !== task || running.stale) return;
    running.stale = true;
    running.resolve(STALE);
    this.#worker?.postMessage({ kind: "cancel", id: running.id });
  }

  close(): void {
    for (const task of [...this.#waiting.keys()]) this.drop(task);
    this.#running?.resolve(STALE);
    this.#running = undefined;
    this.#worker?.terminate();
    this.#worker = undefined;
  }

  #next(): void {
    if (this.#running) return;
    const first = [...this.#waiting.values()].sort((a, b) => this.#rank(a) - this.#rank(b) || a.id - b.id)[0];
    if (!first) return;
    this.#waiting.delete(first.task);
    this.#running = first;
    try {
      this.#worker ??= this.#started();
      this.#worker.postMessage({ kind: "run", id: first.id, task: first.task, request: first.request });
    } catch (error) {
      this.#died(error instanceof Error ? error.message : String(error));
    }
  }

  #rank(job: Job): number {
    const at = this.#order.indexOf(job.task);
    return at < 0 ? this.#order.length : at;
  }

  #started(): WorkerLike {
    const worker = this.#spawn();
    worker.onmessage = (event) => this.#heard(event.data);
    worker.onerror = (event) => this.#died(event.message);
    worker.onmessageerror = () => this.#died("it sent something unreadable");
    return worker;
  }

  #heard(message: FromWorker): void {
    const job = this.#running;
    if (!job || message.id !== job.id) return;
    if (message.kind === "progress") {
      if (!job.stale) job.progress?.(message.done);
      return;
    }
    this.#running = undefined;
    if (message.kind === "done") {
      this.#deaths = 0;
      job.resolve(message.result);
    } else if (message.kind === "fault") job.reject(new TaskFault(message.message, message.field));
    else job.resolve(STALE);
    this.#next();
  }

  #died(reason: string | undefined): void {
    this.#worker?.terminate();
    this.#worker = undefined;
    this.#deaths += 1;
    const job = this.#running;
    this.#running = undefined;
    if (this.#deaths < 2) {
      if (job && !job.stale && !this.#waiting.has(job.task)) this.#waiting.set(job.task, job);
      this.#next();
      return;
    }
    const why = reason ? ` (${reason})` : "";
    const fault = new TaskFault(
      `The computation stopped twice and was not started again${why}. Reload the page to try once more.`,
      null,
    );
    if (job && !job.stale) job.reject(fault);
    for (const waiting of this.#waiting.values()) waiting.reject(fault);
    this.#waiting.clear();
    this.#deaths = 1; // what is asked next gets one fresh worker
  }
}
