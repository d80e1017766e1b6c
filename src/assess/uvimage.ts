import { wavelengthsPerMetre } from "../engine/synthesis/extent.ts";
import type { UvDensity } from "./result.ts";
import type { Synthesis } from "./synthesis.ts";

/** Room round the samples, as a fraction of their reach. */
const ROOM = 1.04;

/** Samples counted on a square grid for drawing, both Hermitian halves, at the centre frequency; null without samples. */
export function uvImage(synthesis: Synthesis, size: number): UvDensity | null {
  const { walk, extent, setup } = synthesis;
  if (!(extent.longestM > 0)) return null;
  const perMetre = wavelengthsPerMetre(setup.track.frequencyHz);
  const cellWavelengths = (2 * ROOM * extent.longestM * perMetre) / size;
  const scale = perMetre / cellWavelengths;
  const counts = new Float32Array(size * size);
  const half = size / 2;
  walk.baselines(0, setup.stations.length, ({ count, uM, vM }) => {
    for (let k = 0; k < count; k++) {
      const x = Math.floor(uM[k] * scale + 0.5);
      const y = Math.floor(vM[k] * scale + 0.5);
      if (x <= -half || y <= -half || x >= half || y >= half) continue;
      counts[size * (y + half) + x + half]++;
      counts[size * (half - y) + half - x]++;
    }
  });
  return { size, cellWavelengths, counts };
}
