import { describe, expect, it } from "vitest";
import { DomainError } from "../../src/base/errors.ts";
import type { FromWorker } from "../../src/tasks/protocol.ts";
import { dispatcher, type Runners } from "../../src/tasks/run.ts";
import { buffersOf } from "../../src/tasks/transfer.ts";

const anything = {} as never;

function heard(runners: Runners): { handle: ReturnType<typeof dispatcher>; said: FromWorker[]; moved: (readonly ArrayBuffer[])[] } {
  const said: FromWorker[] = [];
  const moved: (readonly ArrayBuffer[])[] = [];
  const post = (message: FromWorker, transfer: readonly ArrayBuffer[]): void => {
    said.push(message);
    moved.push(transfer);
  };
  return { handle: dispatcher(runners, post, () => new Promise((resolve) => setTimeout(resolve))), said, moved };
}

describe("dispatcher", () => {
  it("runs a task, reports its progress and hands over the arrays of its answer", async () => {
    const values = new Float32Array(3);
    const { handle, said, moved } = heard({
      picture: {
        run: async (_, checkpoint) => {
          await checkpoint(0.4);
          return { beam: { values } } as never;
        },
        transfer: true,
      },
    });
    await handle({ kind: "run", id: 7, task: "picture", request: anything });
    expect(said).toEqual([
      { kind: "progress", id: 7, done: 0.4 },
      { kind: "done", id: 7, result: { beam: { values } } },
    ]);
    expect(moved[1]).toEqual([values.buffer]);
  });

  it("keeps the arrays of a task that needs them for its next answer", async () => {
    const { handle, moved } = heard({ preview: { run: () => ({ values: new Float32Array(3) }) as never, transfer: false } });
    await handle({ kind: "run", id: 1, task: "preview", request: anything });
    expect(moved[0]).toEqual([]);
  });

  it("stops at the next checkpoint after a cancel", async () => {
    let steps = 0;
    const { handle, said } = heard({
      sweep: {
        run: async (_, checkpoint) => {
          for (; steps < 1000; steps++) await checkpoint(steps / 1000);
          return anything;
        },
        transfer: false,
      },
    });
    const running = handle({ kind: "run", id: 1, task: "sweep", request: anything });
    await handle({ kind: "cancel", id: 1 });
    await running;
    expect(said.at(-1)).toEqual({ kind: "cancelled", id: 1 });
    expect(steps).toBeLessThan(2);
  });

  it("answers a fault with its sentence and, where there is one, its field", async () => {
    const { handle, said } = heard({
      picture: {
        run: () => {
          throw new DomainError("layout", "x", "one of a, b");
        },
        transfer: true,
      },
    });
    await handle({ kind: "run", id: 1, task: "picture", request: anything });
    await handle({ kind: "run", id: 2, task: "ledger", request: anything });
    expect(said[0]).toEqual({ kind: "fault", id: 1, message: 'layout is "x"; expected one of a, b.', field: "layout" });
    expect(said[1]).toMatchObject({ kind: "fault", id: 2, field: "task" });
  });
});

describe("buffersOf", () => {
  it("finds every buffer once, however deep and however often it is seen", () => {
    const shared = new Float64Array(4);
    const other = new Uint8Array(2);
    const found = buffersOf({ a: shared, b: [{ c: shared.subarray(1) }, other], d: null, e: "text", f: 3 });
    expect(found).toEqual([shared.buffer, other.buffer]);
  });
});
