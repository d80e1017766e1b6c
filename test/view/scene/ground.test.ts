import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { placeModel } from "../../../src/view/ground/model.ts";
import { domePoint, groundSpace } from "../../../src/view/scene/ground.ts";
import { sourceOf } from "../../../src/view/scene/source.ts";
import { scenario } from "../../support/scenario.ts";

const DEG = Math.PI / 180;
const angle = fc.double({ min: -89, max: 89, noNaN: true });

describe("the ground under its sky", () => {
  const plan = scenario("thistledown");
  const [layout] = plan.layouts;
  const [observation] = plan.observations;
  const source = sourceOf(plan, layout.id, observation, 0);

  it("lets the source cross the meridian at 90° less the distance of latitude and declination", () => {
    fc.assert(
      fc.property(angle, angle, (dec, lat) => {
        const [x, y, z] = domePoint(0, dec, lat);
        const reach = Math.hypot(x, y, z);
        expect(x / reach).toBeCloseTo(0, 12);
        expect(z / reach).toBeCloseTo(Math.cos((lat - dec) * DEG), 12);
        expect(y / reach).toBeCloseTo(Math.sin((dec - lat) * DEG), 12);
      }),
      { seed: 21 },
    );
  });

  it("lets the source stand in the east before transit and in the west after it", () => {
    expect(domePoint(-3, -30, -31)[0]).toBeGreaterThan(0);
    expect(domePoint(3, -30, -31)[0]).toBeLessThan(0);
  });

  it("keeps every station at its east and north, heights by one stated factor", () => {
    const model = placeModel(plan, layout.id, null, false);
    const space = groundSpace(model, source);
    const times = Number(/drawn (\d+) times as high/.exec(space.note)?.[1]);
    const stations = space.marks.filter(({ kind }) => kind === "station");
    expect(stations).toHaveLength(model.stations.length);
    const scale = stations[0].at[0] / model.stations[0].eastM;
    model.stations.forEach((station, k) => {
      expect(stations[k].at[0]).toBeCloseTo(station.eastM * scale, 9);
      expect(stations[k].at[1]).toBeCloseTo(station.northM * scale, 9);
    });
    // Two stations near the origin: the plane is within a metre of the ellipsoid there, so heights differ as their ups do.
    const near = model.stations.map((s, k) => ({ s, k })).filter(({ s }) => Math.hypot(s.eastM, s.northM) < 1000);
    const [a, b] = [near[0], near[near.length - 1]];
    expect((stations[a.k].at[2] - stations[b.k].at[2]) / scale / times).toBeCloseTo(a.s.heightM - b.s.heightM, 0);
  });

  it("draws the window only where the source is above the limit", () => {
    const model = placeModel(plan, layout.id, null, false);
    const space = groundSpace(model, { ...source, fromH: -12, toH: 12, elevationLimitDeg: 40 });
    const window = space.lines.find(({ kind }) => kind === "window");
    const heights = [...(window?.segments ?? [])].filter((_, k) => k % 3 === 2);
    expect(heights.length).toBeGreaterThan(100);
    expect(Math.min(...heights)).toBeGreaterThanOrEqual(space.radius * Math.sin(40 * DEG) - 1e-6);
  });

  it("links the picked station with every other of its layout", () => {
    const picked = layout.stations[3];
    const space = groundSpace(placeModel(plan, layout.id, picked, false), source);
    const links = space.lines.find(({ kind }) => kind === "link");
    expect((links?.segments.length ?? 0) / 6).toBe(layout.stations.length - 1);
    expect(groundSpace(placeModel(plan, layout.id, null, false), source).lines.some(({ kind }) => kind === "link")).toBe(false);
  });

  it("says that the target is down where it is", () => {
    const model = placeModel(plan, layout.id, null, false);
    const space = groundSpace(model, { ...source, declinationDeg: 80 });
    expect(space.text).toContain("below the horizon");
    expect(space.marks.some(({ kind }) => kind === "target")).toBe(false);
  });
});
