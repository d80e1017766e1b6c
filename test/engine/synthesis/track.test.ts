import { describe, expect, it } from "vitest";
import { channelCentres, sampleTimes } from "../../../src/engine/synthesis/track.ts";

const HOUR = Math.PI / 12;

describe("sample times", () => {
  it("are midpoints of n = round(3600·Δh/(integration·1.00273790935)) equal parts", () => {
    const { hourAngleRad, sampleS } = sampleTimes(-4, 4, 180);
    expect(hourAngleRad.length).toBe(160); // 28 800/(180 × 1.00273790935) = 159.56
    expect(hourAngleRad[0]).toBeCloseTo((-4 + 8 / 320) * HOUR, 14);
    expect(hourAngleRad[159]).toBeCloseTo((4 - 8 / 320) * HOUR, 14);
    expect(sampleS).toBeCloseTo(28_800 / (1.00273790935 * 160), 10);
  });

  it("give one sample for a snapshot, lasting the integration, and for a window shorter than half of it", () => {
    expect(sampleTimes(1.75, 1.75, 30)).toEqual({ hourAngleRad: Float64Array.of(1.75 * HOUR), sampleS: 30 });
    expect(sampleTimes(0, 0.001, 600).hourAngleRad).toEqual(Float64Array.of(0.0005 * HOUR));
  });

  it("refuse a reversed window and a length of nothing", () => {
    expect(() => sampleTimes(3, -5, 60)).toThrow("hourAngle.toH is -5; expected at least hourAngle.fromH, 3.");
    expect(() => sampleTimes(-1, 1, 0)).toThrow("integrationS is 0");
    expect(() => sampleTimes(-1, 1, Number.NaN)).toThrow("integrationS");
  });
});

describe("channel centres", () => {
  it("fill the band evenly", () => {
    expect([...channelCentres(1e9, 4e8, 4)]).toEqual([0.85e9, 0.95e9, 1.05e9, 1.15e9]);
    expect([...channelCentres(1e9, 4e8, 1)]).toEqual([1e9]);
  });

  it("refuse a band that reaches zero frequency", () => {
    expect(() => channelCentres(1e6, 2e6, 2)).toThrow("bandwidthHz is 2000000; expected less than twice the frequency");
  });
});
