import { describe, expect, it } from "vitest";
import { checkedPlan } from "../../../src/plan/read.ts";
import type { Observation } from "../../../src/plan/schema.ts";
import { bandwidthAxis, observationBar, waveAxis } from "../../../src/view/resolve/bar.ts";
import { change, slid } from "../../../src/view/resolve/change.ts";

const { plan } = checkedPlan({
  format: "spanwright-plan",
  version: 1,
  site: { origin: { latitudeDeg: -30, longitudeDeg: 20 } },
  antennas: [{ id: "d", diameterM: 12, elevationLimitDeg: 15, receivers: [{ fromHz: 1e9, toHz: 2e9, sefdJy: 400 }] }],
  stations: [{ id: "A", latitudeDeg: -30, longitudeDeg: 20, antenna: "d" }],
  layouts: [{ id: "one", stations: ["A"] }],
  observations: [
    {
      id: "south",
      declinationDeg: -30.2556,
      hourAngle: { fromH: -4, toH: 3.5 },
      frequencyHz: 1.42e9,
      bandwidthHz: 160e6,
      weighting: { scheme: "robust", robustness: -0.5 },
    },
  ],
});
const observation = plan.observations[0] as Observation;
const bar = (compact = false) => observationBar(plan.site, observation, plan.antennas, compact);

describe("observationBar", () => {
  it("shows one value as wavelength and as frequency", () => {
    const { wavelength } = bar();
    expect([wavelength.field.text, wavelength.field.unit]).toEqual(["21.11", "cm"]);
    expect([wavelength.frequency.text, wavelength.frequency.unit]).toEqual(["1.420", "GHz"]);
  });

  it("writes declination to the second, and to the minute where there is little room", () => {
    expect(bar().declination.field.text).toBe("\u221230° 15′ 20″");
    expect(bar(true).declination.field.text).toBe("\u221230° 15′");
  });

  it.each([
    ["-30:15", -30.25],
    ["-30d15m", -30.25],
    ["−12.5", -12.5],
    ["+12° 30′", 12.5],
  ])("reads the declination %s", (text, want) => expect(bar().declination.field.parse(text)).toBeCloseTo(want, 12));

  it.each(["190", "north", "", "-91"])("refuses the declination %s in one sentence", (text) => {
    expect(() => bar().declination.field.parse(text)).toThrow(/^declination is .*; expected /);
  });

  it("reads a wavelength or a frequency in either field, a bare number in the unit shown", () => {
    const { field, frequency } = bar().wavelength;
    expect(field.parse("18")).toBeCloseTo(0.18, 12);
    expect(field.parse("18cm")).toBeCloseTo(0.18, 12);
    expect(field.parse("1.5 GHz")).toBeCloseTo(299_792_458 / 1.5e9, 9);
    expect(frequency.parse("1.6")).toBe(1.6e9);
    expect(frequency.parse("21cm")).toBeCloseTo(299_792_458 / 0.21, 3);
  });

  it("reads one end of the window, or both as ±4h", () => {
    const { from } = bar().window;
    expect(from.parse("-4h30m")).toBe(-4.5);
    expect(from.parse("±4h")).toEqual({ both: 4 });
    expect(() => from.parse("13")).toThrow(/hour angle/);
  });

  it("dots what sky and receivers cannot reach", () => {
    const { declination, window, wavelength } = bar();
    // Transit above 15° from latitude −30°: declinations up to 45°.
    expect(declination.slider.reach[0][1]).toBeCloseTo((45 + 90) / 180, 12);
    expect(window.slider.reach[0][0]).toBeCloseTo(1 - window.slider.reach[0][1], 12);
    expect(wavelength.slider.reach).toHaveLength(1);
  });
});

describe("change", () => {
  it("keeps the rest of the window and of the weighting", () => {
    expect(change.window(observation, "toH", 5).patch.hourAngle).toMatchObject({ fromH: -4, toH: 5 });
    expect(change.window(observation, "fromH", { both: 2 }).patch.hourAngle).toMatchObject({ fromH: -2, toH: 2 });
    expect(change.robustness(observation, 1).patch.weighting).toMatchObject({ scheme: "robust", robustness: 1, taperArcsec: null });
  });

  it("refuses a window that ends before it begins and a band below 0 Hz", () => {
    expect(() => change.window(observation, "fromH", 4)).toThrow(/hour angle from is 4; expected at most \+3\.50 h/);
    expect(() => change.bandwidth(observation, 3e9)).toThrow(/less than twice the frequency/);
  });
});

describe("slid", () => {
  it("gives the value back that a handle was put at", () => {
    const { declination, wavelength, bandwidth, weighting } = bar();
    expect(slid.declination(declination.slider.handles[0].at)).toBeCloseTo(-30.5, 0);
    expect(slid.wavelength(wavelength.slider.handles[0].at, waveAxis(observation))).toBeCloseTo(0.211, 3);
    expect(slid.bandwidth(bandwidth.slider.handles[0].at, bandwidthAxis(observation), observation.frequencyHz)).toBe(160e6);
    expect(slid.robustness(weighting.slider.handles[0].at)).toBe(-0.5);
  });
});
