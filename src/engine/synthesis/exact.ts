import { SPEED_OF_LIGHT } from "../../base/constants.ts";
import type { Track } from "./track.ts";

/** Every sample that counts, held at once: for tests and small plans. */
export interface SampleList {
  readonly u: Float64Array;
  readonly v: Float64Array;
  /** Wavelengths. */
  readonly w: Float64Array;
  readonly weight: Float64Array;
}

/**
 * The slow, obvious twin of the fast chain: no tables, no gridding, no transform, written again from the definitions so
 * that the two can disagree. Natural, uniform and robust weights by their definitions over lists of samples.
 */
export function exactSamples(
  track: Track,
  weighting: { scheme: "natural" | "uniform" | "robust"; robustness: number; taperRad: number | null; fieldRad: number },
): SampleList {
  const n = track.diameterM.length;
  const rows: { u: number; v: number; w: number; natural: number }[] = [];
  for (const H of track.hourAngleRad) {
    const s = [Math.cos(track.decRad) * Math.cos(H), -Math.cos(track.decRad) * Math.sin(H), Math.sin(track.decRad)];
    const at = (i: number, array: Float64Array): number => array[3 * i] * s[0] + array[3 * i + 1] * s[1] + array[3 * i + 2] * s[2];
    const project = (i: number, j: number): { u: number; v: number; w: number } => {
      const [X, Y, Z] = [0, 1, 2].map((axis) => track.stationXyzM[3 * j + axis] - track.stationXyzM[3 * i + axis]);
      return {
        u: X * Math.sin(H) + Y * Math.cos(H),
        v: -X * Math.sin(track.decRad) * Math.cos(H) + Y * Math.sin(track.decRad) * Math.sin(H) + Z * Math.cos(track.decRad),
        w: X * Math.cos(track.decRad) * Math.cos(H) - Y * Math.cos(track.decRad) * Math.sin(H) + Z * Math.sin(track.decRad),
      };
    };
    const counts = Array.from({ length: n }, (_, i) => {
      const elevation = Math.asin(at(i, track.normals));
      if (elevation < track.lowestRad[i] || elevation > track.highestRad[i]) return false;
      for (let j = 0; j < n; j++) {
        if (j === i) continue;
        const { u, v, w } = project(i, j);
        if (w > 0 && Math.hypot(u, v) < (track.diameterM[i] + track.diameterM[j]) / 2) return false;
      }
      return true;
    });
    for (let i = 0; i < n; i++) {
      for (let j = i + 1; j < n; j++) {
        if (!counts[i] || !counts[j]) continue;
        const { u, v, w } = project(i, j);
        const natural = track.sefdJy ? 1 / (track.sefdJy[i] * track.sefdJy[j]) : 1;
        for (const hz of track.channelHz) {
          const k = hz / SPEED_OF_LIGHT;
          rows.push({ u: u * k, v: v * k, w: w * k, natural });
        }
      }
    }
  }
  const key = (x: number): number => Math.sign(x) * Math.floor(Math.abs(x) * weighting.fieldRad + 0.5) + 0;
  const cells = new Map<string, number>();
  for (const { u, v, natural } of rows) {
    for (const sign of [1, -1]) {
      const name = `${sign * key(u) + 0},${sign * key(v) + 0}`;
      cells.set(name, (cells.get(name) ?? 0) + natural);
    }
  }
  const squares = [...cells.values()].reduce((sum, w) => sum + w * w, 0);
  const total = 2 * rows.reduce((sum, row) => sum + row.natural, 0);
  const weight = rows.map(({ u, v, natural }) => {
    const cell = cells.get(`${key(u)},${key(v)}`) as number;
    let w = natural;
    if (weighting.scheme === "uniform") w = natural / cell;
    if (weighting.scheme === "robust") w = natural / (1 + (cell * (5 * 10 ** -weighting.robustness) ** 2) / (squares / total));
    if (weighting.taperRad !== null) w *= Math.exp((-((Math.PI * weighting.taperRad) ** 2) * (u * u + v * v)) / (4 * Math.LN2));
    return w;
  });
  return {
    u: Float64Array.from(rows, (r) => r.u),
    v: Float64Array.from(rows, (r) => r.v),
    w: Float64Array.from(rows, (r) => r.w),
    weight: Float64Array.from(weight),
  };
}

/** B(l, m) = Σ w cos 2π(ul + vm)/Σ w, peak 1: l east and m north in direction cosines, u and v in wavelengths. */
export function exactBeam(samples: Pick<SampleList, "u" | "v" | "weight">, l: number, m: number): number {
  const { u, v, weight } = samples;
  let sum = 0;
  let total = 0;
  for (let k = 0; k < weight.length; k++) {
    sum += weight[k] * Math.cos(2 * Math.PI * (u[k] * l + v[k] * m));
    total += weight[k];
  }
  return sum / total;
}
