import { describe, expect, it } from "vitest";
import { Pool } from "../../src/tasks/pool.ts";
import { Cancelled, type FromWorker, TaskFault, type ToWorker, type WorkerLike } from "../../src/tasks/protocol.ts";

/** A worker that answers when the test says so. */
class Scripted implements WorkerLike {
  readonly heard: ToWorker[] = [];
  terminated = false;
  onmessage: ((event: { readonly data: FromWorker }) => void) | null = null;
  onerror: ((event: { readonly message?: string }) => void) | null = null;
  onmessageerror: ((event: unknown) => void) | null = null;
  postMessage(message: ToWorker): void {
    this.heard.push(message);
  }
  terminate(): void {
    this.terminated = true;
  }
  /** The request it works on now. */
  get now(): { readonly id: number; readonly layout: string } {
    const last = this.heard.filter((m) => m.kind === "run").at(-1);
    if (last?.kind !== "run") throw new Error("nothing asked");
    return { id: last.id, layout: (last.request as { layout: string }).layout };
  }
  answer(): void {
    const { id, layout } = this.now;
    this.onmessage?.({ data: { kind: "done", id, result: `of ${layout}` as never } });
  }
  say(kind: "cancelled"): void {
    this.onmessage?.({ data: { kind, id: this.now.id } });
  }
  progress(done: number): void {
    this.onmessage?.({ data: { kind: "progress", id: this.now.id, done } });
  }
}

function started(size: number) {
  const workers: Scripted[] = [];
  const pool = new Pool(() => {
    const worker = new Scripted();
    workers.push(worker);
    return worker;
  }, size);
  return { pool, workers };
}
const jobs = (...layouts: readonly string[]) =>
  layouts.map((layout) => ({ plan: {} as never, layout, observation: "o", options: {} }));
const turn = (): Promise<void> => new Promise((resolve) => setTimeout(resolve, 0));

describe("a pool of workers", () => {
  it("answers in the order of the requests, whatever order the workers finish in", async () => {
    const { pool, workers } = started(3);
    const asked = pool.map("assess", jobs("a", "b", "c", "d"));
    expect(workers.map((w) => w.now.layout)).toEqual(["a", "b", "c"]);
    workers[2].answer();
    expect(workers[2].now.layout).toBe("d");
    workers[1].answer();
    workers[2].answer();
    workers[0].answer();
    expect(await asked).toEqual(["of a", "of b", "of c", "of d"]);
  });

  it("starts no more workers than there is work for, and keeps them for the next batch", async () => {
    const { pool, workers } = started(8);
    const first = pool.map("assess", jobs("a", "b"));
    expect(workers).toHaveLength(2);
    for (const worker of workers) worker.answer();
    await first;
    const second = pool.map("assess", jobs("c"));
    expect(workers).toHaveLength(2);
    workers[1].answer();
    expect(await second).toEqual(["of c"]);
    expect(await pool.map("assess", [])).toEqual([]);
  });

  it("tries a request once more when its worker dies, on another worker", async () => {
    const { pool, workers } = started(2);
    const asked = pool.map("assess", jobs("a", "b", "c"));
    workers[0].onerror?.({ message: "out of memory" });
    expect(workers[0].terminated).toBe(true);
    expect(workers[2].now.layout).toBe("a");
    workers[1].answer();
    workers[1].answer();
    workers[2].answer();
    expect(await asked).toEqual(["of a", "of b", "of c"]);
  });

  it("reports a request that kills two workers, cancels the rest, and works again afterwards", async () => {
    const { pool, workers } = started(2);
    const asked = pool.map("assess", jobs("a", "b"));
    const failed = expect(asked).rejects.toThrow(
      "A worker stopped twice at the same point (out of memory); its answer cannot be had.",
    );
    workers[0].onerror?.({ message: "out of memory" });
    workers[2].onerror?.({ message: "out of memory" });
    await failed;
    expect(workers[1].heard.at(-1)?.kind).toBe("cancel");
    const next = pool.map("assess", jobs("c"));
    const fresh = workers[3];
    fresh.answer();
    expect(await next).toEqual(["of c"]);
  });

  it("ends with the fault of a task, naming its field", async () => {
    const { pool, workers } = started(1);
    const asked = pool.map("assess", jobs("a", "b"));
    const failed = expect(asked).rejects.toMatchObject({ name: "TaskFault", field: "declination", message: "too far" });
    workers[0].onmessage?.({ data: { kind: "fault", id: workers[0].now.id, message: "too far", field: "declination" } });
    await failed;
  });

  it("adds up progress, and a checkpoint that throws ends the batch with what it threw", async () => {
    const { pool, workers } = started(2);
    const seen: number[] = [];
    const asked = pool.map("assess", jobs("a", "b"), async (done) => {
      seen.push(done);
      if (done > 0.7) throw new Cancelled();
    });
    const failed = expect(asked).rejects.toBeInstanceOf(Cancelled);
    workers[0].progress(0.5);
    await turn();
    workers[1].answer();
    await turn();
    await failed;
    expect(seen).toEqual([0.25, 0.75]);
    expect(workers[0].heard.at(-1)).toMatchObject({ kind: "cancel" });
  });

  it("lets a newer batch take the place of the one that runs; late answers are dropped", async () => {
    const { pool, workers } = started(1);
    const old = expect(pool.map("assess", jobs("a", "b"))).rejects.toBeInstanceOf(Cancelled);
    const asked = pool.map("assess", jobs("c"));
    await old;
    // The worker is still at the old request; what it says of it is nobody's.
    workers[0].say("cancelled");
    expect(workers[0].now.layout).toBe("c");
    workers[0].answer();
    expect(await asked).toEqual(["of c"]);
  });

  it("says so when no worker can be started, and terminates all when closed", async () => {
    const none = new Pool(() => {
      throw new Error("not here");
    }, 2);
    await expect(none.map("assess", jobs("a"))).rejects.toThrow(TaskFault);
    const { pool, workers } = started(2);
    const asked = expect(pool.map("assess", jobs("a", "b"))).rejects.toBeInstanceOf(Cancelled);
    pool.close();
    await asked;
    expect(workers.every((w) => w.terminated)).toBe(true);
  });
});
