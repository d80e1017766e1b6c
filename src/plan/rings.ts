import type { Fault } from "./faults.ts";
import { isRow, rows } from "./rows.ts";

/** Rings of polygons that are not closed, enclose nothing, or leave the Earth (RFC 7946, 3.1.6 and 4). */
export function ringFaults(document: unknown): Fault[] {
  const site = isRow(document) ? document.site : undefined;
  if (!isRow(site)) return [];
  return [
    ...geometryFaults("site.allowed", site.allowed),
    ...["keepOut", "costAreas"].flatMap((list) =>
      rows(site, list, "site").flatMap(([path, { geometry }]) => geometryFaults(`${path}.geometry`, geometry)),
    ),
  ];
}

function geometryFaults(path: string, geometry: unknown): Fault[] {
  if (!isRow(geometry)) return [];
  const at = `${path}.coordinates`;
  if (geometry.type === "Polygon") return polygonFaults(at, geometry.coordinates);
  if (geometry.type !== "MultiPolygon") return [];
  return list(geometry.coordinates).flatMap((polygon, k) => polygonFaults(`${at}[${k}]`, polygon));
}

const list = (value: unknown): readonly unknown[] => (Array.isArray(value) ? value : []);

const polygonFaults = (path: string, polygon: unknown): Fault[] =>
  list(polygon).flatMap((ring, k) => oneRingFaults(`${path}[${k}]`, list(ring)));

function oneRingFaults(path: string, ring: readonly unknown[]): Fault[] {
  // A position that is none has its own fault, and so has a ring that is too short.
  if (ring.length < 4 || !ring.every(isPosition)) return [];
  const faults: Fault[] = [];
  const [first, last] = [ring[0], ring[ring.length - 1]];
  if (first[0] !== last[0] || first[1] !== last[1]) {
    faults.push({
      path: `${path}[${ring.length - 1}]`,
      value: last,
      expected: `the ring's first position again, ${JSON.stringify(first)}`,
    });
  }
  const different = new Set(ring.map(([lon, lat]) => `${lon},${lat}`)).size;
  if (different < 3) {
    const found = `a ring of ${different} different position${different === 1 ? "" : "s"}`;
    faults.push({ path, value: ring, found, expected: "at least three" });
  }
  for (const [k, [lon, lat]] of ring.entries()) {
    if (Math.abs(lat) <= 90 && lon >= -180 && lon <= 360) continue;
    const expected = "a longitude in [-180, 360] and a latitude in [-90, 90] degrees, in this order";
    faults.push({ path: `${path}[${k}]`, value: [lon, lat], expected });
  }
  return faults;
}

const isPosition = (value: unknown): value is readonly [number, number] =>
  Array.isArray(value) && value.length >= 2 && value.every((x) => typeof x === "number" && Number.isFinite(x));
