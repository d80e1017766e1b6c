import { createHash } from "node:crypto";
import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { assess } from "../../src/assess/assess.ts";
import { judge } from "../../src/assess/requirements.ts";
import { readPlan } from "../../src/plan/read.ts";

const plan = (name: string) => readPlan(readFileSync(`scenarios/${name}.plan.json`, "utf8")).plan;

describe("Thistledown", () => {
  it("has the figures its first drawings were made with, to a few per cent", async () => {
    // Source: a prototype in another language, made before this program, with the same settings: beam 1.80″ × 1.50″ at −79.1°
    // (100.9°), longest baseline 32.0 km, shortest 136 m. It may differ by a few per cent in what it calls the lobe.
    const result = await assess(plan("thistledown"), "trident", "south");
    expect(Math.abs((result.beam.majorArcsec as number) / 1.8 - 1)).toBeLessThan(0.03);
    expect(Math.abs((result.beam.minorArcsec as number) / 1.5 - 1)).toBeLessThan(0.03);
    expect(Math.abs((result.beam.positionAngleDeg as number) - 100.9)).toBeLessThan(3);
    expect((result.longestBaselineM as number) / 1000).toBeCloseTo(32.0, 1);
    expect(Math.abs((result.shortestBaselineM as number) - 136)).toBeLessThan(1);
    expect(result.stationCount).toBe(30);
    expect(result.baselineCount).toBe(435);
  });

  it("shows every state of a line in its ledger", async () => {
    const states = (await judge(plan("thistledown"), "trident", [])).map((o) => o.state);
    expect(new Set(states)).toEqual(new Set(["met", "at risk", "not met", "cannot be computed"]));
  });

  it("names its terrain file by its hash", () => {
    const { terrain } = plan("thistledown").site;
    const bytes = readFileSync(`scenarios/${terrain?.file}`);
    expect(createHash("sha256").update(bytes).digest("hex")).toBe(terrain?.sha256);
  });
});

describe("Sallow Flat", () => {
  it("shadows itself low in the south and not overhead", async () => {
    const field = plan("sallow-flat");
    const low = await assess(field, "packed", "low");
    const snapshot = await assess(field, "packed", "snapshot");
    expect(low.shadowedStationSamples / low.visibleStationSamples).toBeGreaterThan(0.5);
    expect(snapshot.shadowedStationSamples).toBe(0);
    expect(snapshot.beam.majorArcsec).toBeGreaterThan(60 * 10);
  });
});

describe("Long Meridian", () => {
  it("resolves a fraction of a milliarcsecond with baselines near the Earth's diameter", async () => {
    const result = await assess(plan("long-meridian"), "globe", "core");
    expect(result.longestBaselineM).toBeGreaterThan(1.2e7);
    expect(result.longestBaselineM).toBeLessThan(12_756_274); // twice the equatorial radius
    expect(result.beam.majorArcsec).toBeLessThan(0.0005);
  });
});
