import { checkFinite, checkQuarter } from "./checks.ts";
import { wrapTurn } from "./rotation.ts";

/**
 * Unit vector toward a source in the XYZ frame of the origin's meridian: X toward hour angle 0 on the equator, Y toward
 * −6 h, Z toward the pole (Thompson, Moran & Swenson, 3rd ed., §4.1).
 *
 * @param hourAngleRad - At the origin's meridian, radians, west positive.
 * @param decRad - Declination of date, radians, [−π/2, π/2].
 * @throws {@link DomainError} for a declination past a pole or a value that is not finite, as every function here does.
 */
export function sourceDirection(hourAngleRad: number, decRad: number): readonly [number, number, number] {
  checkFinite({ hourAngleRad });
  checkQuarter({ decRad });
  const cosDec = Math.cos(decRad);
  return [cosDec * Math.cos(hourAngleRad), -cosDec * Math.sin(hourAngleRad), Math.sin(decRad)];
}

/** A direction over the horizon. */
export interface Horizontal {
  /** North through east, [0, 2π). */
  readonly azimuthRad: number;
  /** [−π/2, π/2], without refraction. */
  readonly elevationRad: number;
}

/**
 * Hour angle and declination to azimuth and elevation.
 *
 * @param hourAngleRad - At the station's own meridian, radians, west positive, any finite value.
 * @param decRad - Declination of date, radians, [−π/2, π/2].
 * @param latRad - Geodetic latitude, so that elevation is against the ellipsoid normal; radians, [−π/2, π/2].
 * @returns At the zenith and the nadir the azimuth has no meaning: 0 where they are hit exactly.
 */
export function toHorizontal(hourAngleRad: number, decRad: number, latRad: number): Horizontal {
  checkFinite({ hourAngleRad });
  checkQuarter({ decRad, latRad });
  const [sinH, cosH] = [Math.sin(hourAngleRad), Math.cos(hourAngleRad)];
  const [sinDec, cosDec] = [Math.sin(decRad), Math.cos(decRad)];
  const [sinLat, cosLat] = [Math.sin(latRad), Math.cos(latRad)];
  const east = -sinH * cosDec;
  const north = sinDec * cosLat - cosH * cosDec * sinLat;
  const up = cosH * cosDec * cosLat + sinDec * sinLat;
  const flat = Math.hypot(east, north);
  return { azimuthRad: flat === 0 ? 0 : wrapTurn(Math.atan2(east, north)), elevationRad: Math.atan2(up, flat) };
}

/** Azimuth and elevation to hour angle in [−π, π] (0 at a celestial pole) and declination: the inverse of `toHorizontal`. */
export function fromHorizontal(
  azimuthRad: number,
  elevationRad: number,
  latRad: number,
): { readonly hourAngleRad: number; readonly decRad: number } {
  checkFinite({ azimuthRad });
  checkQuarter({ elevationRad, latRad });
  const [sinAz, cosAz] = [Math.sin(azimuthRad), Math.cos(azimuthRad)];
  const [sinEl, cosEl] = [Math.sin(elevationRad), Math.cos(elevationRad)];
  const [sinLat, cosLat] = [Math.sin(latRad), Math.cos(latRad)];
  const meridian = sinEl * cosLat - cosAz * cosEl * sinLat;
  const west = -sinAz * cosEl;
  const pole = cosAz * cosEl * cosLat + sinEl * sinLat;
  const flat = Math.hypot(meridian, west);
  return { hourAngleRad: flat === 0 ? 0 : Math.atan2(west, meridian), decRad: Math.atan2(pole, flat) };
}

/**
 * Angle at the source from the direction of the pole to that of the zenith, positive west of the meridian, [−π, π]; at the
 * zenith it has no meaning and is 0 where that is hit exactly.
 */
export function parallacticAngle(hourAngleRad: number, decRad: number, latRad: number): number {
  checkFinite({ hourAngleRad });
  checkQuarter({ decRad, latRad });
  const across = Math.cos(latRad) * Math.sin(hourAngleRad);
  const along = Math.sin(latRad) * Math.cos(decRad) - Math.cos(latRad) * Math.sin(decRad) * Math.cos(hourAngleRad);
  return across === 0 && along === 0 ? 0 : Math.atan2(across, along);
}
