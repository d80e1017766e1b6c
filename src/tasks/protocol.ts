import type { Tasks } from "./table.ts";

/** Name of a task. */
export type TaskName = keyof Tasks;

/** What the page posts to a worker. */
export type ToWorker =
  | { readonly kind: "run"; readonly id: number; readonly task: TaskName; readonly request: Tasks[TaskName][0] }
  | { readonly kind: "cancel"; readonly id: number };

/** What a worker posts back. Every `run` ends in exactly one `done`, `fault` or `cancelled`. */
export type FromWorker =
  | { readonly kind: "progress"; readonly id: number; readonly done: number }
  | { readonly kind: "done"; readonly id: number; readonly result: Tasks[TaskName][1] }
  | { readonly kind: "fault"; readonly id: number; readonly message: string; readonly field: string | null }
  | { readonly kind: "cancelled"; readonly id: number };

/** The part of a worker that those who run tasks on it lean on: a page's worker has it, and a thread of Node's is made to. */
export interface WorkerLike {
  postMessage(message: ToWorker): void;
  terminate(): void;
  onmessage: ((event: { readonly data: FromWorker }) => void) | null;
  onerror: ((event: { readonly message?: string }) => void) | null;
  onmessageerror: ((event: unknown) => void) | null;
}

/** Thrown by a checkpoint when the job is no longer wanted. */
export class Cancelled extends Error {
  override readonly name = "Cancelled";
}

/** In place of an answer: a newer request of the same channel took its place. */
export const STALE = Symbol("stale");

/** A fault a task answered with; `field` names the input it concerns, where it is one. */
export class TaskFault extends Error {
  override readonly name = "TaskFault";
  readonly field: string | null;
  constructor(message: string, field: string | null) {
    super(message);
    this.field = field;
  }
}

/** Who runs tasks for the page. */
export interface Desk {
  /**
   * Asks for a task; resolves to its result, or to {@link STALE} once a newer request of the same task took its place.
   *
   * @throws {@link TaskFault} where the task answers with a fault, or nobody is left to run it.
   */
  ask<K extends TaskName>(task: K, request: Tasks[K][0], progress?: (done: number) => void): Promise<Tasks[K][1] | typeof STALE>;
  /** Forgets what was asked of a task. */
  drop(task: TaskName): void;
}
