import { describe, expect, it } from "vitest";
import { Host } from "../../src/page/host.ts";
import { type FromWorker, STALE, type ToWorker, type WorkerLike } from "../../src/tasks/protocol.ts";

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
  say(message: FromWorker): void {
    this.onmessage?.({ data: message });
  }
  get runs(): readonly number[] {
    return this.heard.flatMap((m) => (m.kind === "run" ? [m.id] : []));
  }
}

const request = { plan: {} as never, layout: "a", observation: "o", pair: null, uvSize: 8 };
const answer = (marker: string): never => ({ marker }) as never;

function started(letFinish = false): { host: Host; workers: Scripted[] } {
  const workers: Scripted[] = [];
  const spawn = (): Scripted => {
    const worker = new Scripted();
    workers.push(worker);
    return worker;
  };
  return { host: new Host(spawn, ["picture", "ledger", "sweep"], letFinish), workers };
}

describe("Host", () => {
  it("answers a request with the worker's result and reports its progress", async () => {
    const { host, workers } = started();
    const seen: number[] = [];
    const asked = host.ask("picture", request, (done) => seen.push(done));
    workers[0].say({ kind: "progress", id: 1, done: 0.5 });
    workers[0].say({ kind: "done", id: 1, result: answer("one") });
    expect(await asked).toEqual({ marker: "one" });
    expect(seen).toEqual([0.5]);
  });

  it("keeps one in flight and one waiting a task: the newest wins, the others are stale", async () => {
    const { host, workers } = started();
    const first = host.ask("picture", request);
    const second = host.ask("picture", request);
    const third = host.ask("picture", request);
    expect(workers[0].runs).toEqual([1]);
    expect(workers[0].heard).toContainEqual({ kind: "cancel", id: 1 });
    expect(await first).toBe(STALE);
    expect(await second).toBe(STALE);
    workers[0].say({ kind: "cancelled", id: 1 });
    expect(workers[0].runs).toEqual([1, 3]);
    workers[0].say({ kind: "done", id: 3, result: answer("three") });
    expect(await third).toEqual({ marker: "three" });
  });

  it("drops an answer that comes after its request was cancelled", async () => {
    const { host, workers } = started();
    const seen: number[] = [];
    const first = host.ask("picture", request, (done) => seen.push(done));
    host.drop("picture");
    workers[0].say({ kind: "progress", id: 1, done: 0.9 });
    workers[0].say({ kind: "done", id: 1, result: answer("late") });
    expect(await first).toBe(STALE);
    expect(seen).toEqual([]);
  });

  it("serves waiting tasks in its own order, not in that of asking", async () => {
    const { host, workers } = started();
    void host.ask("picture", request);
    void host.ask("sweep", answer("s"));
    void host.ask("ledger", answer("l"));
    workers[0].say({ kind: "done", id: 1, result: answer("p") });
    await Promise.resolve();
    const tasks = workers[0].heard.flatMap((m) => (m.kind === "run" ? [m.task] : []));
    expect(tasks).toEqual(["picture", "ledger"]);
  });

  it("lets a running request finish where asked to, so that a fast stream of requests is answered at all", async () => {
    const { host, workers } = started(true);
    const first = host.ask("preview", answer("a"));
    const second = host.ask("preview", answer("b"));
    const third = host.ask("preview", answer("c"));
    expect(await second).toBe(STALE);
    workers[0].say({ kind: "done", id: 1, result: answer("first") });
    expect(await first).toEqual({ marker: "first" });
    workers[0].say({ kind: "done", id: 3, result: answer("third") });
    expect(await third).toEqual({ marker: "third" });
  });

  it("passes on a fault with the field it names", async () => {
    const { host, workers } = started();
    const asked = host.ask("picture", request);
    workers[0].say({ kind: "fault", id: 1, message: 'layout is "x"; expected one of a.', field: "layout" });
    await expect(asked).rejects.toMatchObject({ name: "TaskFault", field: "layout" });
  });

  it("starts a dead worker once more with what was asked, then says so in a sentence", async () => {
    const { host, workers } = started();
    const asked = host.ask("picture", request);
    const waiting = host.ask("ledger", answer("l"));
    workers[0].onerror?.({ message: "out of memory" });
    expect(workers).toHaveLength(2);
    expect(workers[0].terminated).toBe(true);
    expect(workers[1].runs).toEqual([1]);
    workers[1].onerror?.({ message: "out of memory" });
    const sentence = /stopped twice and was not started again \(out of memory\)\. Reload/;
    await expect(asked).rejects.toThrow(sentence);
    await expect(waiting).rejects.toThrow(sentence);
  });

  it("forgets an old death once a worker has answered", async () => {
    const { host, workers } = started();
    const asked = host.ask("picture", request);
    workers[0].onerror?.({});
    workers[1].say({ kind: "done", id: 1, result: answer("p") });
    await asked;
    const again = host.ask("picture", request);
    workers[1].onerror?.({});
    workers[2].say({ kind: "done", id: 2, result: answer("q") });
    expect(await again).toEqual({ marker: "q" });
  });
});
