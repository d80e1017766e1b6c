import type { Track } from "../synthesis/track.ts";
import { SEES, type Visibility } from "../synthesis/visibility.ts";

/** By how much the air raises a station's SEFD at an elevation, radians; at least 1. */
export type AirOf = (station: number, elevationRad: number) => number;

/**
 * By how much the air over the stations raises the noise of natural weights: √(Σ 1/(S_i S_j) / Σ 1/(S_i A_i S_j A_j)) over the
 * samples that count, A the factor of each station at its own elevation then. 1 without samples.
 *
 * Weights stay those without the air, as the plan has them; weights that knew of it would lose a little less.
 */
export function airNoiseFactor(track: Track, seen: Visibility, airOf: AirOf): number {
  const { normals, hourAngleRad, decRad, sefdJy } = track;
  const stations = track.diameterM.length;
  const times = hourAngleRad.length;
  const [cosDec, sinDec] = [Math.cos(decRad), Math.sin(decRad)];
  let clear = 0;
  let through = 0;
  for (let t = 0; t < times; t++) {
    const [cosH, sinH] = [Math.cos(hourAngleRad[t]), Math.sin(hourAngleRad[t])];
    // Σ over pairs of a_i·a_j is half of (Σa)² − Σa².
    let [sum, squares, airSum, airSquares] = [0, 0, 0, 0];
    for (let i = 0; i < stations; i++) {
      if (seen.flags[times * i + t] !== SEES) continue;
      const sine = normals[3 * i] * cosDec * cosH - normals[3 * i + 1] * cosDec * sinH + normals[3 * i + 2] * sinDec;
      const a = 1 / (sefdJy?.[i] ?? 1);
      const b = a / airOf(i, Math.asin(Math.min(1, Math.max(-1, sine))));
      sum += a;
      squares += a * a;
      airSum += b;
      airSquares += b * b;
    }
    clear += sum * sum - squares;
    through += airSum * airSum - airSquares;
  }
  return through > 0 ? Math.sqrt(clear / through) : 1;
}
