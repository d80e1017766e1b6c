import type { Kernel } from "./kernel.ts";

/** Extra cells beyond each edge, so that a kernel never needs a test or a modulo; folded back once at the end. */
const MARGIN = 8;

/**
 * Half of a point-symmetric uv grid: columns of constant u, from −MARGIN past zero to `lastColumn` + MARGIN.
 * Column a, row y is at `stride * (a + MARGIN) + y + MARGIN`; y is v modulo the size.
 */
export interface HalfGrid {
  /** Cells a side of the whole, periodic grid; a power of two. */
  readonly size: number;
  /** Largest column that holds anything after `foldInPlace`. */
  readonly lastColumn: number;
  readonly stride: number;
  readonly cells: Float64Array;
}

/**
 * @param size - Cells a side of the whole grid.
 * @param maxColumn - Largest |u| of a sample, in cells. Samples past size/2 wrap, as the transform's period demands.
 */
export function halfGrid(size: number, maxColumn: number): HalfGrid {
  const lastColumn = Math.min(size / 2, Math.ceil(maxColumn) + MARGIN);
  const stride = size + 2 * MARGIN;
  return { size, lastColumn, stride, cells: new Float64Array(stride * (lastColumn + 1 + 2 * MARGIN)) };
}

/** A linear map from (u, v) in metres to grid cells: x = xu·u + xv·v, y likewise. */
export interface ToCells {
  readonly xu: number;
  readonly xv: number;
  readonly yu: number;
  readonly yv: number;
}

/**
 * Spreads weighted samples, each as itself or its conjugate, whichever has u ≥ 0. Linear in the weights.
 *
 * @param scale - Multiplies the map: cells per metre change with the channel.
 */
export function spread(
  grid: HalfGrid,
  kernel: Kernel,
  map: ToCells,
  scale: number,
  count: number,
  uM: Float64Array,
  vM: Float64Array,
  weight: Float64Array,
): void {
  const { size, stride, cells } = grid;
  const { width, taps, rows } = kernel;
  const half = width / 2;
  const xu = map.xu * scale;
  const xv = map.xv * scale;
  const yu = map.yu * scale;
  const yv = map.yv * scale;
  const v = new Float64Array(width);
  for (let k = 0; k < count; k++) {
    let x = xu * uM[k] + xv * vM[k];
    let y = yu * uM[k] + yv * vM[k];
    x -= size * Math.round(x / size);
    if (x < 0) {
      x = -x;
      y = -y;
    }
    y -= size * Math.floor(y / size);
    const column0 = Math.ceil(x - half);
    const row0 = Math.ceil(y - half);
    const gx = column0 - x + half;
    const gy = row0 - y + half;
    const rx = (gx * rows + 0.5) | 0;
    const ry = (gy * rows + 0.5) | 0;
    const dx = gx - rx / rows;
    const dy = gy - ry / rows;
    let tap = 3 * width * ry;
    for (let b = 0; b < width; b++, tap += 3) v[b] = taps[tap] + dy * (taps[tap + 1] + dy * taps[tap + 2]);
    tap = 3 * width * rx;
    let at = stride * (column0 + MARGIN) + row0 + MARGIN;
    const w = weight[k];
    if (width === 8) {
      // The width of every settled beam, written out: twice as fast as the loop.
      const v0 = v[0];
      const v1 = v[1];
      const v2 = v[2];
      const v3 = v[3];
      const v4 = v[4];
      const v5 = v[5];
      const v6 = v[6];
      const v7 = v[7];
      for (let a = 0; a < 8; a++, tap += 3, at += stride) {
        const p = w * (taps[tap] + dx * (taps[tap + 1] + dx * taps[tap + 2]));
        cells[at] += p * v0;
        cells[at + 1] += p * v1;
        cells[at + 2] += p * v2;
        cells[at + 3] += p * v3;
        cells[at + 4] += p * v4;
        cells[at + 5] += p * v5;
        cells[at + 6] += p * v6;
        cells[at + 7] += p * v7;
      }
      continue;
    }
    for (let a = 0; a < width; a++, tap += 3, at += stride) {
      const p = w * (taps[tap] + dx * (taps[tap + 1] + dx * taps[tap + 2]));
      for (let b = 0; b < width; b++) cells[at + b] += p * v[b];
    }
  }
}

/**
 * Brings the margins home and adds each sample's conjugate, so that column a ≥ 0, row y holds the whole grid's value at
 * (a, y); columns −a follow by point symmetry.
 */
export function foldInPlace(grid: HalfGrid): void {
  const { size, lastColumn, stride, cells } = grid;
  const columns = lastColumn + 1 + 2 * MARGIN;
  for (let c = 0; c < columns; c++) {
    const base = stride * c + MARGIN;
    for (let m = 1; m <= MARGIN; m++) {
      cells[base + size - m] += cells[base - m];
      cells[base + m - 1] += cells[base + size + m - 1];
    }
  }
  const at = (a: number): number => stride * (a + MARGIN) + MARGIN;
  const addFlipped = (to: number, from: number): void => {
    cells[at(to)] += cells[at(from)];
    for (let y = 1; y < size; y++) cells[at(to) + y] += cells[at(from) + size - y];
  };
  const symmetrise = (a: number): void => {
    const base = at(a);
    cells[base] *= 2;
    cells[base + size / 2] *= 2;
    for (let y = 1; y < size / 2; y++) {
      const sum = cells[base + y] + cells[base + size - y];
      cells[base + y] = sum;
      cells[base + size - y] = sum;
    }
  };
  for (let a = 1; a <= MARGIN && a <= lastColumn; a++) addFlipped(a, -a);
  if (lastColumn === size / 2) {
    for (let a = 1; a <= MARGIN; a++) addFlipped(size / 2 - a, size / 2 + a);
    symmetrise(size / 2);
  }
  symmetrise(0);
}

/** Where column a, row 0 starts after folding. */
export function columnStart(grid: HalfGrid, column: number): number {
  return grid.stride * (column + MARGIN) + MARGIN;
}
