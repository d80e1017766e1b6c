import library from "geographiclib";
import { DomainError } from "../../base/errors.ts";
import { type Ellipsoid, WGS84 } from "./wgs84.ts";

const onWgs84 = library.Geodesic.WGS84;

/** The shortest line between two places along the ellipsoid. */
export interface GeodesicLine {
  readonly distanceM: number;
  /** Forward azimuths at either end, degrees from north through east, [−180, 180]: the line arrives at B going this way. */
  readonly azimuthADeg: number;
  readonly azimuthBDeg: number;
}

/**
 * Distance and azimuths between two places, everywhere on the ellipsoid, nearly opposite places included.
 *
 * @param latADeg - Geodetic latitudes, degrees, [−90, 90].
 * @param latBDeg - Goes with latADeg.
 * @param lonADeg - Longitudes, degrees, east positive, any finite value.
 * @param lonBDeg - Goes with lonADeg.
 * @returns Azimuths of 0 for one and the same place, where they have no meaning.
 * @throws {@link DomainError} for a latitude past a pole or a value that is not finite.
 *
 * Accuracy: 15 nm. Source: Karney, Algorithms for geodesics, J. Geodesy 87 (2013) 43, through his own geographiclib.
 */
export function inverse(
  latADeg: number,
  lonADeg: number,
  latBDeg: number,
  lonBDeg: number,
  ellipsoid: Ellipsoid = WGS84,
): GeodesicLine {
  checkPlace("A", latADeg, lonADeg);
  checkPlace("B", latBDeg, lonBDeg);
  const { s12, azi1, azi2 } = on(ellipsoid).Inverse(latADeg, lonADeg, latBDeg, lonBDeg);
  // The library answers 0 or 180 here by the hemisphere, and at the poles by the longitudes.
  if (s12 === 0) return { distanceM: 0, azimuthADeg: 0, azimuthBDeg: 0 };
  return { distanceM: s12 as number, azimuthADeg: azi1 as number, azimuthBDeg: azi2 as number };
}

/** Where a geodesic ends. */
export interface GeodesicEnd {
  readonly latitudeDeg: number;
  /** [−180, 180]. */
  readonly longitudeDeg: number;
  /** Forward azimuth on arrival, degrees, [−180, 180]. */
  readonly azimuthDeg: number;
}

/**
 * Where a geodesic of a given azimuth and length ends (Karney 2013).
 *
 * @param azimuthDeg - At the start, degrees from north through east, any finite value.
 * @param distanceM - Metres along the ellipsoid; a negative length goes backward.
 * @throws {@link DomainError} for a latitude past a pole or a value that is not finite.
 */
export function direct(
  latDeg: number,
  lonDeg: number,
  azimuthDeg: number,
  distanceM: number,
  ellipsoid: Ellipsoid = WGS84,
): GeodesicEnd {
  checkPlace("", latDeg, lonDeg);
  if (!Number.isFinite(azimuthDeg)) throw new DomainError("azimuthDeg", azimuthDeg, "a finite angle in degrees");
  if (!Number.isFinite(distanceM)) throw new DomainError("distanceM", distanceM, "a finite length in metres");
  const { lat2, lon2, azi2 } = on(ellipsoid).Direct(latDeg, lonDeg, azimuthDeg, distanceM);
  return { latitudeDeg: lat2 as number, longitudeDeg: lon2 as number, azimuthDeg: azi2 as number };
}

/** What a ring of geodesics encloses. */
export interface RingSize {
  readonly areaM2: number;
  readonly perimeterM: number;
}

/**
 * Area and perimeter of a polygon whose edges are geodesics (Karney 2013, §6).
 *
 * @param ring - [longitude, latitude] pairs in degrees, as GeoJSON has them; the last may repeat the first. It must not
 *   cross itself. It may enclose a pole or lie across the antimeridian.
 * @returns Area of the smaller of the two sides, never negative, whichever way round the ring goes; 0 below three corners.
 * @throws {@link DomainError} for a latitude past a pole or a value that is not finite.
 */
export function polygonArea(ring: readonly (readonly number[])[]): RingSize {
  const polygon = onWgs84.Polygon(false);
  const last = ring.length - 1;
  const closed = last > 0 && ring[0][0] === ring[last][0] && ring[0][1] === ring[last][1];
  for (const [k, [lonDeg, latDeg]] of (closed ? ring.slice(0, -1) : ring).entries()) {
    checkPlace(`[${k}]`, latDeg, lonDeg);
    polygon.AddPoint(latDeg, lonDeg);
  }
  const { area, perimeter } = polygon.Compute(false, true);
  return { areaM2: Math.abs(area as number), perimeterM: perimeter };
}

function on(ellipsoid: Ellipsoid): typeof onWgs84 {
  return ellipsoid === WGS84 ? onWgs84 : new library.Geodesic.Geodesic(ellipsoid.aM, ellipsoid.f);
}

/** The library answers NaN where it should refuse. */
function checkPlace(name: string, latDeg: number, lonDeg: number): void {
  if (!(Math.abs(latDeg) <= 90)) throw new DomainError(`lat${name}Deg`, latDeg, "a latitude in [-90, 90] degrees");
  if (!Number.isFinite(lonDeg)) throw new DomainError(`lon${name}Deg`, lonDeg, "a finite longitude in degrees");
}
