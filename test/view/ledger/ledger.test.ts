import { describe, expect, it } from "vitest";
import type { RequirementOutcome } from "../../../src/assess/requirements.ts";
import { checkedPlan } from "../../../src/plan/read.ts";
import type { Plan } from "../../../src/plan/schema.ts";
import { conditionText } from "../../../src/view/ledger/condition.ts";
import { ledgerModel } from "../../../src/view/ledger/ledger.ts";

const plan: Plan = checkedPlan({
  format: "spanwright-plan",
  version: 1,
  site: { origin: { latitudeDeg: -31, longitudeDeg: 20 } },
  antennas: [{ id: "d", diameterM: 12 }],
  stations: [
    { id: "A", latitudeDeg: -31, longitudeDeg: 20, antenna: "d" },
    { id: "B", latitudeDeg: -31.01, longitudeDeg: 20, antenna: "d" },
  ],
  layouts: [
    { id: "wide", stations: ["A", "B"] },
    { id: "tight", stations: ["A"] },
  ],
  observations: [
    {
      id: "south",
      declinationDeg: -30,
      hourAngle: { fromH: -4, toH: 4 },
      frequencyHz: 1.42e9,
      bandwidthHz: 160e6,
      weighting: { scheme: "robust", robustness: 0 },
    },
    { id: "north", declinationDeg: 10, hourAngle: { fromH: -1, toH: 1 }, frequencyHz: 1.42e9 },
  ],
  requirements: [
    { id: "R1", text: "Beam", quantity: "beam.majorArcsec", atMost: 1.85, when: { observation: "south" } },
    { id: "R2", quantity: "largestScaleArcsec", atLeast: 150, when: { observation: "south" } },
    { id: "R3", quantity: "beam.peakAbsoluteSidelobe", atMost: 0.035, when: { observation: "south", sidelobeRadiusArcsec: 30 } },
    { id: "R4", quantity: "noiseJy", atMost: 1e-5, when: { observation: "south", layouts: ["tight"] } },
    { id: "R5", quantity: "hoursVisible", atLeast: 8 },
  ],
}).plan;

const outcome = (
  id: string,
  value: number | null,
  state: RequirementOutcome["state"],
  margin: number | null,
  note: string | null = null,
): RequirementOutcome => ({
  id,
  layout: "wide",
  observation: "south",
  state,
  value,
  limit: 0,
  sense: "atMost",
  margin,
  note,
});
const settled = [
  outcome("R1", 1.806, "at risk", 0.0238),
  outcome("R2", 148.6, "not met", -0.0093),
  outcome("R3", 0.0371, "not met", -0.06),
  outcome("R5", null, "cannot be computed", null, "hoursVisible is not known"),
];
const input = { plan, layout: "wide", settled, live: [], working: false, dragging: false };

describe("ledgerModel", () => {
  it("holds the lines that speak of the layout, in the order of the plan", () => {
    expect(ledgerModel(input).lines.map((l) => l.id)).toEqual(["R1", "R2", "R3", "R5"]);
    expect(ledgerModel({ ...input, layout: "tight" }).lines.map((l) => l.id)).toEqual(["R1", "R2", "R3", "R4", "R5"]);
  });

  it("says value, limit and margin so that the shown figures add up, over or short on the wrong side", () => {
    const [beam, scale, sidelobe] = ledgerModel(input).lines;
    expect(beam).toMatchObject({ title: "Beam", limit: "≤ 1.85″", words: "At risk, 0.04″ in hand", shortWords: "At risk, 0.04″" });
    expect(beam.value).toEqual({ figure: "1.81", unit: "″" });
    expect(scale).toMatchObject({ title: "Largest scale", limit: "≥ 150″", words: "Not met, 1″ short" });
    expect(sidelobe).toMatchObject({ limit: "≤ 3.5\u00a0%", words: "Not met, 0.2\u00a0% over" });
  });

  it("counts the states, and leaves what cannot be computed out of the tally, with its reason", () => {
    const model = ledgerModel(input);
    expect(model.tally.map((t) => t.count)).toEqual([0, 1, 2]);
    expect(model.open).toBe(1);
    expect(model.lines[3]).toMatchObject({ state: "cannot be computed", value: null, margin: null });
    expect(model.lines[3].note).toContain("Hours on the source");
  });

  it("shows the value before a change beside the live one, only where the shown figure differs", () => {
    const live = [outcome("R1", 1.9, "not met", -0.027), outcome("R2", 148.6, "not met", -0.0093)];
    const [beam, scale, sidelobe] = ledgerModel({ ...input, live, dragging: true }).lines;
    expect(beam).toMatchObject({ words: "Not met, was 1.81″", margin: -0.027, wasMargin: 0.0238 });
    expect(scale).toMatchObject({ words: "Not met, 1″ short", wasMargin: null });
    expect(sidelobe).toMatchObject({ state: "working", words: "Working, last value shown" });
  });

  it("works on what is not settled, keeping the last value, and keeps what cannot be computed as it is", () => {
    const lines = ledgerModel({ ...input, working: true }).lines;
    expect(lines.map((l) => l.state)).toEqual(["working", "working", "working", "cannot be computed"]);
    expect(ledgerModel({ ...input, settled: [] }).lines.every((l) => l.state === "working" && l.value === null)).toBe(true);
  });
});

describe("conditionText", () => {
  it.each([
    ["R1", "δ \u221230°, 21\u00a0cm, robust 0"],
    ["R2", "δ \u221230°, 21\u00a0cm"],
    ["R3", "within 30″, either sign"],
    ["R4", "robust 0, 160\u00a0MHz"],
    ["R5", "worst of 2 observations"],
  ])("of %s", (id, text) => {
    const line = plan.requirements.find((r) => r.id === id);
    expect(line && conditionText(plan, line)).toBe(text);
  });
});
