import type { DensityGrid } from "../synthesis/density.ts";

export interface Coverage {
  /** Cells with a sample over all cells whose centre lies inside the longest projected baseline. */
  readonly filledFraction: number;
  /** Evenness of the filled fraction over directions, 1 = even. */
  readonly azimuthalUniformity: number;
}

/** Sectors of a half turn; the other half is its mirror image. */
const SECTORS = 36;

/**
 * How much of the uv plane is filled, and how evenly round the compass, on the density cells inside the longest projected
 * baseline.
 *
 * Azimuthal uniformity is Pielou's evenness (J. Theoret. Biol. 13 (1966) 131) of the filled fractions of 36 sectors of 5°:
 * Shannon's entropy of their shares over its largest value, ln 36. The cell at the origin has no direction and counts in
 * the fraction alone.
 *
 * @param longestWavelengths - Longest projected baseline, over all channels.
 */
export function coverage(density: DensityGrid, longestWavelengths: number): Coverage {
  const { reach, weight, fieldRad } = density;
  const radius = Math.min(reach, longestWavelengths * fieldRad);
  const filled = new Float64Array(SECTORS);
  const cells = new Float64Array(SECTORS);
  const row = 2 * reach + 1;
  const limit = radius * radius;
  const edges = Array.from({ length: SECTORS - 1 }, (_, k) => (Math.PI * (k + 1)) / SECTORS);
  const cosEdge = Float64Array.from(edges, Math.cos);
  const sinEdge = Float64Array.from(edges, Math.sin);
  for (let ku = 0; ku <= radius; ku++) {
    const span = Math.floor(Math.sqrt(limit - ku * ku));
    // Down a column the direction runs from +v round through +u to −v, half a turn, so that sectors come in order.
    let sector = 0;
    for (let kv = span; kv >= (ku === 0 ? 1 : -span); kv--) {
      while (sector < SECTORS - 1 && ku * cosEdge[sector] >= kv * sinEdge[sector]) sector++;
      cells[sector]++;
      if (weight[row * ku + kv + reach] > 0) filled[sector]++;
    }
  }
  const sum = (a: Float64Array): number => a.reduce((total, x) => total + x, 0);
  const centre = weight[reach] > 0 ? 1 : 0;
  const shares = filled.map((f, s) => (cells[s] > 0 ? f / cells[s] : 0));
  const total = sum(shares);
  const entropy = total > 0 ? -sum(shares.map((s) => (s > 0 ? (s / total) * Math.log(s / total) : 0))) : 0;
  return {
    filledFraction: (2 * sum(filled) + centre) / (2 * sum(cells) + 1),
    azimuthalUniformity: Math.abs(entropy) / Math.log(SECTORS),
  };
}
