import type { GeoGeometryObjects } from "d3-geo";
import { feature } from "topojson-client";
import type { GeometryCollection, Topology } from "topojson-specification";

/** Coarse while anything moves, fine once it rests. Natural Earth land, public domain, by way of world-atlas. */
export type CoastDetail = "110m" | "50m";

const loading = new Map<CoastDetail, Promise<GeoGeometryObjects>>();

/** The land of the Earth, loaded the first time it is asked for; a failed load is tried again the next time. */
export function loadCoast(detail: CoastDetail): Promise<GeoGeometryObjects> {
  const known = loading.get(detail);
  if (known) return known;
  const started = (detail === "110m" ? import("world-atlas/land-110m.json") : import("world-atlas/land-50m.json")).then(
    ({ default: atlas }) => landOf(atlas as unknown as Topology<{ land: GeometryCollection }>),
  );
  loading.set(detail, started);
  started.catch(() => loading.delete(detail));
  return started;
}

function landOf(atlas: Topology<{ land: GeometryCollection }>): GeoGeometryObjects {
  const { features } = feature(atlas, atlas.objects.land);
  return { type: "GeometryCollection", geometries: features.map(({ geometry }) => geometry) };
}
