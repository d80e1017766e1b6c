import { wavelengthsPerMetre } from "./extent.ts";
import type { Walk } from "./walk.ts";

/** At most this many cells span twice the largest |u| or |v|. */
export const MAX_CELLS = 4096;

/**
 * Summed natural weight in square uv cells, all channels pooled, both Hermitian halves.
 *
 * Cells are 1/field wavelengths wide and centred on whole multiples of that. Only one of each pair of opposite cells is
 * stored, since the grid is point-symmetric: cell (ku, kv) with ku > 0, or ku = 0 and kv ≥ 0, stands at
 * `(2 * reach + 1) * ku + kv + reach`.
 */
export interface DensityGrid {
  /** Width of the field whose inverse is the cell, radians. */
  readonly fieldRad: number;
  /** Largest |ku| and |kv|. */
  readonly reach: number;
  readonly weight: Float64Array;
}

/** The field a density grid really uses: the wanted one, made smaller so that at most 4096 cells span 2·max(|u|, |v|). */
export function densityField(wantedRad: number, maxUvWavelengths: number): number {
  // The outermost cell index is floor(max·field + ½), so that 2·reach cells span the samples.
  return maxUvWavelengths > 0 ? Math.min(wantedRad, MAX_CELLS / 2 / maxUvWavelengths) : wantedRad;
}

export function emptyDensity(fieldRad: number, maxUvWavelengths: number): DensityGrid {
  const reach = Math.floor(maxUvWavelengths * fieldRad + 0.5) + 1;
  return { fieldRad, reach, weight: new Float64Array((reach + 1) * (2 * reach + 1)) };
}

/**
 * Where a sample's cell is stored. The sample itself is indexed and its conjugate takes the negated index, so
 * k = sign(x)·floor(|x|·field + ½) on each axis.
 */
export function densityIndex(grid: DensityGrid, uCells: number, vCells: number): number {
  let ku = uCells < 0 ? -Math.floor(0.5 - uCells) : Math.floor(uCells + 0.5);
  let kv = vCells < 0 ? -Math.floor(0.5 - vCells) : Math.floor(vCells + 0.5);
  if (ku < 0 || (ku === 0 && kv < 0)) {
    ku = -ku;
    kv = -kv;
  }
  return (2 * grid.reach + 1) * ku + kv + grid.reach;
}

/** Adds the samples of some baselines. The cell at the origin holds a sample and its conjugate, so it counts both. */
export function addToDensity(grid: DensityGrid, walk: Walk, natural: NaturalWeight, from: number, to: number): void {
  const { weight, reach } = grid;
  const scales = walk.track.channelHz.map((hz) => wavelengthsPerMetre(hz) * grid.fieldRad);
  walk.baselines(from, to, ({ i, j, count, uM, vM }) => {
    const w = natural(i, j);
    for (const scale of scales) {
      for (let k = 0; k < count; k++) {
        const cell = densityIndex(grid, uM[k] * scale, vM[k] * scale);
        weight[cell] += cell === reach ? 2 * w : w;
      }
    }
  });
}

/** Natural weight of a baseline by its stations' rows, relative to the first two stations: exactly 1 when all are alike. */
export type NaturalWeight = (i: number, j: number) => number;

/** 1/(SEFD_i·SEFD_j), scaled; 1 where a sensitivity is not known. */
export function naturalWeight(sefdJy: Float64Array | null): NaturalWeight {
  if (!sefdJy) return () => 1;
  const unit = sefdJy[0];
  return (i, j) => (unit / sefdJy[i]) * (unit / sefdJy[j]);
}

/** ΣW² over all cells and Σw over all samples, both halves: Briggs (1995) normalises his robust weights by their ratio. */
export function densityMoments(grid: DensityGrid): { squares: number; sum: number } {
  const { weight, reach } = grid;
  let squares = 0;
  let sum = 0;
  for (let cell = 0; cell < weight.length; cell++) {
    const w = weight[cell];
    if (w === 0) continue;
    squares += w * w;
    sum += w;
  }
  const centre = weight[reach];
  return { squares: 2 * squares - centre * centre, sum: 2 * sum - centre };
}
