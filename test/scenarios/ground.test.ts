import { readFileSync } from "node:fs";
import { geoContains } from "d3-geo";
import { feature } from "topojson-client";
import type { GeometryCollection, Topology } from "topojson-specification";
import { describe, expect, it } from "vitest";
import { geodeticToEcef } from "../../src/engine/geodesy/wgs84.ts";
import { antennaById, stationById } from "../../src/plan/find.ts";
import { readPlan } from "../../src/plan/read.ts";
import type { Geometry, Plan, Station } from "../../src/plan/schema.ts";

const NAMES = ["thistledown", "sallow-flat", "long-meridian"];
const planOf = (name: string): Plan => readPlan(readFileSync(`scenarios/${name}.plan.json`, "utf8")).plan;

// Source: Natural Earth 1:50 million land, as packaged in world-atlas.
const atlas = JSON.parse(readFileSync("node_modules/world-atlas/land-50m.json", "utf8")) as Topology<{ land: GeometryCollection }>;
const land = feature(atlas, atlas.objects.land);

/** Even-odd rule in longitude and latitude: areas of tens of kilometres, far from the poles and the antimeridian. */
function holds({ type, coordinates }: Geometry, { longitudeDeg: x, latitudeDeg: y }: Station): boolean {
  const rings = type === "Polygon" ? coordinates : coordinates.flat();
  const crossings = rings.flatMap((ring) =>
    ring.slice(1).filter(([x2, y2], k) => {
      const [x1, y1] = ring[k];
      return y1 > y !== y2 > y && x < x1 + ((x2 - x1) * (y - y1)) / (y2 - y1);
    }),
  );
  return crossings.length % 2 === 1;
}

const ecefM = ({ latitudeDeg, longitudeDeg, heightM }: Station) =>
  geodeticToEcef((latitudeDeg * Math.PI) / 180, (longitudeDeg * Math.PI) / 180, heightM);

describe("D10 a scenario", () => {
  it.each(NAMES)("%s is read without fault or warning", (name) => {
    expect(readPlan(readFileSync(`scenarios/${name}.plan.json`, "utf8")).warnings).toEqual([]);
  });

  it.each(NAMES)("%s stands on dry land", (name) => {
    const wet = planOf(name).stations.filter((s) => !geoContains(land, [s.longitudeDeg, s.latitudeDeg]));
    expect(wet.map((s) => s.id)).toEqual([]);
  });

  it.each(NAMES)("%s keeps the spacing its antennas need, and every station is in a layout", (name) => {
    const plan = planOf(name);
    const tight: string[] = [];
    for (const layout of plan.layouts) {
      const stations = layout.stations.map((id) => stationById(plan, id));
      for (const [i, a] of stations.entries()) {
        for (const b of stations.slice(i + 1)) {
          const [p, q] = [ecefM(a), ecefM(b)];
          const need = Math.max(antennaById(plan, a.antenna).minSpacingM, antennaById(plan, b.antenna).minSpacingM);
          if (Math.hypot(p[0] - q[0], p[1] - q[1], p[2] - q[2]) < need) tight.push(`${layout.id}: ${a.id} ${b.id}`);
        }
      }
    }
    expect(tight).toEqual([]);
    const listed = new Set(plan.layouts.flatMap((l) => l.stations));
    expect(plan.stations.filter((s) => !listed.has(s.id))).toEqual([]);
  });

  it.each(NAMES)("%s has a receiver for every observation", (name) => {
    const plan = planOf(name);
    for (const { id, frequencyHz, bandwidthHz } of plan.observations) {
      for (const antenna of plan.antennas) {
        const inBand = antenna.receivers.some(
          (r) => r.fromHz <= frequencyHz - bandwidthHz / 2 && frequencyHz + bandwidthHz / 2 <= r.toHz,
        );
        expect(inBand, `${antenna.id} for ${id}`).toBe(true);
      }
    }
  });

  it("Thistledown builds on allowed ground and keeps out of what it must", () => {
    const { site, stations } = planOf("thistledown");
    expect(stations.filter((s) => !holds(site.allowed as Geometry, s)).map((s) => s.id)).toEqual([]);
    for (const { label, geometry } of site.keepOut) {
      expect(
        stations.filter((s) => holds(geometry, s)).map((s) => s.id),
        label,
      ).toEqual([]);
    }
  });

  it("Thistledown names every station once", () => {
    const names = planOf("thistledown").stations.map((s) => s.name);
    expect(new Set(names).size).toBe(120);
    expect(names).not.toContain("");
  });
});
