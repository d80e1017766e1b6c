import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { placeModel } from "../../../src/view/ground/model.ts";
import { geodesicPoints, globePoint, globeSpace, normalAt, sightRing } from "../../../src/view/scene/globe.ts";
import { scenario } from "../../support/scenario.ts";

const DEG = Math.PI / 180;
const B_OVER_A = 1 - 1 / 298.257223563;
const dot = (a: readonly number[], b: readonly number[]): number => a[0] * b[0] + a[1] * b[1] + a[2] * b[2];
const place = fc.record({
  latitudeDeg: fc.double({ min: -89, max: 89, noNaN: true }),
  longitudeDeg: fc.double({ min: -180, max: 180, noNaN: true }),
});

describe("the globe", () => {
  it("puts every place on the WGS84 ellipsoid", () => {
    fc.assert(
      fc.property(place, (at) => {
        const [x, y, z] = globePoint(at);
        expect(x * x + y * y + (z / B_OVER_A) ** 2).toBeCloseTo(1, 12);
      }),
      { seed: 11 },
    );
  });

  it("rings the places that see the source at one elevation of their own vertical", () => {
    const source = fc.record({
      declinationDeg: fc.double({ min: -90, max: 90, noNaN: true }),
      hourAngleH: fc.double({ min: -12, max: 12, noNaN: true }),
    });
    fc.assert(
      fc.property(
        source,
        fc.double({ min: 1, max: 90, noNaN: true }),
        fc.double({ min: 0, max: 6.28, noNaN: true }),
        (s, far, side) => {
          const lonDeg = 23;
          // Direction of the source in ECEF: over the meridian that lies the hour angle to the west of the origin's.
          const over = (lonDeg - 15 * s.hourAngleH) * DEG;
          const dec = s.declinationDeg * DEG;
          const direction = [Math.cos(dec) * Math.cos(over), Math.cos(dec) * Math.sin(over), Math.sin(dec)];
          expect(dot(normalAt(sightRing(s, lonDeg, far, side)), direction)).toBeCloseTo(Math.cos(far * DEG), 10);
        },
      ),
      { seed: 12 },
    );
  });

  it("draws links as geodesics that begin and end at their stations", () => {
    fc.assert(
      fc.property(place, place, (a, b) => {
        const points = geodesicPoints(a, b);
        const ends = [points[0], points[points.length - 1]];
        // A micro-radian is six metres.
        expect(Math.hypot(...globePoint(ends[0]).map((x, k) => x - globePoint(a)[k]))).toBeLessThan(1e-6);
        expect(Math.hypot(...globePoint(ends[1]).map((x, k) => x - globePoint(b)[k]))).toBeLessThan(1e-6);
      }),
      { seed: 13 },
    );
  });

  it("counts the stations that see the target", () => {
    const plan = scenario("long-meridian");
    const [layout] = plan.layouts;
    const model = placeModel(plan, layout.id, null, false);
    const at = (elevationLimitDeg: number) =>
      globeSpace(model, { declinationDeg: 90, fromH: -6, toH: 6, elevationLimitDeg, hourAngleH: 0 }, []);
    // From the pole's direction every station of the northern half sees the source as high as its latitude.
    const north = model.stations.filter(({ latitudeDeg }) => latitudeDeg >= 40).length;
    expect(at(40).text).toContain(`${north} of ${model.stations.length} stations`);
    expect(at(0).marks.filter(({ kind }) => kind === "station")).toHaveLength(model.stations.length);
  });
});
