import { dot, type Vec3 } from "./vec3.ts";
import { geodeticToEcef } from "./wgs84.ts";

/** East, north, up in metres at a place on WGS84, up along its ellipsoid normal. */
export interface EnuFrame {
  readonly originEcefM: Vec3;
  /** Unit vectors in geocentric axes. */
  readonly east: Vec3;
  readonly north: Vec3;
  readonly up: Vec3;
}

/**
 * The frame of a place.
 *
 * @param latRad - Geodetic latitude, radians, [−π/2, π/2]. At a pole the longitude still sets where east lies.
 * @param lonRad - Longitude, radians, east positive.
 * @param heightM - Above the ellipsoid, metres.
 * @throws {@link DomainError} for a latitude past a pole or a value that is not finite.
 */
export function enuFrame(latRad: number, lonRad: number, heightM: number): EnuFrame {
  const [sinLat, cosLat] = [Math.sin(latRad), Math.cos(latRad)];
  const [sinLon, cosLon] = [Math.sin(lonRad), Math.cos(lonRad)];
  return {
    originEcefM: geodeticToEcef(latRad, lonRad, heightM),
    east: [-sinLon, cosLon, 0],
    north: [-sinLat * cosLon, -sinLat * sinLon, cosLat],
    up: [cosLat * cosLon, cosLat * sinLon, sinLat],
  };
}

/**
 * Geocentric metres to east, north, up metres of a frame. A shift and a rotation: exact at any distance but for the
 * rounding of geocentric metres, 2 nm.
 */
export function ecefToEnu(frame: EnuFrame, xyzM: Vec3): Vec3 {
  const { originEcefM: o, east, north, up } = frame;
  const d: Vec3 = [xyzM[0] - o[0], xyzM[1] - o[1], xyzM[2] - o[2]];
  return [dot(east, d), dot(north, d), dot(up, d)];
}

/** East, north, up metres of a frame to geocentric metres: the inverse of `ecefToEnu`. */
export function enuToEcef(frame: EnuFrame, enuM: Vec3): Vec3 {
  const { originEcefM: o, east, north, up } = frame;
  const along = (axis: 0 | 1 | 2): number => o[axis] + east[axis] * enuM[0] + north[axis] * enuM[1] + up[axis] * enuM[2];
  return [along(0), along(1), along(2)];
}
