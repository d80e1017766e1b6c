import { parentPort, Worker } from "node:worker_threads";
import type { FromWorker, ToWorker, WorkerLike } from "../tasks/protocol.ts";
import { dispatcher } from "../tasks/run.ts";
import { runners } from "../tasks/runners.ts";

/** Tells the program's own threads from those of somebody who imports it. */
const MARK = "spanwright thread";

/** A thread that runs tasks: this same program, started as {@link serveThread} sees it. @param program - The built program's address. */
export function thread(program: URL): WorkerLike {
  const worker = new Worker(program, { workerData: MARK });
  let ended = false;
  const like: WorkerLike = {
    postMessage: (message) => worker.postMessage(message),
    terminate: () => {
      ended = true;
      void worker.terminate();
    },
    onmessage: null,
    onerror: null,
    onmessageerror: null,
  };
  const died = (message: string): void => {
    if (ended) return;
    ended = true;
    like.onerror?.({ message });
  };
  worker.on("message", (data: FromWorker) => like.onmessage?.({ data }));
  worker.on("messageerror", (error) => like.onmessageerror?.(error));
  worker.on("error", (error: unknown) => died(error instanceof Error ? error.message : String(error)));
  worker.on("exit", (code) => died(`it left with code ${code}`));
  return like;
}

/** Runs tasks for the thread that started this one. */
export function serveThread(): void {
  const port = parentPort;
  if (!port) throw new Error("A thread of tasks was started without a parent.");
  const pause = (): Promise<void> => new Promise((resolve) => setImmediate(resolve));
  const handle = dispatcher(runners(), (message, transfer) => port.postMessage(message, transfer as ArrayBuffer[]), pause);
  port.on("message", (message: ToWorker) => void handle(message));
}

export const isTaskThread = (workerData: unknown): boolean => workerData === MARK;
