import { describe, expect, it } from "vitest";
import { DomainError } from "../../src/base/errors.ts";
import {
  addObservation,
  addRequirement,
  addStation,
  changeLayout,
  changeObservation,
  changeRequirement,
  changeSite,
  changeStation,
  cloneLayout,
  listStation,
  moveStation,
  removeLayout,
  removeObservation,
  removeRequirement,
  removeStation,
  renamePlan,
  unlistStation,
} from "../../src/plan/edits.ts";
import { antennaById, layoutById, observationById, stationById } from "../../src/plan/find.ts";
import { checkedPlan } from "../../src/plan/read.ts";
import type { Plan } from "../../src/plan/schema.ts";
import { read } from "./small.ts";

const frozen = <T>(value: T): T => {
  if (value !== null && typeof value === "object") for (const inner of Object.values(Object.freeze(value))) frozen(inner);
  return value;
};

/** Stations K1, K2, K3; layouts wide (K1, K2) and lone (K2). Frozen: an edit in place throws. */
const plan: Plan = frozen(
  read((p) => {
    p.stations.push({ ...p.stations[0], id: "K3", heightM: 55 });
    p.layouts.push({ id: "lone", stations: ["K2"] });
    p.requirements = [{ id: "R1", quantity: "noiseJy", atMost: 1 }];
  }).plan,
);

/** What the edited plan still shares with the plan. */
const shared = (edited: Plan): string[] => Object.keys(plan).filter((key) => edited[key] === plan[key]);
const LISTS = ["antennas", "stations", "layouts", "observations", "requirements"];
const others = (changed: string): string[] => LISTS.filter((name) => name !== changed);

describe("D7 edits make new plans, share what did not change, and give plans that can be read", () => {
  it.each<[string, Plan, string]>([
    ["renamePlan", renamePlan(plan, "New"), ""],
    ["changeSite", changeSite(plan, { maxSlopeDeg: 4 }), ""],
    ["moveStation", moveStation(plan, "K1", { latitudeDeg: 1, longitudeDeg: 2 }), "stations"],
    ["changeStation", changeStation(plan, "K1", { locked: true }), "stations"],
    ["addStation without a layout", addStation(plan, null, { ...plan.stations[0], id: "K4" }), "stations"],
    ["listStation", listStation(plan, "wide", "K3"), "layouts"],
    ["unlistStation", unlistStation(plan, "wide", "K1"), "layouts"],
    ["changeLayout", changeLayout(plan, "wide", { label: "Wide" }), "layouts"],
    ["cloneLayout, shared", cloneLayout(plan, "wide", { id: "wide2", label: "Wide 2" }, "shared"), "layouts"],
    ["removeLayout", removeLayout(plan, "lone"), "layouts"],
    ["removeStation, in no layout", removeStation(plan, "K3"), "stations"],
    ["changeObservation", changeObservation(plan, "south", { channels: 4 }), "observations"],
    ["addObservation", addObservation(plan, { ...plan.observations[0], id: "north" }), "observations"],
    ["addRequirement", addRequirement(plan, { ...plan.requirements[0], id: "R2" }), "requirements"],
    ["changeRequirement", changeRequirement(plan, "R1", { atMost: 2 }), "requirements"],
    ["removeRequirement", removeRequirement(plan, "R1"), "requirements"],
  ])("%s", (_, edited, list) => {
    expect(edited).not.toEqual(plan);
    expect(shared(edited)).toEqual(expect.arrayContaining(others(list)));
    expect(checkedPlan(structuredClone(edited)).plan).toEqual(edited);
  });

  it("shares the rows beside the one that changed", () => {
    const moved = moveStation(plan, "K2", { latitudeDeg: 1, longitudeDeg: 2 });
    expect(moved.stations.map((s, k) => s === plan.stations[k])).toEqual([true, false, true]);
    const listed = listStation(plan, "lone", "K3");
    expect(listed.layouts.map((l, k) => l === plan.layouts[k])).toEqual([true, false]);
  });

  it("moves a station in every layout that lists it, and keeps its height unless one is given", () => {
    const place = { latitudeDeg: 1.5, longitudeDeg: 2.5 };
    expect(moveStation(plan, "K3", place).stations[2]).toEqual({ ...plan.stations[2], ...place });
    expect(moveStation(plan, "K3", { ...place, heightM: undefined }).stations[2].heightM).toBe(55);
    expect(moveStation(plan, "K3", { ...place, heightM: 60 }).stations[2].heightM).toBe(60);
    expect(moveStation(plan, "K2", place).layouts).toBe(plan.layouts);
  });

  it("adds a station to the end of a layout", () => {
    const added = addStation(plan, "lone", { ...plan.stations[0], id: "K4" });
    expect(stationById(added, "K4").latitudeDeg).toBe(-31);
    expect(layoutById(added, "lone").stations).toEqual(["K2", "K4"]);
    expect(layoutById(added, "wide")).toBe(layoutById(plan, "wide"));
  });

  it("takes a removed station out of every layout that lists it", () => {
    const removed = removeStation(listStation(plan, "lone", "K1"), "K1");
    expect(removed.stations.map((s) => s.id)).toEqual(["K2", "K3"]);
    expect(removed.layouts.map((l) => l.stations)).toEqual([["K2"], ["K2"]]);
  });

  it("keeps a station that is out of a layout as a candidate pad", () => {
    const less = unlistStation(plan, "wide", "K1");
    expect(less.stations).toBe(plan.stations);
    expect(layoutById(less, "wide").stations).toEqual(["K2"]);
  });

  it("puts a copied layout behind its original, with the same stations or with its own", () => {
    const made = { id: "trial", label: "Trial" };
    const shares = cloneLayout(plan, "wide", made, "shared");
    expect(shares.layouts.map((l) => l.id)).toEqual(["wide", "trial", "lone"]);
    expect(layoutById(shares, "trial")).toEqual({ id: "trial", label: "Trial", stations: ["K1", "K2"] });
    const own = cloneLayout(plan, "wide", made, "own");
    expect(layoutById(own, "trial").stations).toEqual(["K1-2", "K2-2"]);
    expect(stationById(own, "K2-2")).toEqual({ ...stationById(own, "K2"), id: "K2-2" });
    const again = cloneLayout(own, "wide", { id: "trial2", label: "" }, "own");
    expect(layoutById(again, "trial2").stations).toEqual(["K1-3", "K2-3"]);
  });

  it("copies stations of the longest ids to ids that can be read", () => {
    const long = "𝔎".repeat(64);
    const { plan: tall } = read((p) => {
      p.stations[0].id = long;
      p.layouts[0].stations[0] = long;
    });
    const own = cloneLayout(tall, "wide", { id: "trial", label: "" }, "own");
    expect(checkedPlan(structuredClone(own)).plan).toEqual(own);
  });

  it("leaves requirements that name what is removed, and reading says so", () => {
    const named = changeRequirement(addObservation(plan, { ...plan.observations[0], id: "north" }), "R1", {
      when: { observation: "north", layouts: ["lone"] },
    });
    const removed = removeLayout(removeObservation(named, "north"), "lone");
    expect(removed.requirements).toBe(named.requirements);
    expect(checkedPlan(structuredClone(removed)).warnings.length).toBe(2);
  });

  it.each<[string, () => unknown, string]>([
    [
      "a station there is not",
      () => moveStation(plan, "Z", { latitudeDeg: 0, longitudeDeg: 0 }),
      'station is "Z"; expected one of K1, K2, K3.',
    ],
    ["a layout there is not", () => layoutById(plan, "tall"), 'layout is "tall"; expected one of wide, lone.'],
    ["an observation there is not", () => observationById(plan, "up"), 'observation is "up"; expected one of south.'],
    ["an antenna there is not", () => antennaById(plan, "d1"), 'antenna is "d1"; expected one of d12.'],
    ["an observation to change", () => changeObservation(plan, "up", {}), 'observation is "up"; expected one of south.'],
    [
      "a requirement where there is none",
      () => removeRequirement(removeRequirement(plan, "R1"), "R1"),
      'requirement is "R1"; expected nothing: the plan has none.',
    ],
    ["an id that is taken", () => addStation(plan, null, plan.stations[0]), 'station is "K1"; expected an id that no other has.'],
    [
      "a layout's id that is taken",
      () => cloneLayout(plan, "wide", { id: "lone", label: "" }, "shared"),
      'layout is "lone"; expected an id that no other has.',
    ],
    [
      "a station listed twice",
      () => listStation(plan, "wide", "K1"),
      'station is "K1"; expected a station that layout wide does not have yet.',
    ],
    [
      "a station that is not listed",
      () => unlistStation(plan, "lone", "K1"),
      'station is "K1"; expected a station of layout lone.',
    ],
    [
      "the last station of a layout",
      () => removeStation(plan, "K2"),
      'station is "K2"; expected one that is not the last of layout lone.',
    ],
    [
      "the last layout",
      () => removeLayout(removeLayout(plan, "lone"), "wide"),
      'layout is "wide"; expected one that is not the last layout.',
    ],
    [
      "the last observation",
      () => removeObservation(plan, "south"),
      'observation is "south"; expected one that is not the last observation.',
    ],
  ])("refuses %s", (_, edit, message) => {
    expect(edit).toThrow(DomainError);
    expect(edit).toThrow(message);
  });

  it("names twelve of what exists and counts the rest", () => {
    const { plan: many } = read((p) => {
      p.stations = Array.from({ length: 20 }, (_, k) => ({ ...p.stations[0], id: `S${k}` }));
      p.layouts[0].stations = ["S0"];
    });
    expect(() => stationById(many, "Z")).toThrow(
      'station is "Z"; expected one of S0, S1, S2, S3, S4, S5, S6, S7, S8, S9, S10, S11 and 8 more.',
    );
  });
});
