import type { Geometry, Site } from "../../plan/schema.ts";
import type { GeoPoint, GroundPoint, LocalFrame } from "./frame.ts";

/** Rings of one area ready to draw; even-odd inside. */
export interface Area {
  readonly label: string;
  readonly rings: readonly (readonly GroundPoint[])[];
}

/** Corners closer than this draw straight: over 0.02° the bend against a straight line is below 0.1 m. */
const STEP_DEG = 0.02;
const MOST_STEPS = 64;

const ringsOf = (geometry: Geometry): readonly (readonly (readonly number[])[])[] =>
  geometry.type === "Polygon" ? geometry.coordinates : geometry.coordinates.flat();

/**
 * Whether a place lies inside a GeoJSON geometry, by the even-odd rule. Edges are straight in longitude and latitude, as
 * RFC 7946 §3.1.1 defines them, so no projection enters; each runs the short way round, so an area across the antimeridian
 * works. A place exactly on an edge may fall to either side.
 */
export function contains(geometry: Geometry, { latitudeDeg, longitudeDeg }: GeoPoint): boolean {
  let inside = false;
  for (const ring of ringsOf(geometry)) {
    const longitudes = unwrapped(ring);
    const middle = (Math.min(...longitudes) + Math.max(...longitudes)) / 2;
    const x = middle + shortWay(longitudeDeg - middle);
    for (let i = 0, j = ring.length - 1; i < ring.length; j = i++) {
      const yi = ring[i][1] - latitudeDeg;
      const yj = ring[j][1] - latitudeDeg;
      if (yi > 0 === yj > 0) continue;
      if (longitudes[i] - (yi * (longitudes[j] - longitudes[i])) / (yj - yi) > x) inside = !inside;
    }
  }
  return inside;
}

/** Longitudes of a ring without jumps of 360°. */
function unwrapped(ring: readonly (readonly number[])[]): readonly number[] {
  const longitudes = [ring[0][0]];
  for (let i = 1; i < ring.length; i++) longitudes.push(longitudes[i - 1] + shortWay(ring[i][0] - ring[i - 1][0]));
  return longitudes;
}

/** An angle in (−180, 180]. */
export const shortWay = (deg: number): number => {
  const turn = ((deg % 360) + 360) % 360;
  return turn > 180 ? turn - 360 : turn;
};

/** An area at one height, its long edges cut so that they follow the straight line in longitude and latitude. */
export function areaOf(label: string, geometry: Geometry, frame: LocalFrame, heightM: number): Area {
  const rings = ringsOf(geometry).map((ring) => {
    const points: GroundPoint[] = [];
    for (let i = 0; i + 1 < ring.length; i++) {
      const [lon, lat] = ring[i];
      const dLon = shortWay(ring[i + 1][0] - lon);
      const dLat = ring[i + 1][1] - lat;
      const steps = Math.min(MOST_STEPS, Math.max(1, Math.ceil(Math.max(Math.abs(dLon), Math.abs(dLat)) / STEP_DEG - 1e-9)));
      for (let k = 0; k < steps; k++) points.push(frame.point(lat + (dLat * k) / steps, lon + (dLon * k) / steps, heightM));
    }
    return points;
  });
  return { label, rings };
}

/** The land and keep-outs of a site, on the ellipsoid raised to the origin's height. */
export function areasOf(site: Site, frame: LocalFrame): { readonly land: Area | null; readonly keepOuts: readonly Area[] } {
  const heightM = frame.origin.heightM;
  return {
    land: site.allowed ? areaOf("Land boundary", site.allowed, frame, heightM) : null,
    keepOuts: site.keepOut.map((area) => areaOf(area.label || "Keep-out", area.geometry, frame, heightM)),
  };
}

/** What the site says of a place. */
export interface GroundVerdict {
  readonly clear: boolean;
  readonly text: string;
}

/** Clear, or what stands in the way; null where the plan draws neither land nor keep-outs. */
export function groundVerdict(site: Site, place: GeoPoint): GroundVerdict | null {
  const keepOut = site.keepOut.find((area) => contains(area.geometry, place));
  if (keepOut) return { clear: false, text: `inside ${keepOut.label || "a keep-out"}` };
  if (site.allowed && !contains(site.allowed, place)) return { clear: false, text: "outside the land boundary" };
  return site.allowed || site.keepOut.length > 0 ? { clear: true, text: "clear" } : null;
}
