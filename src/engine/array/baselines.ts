/**
 * All baselines of a set of stations, position of j minus position of i for i < j in station order.
 *
 * @param stationXyzM - (N, 3) row-major, metres, any Cartesian frame.
 * @returns (N(N−1)/2, 3) row-major, metres: rows (0,1), (0,2) … (0,N−1), (1,2) …
 */
export function baselineXyzM(stationXyzM: Float64Array): Float64Array {
  const n = stationXyzM.length / 3;
  const out = new Float64Array((3 * n * (n - 1)) / 2);
  let at = 0;
  for (let i = 0; i < n; i++) {
    for (let j = i + 1; j < n; j++) {
      for (let axis = 0; axis < 3; axis++) out[at++] = stationXyzM[3 * j + axis] - stationXyzM[3 * i + axis];
    }
  }
  return out;
}
