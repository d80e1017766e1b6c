import { describe, expect, it } from "vitest";
import { addStation, changeObservation, changeStation, moveStation, removeStation, renamePlan } from "../../src/plan/edits.ts";
import { layoutById, observationById, stationById } from "../../src/plan/find.ts";
import { begin, canRedo, canUndo, record, redo, redoLabel, undo, undoLabel } from "../../src/plan/history.ts";
import { readPlan } from "../../src/plan/read.ts";

const { plan } = readPlan(
  JSON.stringify({
    format: "spanwright-plan",
    version: 1,
    site: { origin: { latitudeDeg: 10, longitudeDeg: 20 } },
    antennas: [{ id: "a", diameterM: 6 }],
    stations: ["P", "Q"].map((id) => ({ id, latitudeDeg: 10, longitudeDeg: 20, heightM: 55, antenna: "a" })),
    layouts: [
      { id: "both", stations: ["P", "Q"] },
      { id: "lone", stations: ["Q"] },
    ],
    observations: [{ id: "o", declinationDeg: 0, hourAngle: { fromH: -1, toH: 1 }, frequencyHz: 1e9 }],
  }),
);

describe("D7 edits make new plans and leave the old one as it was", () => {
  it("moves a station, keeping its height", () => {
    const moved = moveStation(plan, "P", { latitudeDeg: 10.1, longitudeDeg: 20.2 });
    expect(stationById(moved, "P")).toMatchObject({ latitudeDeg: 10.1, longitudeDeg: 20.2, heightM: 55 });
    expect(stationById(plan, "P").latitudeDeg).toBe(10);
    expect(moved.stations[1]).toBe(plan.stations[1]);
  });

  it("changes, adds, removes, renames", () => {
    expect(stationById(changeStation(plan, "Q", { locked: true }), "Q").locked).toBe(true);
    expect(observationById(changeObservation(plan, "o", { declinationDeg: 5 }), "o").declinationDeg).toBe(5);
    const added = addStation(plan, "lone", { ...plan.stations[0], id: "R" });
    expect(layoutById(added, "lone").stations).toEqual(["Q", "R"]);
    const removed = removeStation(plan, "Q");
    expect(removed.stations.map((s) => s.id)).toEqual(["P"]);
    expect(removed.layouts.map((l) => l.id)).toEqual(["both"]); // a layout of nothing is none
    expect(renamePlan(plan, "New").title).toBe("New");
  });

  it("names what exists when asked for what does not", () => {
    expect(() => moveStation(plan, "Z", { latitudeDeg: 0, longitudeDeg: 0 })).toThrow('station is "Z"; expected one of P, Q.');
    expect(() => layoutById(plan, "wide")).toThrow('layout is "wide"; expected one of both, lone.');
  });
});

describe("D8 undo takes back one named step; a drag is one step", () => {
  it("undoes and redoes, and a new step forgets what was undone", () => {
    const first = record(begin(plan), "Rename", renamePlan(plan, "One"));
    const second = record(first, "Rename again", renamePlan(first.present, "Two"));
    expect(undoLabel(second)).toBe("Rename again");
    const back = undo(second);
    expect([back.present.title, redoLabel(back), canRedo(back)]).toEqual(["One", "Rename again", true]);
    expect(redo(back).present.title).toBe("Two");
    expect(canRedo(record(back, "Third", renamePlan(back.present, "Three")))).toBe(false);
    expect(undo(undo(second)).present).toBe(plan);
    const start = begin(plan);
    expect([undo(start), redo(start), canUndo(start)]).toEqual([start, start, false]);
  });

  it("joins steps of one key, and records nothing for no change", () => {
    let history = begin(plan);
    for (const lat of [10.1, 10.2, 10.3]) {
      history = record(history, "Move P", moveStation(history.present, "P", { latitudeDeg: lat, longitudeDeg: 20 }), "drag 1");
    }
    expect(history.past.length).toBe(1);
    expect(undo(history).present).toBe(plan);
    expect(record(history, "Nothing", history.present)).toBe(history);
    const other = record(history, "Move P", moveStation(history.present, "P", { latitudeDeg: 11, longitudeDeg: 20 }), "drag 2");
    expect(other.past.length).toBe(2);
  });
});
