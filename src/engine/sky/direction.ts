import type { Vec3 } from "../geodesy/vec3.ts";
import { wrapTurn } from "./rotation.ts";

/**
 * Unit vector toward a source in the XYZ frame of the origin's meridian: X toward hour angle 0 on the equator, Y toward
 * −6 h, Z toward the pole (Thompson, Moran & Swenson, 3rd ed., §4.1).
 */
export function sourceDirection(hourAngleRad: number, decRad: number): Vec3 {
  const cosDec = Math.cos(decRad);
  return [cosDec * Math.cos(hourAngleRad), -cosDec * Math.sin(hourAngleRad), Math.sin(decRad)];
}

/** A direction over the horizon: azimuth north through east in [0, 2π), elevation in [−π/2, π/2]. */
export interface Horizontal {
  readonly azimuthRad: number;
  readonly elevationRad: number;
}

/** Hour angle and declination to azimuth and elevation at a latitude. No refraction. At the zenith the azimuth is 0. */
export function toHorizontal(hourAngleRad: number, decRad: number, latRad: number): Horizontal {
  const [sh, ch] = [Math.sin(hourAngleRad), Math.cos(hourAngleRad)];
  const [sd, cd] = [Math.sin(decRad), Math.cos(decRad)];
  const [sp, cp] = [Math.sin(latRad), Math.cos(latRad)];
  const east = -sh * cd;
  const north = sd * cp - ch * cd * sp;
  const up = ch * cd * cp + sd * sp;
  const flat = Math.hypot(east, north);
  return { azimuthRad: flat === 0 ? 0 : wrapTurn(Math.atan2(east, north)), elevationRad: Math.atan2(up, flat) };
}

/** Azimuth and elevation to hour angle in (−π, π] and declination. */
export function fromHorizontal(azimuthRad: number, elevationRad: number, latRad: number): { hourAngleRad: number; decRad: number } {
  const [sa, ca] = [Math.sin(azimuthRad), Math.cos(azimuthRad)];
  const [se, ce] = [Math.sin(elevationRad), Math.cos(elevationRad)];
  const [sp, cp] = [Math.sin(latRad), Math.cos(latRad)];
  const x = -ca * ce * sp + se * cp;
  const y = -sa * ce;
  const z = ca * ce * cp + se * sp;
  const flat = Math.hypot(x, y);
  return { hourAngleRad: flat === 0 ? 0 : Math.atan2(y, x), decRad: Math.atan2(z, flat) };
}

/** Angle at the source between the pole and the zenith, positive west of the meridian, (−π, π]; 0 at the zenith. */
export function parallacticAngle(hourAngleRad: number, decRad: number, latRad: number): number {
  const across = Math.cos(latRad) * Math.sin(hourAngleRad);
  const along = Math.sin(latRad) * Math.cos(decRad) - Math.cos(latRad) * Math.sin(decRad) * Math.cos(hourAngleRad);
  return across === 0 && along === 0 ? 0 : Math.atan2(across, along);
}
