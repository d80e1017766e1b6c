import { describe, expect, it } from "vitest";
import type { AssessResult } from "../../src/assess/result.ts";
import { readPlan } from "../../src/plan/read.ts";
import { NONE, pairText, resultTable } from "../../src/view/tables.ts";
import { smallPlan } from "../cli/small-plan.ts";

const { plan } = readPlan(JSON.stringify(smallPlan()));
const [observation] = plan.observations;

/** A made-up result; what is not given cannot be had. */
function result(layout: string, given: Partial<AssessResult> = {}): AssessResult {
  return {
    layout,
    observation: "south",
    stationCount: 5,
    baselineCount: 10,
    longestBaselineM: null,
    shortestBaselineM: null,
    samplesPerBaseline: 24,
    samplesKept: 0,
    longestProjectedM: null,
    shortestProjectedM: null,
    longestUvWavelengths: null,
    maxWWavelengths: null,
    shadowedStationSamples: 0,
    visibleStationSamples: 0,
    hoursVisible: 0,
    coverage: { filledFraction: null, largestRadialGap: null, azimuthalUniformity: null },
    beam: {} as AssessResult["beam"],
    apertureResolutionArcsec: { slit: null, circular: null },
    largestScaleArcsec: null,
    recoverable: { gaussianArcsec: null, discArcsec: null },
    primaryBeamArcsec: 3600,
    primaryBeams: { d12: 3600 },
    densityFieldArcsec: null,
    noiseJy: null,
    weightingNoiseFactor: null,
    brightnessNoiseK: null,
    smearing: { bandwidthArcsec: null, timeArcsec: null },
    planarRadiusArcsec: null,
    air: { zenithOpacity: null, noiseFactor: null },
    fraunhoferM: { antenna: 1000, array: null },
    protectedFraction: 0,
    positionError: { phaseDeg: null, coherence: null, widthFraction: null },
    fullField: { channelWidthHz: null, sampleS: null, visibilitiesPerS: null, bytesPerS: null },
    warnings: [],
    ...given,
  };
}

const rowOf = (results: readonly AssessResult[], label: string) =>
  resultTable(plan, observation, results, null)
    .groups.flat()
    .find((row) => row.label === label);

describe("a table of results", () => {
  it("has a column a layout, one unit a row and figures enough for the smallest", () => {
    const lengths = [32_000, 512].map((x, k) => result(`L${k}`, { longestBaselineM: x }));
    expect(rowOf(lengths, "longest baseline, straight")).toEqual({
      label: "longest baseline, straight",
      unit: "km",
      cells: ["32.000", "0.512"],
    });
    const noise = [3.2e-6, 41e-6].map((x, k) => result(`L${k}`, { noiseJy: x }));
    expect(rowOf(noise, "noise in the image, per beam")).toMatchObject({ unit: "µJy", cells: ["3.20", "41.00"] });
  });

  it("writes both axes of a beam in one unit", () => {
    const beam = { majorArcsec: 0.26e-3 * 4, minorArcsec: 0.186e-3 } as AssessResult["beam"];
    expect(rowOf([result("a", { beam })], "beam major axis, FWHM of the fit")).toMatchObject({ unit: "mas", cells: ["1.04"] });
    expect(rowOf([result("a", { beam })], "beam minor axis, FWHM of the fit")).toMatchObject({ unit: "mas", cells: ["0.186"] });
  });

  it("signs sidelobes, both ways", () => {
    const beam = { peakSidelobe: 0.0312, deepestSidelobe: -0.0449 } as AssessResult["beam"];
    expect(rowOf([result("a", { beam })], "highest sidelobe")).toMatchObject({ unit: "%", cells: ["+3.1"] });
    expect(rowOf([result("a", { beam })], "deepest sidelobe")).toMatchObject({ unit: "%", cells: ["−4.5"] });
  });

  it("shows a dash for what cannot be had, never 0", () => {
    const cells = resultTable(plan, observation, [result("a")], null)
      .groups.flat()
      // These are there whether the source rises or not.
      .filter((row) => !/^(stations|baselines|primary|band protected|far field)/.test(row.label));
    for (const row of cells) {
      expect(row.cells).toEqual([row.label.startsWith("hours") ? "0.0" : NONE]);
    }
  });

  it("says what the figures assume", () => {
    expect(resultTable(plan, observation, [result("a")], null).settings).toEqual([
      "declination −45° 00′ 00″ of date, hour angle −2.0 to +2.0\u00a0h",
      // 4 h of hour angle in 24 samples: 600 s / 1.00273790935.
      "elevation from 15°; 24 samples a baseline, 598.4 s each",
      "1.42\u00a0GHz (21.11\u00a0cm), 1\u00a0MHz in 1 channel, 2 polarizations (Stokes I)",
      "natural weights, no taper; efficiency 1",
    ]);
    const other = {
      ...observation,
      epoch: "J2000" as const,
      startUtc: "2027-03-21T18:00:00Z",
      rightAscensionDeg: 10,
      repeats: 3,
      weighting: { ...observation.weighting, scheme: "robust" as const, robustness: -0.5, taperArcsec: 4 },
    };
    const [place, , , weights] = resultTable(plan, other, [result("a")], null).settings;
    expect(place).toContain("of J2000, brought to 2027-03-21T18:00:00Z");
    expect(weights).toBe("robust −0.5 weights, taper 4.00″, 3 repeats; efficiency 1");
    const undated = resultTable(plan, { ...other, startUtc: null }, [result("a")], null).settings[0];
    expect(undated).toContain("of J2000, taken as of date");
  });

  it("shows the verdict on a pair, and the pair", () => {
    const pair = { separationArcsec: 2, positionAngleDeg: 30, fluxRatio: 0.5 };
    const table = resultTable(
      plan,
      observation,
      [result("a", { pair: { dip: 0.314, verdict: "resolved" } }), result("b", { pair: { dip: null, verdict: "blended" } })],
      pair,
    );
    const rows = table.groups.flat();
    expect(rows.find(({ label }) => label === "pair")?.cells).toEqual(["resolved", "blended"]);
    expect(rows.find(({ label }) => label.startsWith("dip"))?.cells).toEqual(["31.4", NONE]);
    expect(table.settings.at(-1)).toBe("pair: two sources 2.00″ apart at PA 30°, fluxes 1 : 0.5");
    expect(pairText({ ...pair, fluxRatio: 1 })).toBe("two equal sources 2.00″ apart at PA 30°");
  });
});
