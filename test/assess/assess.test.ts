import { describe, expect, it } from "vitest";
import { assess, assessment } from "../../src/assess/assess.ts";
import { beamImage } from "../../src/assess/image.ts";
import { picture } from "../../src/assess/picture.ts";
import { PreviewSession } from "../../src/assess/preview.ts";
import { judge, marginOf, quantityOf } from "../../src/assess/requirements.ts";
import { setup } from "../../src/assess/setup.ts";
import { sweep, sweepValues } from "../../src/assess/sweep.ts";
import { tracks } from "../../src/assess/tracks.ts";
import { roundedJson } from "../../src/base/json.ts";
import { exactSamples } from "../../src/engine/synthesis/exact.ts";
import { moveStation } from "../../src/plan/edits.ts";
import { readPlan } from "../../src/plan/read.ts";
import { parkMiller } from "../support/random.ts";

const random = parkMiller(31);
const places = Array.from({ length: 9 }, () => [-31 + 0.05 * (random() - 0.5), 24 + 0.06 * (random() - 0.5)]);

/** Nine stations within a few kilometres, one observation, with changes. */
function plan(
  change: {
    stations?: number[][];
    observation?: object;
    antenna?: object;
    requirements?: object[];
    originLongitudeDeg?: number;
  } = {},
) {
  const stations = (change.stations ?? places).map(([latitudeDeg, longitudeDeg], k) => ({
    id: `S${k}`,
    latitudeDeg,
    longitudeDeg,
    antenna: "a",
  }));
  const text = JSON.stringify({
    format: "spanwright-plan",
    version: 1,
    site: { origin: { latitudeDeg: -31, longitudeDeg: change.originLongitudeDeg ?? 24 } },
    antennas: [
      { id: "a", diameterM: 12, elevationLimitDeg: 15, receivers: [{ fromHz: 1e9, toHz: 2e9, sefdJy: 400 }], ...change.antenna },
    ],
    stations,
    layouts: [{ id: "all", stations: stations.map((s) => s.id) }],
    observations: [
      {
        id: "o",
        declinationDeg: -40,
        hourAngle: { fromH: -3, toH: 3 },
        frequencyHz: 1.4e9,
        bandwidthHz: 1e7,
        channels: 2,
        integrationS: 300,
        ...change.observation,
      },
    ],
    requirements: change.requirements ?? [],
  });
  return readPlan(text).plan;
}

/** Paths of every value in a result, arrays and the antennas' own ids aside. */
function paths(value: object, prefix = ""): string[] {
  return Object.entries(value).flatMap(([key, inner]) => {
    const at = prefix + key;
    if (at === "primaryBeams" || at === "warnings" || inner === null || typeof inner !== "object") return [at];
    return paths(inner, `${at}.`);
  });
}

describe("a result", () => {
  it("has exactly the keys that requirements and scripts may point at, in every case", async () => {
    const keys = [
      "layout",
      "observation",
      "stationCount",
      "baselineCount",
      "longestBaselineM",
      "shortestBaselineM",
      "samplesPerBaseline",
      "samplesKept",
      "longestProjectedM",
      "shortestProjectedM",
      "longestUvWavelengths",
      "maxWWavelengths",
      "shadowedStationSamples",
      "visibleStationSamples",
      "hoursVisible",
      "coverage.filledFraction",
      "coverage.largestRadialGap",
      "coverage.azimuthalUniformity",
      "beam.majorArcsec",
      "beam.minorArcsec",
      "beam.axisRatio",
      "beam.positionAngleDeg",
      "beam.halfPowerMajorArcsec",
      "beam.halfPowerMinorArcsec",
      "beam.firstZeroMinArcsec",
      "beam.firstZeroMaxArcsec",
      "beam.firstMinimumMinArcsec",
      "beam.firstMinimumMaxArcsec",
      "beam.peakSidelobe",
      "beam.deepestSidelobe",
      "beam.peakAbsoluteSidelobe",
      "beam.rmsSidelobe",
      "beam.sidelobeRadiusArcsec",
      "beam.pixelArcsec",
      "beam.sizePx",
      "apertureResolutionArcsec.slit",
      "apertureResolutionArcsec.circular",
      "largestScaleArcsec",
      "recoverable.gaussianArcsec",
      "recoverable.discArcsec",
      "primaryBeamArcsec",
      "primaryBeams",
      "densityFieldArcsec",
      "noiseJy",
      "weightingNoiseFactor",
      "air.zenithOpacity",
      "air.noiseFactor",
      "brightnessNoiseK",
      "smearing.bandwidthArcsec",
      "smearing.timeArcsec",
      "planarRadiusArcsec",
      "fraunhoferM.antenna",
      "fraunhoferM.array",
      "protectedFraction",
      "positionError.phaseDeg",
      "positionError.coherence",
      "positionError.widthFraction",
      "fullField.channelWidthHz",
      "fullField.sampleS",
      "fullField.visibilitiesPerS",
      "fullField.bytesPerS",
      "warnings",
    ];
    expect(paths(await assess(plan(), "all", "o"))).toEqual(keys);
    expect(paths(await assess(plan({ observation: { declinationDeg: 80 } }), "all", "o"))).toEqual(keys);
    const withPair = await assess(plan(), "all", "o", { pair: { separationArcsec: 30, positionAngleDeg: 10, fluxRatio: 1 } });
    expect(paths(withPair).filter((key) => key.startsWith("pair"))).toEqual(["pair.dip", "pair.verdict"]);
  });

  it("counts samples as the slow twin does, and no figure of it is NaN or infinite", async () => {
    const result = await assess(plan(), "all", "o");
    const { track } = setup(plan(), "all", "o");
    expect(result.samplesKept).toBe(
      exactSamples(track, { scheme: "natural", robustness: 0, taperRad: null, fieldRad: 1e-3 }).u.length,
    );
    expect(result.baselineCount).toBe(36);
    for (const path of paths(result)) {
      const value = quantityOf(result, path);
      if (typeof value === "number") expect(Number.isFinite(value), path).toBe(true);
    }
  });

  it("is the same bytes each time, and holds the image's own figures", async () => {
    const first = roundedJson(await assess(plan(), "all", "o"));
    expect(roundedJson(await assess(plan(), "all", "o"))).toBe(first);
    expect(roundedJson((await beamImage(plan(), "all", "o")).result)).toBe(first);
    expect(roundedJson((await picture({ plan: plan(), layout: "all", observation: "o", pair: null, uvSize: 64 })).result)).toBe(
      first,
    );
  });

  it("has noise by the radiometer equation", async () => {
    // Source: Thompson, Moran & Swenson, 3rd ed., ch. 6: SEFD/√(n_pol·N(N−1)·Δν·t) for N alike antennas, natural weights.
    const result = await assess(plan({ observation: { hourAngle: { fromH: 0, toH: 0 }, integrationS: 1200 } }), "all", "o");
    expect((result.noiseJy as number) / (400 / Math.sqrt(2 * 9 * 8 * 1e7 * 1200))).toBeCloseTo(1, 12);
    expect(result.weightingNoiseFactor).toBeCloseTo(1, 12);
    const weak = await assess(
      plan({ observation: { hourAngle: { fromH: 0, toH: 0 }, integrationS: 1200, polarizations: 1, repeats: 4, efficiency: 0.5 } }),
      "all",
      "o",
    );
    expect((weak.noiseJy as number) / (result.noiseJy as number)).toBeCloseTo((Math.SQRT2 * 2) / 2, 12);
  });

  it("scales with wavelength: all angles together", async () => {
    const narrow = { bandwidthHz: 1e4, channels: 1 };
    const a = await assess(plan({ observation: { ...narrow, frequencyHz: 1.2e9 } }), "all", "o");
    const b = await assess(plan({ observation: { ...narrow, frequencyHz: 1.8e9 } }), "all", "o");
    // The image's pixels scale too, so that only the band's own half percent of a hundredth is left.
    for (const path of [
      "beam.majorArcsec",
      "beam.minorArcsec",
      "beam.firstMinimumMinArcsec",
      "largestScaleArcsec",
      "primaryBeamArcsec",
    ]) {
      expect((quantityOf(a, path) as number) / (quantityOf(b, path) as number)).toBeCloseTo(1.5, 4);
    }
    expect(a.beam.peakAbsoluteSidelobe).toBeCloseTo(b.beam.peakAbsoluteSidelobe as number, 4);
  });
});

describe("what can be assessed only in part is, with a warning, and nulls for what cannot be had", () => {
  const cases: readonly [string, Parameters<typeof plan>[0], RegExp, readonly string[]][] = [
    [
      "a source that never rises",
      { observation: { declinationDeg: 80 } },
      /never rises/,
      ["noiseJy", "beam.majorArcsec", "longestProjectedM", "coverage.filledFraction"],
    ],
    [
      "one above the upper limit",
      { antenna: { elevationUpperLimitDeg: 70 }, observation: { declinationDeg: -31, hourAngle: { fromH: 0, toH: 0 } } },
      /stays above the upper elevation limits/,
      ["noiseJy"],
    ],
    ["no receiver for the band", { observation: { frequencyHz: 9e9 } }, /no receiver for 9 GHz/, ["noiseJy", "brightnessNoiseK"]],
    ["one station", { stations: places.slice(0, 1) }, /one station/, ["longestBaselineM", "beam.majorArcsec", "noiseJy"]],
    ["two stations at one place", { stations: [...places, places[0]] }, /stand at one place/, ["largestScaleArcsec"]],
    [
      "stations in one line, seen at once",
      { stations: [0, 1, 3].map((k) => [-31, 24 + 0.01 * k]), observation: { declinationDeg: 0, hourAngle: { fromH: 0, toH: 0 } } },
      /lie in one line/,
      ["beam.majorArcsec", "beam.axisRatio", "beam.positionAngleDeg"],
    ],
    [
      "one baseline",
      { stations: places.slice(0, 2), observation: { hourAngle: { fromH: 0, toH: 0 }, channels: 1 } },
      /lie in one line/,
      ["beam.majorArcsec"],
    ],
    [
      "uniform weights in cells of one sample",
      { observation: { integrationS: 3600, channels: 1, weighting: { scheme: "uniform", fieldArcsec: 40_000 } } },
      /uniform weights equal natural ones/,
      [],
    ],
    [
      "J2000 without a date",
      { observation: { epoch: "J2000", rightAscensionDeg: 20 } },
      /startUtc is not given: it is taken as of date/,
      [],
    ],
    [
      "a sidelobe radius past the image",
      { observation: { image: { sizePx: 64, sidelobeRadiusArcsec: 5000 } } },
      /the image reaches/,
      [],
    ],
  ];
  it.each(cases)("%s", async (_, change, warning, nulls) => {
    const result = await assess(plan(change), "all", "o");
    expect(result.warnings.join("\n")).toMatch(warning);
    for (const path of nulls) expect(quantityOf(result, path), path).toBeNull();
    expect(roundedJson(result)).not.toMatch(/NaN|Infinity/);
  });

  it("keeps what a line of stations can have: noise, lengths, and widths across the line", async () => {
    const [, change] = cases[5];
    const { result, beam } = await assessment(plan(change), "all", "o");
    expect(result.noiseJy).toBeGreaterThan(0);
    expect(result.longestBaselineM).toBeGreaterThan(2000);
    expect(beam?.shape.minorRad).toBeGreaterThan(0);
    expect(result.beam.firstMinimumMinArcsec).toBeGreaterThan(0);
  });
});

describe("extremes", () => {
  it.each([
    [
      "the pole",
      24,
      [
        [89.99, 10],
        [89.99, 170],
        [89.98, -100],
        [90, 0],
      ],
      { declinationDeg: 90 },
    ],
    [
      "millimetres, across the antimeridian",
      180,
      [
        [0.001, 179.9999],
        [-0.001, -179.9999],
        [0.002, 180],
      ],
      { declinationDeg: 5, frequencyHz: 2.99792458e11, bandwidthHz: 1e9 },
    ],
    [
      "wavelengths of ten kilometres over the diameter of the Earth",
      24,
      [
        [0, 0],
        [0, 89],
        [0.00001, 0],
        [40, 40],
      ],
      { declinationDeg: 20, frequencyHz: 29_979.2458, bandwidthHz: 1000 },
    ],
  ])("%s", async (_, originLongitudeDeg, stations, observation) => {
    const result = await assess(
      plan({
        originLongitudeDeg,
        stations: stations as number[][],
        observation,
        antenna: { elevationLimitDeg: -5, diameterM: 0.5 },
      }),
      "all",
      "o",
    );
    expect(result.samplesKept).toBeGreaterThan(0);
    expect(result.beam.minorArcsec ?? result.beam.halfPowerMinorArcsec ?? result.beam.firstMinimumMinArcsec).toBeGreaterThan(0);
    expect(roundedJson(result)).not.toMatch(/NaN|Infinity/);
  });
});

describe("requirements", () => {
  const line = (id: string, quantity: string, limits: object, when: object = {}) => ({ id, quantity, ...limits, when });
  it("are met, at risk, not met, or cannot be computed, with the reason", async () => {
    const { beam, noiseJy } = await assess(plan(), "all", "o");
    const major = beam.majorArcsec as number;
    const given = plan({
      requirements: [
        line("met", "beam.majorArcsec", { atMost: major * 1.2 }),
        line("risk", "beam.majorArcsec", { atMost: major * 1.02 }),
        line("not", "beam.majorArcsec", { atMost: major * 0.9 }),
        line("least", "noiseJy", { atLeast: (noiseJy as number) * 0.5 }),
        line("unknown", "beam.colour", { atMost: 1 }),
        line("loss", "beam.majorArcsec", { atMost: 1 }, { without: 1 }),
        line("gone", "noiseJy", { atMost: 1 }, { observation: "gone" }),
        line("blended", "pair.dip", { atLeast: 0.1 }, { pair: { separationArcsec: major / 4, positionAngleDeg: 0 } }),
        line("range", "beam.majorArcsec", { atMost: major * 3 }, { declinationDeg: { from: -60, to: 20, step: 40 } }),
        line("never", "beam.majorArcsec", { atMost: 9 }, { declinationDeg: { from: -60, to: 80, step: 140 } }),
      ],
    });
    const outcomes = await judge(given, "all", []);
    expect(outcomes.map((o) => o.state)).toEqual([
      "met",
      "at risk",
      "not met",
      "met",
      "cannot be computed",
      "cannot be computed",
      "cannot be computed",
      "not met",
      outcomes[8].state,
      "cannot be computed",
    ]);
    expect(outcomes[4].note).toBe("not computed yet: beam.colour");
    expect(outcomes[6].note).toBe("the plan has no observation gone");
    expect(outcomes[7]).toMatchObject({ value: 0, margin: -1 });
    expect(outcomes[8].note).toMatch(/^worst at declination (-60|-20|20)°$/);
    expect(outcomes[9].note).toMatch(/^at declination 80°: the source never rises/);
  });

  it("speak of the layouts they name", async () => {
    expect(await judge(plan({ requirements: [line("R", "noiseJy", { atMost: 1 }, { layouts: ["other"] })] }), "all", [])).toEqual(
      [],
    );
  });

  it("have margins by (limit − value)/|limit|, absolute where the limit is 0", () => {
    expect(marginOf(8, 10, "atMost")).toBeCloseTo(0.2, 15);
    expect(marginOf(12, 10, "atLeast")).toBeCloseTo(0.2, 15);
    expect(marginOf(-12, -10, "atMost")).toBeCloseTo(0.2, 15);
    expect(marginOf(3, 0, "atMost")).toBe(-3);
  });
});

describe("sweeps", () => {
  it("have both ends when the step divides the range", () => {
    expect(sweepValues(-60, 30, 30)).toEqual([-60, -30, 0, 30]);
    expect(sweepValues(0, 1, 0.1).length).toBe(11);
    expect(sweepValues(1, 0, -0.5)).toEqual([1, 0.5, 0]);
    expect(() => sweepValues(0, 10, -1)).toThrow("step is -1; expected a step that leads from 0 to 10.");
    expect(() => sweepValues(0, 10, 0)).toThrow("step is 0");
    expect(() => sweepValues(0, 1, 1e-6)).toThrow("at most 10000 points");
  });

  it("give at each point what that point alone gives", async () => {
    const points = await sweep(plan(), "all", "o", { axis: "declination", values: [-50, -20] });
    expect(roundedJson(points[1].result)).toBe(
      roundedJson(await assess(plan({ observation: { declinationDeg: -20 } }), "all", "o")),
    );
    const [hours] = await sweep(plan(), "all", "o", { axis: "hours", values: [2] });
    expect(hours.result.hoursVisible).toBeCloseTo(2, 10);
    await expect(sweep(plan(), "all", "o", { axis: "declination", values: [95] })).rejects.toThrow(
      "declination is 95; expected a declination in [-90, 90] degrees.",
    );
    await expect(sweep(plan(), "all", "o", { axis: "hours", values: [25] })).rejects.toThrow("hours is 25");
  });
});

describe("tracks", () => {
  it("say of each sample whether it counts, and of each that does not, why", async () => {
    const given = plan({ observation: { hourAngle: { fromH: -8, toH: 8 }, integrationS: 1800 } });
    const all = [...tracks(given, "all", "o")];
    const result = await assess(given, "all", "o");
    expect(all.length).toBe(result.baselineCount * result.samplesPerBaseline);
    expect(all.filter((s) => s.reason === null).length * 2).toBe(result.samplesKept); // two channels
    expect(all.find((s) => s.reason !== null)?.reason).toMatch(/^S\d below its elevation limit$/);
    const longest = Math.max(...all.filter((s) => s.reason === null).map((s) => Math.hypot(s.uM, s.vM)));
    expect(longest / (result.longestProjectedM as number)).toBeCloseTo(1, 12);
  });
});

describe("previews", () => {
  it("follow a moved station to within a few per cent of the settled figures, and say what they are", async () => {
    const before = plan({ observation: { integrationS: 120, weighting: { scheme: "robust", robustness: 0 } } });
    const base = await assess(before, "all", "o");
    const session = new PreviewSession();
    const ask = (p: typeof before) =>
      session.picture({ plan: p, layout: "all", observation: "o", pair: null, uvSize: 128, key: "drag", base });
    ask(before);
    const after = moveStation(before, "S3", { latitudeDeg: -31.02, longitudeDeg: 24.025 });
    const preview = ask(after);
    const settled = await assess(after, "all", "o");
    expect(preview?.settled).toBe(false);
    // Nearest cells and a normalisation kept from the start of the drag.
    expect((preview?.result.beam.majorArcsec as number) / (settled.beam.majorArcsec as number)).toBeCloseTo(1, 1);
    expect(preview?.result.longestProjectedM).toBe(settled.longestProjectedM);
    expect((preview?.result.largestScaleArcsec as number) / (settled.largestScaleArcsec as number)).toBeCloseTo(1, 12);
    // A station dragged far outside gets a new grid rather than being left out.
    const far = moveStation(before, "S3", { latitudeDeg: -31.2, longitudeDeg: 24.3 });
    expect(ask(far)?.result.longestProjectedM).toBe((await assess(far, "all", "o")).longestProjectedM);
  });
});

describe("receivers and the air", () => {
  const receiver = { fromHz: 1e9, toHz: 1e11, sefdJy: null, systemK: 40, apertureEfficiency: 0.7 };
  const at = (frequencyHz: number, change: object = {}, observation: object = {}) =>
    assess(
      plan({
        antenna: { receivers: [{ ...receiver, ...change }] },
        observation: { frequencyHz, bandwidthHz: 1e7, ...observation },
      }),
      "all",
      "o",
    );

  it("take an SEFD from temperature, efficiency and surface as one that is given", async () => {
    // 2kT/(ηA) of 12 m at 40 K and 0.7: 24.415235 Jy/K (the outside checks' S03-12) × 40 / 0.7.
    const [computed, given] = [
      await at(1.4e9),
      await at(1.4e9, { sefdJy: (24.41523478 * 40) / 0.7, systemK: null, apertureEfficiency: null }),
    ];
    expect(computed.noiseJy as number).toBeCloseTo(given.noiseJy as number, 12);
    const rough = await at(1e11, { surfaceRmsM: 299_792_458 / 1e11 / 16 });
    const smooth = await at(1e11);
    // λ/16 leaves 0.5396414858 of the efficiency (the outside checks' S17).
    expect((smooth.noiseJy as number) / (rough.noiseJy as number)).toBeCloseTo(0.5396414858, 8);
  });

  it("count the air in the noise where its vapour is given, and only there", async () => {
    const clear = await at(2.2e10);
    expect(clear.air).toEqual({ zenithOpacity: null, noiseFactor: null });
    const humid = await at(2.2e10, {}, { vapourGm3: 10 });
    const dry = await at(2.2e10, {}, { vapourGm3: 1 });
    expect(humid.air.zenithOpacity).toBeGreaterThan(dry.air.zenithOpacity as number);
    expect((humid.noiseJy as number) / (clear.noiseJy as number)).toBeCloseTo(humid.air.noiseFactor as number, 12);
    expect(dry.air.noiseFactor).toBeGreaterThan(1);
    expect(humid.beam).toEqual(clear.beam);
  });

  it("leave the air out, and say so, where the system's temperature is not known", async () => {
    const result = await at(2.2e10, { sefdJy: 900, systemK: null, apertureEfficiency: null }, { vapourGm3: 10 });
    expect(result.air.noiseFactor).toBeNull();
    expect(result.warnings.join(" ")).toContain("antenna a gives no systemK for the band");
    expect(result.noiseJy).toBeGreaterThan(0);
  });

  it("say what a stated position error costs, and that a phase of one radian leaves e^−½ of the peak", async () => {
    const none = await at(1.4e9);
    expect(none.positionError).toEqual({ phaseDeg: null, coherence: null, widthFraction: null });
    // 2π√2·ε/λ = 1 (the outside checks' S17b for the loss).
    const positionErrorM = 299_792_458 / 1.4e9 / (2 * Math.PI * Math.SQRT2);
    const { positionError } = await at(1.4e9, {}, { positionErrorM });
    expect(positionError.phaseDeg).toBeCloseTo(180 / Math.PI, 9);
    expect(positionError.coherence).toBeCloseTo(0.6065306597, 9);
    expect(positionError.widthFraction).toBeGreaterThan(0);
    expect(positionError.widthFraction).toBeLessThan(1e-3);
  });
});
