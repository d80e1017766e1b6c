import { beamTable, densityPlace, densityTable, stretch, type Theme } from "./colour.ts";

/** Steps of a colour table: finer than 8 bits a channel can tell along any arm. */
const STEPS = 1024;

export interface BeamPaint {
  /** `stretched` shows sidelobes of a thousandth of the peak, `linear` the shape of the main lobe. */
  readonly stretch: "stretched" | "linear";
}

/**
 * A beam in colour, with north up and east to the left.
 *
 * @param values - (size, size) at `size * y + x`, fraction of the peak, x to the east and y to the north. Not changed.
 * @returns RGBA from the top left: row 0 is the north edge, column 0 the east edge.
 */
export function paintBeam(
  values: ArrayLike<number>,
  size: number,
  theme: Theme,
  { stretch: kind }: BeamPaint,
): Uint8ClampedArray<ArrayBuffer> {
  const table = beamTable(theme, STEPS);
  const place = kind === "linear" ? (v: number) => v : stretch;
  return painted(size, table, (row, column) => {
    const s = place(values[size * (size - 1 - row) + (size - 1 - column)]);
    return Math.round(STEPS * (1 + (s > -1 ? Math.min(1, s) : s <= -1 ? -1 : 0)));
  });
}

/**
 * Counts of uv samples in colour on a log scale, with u to the right and v up. Empty cells have the page's colour.
 *
 * @param counts - (size, size) at `size * y + x`, x along u and y along v. Not changed.
 * @returns RGBA from the top left: row 0 is the largest v, column 0 the smallest u.
 */
export function paintDensity(counts: ArrayLike<number>, size: number, theme: Theme): Uint8ClampedArray<ArrayBuffer> {
  const table = densityTable(theme, STEPS);
  let most = 0;
  for (let k = 0; k < counts.length; k++) if (counts[k] > most) most = counts[k];
  return painted(size, table, (row, column) => Math.round(STEPS * densityPlace(counts[size * (size - 1 - row) + column], most)));
}

function painted(
  size: number,
  table: Uint8ClampedArray,
  index: (row: number, column: number) => number,
): Uint8ClampedArray<ArrayBuffer> {
  const rgba = new Uint8ClampedArray(4 * size * size);
  for (let row = 0, k = 0; row < size; row++) {
    for (let column = 0; column < size; column++, k += 4) {
      const from = 3 * index(row, column);
      rgba[k] = table[from];
      rgba[k + 1] = table[from + 1];
      rgba[k + 2] = table[from + 2];
      rgba[k + 3] = 255;
    }
  }
  return rgba;
}
