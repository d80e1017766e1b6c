import type { Vec3 } from "./vec3.ts";
import { geodeticToEcef } from "./wgs84.ts";

/** East, north, up in metres at a place, up along its ellipsoid normal. */
export interface EnuFrame {
  readonly originEcefM: Vec3;
  /** Rows east, north, up in geocentric axes. */
  readonly east: Vec3;
  readonly north: Vec3;
  readonly up: Vec3;
}

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

/** Geocentric metres to east, north, up metres. A rotation: exact for any distance. */
export function ecefToEnu(frame: EnuFrame, xyzM: Vec3): Vec3 {
  const { originEcefM: o, east, north, up } = frame;
  const d: Vec3 = [xyzM[0] - o[0], xyzM[1] - o[1], xyzM[2] - o[2]];
  return [dot(east, d), dot(north, d), dot(up, d)];
}

export function enuToEcef(frame: EnuFrame, enuM: Vec3): Vec3 {
  const { originEcefM: o, east, north, up } = frame;
  const along = (axis: 0 | 1 | 2): number => o[axis] + east[axis] * enuM[0] + north[axis] * enuM[1] + up[axis] * enuM[2];
  return [along(0), along(1), along(2)];
}

function dot(a: Vec3, b: Vec3): number {
  return a[0] * b[0] + a[1] * b[1] + a[2] * b[2];
}
