import type { Track } from "./track.ts";

/** Why a station's sample does not count; 0 when it does. */
export const SEES = 0;
export const TOO_LOW = 1;
export const TOO_HIGH = 2;
export const SHADOWED = 3;

/** What each station sees, and when. */
export interface Visibility {
  /** (N, T) row-major: flag of station i at time t at `T * i + t`. */
  readonly flags: Uint8Array;
  /** Station-times with the source inside the elevation limits, shadowed or not. */
  readonly visible: number;
  readonly shadowed: number;
  /** Times at which at least two stations see the source. */
  readonly timesShared: number;
}

/**
 * Flags every station and time of a track.
 *
 * A station sees the source while its elevation, against its own ellipsoid normal, lies within its limits.
 * One that does is shadowed while any other station, seeing or not, stands nearer the source with a projected
 * distance √(u²+v²) below the mean of the two diameters. At equal distance neither is. Common practice.
 */
export function visibility(track: Track): Visibility {
  const { normals, lowestRad, highestRad, hourAngleRad, decRad } = track;
  const n = lowestRad.length;
  const times = hourAngleRad.length;
  const flags = new Uint8Array(n * times);
  const cosDec = Math.cos(decRad);
  const sinDec = Math.sin(decRad);
  let visible = 0;
  const seeing = new Int32Array(times);
  for (let i = 0; i < n; i++) {
    const nx = normals[3 * i];
    const ny = normals[3 * i + 1];
    const nz = normals[3 * i + 2];
    // Compare elevations, not their sines: a limit of exactly 90° must not fall to rounding.
    for (let t = 0; t < times; t++) {
      const h = hourAngleRad[t];
      const sine = nx * cosDec * Math.cos(h) - ny * cosDec * Math.sin(h) + nz * sinDec;
      const elevation = Math.asin(Math.min(1, Math.max(-1, sine)));
      const flag = elevation < lowestRad[i] ? TOO_LOW : elevation > highestRad[i] ? TOO_HIGH : SEES;
      flags[times * i + t] = flag;
      if (flag === SEES) {
        visible++;
        seeing[t]++;
      }
    }
  }
  const shadowed = markShadows(track, flags);
  let timesShared = 0;
  for (let t = 0; t < times; t++) if (seeing[t] >= 2) timesShared++;
  return { flags, visible, shadowed, timesShared };
}

function markShadows(track: Track, flags: Uint8Array): number {
  const { stationXyzM, normals, diameterM, lowestRad } = track;
  const n = diameterM.length;
  let shadowed = 0;
  for (let i = 0; i < n; i++) {
    for (let j = 0; j < n; j++) {
      if (i === j) continue;
      const x = stationXyzM[3 * j] - stationXyzM[3 * i];
      const y = stationXyzM[3 * j + 1] - stationXyzM[3 * i + 1];
      const z = stationXyzM[3 * j + 2] - stationXyzM[3 * i + 2];
      const length = Math.hypot(x, y, z);
      const reach = (diameterM[i] + diameterM[j]) / 2;
      if (length > reach) {
        // j blocks i only with the source within asin(reach/length) of j's direction: most pairs on level ground never qualify.
        const rise = Math.asin((x * normals[3 * i] + y * normals[3 * i + 1] + z * normals[3 * i + 2]) / length);
        if (rise + Math.asin(reach / length) < lowestRad[i] - 1e-9) continue;
      }
      shadowed += markPair(track, flags, i, x, y, z, reach);
    }
  }
  return shadowed;
}

/** Marks the times at which a station at offset (x, y, z) from station i blocks it; returns how many were new. */
function markPair(track: Track, flags: Uint8Array, i: number, x: number, y: number, z: number, reach: number): number {
  const { hourAngleRad, decRad } = track;
  const times = hourAngleRad.length;
  const cosDec = Math.cos(decRad);
  const sinDec = Math.sin(decRad);
  let marked = 0;
  for (let t = 0; t < times; t++) {
    if (flags[times * i + t] !== SEES) continue;
    const cosH = Math.cos(hourAngleRad[t]);
    const sinH = Math.sin(hourAngleRad[t]);
    const w = x * cosDec * cosH - y * cosDec * sinH + z * sinDec;
    if (!(w > 0)) continue;
    const u = x * sinH + y * cosH;
    const v = -x * sinDec * cosH + y * sinDec * sinH + z * cosDec;
    if (u * u + v * v < reach * reach) {
      flags[times * i + t] = SHADOWED;
      marked++;
    }
  }
  return marked;
}
