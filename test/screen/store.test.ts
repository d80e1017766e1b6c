import { afterEach, describe, expect, it, vi } from "vitest";
import { changeObservation, moveStation } from "../../src/plan/edits.ts";
import { checkedPlan } from "../../src/plan/read.ts";
import type { Plan } from "../../src/plan/schema.ts";
import { Store } from "../../src/screen/store.ts";
import { type Desk, STALE, TaskFault, type TaskName } from "../../src/tasks/protocol.ts";
import { runners } from "../../src/tasks/runners.ts";

const plan: Plan = checkedPlan({
  format: "spanwright-plan",
  version: 1,
  site: { origin: { latitudeDeg: -30, longitudeDeg: 20 } },
  antennas: [{ id: "d", diameterM: 12, receivers: [{ fromHz: 1e9, toHz: 2e9, sefdJy: 400 }] }],
  stations: [
    [0, 0],
    [0.011, 0.004],
    [-0.003, 0.017],
    [-0.019, -0.006],
  ].map(([north, east], k) => ({
    id: `S${k}`,
    latitudeDeg: -30 + north,
    longitudeDeg: 20 + east,
    antenna: "d",
  })),
  layouts: [
    { id: "four", stations: ["S0", "S1", "S2", "S3"] },
    { id: "three", stations: ["S0", "S1", "S2"] },
  ],
  observations: [{ id: "south", declinationDeg: -40, hourAngle: { fromH: -3, toH: 3 }, integrationS: 600, frequencyHz: 1.42e9 }],
  requirements: [
    { id: "R1", quantity: "beam.majorArcsec", atMost: 40 },
    { id: "R2", quantity: "largestScaleArcsec", atLeast: 20 },
    { id: "R3", quantity: "pair.dip", atLeast: 0.2, when: { pair: { separationArcsec: 25 } } },
  ],
}).plan;

/** Only so that a hang ends: nothing here depends on how long an answer takes. */
const PATIENCE = { timeout: 60_000 };

const kept = { task: "place", theme: "light", keys: true } as const;
const moved = (by: number): Plan => moveStation(plan, "S3", { latitudeDeg: -30.019 + by, longitudeDeg: 19.994 });

/** Runs the real tasks here, at once. */
function nearDesk(): Desk {
  const all = runners();
  return {
    ask: async (task, request) => (await all[task]?.run(request as never, () => {})) as never,
    drop: () => {},
  };
}

/** Answers when the test says so. */
class HeldDesk implements Desk {
  readonly asked: { task: TaskName; request: unknown; resolve: (value: never) => void; reject: (error: Error) => void }[] = [];
  readonly dropped: TaskName[] = [];
  ask(task: TaskName, request: unknown): Promise<never> {
    return new Promise((resolve, reject) => this.asked.push({ task, request, resolve, reject }));
  }
  drop(task: TaskName): void {
    this.dropped.push(task);
  }
}

const settled = (store: Store): Promise<void> =>
  vi.waitFor(() => {
    const { behind, outcomes, live, dragging } = store.shown;
    if (behind || outcomes.length === 0 || live.length > 0 || dragging) throw new Error("not settled yet");
  }, PATIENCE);

afterEach(() => vi.useRealTimers());

describe("Store", { timeout: 120_000 }, () => {
  it("opens a plan with a settled picture and its ledger", async () => {
    const store = new Store(nearDesk(), plan, kept);
    await settled(store);
    expect(store.shown.picture?.settled).toBe(true);
    expect(store.shown.outcomes.map((o) => o.id)).toEqual(["R1", "R2", "R3"]);
    expect(store.shown.session.pair.separationArcsec).toBe(25);
  });

  it("settles after every edit, and undo and redo bring plan and figures back", async () => {
    const store = new Store(nearDesk(), plan, kept);
    await settled(store);
    const before = store.shown.picture?.result.beam.majorArcsec;
    store.edit("move S3", moved(0.01));
    expect(store.shown.behind).toBe(true);
    await settled(store);
    const after = store.shown.picture?.result.beam.majorArcsec;
    expect(after).not.toBe(before);
    expect(store.shown.undoLabel).toBe("move S3");
    store.undo();
    await settled(store);
    expect(store.plan).toBe(plan);
    expect(store.shown.picture?.result.beam.majorArcsec).toBe(before);
    expect(store.shown).toMatchObject({ undoLabel: null, redoLabel: "move S3" });
    store.redo();
    await settled(store);
    expect(store.shown.picture?.result.beam.majorArcsec).toBe(after);
  });

  it("previews while a station is held, with the lines that follow, and records nothing until it is put down", async () => {
    const store = new Store(nearDesk(), plan, kept);
    await settled(store);
    store.drag(moved(0.002), "move");
    await vi.waitFor(() => expect(store.shown.picture?.settled).toBe(false), PATIENCE);
    expect(store.shown.plan).not.toBe(plan);
    expect(store.plan).toBe(plan);
    expect(store.shown.live.map((o) => o.id)).toEqual(["R1", "R2"]);
    expect(store.shown.undoLabel).toBeNull();
    store.release();
    await settled(store);
    expect(store.shown.plan).toBe(plan);
    expect(store.shown.picture?.settled).toBe(true);
  });

  it("drops an answer that a newer change has overtaken", async () => {
    const desk = new HeldDesk();
    const store = new Store(desk, plan, kept);
    store.edit("move S3", moved(0.01));
    const [first, second] = desk.asked;
    const real = await runners().picture?.run(first.request as never, () => {});
    first.resolve(real as never);
    await Promise.resolve();
    expect(store.shown.picture).toBeNull();
    second.resolve(real as never);
    await vi.waitFor(() => expect(store.shown.picture).not.toBeNull(), PATIENCE);
    expect(desk.asked[2].task).toBe("ledger");
    expect(desk.dropped).toContain("ledger");
  });

  it("says it is working only past 150 ms, and stops saying so", async () => {
    vi.useFakeTimers();
    const desk = new HeldDesk();
    const store = new Store(desk, plan, kept);
    await vi.advanceTimersByTimeAsync(149);
    expect(store.shown.working).toBe(false);
    await vi.advanceTimersByTimeAsync(2);
    expect(store.shown.working).toBe(true);
    desk.asked[0].reject(new TaskFault("The computation stopped twice.", null));
    await vi.advanceTimersByTimeAsync(0);
    expect(store.shown).toMatchObject({ working: false, fault: "The computation stopped twice." });
  });

  it("ignores a stale answer without a word", async () => {
    const desk = new HeldDesk();
    const store = new Store(desk, plan, kept);
    desk.asked[0].resolve(STALE as never);
    await Promise.resolve();
    expect(store.shown).toMatchObject({ picture: null, fault: null });
  });

  it("sees another layout, and keeps what is looked at inside the plan", async () => {
    const store = new Store(nearDesk(), plan, kept);
    await settled(store);
    store.look({ layout: "three", station: "S1", line: "R2" });
    await settled(store);
    expect(store.shown.picture?.result.stationCount).toBe(3);
    store.look({ layout: "gone", station: "gone" });
    expect(store.shown.session).toMatchObject({ layout: "four", station: null, line: "R2" });
  });

  it("undoes steps of one key together", () => {
    const store = new Store(new HeldDesk(), plan, kept);
    store.edit("declination −41°", changeObservation(store.plan, "south", { declinationDeg: -41 }), "declination");
    store.edit("declination −42°", changeObservation(store.plan, "south", { declinationDeg: -42 }), "declination");
    store.undo();
    expect(store.plan).toBe(plan);
  });

  it("opens another plan as one step that undo takes back", async () => {
    const store = new Store(nearDesk(), plan, kept);
    await settled(store);
    const other = { ...plan, title: "Other", layouts: [plan.layouts[1]] };
    store.open(other, "Other");
    expect(store.shown.session.layout).toBe("three");
    expect(store.shown.toast).toMatchObject({ text: "Opened Other.", action: "undo" });
    store.undo();
    expect(store.plan).toBe(plan);
  });

  it("tells what changed state in the ledger once it is settled", async () => {
    const store = new Store(nearDesk(), plan, kept);
    await settled(store);
    const { value } = store.shown.outcomes[0];
    const strict = {
      ...plan,
      requirements: [{ ...plan.requirements[0], atMost: (value as number) * 0.9 }, ...plan.requirements.slice(1)],
    };
    store.edit("tighten", strict);
    await vi.waitFor(() => expect(store.shown.announced).toBe("Beam, major axis not met, was met."), PATIENCE);
  });
});
