import { readFileSync } from "node:fs";
import { geoContains } from "d3-geo";
import { feature } from "topojson-client";
import type { GeometryCollection, Topology } from "topojson-specification";
import { describe, expect, it } from "vitest";
import { assess } from "../../src/assess/assess.ts";
import { layoutById, stationById } from "../../src/plan/find.ts";
import { readPlan } from "../../src/plan/read.ts";

// Source: Natural Earth 1:50 million land, as packaged in world-atlas; one polygon a land mass.
const atlas = JSON.parse(readFileSync("node_modules/world-atlas/land-50m.json", "utf8")) as Topology<{ land: GeometryCollection }>;
const masses = feature(atlas, atlas.objects.land).features.flatMap(({ geometry }) =>
  geometry.type === "MultiPolygon" ? geometry.coordinates.map((coordinates) => ({ type: "Polygon" as const, coordinates })) : [],
);

const { plan } = readPlan(readFileSync("scenarios/long-meridian.plan.json", "utf8"));

describe("D10 Long Meridian", () => {
  it("has a layout on one continent and one on several", () => {
    const under = (layout: string): Set<number> =>
      new Set(
        layoutById(plan, layout).stations.map((id) => {
          const { longitudeDeg, latitudeDeg } = stationById(plan, id);
          return masses.findIndex((mass) => geoContains(mass, [longitudeDeg, latitudeDeg]));
        }),
      );
    expect(under("west").size).toBe(1);
    expect(under("globe").size).toBeGreaterThan(2);
    expect(under("globe")).not.toContain(-1);
  });

  it.each(plan.layouts.map(({ id }) => id))(
    "%s has each source in common view for three quarters of its window",
    async (layout) => {
      for (const { id, hourAngle } of plan.observations) {
        const { hoursVisible } = await assess(plan, layout, id);
        expect(hoursVisible).toBeGreaterThan(0.75 * (hourAngle.toH - hourAngle.fromH));
      }
    },
  );
});
