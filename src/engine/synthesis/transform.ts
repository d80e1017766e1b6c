import FFT from "fft.js";

/**
 * A view of half of a real, point-symmetric grid of `size`² cells: rows of column a ≥ 0 start at `start(a)` and run over v
 * modulo `size`; columns past `lastColumn` are empty.
 */
export interface SymmetricGrid {
  readonly size: number;
  readonly lastColumn: number;
  readonly cells: Float64Array | Int32Array;
  readonly start: (column: number) => number;
}

/** Columns transformed before one transposing write: 8 complex values fill two cache lines. */
const BLOCK = 8;

/**
 * Transforms point-symmetric real grids to point-symmetric real images, all buffers kept between calls.
 *
 * Both halves of both passes are packed two reals to a complex transform: columns u ≥ 0 only, empty ones skipped; rows
 * m ≥ 0 only, and only as many as the image shows; the rest is the mirror image. fft.js does the one-dimensional work;
 * every array it sees is a plain Array, since mixing array types slows it for the life of the process.
 */
export class SymmetricTransform {
  readonly size: number;
  private readonly fft: FFT;
  private readonly input: number[];
  private readonly outputs: number[][];
  private spectrum = new Float64Array(0);

  /** @param size - Cells a side of the grid: a power of two, at least 16. */
  constructor(size: number) {
    this.size = size;
    this.fft = new FFT(size);
    this.input = this.fft.createComplexArray();
    this.outputs = Array.from({ length: BLOCK / 2 }, () => this.fft.createComplexArray());
  }

  /**
   * @param grid - Weights; unchanged.
   * @param shown - Pixels a side of the image, even, at most `size`.
   * @returns (shown, shown): pixel (x, y) at `shown * y + x` is Σ over the whole grid of
   *   weight·cos 2π(a(x − shown/2) + b(y − shown/2))/size. Rounding only.
   */
  image(grid: SymmetricGrid, shown: number, out = new Float64Array(shown * shown)): Float64Array {
    const rows = shown / 2 + 1;
    const columns = grid.lastColumn + 1;
    // Whole blocks and a little more: strides off the powers of two keep rows from falling into one cache set.
    const stride = 2 * BLOCK * Math.ceil(columns / BLOCK) + 8;
    if (this.spectrum.length < stride * (rows + 1)) this.spectrum = new Float64Array(stride * (rows + 1));
    // An odd last row is transformed with an empty one: what an earlier image left there would change its rounding.
    this.spectrum.fill(0, stride * rows, stride * (rows + 1));
    this.columnPass(grid, rows, stride);
    this.rowPass(columns, rows, stride, shown, out);
    return out;
  }

  private columnPass(grid: SymmetricGrid, rows: number, stride: number): void {
    const { size, input, outputs } = this;
    const { cells, lastColumn } = grid;
    for (let block = 0; block <= lastColumn; block += BLOCK) {
      const pairs = Math.min(BLOCK / 2, Math.ceil((lastColumn + 1 - block) / 2));
      for (let p = 0; p < pairs; p++) {
        const first = grid.start(block + 2 * p);
        if (block + 2 * p + 1 <= lastColumn) {
          const second = grid.start(block + 2 * p + 1);
          for (let y = 0; y < size; y++) {
            input[2 * y] = cells[first + y];
            input[2 * y + 1] = cells[second + y];
          }
        } else {
          for (let y = 0; y < size; y++) {
            input[2 * y] = cells[first + y];
            input[2 * y + 1] = 0;
          }
        }
        this.fft.transform(outputs[p], input);
      }
      this.transpose(rows, stride, block);
    }
  }

  /** Parts each packed pair and writes a block of columns to the rows of the spectrum, two cache lines a row. */
  private transpose(rows: number, stride: number, block: number): void {
    const { size, spectrum } = this;
    const [z0, z1, z2, z3] = this.outputs;
    for (let m = 0; m < rows; m++) {
      const to = stride * m + 2 * block;
      const k = 2 * m;
      const mirror = m === 0 ? 0 : 2 * (size - m);
      part(z0, k, mirror, spectrum, to);
      part(z1, k, mirror, spectrum, to + 4);
      part(z2, k, mirror, spectrum, to + 8);
      part(z3, k, mirror, spectrum, to + 12);
    }
  }

  private rowPass(columns: number, rows: number, stride: number, shown: number, out: Float64Array): void {
    const { size, input, spectrum } = this;
    const output = this.outputs[0];
    const half = shown / 2;
    for (let k = 2 * columns; k < 2 * (size - columns + 1); k++) input[k] = 0;
    for (let m = 0; m < rows; m += 2) {
      const first = stride * m;
      const second = stride * (m + 1);
      // Row m is Hermitian in a; a packed pair R + iS has the value conj(R) + i·conj(S) at −a.
      input[0] = spectrum[first];
      input[1] = spectrum[second];
      let k = 2;
      let mirror = 2 * size - 2;
      for (let a = 1; a < columns; a++, k += 2, mirror -= 2) {
        const re = spectrum[first + k];
        const im = spectrum[first + k + 1];
        const re2 = spectrum[second + k];
        const im2 = spectrum[second + k + 1];
        input[mirror] = re + im2;
        input[mirror + 1] = re2 - im;
        input[k] = re - im2;
        input[k + 1] = im + re2;
      }
      this.fft.transform(output, input);
      if (m > 0 && m + 1 < half) {
        writeRows(output, m, size, half, out);
      } else {
        writeRow(output, 0, m, size, half, out);
        if (m + 1 < rows) writeRow(output, 1, m + 1, size, half, out);
      }
    }
  }
}

/** Z = A + iB of two real columns: A = (Z(m) + conj Z(−m))/2, B = (Z(m) − conj Z(−m))/2i. */
function part(z: number[], k: number, mirror: number, out: Float64Array, to: number): void {
  const re = z[k];
  const im = z[k + 1];
  const reMirror = z[mirror];
  const imMirror = z[mirror + 1];
  out[to] = 0.5 * (re + reMirror);
  out[to + 1] = 0.5 * (im - imMirror);
  out[to + 2] = 0.5 * (im + imMirror);
  out[to + 3] = 0.5 * (reMirror - re);
}

/** Copies row m ≥ 0 of the transform, and its mirror image at −m, to the image. */
function writeRow(output: number[], part: 0 | 1, m: number, size: number, half: number, out: Float64Array): void {
  const shown = 2 * half;
  for (const sign of [1, -1] as const) {
    const row = half + sign * m;
    if (row >= shown || (m === 0 && sign < 0)) continue;
    const to = shown * row + half;
    for (let l = -half; l < half; l++) {
      const from = sign * l;
      out[to + l] = output[(from < 0 ? 2 * (size + from) : 2 * from) + part];
    }
  }
}

/** The same for rows m and m + 1 of one packed transform, neither of them first or last: the inner loop of every image. */
function writeRows(output: number[], m: number, size: number, half: number, out: Float64Array): void {
  const shown = 2 * half;
  const above = shown * (half + m) + half;
  const below = shown * (half - m) + half;
  const above2 = above + shown;
  const below2 = below - shown;
  for (let l = 0, east = 0, west = 2 * size; l < half; l++, east += 2, west -= 2) {
    const e = output[east];
    const e2 = output[east + 1];
    out[above + l] = e;
    out[below - l] = e;
    out[above2 + l] = e2;
    out[below2 - l] = e2;
    if (l === 0) continue;
    const w = output[west];
    const w2 = output[west + 1];
    out[above - l] = w;
    out[below + l] = w;
    out[above2 - l] = w2;
    out[below2 + l] = w2;
  }
  out[above - half] = output[2 * (size - half)];
  out[above2 - half] = output[2 * (size - half) + 1];
  out[below - half] = output[2 * (half % size)];
  out[below2 - half] = output[2 * (half % size) + 1];
}
