import { direct, inverse } from "../../engine/geodesy/geodesic.ts";
import type { GeoPoint } from "./frame.ts";
import { EARTH_RADIUS_M } from "./sheet.ts";

/** How far and which way. */
export interface Displacement {
  readonly distanceM: number;
  /** North through east, [0, 360). */
  readonly bearingDeg: number;
}

const turned = (deg: number): number => ((deg % 360) + 360) % 360;

/**
 * From one place to another, along the ellipsoid raised to a height: on a plateau at 2 400 m a walk of 600 m is 0.2 m longer
 * than its shadow at sea level, and east and north are counted up there. Bearing 0 where the places coincide.
 */
export function displacement(from: GeoPoint, to: GeoPoint, heightM = 0): Displacement {
  const { distanceM: shadowM, azimuthADeg } = inverse(from.latitudeDeg, from.longitudeDeg, to.latitudeDeg, to.longitudeDeg);
  const distanceM = shadowM * (1 + heightM / EARTH_RADIUS_M);
  return { distanceM, bearingDeg: distanceM === 0 ? 0 : turned(azimuthADeg) };
}

/**
 * The place on a bearing from `from`, or on its continuation backwards, that lies abreast of `to`: the foot of the right-angled
 * spherical triangle (tan a = cos A tan c, Napier's rules), walked along the ellipsoid.
 */
export function heldTo(from: GeoPoint, to: GeoPoint, bearingDeg: number): GeoPoint {
  const way = displacement(from, to);
  const angle = way.distanceM / EARTH_RADIUS_M;
  const off = ((way.bearingDeg - bearingDeg) * Math.PI) / 180;
  return direct(
    from.latitudeDeg,
    from.longitudeDeg,
    bearingDeg,
    EARTH_RADIUS_M * Math.atan2(Math.sin(angle) * Math.cos(off), Math.cos(angle)),
  );
}
