import { shortWay } from "./areas.ts";
import type { GeoPoint, GroundPoint, LocalFrame } from "./frame.ts";
import { angleBetween, type Camera, EARTH_RADIUS_M } from "./sheet.ts";

const DEG = 180 / Math.PI;
/** Past this angle from the middle a station stands too near the globe's edge to be worked with. */
const WIDE_RAD = (75 * Math.PI) / 180;
/** An array that spans less is fitted by its east and north. */
const LOCAL_SPAN_M = 400_000;
/** A lone station gets a view this wide. */
const ALONE_SPAN_M = 1_000;
const LEAST_SPAN_M = 10;

/** Middle and angular radius of a set of places: the mean direction, and the farthest from it. */
export function cap(points: readonly GeoPoint[]): { readonly middle: GeoPoint; readonly radiusRad: number } {
  let [x, y, z] = [0, 0, 0];
  for (const { latitudeDeg, longitudeDeg } of points) {
    const c = Math.cos(latitudeDeg / DEG);
    x += c * Math.cos(longitudeDeg / DEG);
    y += c * Math.sin(longitudeDeg / DEG);
    z += Math.sin(latitudeDeg / DEG);
  }
  const middle = { latitudeDeg: Math.atan2(z, Math.hypot(x, y)) * DEG, longitudeDeg: Math.atan2(y, x) * DEG };
  return { middle, radiusRad: points.reduce((most, point) => Math.max(most, angleBetween(middle, point)), 0) };
}

/** Whether no one side of the globe shows these places well. */
export const isWide = (points: readonly GeoPoint[]): boolean => cap(points).radiusRad > WIDE_RAD;

/** The camera that shows all points with `marginPx` round them. */
export function fittedCamera(
  points: readonly GroundPoint[],
  frame: LocalFrame,
  width: number,
  height: number,
  marginPx: number,
): Camera {
  const inner = { width: Math.max(40, width - 2 * marginPx), height: Math.max(40, height - 2 * marginPx) };
  if (points.length === 0) return { ...frame.origin, metresPerPx: ALONE_SPAN_M / Math.min(inner.width, inner.height) };
  const { middle, radiusRad } = cap(points);
  const leastM = points.length === 1 ? ALONE_SPAN_M : LEAST_SPAN_M;
  const nearOrigin = points.every((point) => angleBetween(point, frame.origin) < Math.PI / 4);
  let [west, east, south, north] = [Infinity, -Infinity, Infinity, -Infinity];
  for (const { eastM, northM } of points) {
    west = Math.min(west, eastM);
    east = Math.max(east, eastM);
    south = Math.min(south, northM);
    north = Math.max(north, northM);
  }
  const local = nearOrigin && Math.max(-west, east, -south, north) < LOCAL_SPAN_M;
  if (local) {
    const place = frame.at((west + east) / 2, (south + north) / 2, frame.origin.heightM) ?? frame.origin;
    const metresPerPx = Math.max(
      (east - west) / inner.width,
      (north - south) / inner.height,
      leastM / Math.max(inner.width, inner.height),
    );
    return { latitudeDeg: place.latitudeDeg, longitudeDeg: place.longitudeDeg, metresPerPx };
  }
  if (radiusRad > WIDE_RAD) {
    // The Natural Earth sheet is 2 × 2.7373 radii wide and 2 × 1.4219 high.
    const metresPerPx = Math.max((2 * 2.7373 * EARTH_RADIUS_M) / inner.width, (2 * 1.4219 * EARTH_RADIUS_M) / inner.height);
    return { latitudeDeg: 0, longitudeDeg: acrossGap(points), metresPerPx };
  }
  const spanM = 2 * EARTH_RADIUS_M * Math.sin(Math.max(radiusRad, leastM / EARTH_RADIUS_M));
  return { ...middle, metresPerPx: spanM / Math.min(inner.width, inner.height) };
}

/** The meridian opposite the middle of the widest gap in longitude: a flat world centred there cuts the array where it is empty. */
function acrossGap(points: readonly GeoPoint[]): number {
  const longitudes = points.map(({ longitudeDeg }) => shortWay(longitudeDeg)).sort((a, b) => a - b);
  let widest = { deg: -1, middle: 0 };
  longitudes.forEach((from, i) => {
    const to = i + 1 < longitudes.length ? longitudes[i + 1] : longitudes[0] + 360;
    if (to - from > widest.deg) widest = { deg: to - from, middle: (from + to) / 2 };
  });
  return shortWay(widest.middle + 180);
}
