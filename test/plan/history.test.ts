import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { moveStation, renamePlan } from "../../src/plan/edits.ts";
import { begin, canRedo, canUndo, type History, record, redo, redoLabel, undo, undoLabel } from "../../src/plan/history.ts";
import type { Plan } from "../../src/plan/schema.ts";
import { read } from "./small.ts";

const { plan } = read(() => {});
const renamed = (history: History, title: string): Plan => renamePlan(history.present, title);
const moved = (history: History, latitudeDeg: number): Plan =>
  moveStation(history.present, "K1", { latitudeDeg, longitudeDeg: 20 });

describe("D8 undo takes back one named step; a drag is one step", () => {
  it("undoes and redoes by name, and a new step forgets what was undone", () => {
    const first = record(begin(plan), "rename", renamePlan(plan, "One"));
    const second = record(first, "rename again", renamed(first, "Two"));
    expect(undoLabel(second)).toBe("rename again");
    const back = undo(second);
    expect([back.present.title, undoLabel(back), redoLabel(back), canRedo(back)]).toEqual(["One", "rename", "rename again", true]);
    expect(redo(back)).toEqual(second);
    expect(canRedo(record(back, "third", renamed(back, "Three")))).toBe(false);
    expect(undo(undo(second)).present).toBe(plan);
  });

  it("has nothing to do at either end", () => {
    const start = begin(plan);
    expect([undo(start), redo(start)]).toEqual([start, start]);
    expect([canUndo(start), canRedo(start), undoLabel(start), redoLabel(start)]).toEqual([false, false, undefined, undefined]);
  });

  it("records nothing where nothing changed", () => {
    const start = begin(plan);
    expect(record(start, "nothing", plan)).toBe(start);
  });

  it("joins steps in a row of one key, under the last one's name", () => {
    let history = record(begin(plan), "rename", renamePlan(plan, "One"));
    for (const lat of [10.1, 10.2, 10.3]) history = record(history, `move K1 to ${lat}`, moved(history, lat), "drag 1");
    expect([history.past.length, undoLabel(history)]).toEqual([2, "move K1 to 10.3"]);
    expect(undo(history).present.title).toBe("One");
    expect(undo(history).present.stations).toBe(plan.stations);
    expect(redo(undo(history)).present.stations[0].latitudeDeg).toBe(10.3);
  });

  it("does not join another key, none, or a step that was undone", () => {
    const one = record(begin(plan), "move", moved(begin(plan), 11), "drag 1");
    expect(record(one, "move", moved(one, 12), "drag 2").past.length).toBe(2);
    expect(record(one, "move", moved(one, 12)).past.length).toBe(2);
    const unkeyed = record(begin(plan), "move", moved(begin(plan), 11));
    expect(record(unkeyed, "move", moved(unkeyed, 12)).past.length).toBe(2);
    const two = record(one, "rename", renamed(one, "x"));
    const back = undo(two);
    const next = record(back, "move", moved(back, 12), "drag 1");
    expect([next.past.length, next.past[0]]).toEqual([2, one.past[0]]);
  });

  it("comes back to every plan it went through", () => {
    fc.assert(
      fc.property(fc.array(fc.tuple(fc.string({ maxLength: 5 }), fc.constantFrom(null, "a", "b")), { maxLength: 20 }), (steps) => {
        let history = begin(plan);
        for (const [title, key] of steps) history = record(history, title, renamed(history, title), key);
        const seen = [history.present];
        while (canUndo(history)) {
          history = undo(history);
          seen.push(history.present);
        }
        expect(history.present).toBe(plan);
        for (let k = seen.length - 2; k >= 0; k--) {
          history = redo(history);
          expect(history.present).toBe(seen[k]);
        }
        expect(canRedo(history)).toBe(false);
      }),
      { seed: 20260101 },
    );
  });
});
