import geodesic from "geographiclib";

const { WGS84 } = geodesic.Geodesic;

/** Shortest line between two places on the ellipsoid. */
export interface GeodesicLine {
  readonly distanceM: number;
  /** Forward azimuths at either end, degrees from north through east, [−180, 180]. */
  readonly azimuthADeg: number;
  readonly azimuthBDeg: number;
}

/** Distance and azimuths on WGS84 (Karney, J. Geodesy 87 (2013) 43). Degrees. */
export function inverse(latADeg: number, lonADeg: number, latBDeg: number, lonBDeg: number): GeodesicLine {
  const { s12, azi1, azi2 } = WGS84.Inverse(latADeg, lonADeg, latBDeg, lonBDeg);
  return { distanceM: s12 as number, azimuthADeg: azi1 as number, azimuthBDeg: azi2 as number };
}

/** Where a geodesic of a given azimuth and length ends (Karney 2013). Degrees; longitude in [−180, 180]. */
export function direct(
  latDeg: number,
  lonDeg: number,
  azimuthDeg: number,
  distanceM: number,
): { readonly latitudeDeg: number; readonly longitudeDeg: number; readonly azimuthDeg: number } {
  const { lat2, lon2, azi2 } = WGS84.Direct(latDeg, lonDeg, azimuthDeg, distanceM);
  return { latitudeDeg: lat2 as number, longitudeDeg: lon2 as number, azimuthDeg: azi2 as number };
}

/**
 * Area and perimeter of a polygon of geodesics (Karney 2013).
 *
 * @param ring - [longitude, latitude] pairs in degrees, as GeoJSON has them; the last may repeat the first.
 * @returns Area in m², positive whichever way round; perimeter in metres.
 */
export function polygonArea(ring: readonly (readonly number[])[]): { readonly areaM2: number; readonly perimeterM: number } {
  const polygon = WGS84.Polygon(false);
  const closed = ring.length > 1 && ring[0][0] === ring[ring.length - 1][0] && ring[0][1] === ring[ring.length - 1][1];
  for (const [lon, lat] of closed ? ring.slice(0, -1) : ring) polygon.AddPoint(lat, lon);
  const { area, perimeter } = polygon.Compute(false, true);
  return { areaM2: Math.abs(area as number), perimeterM: perimeter };
}
