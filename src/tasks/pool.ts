import type { Checkpoint } from "../base/checkpoint.ts";
import { Cancelled, type FromWorker, TaskFault, type TaskName, type WorkerLike } from "./protocol.ts";
import type { Tasks } from "./table.ts";

/** One request of a batch, on its way. */
interface Job {
  readonly id: number;
  readonly place: number;
  /** How often a worker died of it. */
  deaths: number;
  done: number;
}

/** One batch: requests of one task, answered in order. */
interface Batch {
  readonly task: TaskName;
  readonly requests: readonly unknown[];
  readonly results: unknown[];
  readonly waiting: Job[];
  readonly checkpoint: Checkpoint | undefined;
  left: number;
  /** Fraction done of all that are under way or answered, summed. */
  done: number;
  telling: boolean;
  readonly end: (error?: Error) => void;
}

/**
 * Runs batches of one task over several workers, one request a worker at a time. Requests are independent, so the answers are
 * those of one worker, in the order of the requests, whatever the number of workers.
 *
 * A worker that dies is replaced and its request is tried once more; when that kills the next worker too, the batch ends with
 * a {@link TaskFault}. A checkpoint that throws cancels what is under way and ends the batch with what it threw.
 */
export class Pool {
  readonly #spawn: () => WorkerLike;
  readonly #size: number;
  readonly #idle: WorkerLike[] = [];
  readonly #busy = new Map<WorkerLike, Job>();
  #batch: Batch | undefined;
  #nextId = 1;

  /** @param size - Workers at most; they start when there is work for them. */
  constructor(spawn: () => WorkerLike, size: number) {
    this.#spawn = spawn;
    this.#size = Math.max(1, Math.floor(size));
  }

  /**
   * Answers every request, one batch at a time: a batch asked for while another runs cancels that one.
   *
   * @throws {@link TaskFault} of the first request that fails; {@link Cancelled} when another batch takes its place.
   */
  map<K extends TaskName>(task: K, requests: readonly Tasks[K][0][], checkpoint?: Checkpoint): Promise<readonly Tasks[K][1][]> {
    this.cancel();
    if (requests.length === 0) return Promise.resolve([]);
    return new Promise((resolve, reject) => {
      const results: Tasks[K][1][] = new Array(requests.length);
      this.#batch = {
        task,
        requests,
        results,
        waiting: requests.map((_, place) => ({ id: this.#nextId++, place, deaths: 0, done: 0 })),
        checkpoint,
        left: requests.length,
        done: 0,
        telling: false,
        end: (error) => (error ? reject(error) : resolve(results)),
      };
      this.#serve();
    });
  }

  /** Ends the batch that runs, if any, as {@link Cancelled}. */
  cancel(): void {
    this.#stop(new Cancelled());
  }

  /** Ends the batch and every worker. */
  close(): void {
    this.cancel();
    for (const worker of [...this.#idle, ...this.#busy.keys()]) worker.terminate();
    this.#idle.length = 0;
    this.#busy.clear();
  }

  /** Gives waiting requests to idle workers, starting more up to the size. */
  #serve(): void {
    for (;;) {
      const batch = this.#batch;
      const job = batch?.waiting[0];
      if (!batch || !job) return;
      let worker = this.#idle.pop();
      if (!worker && this.#busy.size >= this.#size) return;
      try {
        worker ??= this.#started();
        batch.waiting.shift();
        this.#busy.set(worker, job);
        worker.postMessage({ kind: "run", id: job.id, task: batch.task, request: batch.requests[job.place] as never });
      } catch (error) {
        const reason = error instanceof Error ? error.message : String(error);
        if (worker) this.#died(worker, reason);
        else this.#stop(new TaskFault(`No worker could be started (${reason}).`, null));
      }
    }
  }

  #started(): WorkerLike {
    const worker = this.#spawn();
    worker.onmessage = (event) => this.#heard(worker, event.data);
    worker.onerror = (event) => this.#died(worker, event.message);
    worker.onmessageerror = () => this.#died(worker, "it sent something unreadable");
    return worker;
  }

  #heard(worker: WorkerLike, message: FromWorker): void {
    const job = this.#busy.get(worker);
    if (!job || message.id !== job.id) return;
    const batch = this.#batch;
    // A request of a batch that has ended: its worker is free again once it says so.
    const mine = batch && job.place < batch.requests.length && this.#belongs(batch, job);
    if (message.kind === "progress") {
      if (mine) this.#tell(batch, job, message.done);
      return;
    }
    this.#busy.delete(worker);
    this.#idle.push(worker);
    if (mine && message.kind === "done") {
      batch.results[job.place] = message.result;
      batch.left -= 1;
      this.#tell(batch, job, 1);
      if (batch.left === 0) {
        this.#batch = undefined;
        batch.end();
      }
    } else if (mine && message.kind === "fault") this.#stop(new TaskFault(message.message, message.field));
    this.#serve();
  }

  #belongs(batch: Batch, job: Job): boolean {
    return job.id >= this.#nextId - batch.requests.length && job.id < this.#nextId;
  }

  /** Progress is told one word at a time: a listener that takes its time is not buried. */
  #tell(batch: Batch, job: Job, done: number): void {
    batch.done += done - job.done;
    job.done = done;
    if (batch.telling || !batch.checkpoint) return;
    batch.telling = true;
    Promise.resolve()
      .then(() => batch.checkpoint?.(Math.min(1, batch.done / batch.requests.length)))
      .then(
        () => {
          batch.telling = false;
        },
        (error: unknown) => {
          if (this.#batch === batch) this.#stop(error instanceof Error ? error : new Cancelled());
        },
      );
  }

  #stop(error: Error): void {
    const batch = this.#batch;
    if (!batch) return;
    this.#batch = undefined;
    for (const [worker, job] of this.#busy) worker.postMessage({ kind: "cancel", id: job.id });
    batch.end(error);
  }

  #died(worker: WorkerLike, reason: string | undefined): void {
    const job = this.#busy.get(worker);
    this.#busy.delete(worker);
    const at = this.#idle.indexOf(worker);
    if (at >= 0) this.#idle.splice(at, 1);
    worker.terminate();
    const batch = this.#batch;
    if (batch && job && this.#belongs(batch, job)) {
      job.deaths += 1;
      if (job.deaths > 1) {
        const why = reason ? ` (${reason})` : "";
        this.#stop(new TaskFault(`A worker stopped twice at the same point${why}; its answer cannot be had.`, null));
        return;
      }
      batch.done -= job.done;
      job.done = 0;
      batch.waiting.unshift(job);
    }
    this.#serve();
  }
}
