import { DomainError } from "../../base/errors.ts";

/**
 * Geocentric positions turned about the pole to the origin's meridian: the X, Y, Z of Thompson, Moran & Swenson, 3rd ed.,
 * §4.1, X toward hour angle 0 on the equator, Y toward hour angle −6 h (90° east of X), Z toward the pole.
 *
 * @param ecefXyzM - (N, 3) row-major, metres, component k of station i at `3 * i + k`.
 * @param originLonRad - Longitude of the plan's origin, radians, east positive.
 * @returns A new array, (N, 3) row-major, metres. Distances and z stay; the origin itself falls on Y = 0.
 * @throws {@link DomainError} for a length not divisible by 3 or a longitude that is not finite.
 */
export function stationXyzM(ecefXyzM: Float64Array, originLonRad: number): Float64Array {
  if (ecefXyzM.length % 3 !== 0) throw new DomainError("ecefXyzM.length", ecefXyzM.length, "a multiple of 3");
  const { cos, sin } = meridian(originLonRad);
  const out = new Float64Array(ecefXyzM.length);
  for (let k = 0; k < ecefXyzM.length; k += 3) {
    out[k] = cos * ecefXyzM[k] + sin * ecefXyzM[k + 1];
    out[k + 1] = cos * ecefXyzM[k + 1] - sin * ecefXyzM[k];
    out[k + 2] = ecefXyzM[k + 2];
  }
  return out;
}

/**
 * Unit normals of the ellipsoid at each station, in the frame of `stationXyzM`.
 *
 * @param latRad - (N) geodetic latitudes and longitudes, radians.
 * @param lonRad - Goes with latRad.
 * @returns (N, 3) row-major. A source stands at elevation e over station i where its direction · normal i = sin e.
 * @throws {@link DomainError} for arrays of unlike length or a longitude of the origin that is not finite.
 */
export function stationNormals(latRad: ArrayLike<number>, lonRad: ArrayLike<number>, originLonRad: number): Float64Array {
  if (lonRad.length !== latRad.length) throw new DomainError("lonRad.length", lonRad.length, `${latRad.length}, as latRad has`);
  const { cos, sin } = meridian(originLonRad);
  const out = new Float64Array(3 * latRad.length);
  for (let i = 0; i < latRad.length; i++) {
    const cosLat = Math.cos(latRad[i]);
    const x = cosLat * Math.cos(lonRad[i]);
    const y = cosLat * Math.sin(lonRad[i]);
    // Turned as positions are, not by lon − origin: both then round alike, on either side of the antimeridian.
    out.set([cos * x + sin * y, cos * y - sin * x, Math.sin(latRad[i])], 3 * i);
  }
  return out;
}

function meridian(originLonRad: number): { readonly cos: number; readonly sin: number } {
  if (!Number.isFinite(originLonRad)) throw new DomainError("originLonRad", originLonRad, "a finite angle in radians");
  return { cos: Math.cos(originLonRad), sin: Math.sin(originLonRad) };
}
