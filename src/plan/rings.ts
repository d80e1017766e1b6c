import type { Fault } from "./faults.ts";
import { isRow, rows } from "./rows.ts";

/** Rings of polygons that are not closed, enclose nothing, or leave the Earth (RFC 7946, 3.1.6 and 4). */
export function* ringFaults(document: unknown): Generator<Fault> {
  const site = isRow(document) ? document.site : undefined;
  if (!isRow(site)) return;
  yield* geometryFaults("site.allowed", site.allowed);
  for (const list of ["keepOut", "costAreas"]) {
    for (const [path, { geometry }] of rows(site, list, "site")) yield* geometryFaults(`${path}.geometry`, geometry);
  }
}

function* geometryFaults(path: string, geometry: unknown): Generator<Fault> {
  if (!isRow(geometry)) return;
  const at = `${path}.coordinates`;
  if (geometry.type === "Polygon") yield* polygonFaults(at, geometry.coordinates);
  if (geometry.type !== "MultiPolygon") return;
  for (const [k, polygon] of list(geometry.coordinates).entries()) yield* polygonFaults(`${at}[${k}]`, polygon);
}

const list = (value: unknown): readonly unknown[] => (Array.isArray(value) ? value : []);

function* polygonFaults(path: string, polygon: unknown): Generator<Fault> {
  for (const [k, ring] of list(polygon).entries()) yield* oneRingFaults(`${path}[${k}]`, list(ring));
}

function* oneRingFaults(path: string, ring: readonly unknown[]): Generator<Fault> {
  // A position that is none has its own fault, and so has a ring that is too short.
  if (ring.length < 4 || !ring.every(isPosition)) return;
  const [first, last] = [ring[0], ring[ring.length - 1]];
  if (first[0] !== last[0] || first[1] !== last[1]) {
    yield {
      path: `${path}[${ring.length - 1}]`,
      value: last,
      expected: `the ring's first position again, ${JSON.stringify(first)}`,
    };
  }
  const different = new Set(ring.map(([lon, lat]) => `${lon},${lat}`)).size;
  if (different < 3) {
    const found = `a ring of ${different} different position${different === 1 ? "" : "s"}`;
    yield { path, value: ring, found, expected: "at least three" };
  }
  for (const [k, [lon, lat]] of ring.entries()) {
    if (Math.abs(lat) <= 90 && lon >= -180 && lon <= 360) continue;
    const expected = "a longitude in [-180, 360] and a latitude in [-90, 90] degrees, in this order";
    yield { path: `${path}[${k}]`, value: [lon, lat], expected };
  }
}

const isPosition = (value: unknown): value is readonly [number, number] =>
  Array.isArray(value) && value.length >= 2 && value.every((x) => typeof x === "number" && Number.isFinite(x));
