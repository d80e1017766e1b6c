import { describe, expect, it } from "vitest";
import { assess } from "../../src/assess/assess.ts";
import type { AssessResult } from "../../src/assess/result.ts";
import { readPlan } from "../../src/plan/read.ts";
import type { Plan } from "../../src/plan/schema.ts";

type Place = readonly [latitudeDeg: number, longitudeDeg: number, heightM?: number];

/** A plan of these stations and one observation, both limits at the horizon. */
function planOf(places: readonly Place[], observation: object = {}, diameterM = 0.5): Plan {
  const stations = places.map(([latitudeDeg, longitudeDeg, heightM = 0], k) => ({
    id: `S${k}`,
    latitudeDeg,
    longitudeDeg,
    heightM,
    antenna: "a",
  }));
  const [latitudeDeg, longitudeDeg] = places[0];
  return readPlan(
    JSON.stringify({
      format: "spanwright-plan",
      version: 1,
      site: { origin: { latitudeDeg, longitudeDeg, heightM: 0 } },
      antennas: [{ id: "a", diameterM, elevationLimitDeg: 0, receivers: [{ fromHz: 1e3, toHz: 1e13, sefdJy: 500 }] }],
      stations,
      layouts: [{ id: "all", stations: stations.map(({ id }) => id) }],
      observations: [
        { id: "o", declinationDeg: 30, hourAngle: { fromH: -3, toH: 3 }, frequencyHz: 1.4e9, integrationS: 300, ...observation },
      ],
    }),
  ).plan;
}

/** Every number of a result is a number, or null with a warning; never NaN or infinite. */
function expectWhole(result: AssessResult): void {
  const visit = (value: unknown, path: string): void => {
    if (typeof value === "number") expect(Number.isFinite(value), path).toBe(true);
    else if (value !== null && typeof value === "object")
      for (const [key, inner] of Object.entries(value)) visit(inner, `${path}.${key}`);
  };
  visit(result, "result");
  if (result.beam.majorArcsec === null) expect(result.warnings.length).toBeGreaterThan(0);
}
const run = async (plan: Plan): Promise<AssessResult> => {
  const result = await assess(plan, "all", "o");
  expectWhole(result);
  return result;
};

/** Five places within some hundred metres, about a latitude and longitude. */
const field = (latitudeDeg: number, longitudeDeg: number): readonly Place[] =>
  [
    [0, 0],
    [0.004, 0.001],
    [-0.003, 0.005],
    [0.001, -0.006],
    [-0.002, -0.002],
  ].map(([a, b]): Place => [latitudeDeg + a, longitudeDeg + b]);

describe("edges with a defined answer", () => {
  it("the same field across the antimeridian as anywhere else along its parallel", async () => {
    const [here, there] = [
      await run(planOf(field(20, 10))),
      await run(planOf(field(20, 180).map(([a, b]): Place => [a, b > 180 ? b - 360 : b]))),
    ];
    expect(there.longestBaselineM).toBeCloseTo(here.longestBaselineM as number, 6);
    // Positions are the same to a nanometre of their radius.
    expect(there.beam.majorArcsec).toBeCloseTo(here.beam.majorArcsec as number, 6);
    expect(there.samplesKept).toBe(here.samplesKept);
  });

  it("at the poles: stations about the axis see a star of the pole all day at one height", async () => {
    const south: readonly Place[] = [0, 70, 140, 210, 290].map((lon, k) => [-89.99 + 0.001 * k, lon]);
    const result = await run(planOf(south, { declinationDeg: -90, hourAngle: { fromH: -12, toH: 12 } }));
    expect(result.visibleStationSamples).toBe(5 * result.samplesPerBaseline);
    // Every baseline turns about the axis: the beam is round.
    expect(result.beam.axisRatio).toBeCloseTo(1, 2);
    const none = await run(planOf(south, { declinationDeg: 90, hourAngle: { fromH: -12, toH: 12 } }));
    expect(none.samplesKept).toBe(0);
    expect(none.beam.majorArcsec).toBeNull();
  });

  it.each([90, -90])("a source at declination %d is seen from its half of the Earth", async (declinationDeg) => {
    const result = await run(planOf(field(Math.sign(declinationDeg) * 40, 10), { declinationDeg }));
    expect(result.visibleStationSamples).toBe(5 * result.samplesPerBaseline);
    expect(result.beam.majorArcsec).toBeGreaterThan(0);
  });

  it("a window of no length is one sample of the integration time", async () => {
    const result = await run(planOf(field(20, 10), { hourAngle: { fromH: 1, toH: 1 } }));
    expect(result.samplesPerBaseline).toBe(1);
    expect(result.samplesKept).toBe(10);
  });

  it("one baseline has no ellipse and says so; its fringe is as wide as its length makes it", async () => {
    const result = await run(planOf(field(20, 10).slice(0, 2), { hourAngle: { fromH: 0, toH: 0 } }));
    expect(result.baselineCount).toBe(1);
    expect(result.beam.majorArcsec).toBeNull();
    expect(result.warnings.join(" ")).toContain("line");
    // A cosine falls to zero a quarter of the fringe from its peak; rays step a four-hundredth of that.
    const fringeArcsec = 206264.806247 / (result.longestUvWavelengths as number);
    expect((result.beam.firstZeroMinArcsec as number) / (fringeArcsec / 4)).toBeCloseTo(1, 3);
  });

  it("stations in one line, seen at transit, have no width along it: stated, not NaN", async () => {
    const line: readonly Place[] = [0, 1, 3, 7].map((k) => [0, 10 + 0.001 * k]);
    const result = await run(planOf(line, { declinationDeg: 0 }));
    expect(result.beam.majorArcsec).toBeNull();
    expect(result.beam.axisRatio).toBeNull();
    expect(result.noiseJy).toBeGreaterThan(0);
  });

  it("all samples in one density cell: uniform is natural but for the count", async () => {
    const close: readonly Place[] = [
      [20, 10],
      [20.00001, 10],
      [20, 10.00001],
    ];
    const weighting = (scheme: string) => ({ weighting: { scheme, fieldArcsec: 0.1 } });
    const uniform = await run(planOf(close, weighting("uniform"), 0.01));
    const natural = await run(planOf(close, weighting("natural"), 0.01));
    expect(uniform.weightingNoiseFactor).toBeCloseTo(1, 9);
    expect(uniform.beam.majorArcsec).toBeCloseTo(natural.beam.majorArcsec as number, 6);
  });

  it.each([
    [1e-3, 0.5],
    [10_000, 0.5],
  ])("a wavelength of %d m", async (wavelengthM, diameterM) => {
    const frequencyHz = 299_792_458 / wavelengthM;
    const result = await run(planOf(field(20, 10), { frequencyHz, bandwidthHz: frequencyHz / 1000 }, diameterM));
    const reference = await run(planOf(field(20, 10), { frequencyHz: 1.4e9, bandwidthHz: 1.4e6 }));
    // Angles follow the wavelength: the same plan at 21 cm tells both. Natural weights, so no cells come in.
    const ratio = (result.beam.majorArcsec as number) / (reference.beam.majorArcsec as number);
    expect(ratio / (wavelengthM / (299_792_458 / 1.4e9))).toBeCloseTo(1, 6);
  });

  it("baselines of one metre and of 12 700 km in one plan", async () => {
    const places: readonly Place[] = [
      [0, 0],
      [0, 0.000009],
      [2, 172],
      [60, 90],
      [-55, 80],
    ];
    const result = await run(planOf(places, { declinationDeg: 10, hourAngle: { fromH: -12, toH: 12 } }, 0.5));
    expect(result.shortestBaselineM).toBeCloseTo(1.0019, 3);
    expect(result.longestBaselineM).toBeGreaterThan(12_690_000);
    expect(result.beam.minorArcsec).toBeGreaterThan(0);
  });
});
