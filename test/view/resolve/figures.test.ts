import { beforeAll, describe, expect, it } from "vitest";
import { picture } from "../../../src/assess/picture.ts";
import type { Picture } from "../../../src/assess/result.ts";
import { SPEED_OF_LIGHT } from "../../../src/base/constants.ts";
import { checkedPlan } from "../../../src/plan/read.ts";
import type { Observation, Plan } from "../../../src/plan/schema.ts";
import { allFigures } from "../../../src/view/resolve/allfigures.ts";
import { axisEnds, beamModel, beamReadout } from "../../../src/view/resolve/beam.ts";
import { cutsModel, sidelobeLimit } from "../../../src/view/resolve/cuts.ts";
import { declinationModel } from "../../../src/view/resolve/declination.ts";
import { elevationDeg, elevationModel, hoursAbove } from "../../../src/view/resolve/elevation.ts";
import { pairImage, pairModel } from "../../../src/view/resolve/pair.ts";
import { scalesModel, wavelengthRange } from "../../../src/view/resolve/scales.ts";
import { uvHalf, uvModel, uvReadout } from "../../../src/view/resolve/uv.ts";
import { windowed } from "../../../src/view/resolve/uvwindow.ts";

/** Five stations on an uneven cross, one receiver: small enough to assess for every test file. */
const plan: Plan = checkedPlan({
  format: "spanwright-plan",
  version: 1,
  site: { origin: { latitudeDeg: -30, longitudeDeg: 20 } },
  antennas: [
    {
      id: "d",
      diameterM: 12,
      elevationLimitDeg: 15,
      receivers: [{ fromHz: 1e9, toHz: 2e9, sefdJy: 400, systemK: null, apertureEfficiency: null, surfaceRmsM: 0 }],
    },
  ],
  stations: [
    [0, 0],
    [0.011, 0.004],
    [-0.003, 0.017],
    [-0.019, -0.006],
    [0.007, -0.023],
  ].map(([north, east], k) => ({
    id: `S${k}`,
    latitudeDeg: -30 + north,
    longitudeDeg: 20 + east,
    antenna: "d",
  })),
  layouts: [{ id: "cross", stations: ["S0", "S1", "S2", "S3", "S4"] }],
  observations: [
    {
      id: "south",
      declinationDeg: -40,
      hourAngle: { fromH: -4, toH: 4 },
      integrationS: 300,
      frequencyHz: 1.42e9,
      bandwidthHz: 1e6,
    },
  ],
  requirements: [
    { id: "R1", quantity: "beam.peakAbsoluteSidelobe", atMost: 0.05 },
    { id: "R2", quantity: "beam.peakSidelobe", atMost: 0.08 },
  ],
}).plan;
const observation = plan.observations[0] as Observation;
const pair = { separationArcsec: 20, positionAngleDeg: 40, fluxRatio: 1 };
const size = { width: 360, height: 240 };
let shown: Picture;

beforeAll(async () => {
  shown = await picture({ plan, layout: "cross", observation: "south", pair, uvSize: 128 });
});

describe("uvModel", () => {
  it("rings stand at their baseline length in wavelengths", () => {
    const model = uvModel(shown, observation.frequencyHz, null);
    const km = model.rings.find((r) => r.label === "1\u00a0km");
    expect(km?.radius).toBeCloseTo(1000 / (SPEED_OF_LIGHT / 1.42e9) / model.halfWavelengths, 9);
  });

  it("says u, v and spacing under a point, v upward", () => {
    const model = uvModel(shown, observation.frequencyHz, 10_000);
    expect(uvReadout(model, 0.3, -0.4)).toBe("u 3.0, v \u22124.0 kλ is a 1.06\u00a0km spacing");
  });

  it("shows a grid with more room at the scale of the one before, cell for cell", () => {
    const counts = new Float32Array(16 * 16);
    counts[16 * 8 + 8] = 5;
    counts[16 * 10 + 11] = 2;
    const inner = windowed({ size: 16, cellWavelengths: 10, counts }, 40);
    expect(inner.size).toBe(8);
    expect(inner.counts[8 * 4 + 4]).toBe(5);
    expect(inner.counts[8 * 6 + 7]).toBe(2);
    const outer = windowed({ size: 16, cellWavelengths: 10, counts }, 120);
    expect(outer.counts[24 * 12 + 12]).toBe(5);
    expect(uvHalf({ size: 16, cellWavelengths: 10, counts })).toBe(80);
  });
});

describe("beamModel", () => {
  it("keeps its edge while a station moves", () => {
    expect(beamModel(shown, 77).halfWidthArcsec).toBe(77);
  });

  it("reads one at the middle, and says which side a point lies on with east to the left", () => {
    const model = beamModel(shown, null);
    expect(beamReadout(model, 0, 0)).toMatch(/: 100\.0 % of peak$/);
    expect(beamReadout(model, -0.5, 0.5)).toMatch(/″ E, .*″ N: /);
    expect(beamReadout(model, 0.5, -0.5)).toMatch(/″ W, .*″ S: /);
  });

  it("draws a position angle of 90° toward the left, which is east", () => {
    const [x1, y1, x2, y2] = axisEnds(90, 0.2, 0.9);
    expect([x1, x2]).toEqual([-0.2, -0.9]);
    expect(y1).toBeCloseTo(0, 12);
    expect(y2).toBeCloseTo(0, 12);
  });
});

describe("cutsModel", () => {
  it("takes the tightest limit, and tints both signs where the limit is on either sign", () => {
    const limit = sidelobeLimit(plan, "cross", "south");
    expect(limit).toEqual({ limit: 0.05, bothSigns: true });
    const cuts = cutsModel(shown, 60, false, limit, size);
    const band = cuts?.band;
    expect(band && cuts && (band.top + band.bottom) / 2).toBeCloseTo(cuts?.zeroY as number, 6);
    expect(band?.label).toBe("limit ±5\u00a0%");
  });

  it("magnifies to ±10 % of the peak", () => {
    expect(cutsModel(shown, 60, true, null, size)?.yTicks.map((t) => t.label)).toEqual(["\u221210", "\u22125", "0", "5", "10"]);
  });

  it("has no figure where there is no room", () => {
    expect(cutsModel(shown, 60, false, null, { width: 50, height: 20 })).toBeNull();
  });
});

describe("pairModel", () => {
  it("says the result's verdict, and a preview gives none", () => {
    const verdict = shown.result.pair?.verdict as string;
    const model = pairModel(shown, pair, size);
    expect(model.verdict.words.toLowerCase()).toContain(verdict);
    expect(pairModel({ ...shown, settled: false }, pair, size).verdict.words).toBe("after the drop");
  });

  it("draws the dip as deep as the result says, to a pixel", () => {
    const { profile } = pairModel(shown, { ...pair }, size);
    const dip = shown.result.pair?.dip;
    const mark = profile?.dip;
    if (!profile || !mark || !dip) throw new Error("the pair was chosen to have a dip");
    const depth = (mark.bottom - mark.top) / (profile.zeroY - mark.top);
    // A pixel of the plot is 0.5 % of the peak; the profile is interpolated and sampled at 240 points.
    expect(Math.abs(depth - dip)).toBeLessThan(0.01);
  });

  it("puts the fainter source along the position angle, north through east", () => {
    if (!shown.beam) throw new Error("there is a beam");
    const n = 64;
    const half = 40;
    const out = pairImage(shown.beam, { separationArcsec: 40, positionAngleDeg: 90, fluxRatio: 0.5 }, half, n);
    const at = (east: number): number => out[n * (n / 2) + Math.round((east / half + 1) * (n / 2))];
    expect(at(-20)).toBeGreaterThan(0.9);
    expect(at(20) / at(-20)).toBeGreaterThan(0.3);
    expect(at(20) / at(-20)).toBeLessThan(0.75);
  });
});

describe("scalesModel", () => {
  it("runs from 1 mm to 10 m, or wider by whole decades as receivers ask", () => {
    expect(wavelengthRange(0.21, plan.antennas)).toEqual([1e-3, 10]);
    const low = {
      ...plan.antennas[0],
      receivers: [{ fromHz: 1e7, toHz: 2e7, sefdJy: 1, systemK: null, apertureEfficiency: null, surfaceRmsM: 0 }],
    };
    expect(wavelengthRange(0.21, [low])[1]).toBeCloseTo(100, 9);
  });

  it("draws every angle growing as the wavelength: parallel lines through the result's figures", () => {
    const model = scalesModel(shown, observation.frequencyHz, plan.antennas, size);
    const slopes = model?.lines.map((l) => (l.y2 - l.y1) / (l.x2 - l.x1)) ?? [];
    expect(slopes).toHaveLength(3);
    for (const slope of slopes) expect(slope).toBeCloseTo(slopes[0], 9);
    for (const l of model?.lines ?? []) {
      expect(l.y1 + ((l.y2 - l.y1) * (l.at.x - l.x1)) / (l.x2 - l.x1)).toBeCloseTo(l.at.y, 6);
    }
    expect(model?.bands.map((b) => b.label)).toEqual(["1–2"]);
  });
});

describe("elevation", () => {
  // Source: a source at the declination of the latitude passes the zenith; one on the equator is up twelve hours (geometry).
  it("culminates at 90° less the distance from the zenith, and an equatorial source is up half the day", () => {
    expect(elevationDeg(-30, -30, 0)).toBeCloseTo(90, 6);
    expect(elevationDeg(-30, 20, 0)).toBeCloseTo(40, 9);
    expect(hoursAbove(-30, 0, 0)).toBeCloseTo(12, 9);
    expect(hoursAbove(-30, -80, 0)).toBe(24);
    expect(hoursAbove(-30, 70, 0)).toBe(0);
  });

  it("takes the higher of the observation's and the antennas' limits", () => {
    expect(elevationModel(plan.site, observation, plan.antennas, size)?.aside).toMatch(/^above 15° for/);
  });
});

describe("declinationModel", () => {
  it("leaves a gap where the source is not up", () => {
    const up = shown.result;
    const down = { ...up, beam: { ...up.beam, majorArcsec: null, minorArcsec: null } };
    const points = [
      { at: -60, result: up },
      { at: 0, result: up },
      { at: 60, result: down },
      { at: 90, result: down },
    ];
    const model = declinationModel(points, observation, up.beam.majorArcsec, null, size);
    expect(model?.never).toHaveLength(1);
    const { box } = model as NonNullable<typeof model>;
    // Half way from 0° to 60°, then to the edge.
    expect(model?.never[0].x).toBeCloseTo(box.x + (box.width * 120) / 180, 6);
    expect((model?.never[0].x ?? 0) + (model?.never[0].width ?? 0)).toBeCloseTo(box.x + box.width, 6);
    expect(model?.text.rows[2]).toEqual(["60.0°", "not up", "not up"]);
  });
});

describe("allFigures", () => {
  it("names the settings behind the weights, and says what cannot be had", () => {
    const groups = allFigures({ ...shown.result, noiseJy: null }, observation);
    const rows = groups.flatMap((g) => g.rows);
    const value = (name: string): string | undefined => rows.find(([n]) => n === name)?.[1];
    expect(value("Noise")).toBe("cannot be had");
    expect(value("Integration")).toBe("300\u00a0s");
    expect(rows.every(([, text]) => !/NaN|undefined|null/.test(text))).toBe(true);
    for (const name of ["Density field", "Channels", "Pixel, size"]) expect(value(name)).toBeDefined();
  });
});
