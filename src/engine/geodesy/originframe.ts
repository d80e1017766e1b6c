/**
 * Geocentric positions turned about the pole to the origin's meridian: the X, Y, Z of Thompson, Moran & Swenson, 3rd ed.,
 * §4.1, X toward hour angle 0 on the equator, Y toward hour angle −6 h, Z toward the pole.
 *
 * @param ecefXyzM - (N, 3) row-major, metres.
 * @param originLonRad - Longitude of the plan's origin, radians.
 * @returns (N, 3) row-major, metres.
 */
export function stationXyzM(ecefXyzM: Float64Array, originLonRad: number): Float64Array {
  const cos = Math.cos(originLonRad);
  const sin = Math.sin(originLonRad);
  const out = new Float64Array(ecefXyzM.length);
  for (let k = 0; k < ecefXyzM.length; k += 3) {
    out[k] = cos * ecefXyzM[k] + sin * ecefXyzM[k + 1];
    out[k + 1] = cos * ecefXyzM[k + 1] - sin * ecefXyzM[k];
    out[k + 2] = ecefXyzM[k + 2];
  }
  return out;
}

/** Unit normals of the ellipsoid at each station, (N, 3) row-major, in the frame of `stationXyzM`. */
export function stationNormals(latRad: Float64Array, lonRad: Float64Array, originLonRad: number): Float64Array {
  const out = new Float64Array(3 * latRad.length);
  for (let i = 0; i < latRad.length; i++) {
    const cosLat = Math.cos(latRad[i]);
    const lon = lonRad[i] - originLonRad;
    out.set([cosLat * Math.cos(lon), cosLat * Math.sin(lon), Math.sin(latRad[i])], 3 * i);
  }
  return out;
}
