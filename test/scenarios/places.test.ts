import { readdirSync, readFileSync } from "node:fs";
import { geoContains } from "d3-geo";
import { feature } from "topojson-client";
import type { GeometryCollection, Topology } from "topojson-specification";
import { describe, expect, it } from "vitest";
import { assess } from "../../src/assess/assess.ts";
import { inverse } from "../../src/engine/geodesy/geodesic.ts";
import { antennaById, layoutById, stationById } from "../../src/plan/find.ts";
import { type ReadPlan, readPlan } from "../../src/plan/read.ts";
import type { Geometry, Layout, Plan, Station } from "../../src/plan/schema.ts";

const NAMES = ["long-meridian", "sallow-flat", "thistledown"];
const read = (name: string): ReadPlan => readPlan(readFileSync(`scenarios/${name}.plan.json`, "utf8"));
const stationsOf = (plan: Plan, { stations }: Layout): readonly Station[] => stations.map((id) => stationById(plan, id));

/** Even-odd rule, on plain degrees: enough for areas of some tens of kilometres. Source: common practice. */
function inRing(ring: readonly (readonly number[])[], { longitudeDeg: x, latitudeDeg: y }: Station): boolean {
  let inside = false;
  for (let k = 1; k < ring.length; k++) {
    const [[x1, y1], [x2, y2]] = [ring[k - 1], ring[k]];
    if (y1 > y !== y2 > y && x < x1 + ((x2 - x1) * (y - y1)) / (y2 - y1)) inside = !inside;
  }
  return inside;
}

const inArea = (area: Geometry, station: Station): boolean =>
  (area.type === "Polygon" ? [area.coordinates] : area.coordinates).some(
    ([outer, ...holes]) => inRing(outer, station) && !holes.some((hole) => inRing(hole, station)),
  );

/** Natural Earth's land, scale 1:10 000 000, by way of world-atlas: one polygon a land mass. */
function landMasses(): readonly GeoJSON.Polygon[] {
  const atlas = JSON.parse(readFileSync("node_modules/world-atlas/land-10m.json", "utf8"));
  const { features } = feature(atlas as Topology<{ land: GeometryCollection }>, atlas.objects.land as GeometryCollection);
  return features.flatMap(({ geometry }) =>
    geometry.type === "MultiPolygon"
      ? geometry.coordinates.map((coordinates): GeoJSON.Polygon => ({ type: "Polygon", coordinates }))
      : [geometry as GeoJSON.Polygon],
  );
}

it("D10 every file of the folder is looked at here", () => {
  expect(readdirSync("scenarios").filter((name) => name.endsWith(".plan.json"))).toEqual(NAMES.map((name) => `${name}.plan.json`));
});

describe.each(NAMES)("D10 the worked plan %s", (name) => {
  const { plan, warnings } = read(name);

  it("is read with no warning, and says that it is invented", () => {
    expect(warnings).toEqual([]);
    expect(plan.notes).toMatch(/invented/i);
  });

  it("has a receiver for every observation on every antenna", () => {
    for (const { frequencyHz, bandwidthHz } of plan.observations) {
      for (const { receivers } of plan.antennas) {
        const fits = receivers.some(
          ({ fromHz, toHz }) => fromHz <= frequencyHz - bandwidthHz / 2 && frequencyHz + bandwidthHz / 2 <= toHz,
        );
        expect(fits).toBe(true);
      }
    }
  });

  it("keeps the stations of a layout as far apart as their antennas need", () => {
    for (const layout of plan.layouts) {
      const stations = stationsOf(plan, layout);
      for (const [k, a] of stations.entries()) {
        for (const b of stations.slice(0, k)) {
          const least = Math.max(...[a, b].map(({ antenna }) => antennaById(plan, antenna).minSpacingM));
          const { distanceM } = inverse(a.latitudeDeg, a.longitudeDeg, b.latitudeDeg, b.longitudeDeg);
          expect(distanceM).toBeGreaterThanOrEqual(least);
        }
      }
    }
  });

  it("stands on land", () => {
    const land = landMasses();
    for (const { id, latitudeDeg, longitudeDeg } of plan.stations) {
      expect(
        land.some((mass) => geoContains(mass, [longitudeDeg, latitudeDeg])),
        id,
      ).toBe(true);
    }
  });
});

describe("D10 Thistledown", () => {
  const { plan } = read("thistledown");

  it("has four layouts of thirty stations, none shared", () => {
    expect(plan.layouts.map(({ id, stations }) => [id, stations.length])).toEqual(
      ["trident", "long-arms", "ring", "short-trench"].map((id) => [id, 30]),
    );
    expect(new Set(plan.layouts.flatMap(({ stations }) => stations)).size).toBe(plan.stations.length);
  });

  it("has every station on ground that is allowed, and in no area that is kept free", () => {
    const { allowed, keepOut } = plan.site;
    for (const station of plan.stations) {
      expect(inArea(allowed as Geometry, station), station.id).toBe(true);
      expect(
        keepOut.filter(({ geometry }) => inArea(geometry, station)).map(({ label }) => label),
        station.id,
      ).toEqual([]);
    }
    // The hub stands at the middle of it all: the areas are where they should be, and not with longitude and latitude swapped.
    expect(plan.site.hub).toEqual({ latitudeDeg: plan.site.origin.latitudeDeg, longitudeDeg: plan.site.origin.longitudeDeg });
  });
});

describe("D10 Long Meridian", () => {
  const { plan } = read("long-meridian");

  it("has a layout that goes round the globe and one on a single land mass", () => {
    const land = landMasses();
    const masses = (id: string): number =>
      new Set(
        stationsOf(plan, layoutById(plan, id)).map(({ longitudeDeg, latitudeDeg }) =>
          land.findIndex((mass) => geoContains(mass, [longitudeDeg, latitudeDeg])),
        ),
      ).size;
    expect(masses("west")).toBe(1);
    expect(masses("globe")).toBeGreaterThan(2);
  });

  it.each(["maser", "core"])("%s is seen by stations in common through the most of its window", async (observation) => {
    for (const { id } of plan.layouts) {
      const { hoursVisible } = await assess(plan, id, observation);
      expect(hoursVisible).toBeGreaterThan(9); // of 12
    }
  });
});
