import { DomainError } from "../../base/errors.ts";

/** Baselines among N stations: N(N − 1)/2. */
export function baselineCount(stationCount: number): number {
  return (stationCount * (stationCount - 1)) / 2;
}

/**
 * All baselines of a set of stations, position of j minus position of i for i < j in station order.
 *
 * @param stationXyzM - (N, 3) row-major, metres, any Cartesian frame.
 * @returns (N(N − 1)/2, 3) row-major, metres, in the order (0,1), (0,2) … (0,N−1), (1,2) …; empty below two stations.
 * @throws {@link DomainError} for a length not divisible by 3.
 */
export function baselineXyzM(stationXyzM: Float64Array): Float64Array {
  if (stationXyzM.length % 3 !== 0) throw new DomainError("stationXyzM.length", stationXyzM.length, "a multiple of 3");
  const n = stationXyzM.length / 3;
  const out = new Float64Array(3 * baselineCount(n));
  let at = 0;
  for (let i = 0; i < n; i++) {
    for (let j = i + 1; j < n; j++) {
      for (let axis = 0; axis < 3; axis++) out[at++] = stationXyzM[3 * j + axis] - stationXyzM[3 * i + axis];
    }
  }
  return out;
}

/** Stations i < j of every baseline, in the order of `baselineXyzM`: (N(N − 1)/2, 2) row-major. */
export function baselineStations(stationCount: number): Uint32Array {
  const out = new Uint32Array(2 * baselineCount(stationCount));
  let at = 0;
  for (let i = 0; i < stationCount; i++) {
    for (let j = i + 1; j < stationCount; j++) {
      out[at++] = i;
      out[at++] = j;
    }
  }
  return out;
}

/** Row of the baseline between stations i < j of N in the order of `baselineXyzM`. */
export function baselineIndex(i: number, j: number, stationCount: number): number {
  if (!(i >= 0 && i < j && j < stationCount)) throw new DomainError("i, j", [i, j], `0 ≤ i < j < ${stationCount}`);
  return (i * (2 * stationCount - i - 1)) / 2 + (j - i - 1);
}

/** Straight lengths of baselines, metres: (B) from (B, 3) row-major. */
export function baselineLengthsM(xyzM: Float64Array): Float64Array {
  if (xyzM.length % 3 !== 0) throw new DomainError("xyzM.length", xyzM.length, "a multiple of 3");
  return Float64Array.from({ length: xyzM.length / 3 }, (_, b) => Math.hypot(xyzM[3 * b], xyzM[3 * b + 1], xyzM[3 * b + 2]));
}
