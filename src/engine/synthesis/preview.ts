import { type Arc, arcReach, countArc, foldedCounts, sharedRuns } from "./cells.ts";
import { type DensityGrid, densityIndex, densityMoments, emptyDensity, type NaturalWeight } from "./density.ts";
import { wavelengthsPerMetre } from "./extent.ts";
import { type BeamPlane, squareAxes } from "./plane.ts";
import type { Track } from "./track.ts";
import { SymmetricTransform } from "./transform.ts";
import type { Visibility } from "./visibility.ts";
import type { Weighting } from "./weights.ts";

/**
 * The beam while stations move: samples fall on the nearest cell, and a moved station takes only its own baselines with
 * it. A preview, never a result: up to a few thousandths of the peak from the direct sum at the edge of the image.
 *
 * Kept between frames: the density of the natural weights, and the image grid of weighted cells. When a sample enters or
 * leaves a cell, only that cell's weight changes, so a frame costs its moved samples and one transform, whatever the
 * number of cells. Frozen while dragging: what each station sees, and Briggs' normalisation f².
 */
export class PreviewGrid {
  /** Samples farther out than this, in |u| or |v|, are left out: make a new grid for them. */
  readonly reachM: number;
  private track: Track;
  private readonly seen: Visibility;
  private readonly natural: NaturalWeight;
  private readonly density: DensityGrid;
  private readonly transform: SymmetricTransform;
  private readonly size: number;
  private readonly shown: number;
  private readonly level: Float64Array;
  private readonly pixelRad: number;
  private readonly lastColumn: number;
  /** Column a ≥ 0 of weighted cells at `size * a + (v modulo size)`. */
  private readonly cells: Float64Array;
  private total = 0;
  private f2 = 0;
  private readonly scheme: Weighting["scheme"];
  private readonly taper: number;
  /** Image column or row of each density index, from −reach to reach at 0 … 2·reach. */
  private readonly toImage: Int32Array;
  private readonly uvCounts: Int32Array;
  private readonly uvSize: number;
  private readonly uvCellsPerMetre: number;
  private readonly channelHz: readonly number[];

  /**
   * @param maxUvM - Largest |u| or |v| of the samples, metres; \`reachM\` is a little more, so that a station can move outward.
   * @param size - Cells a side of the uv grid: a power of two. `shown` pixels a side of the image are made of it: the middle
   *   half is closer to the settled beam than the whole.
   * @param fieldRad - Of the density cells and of the image, as `previewGeometry` pairs them.
   * @param pixelRad - Goes with fieldRad.
   * @param uv - Side of the drawn uv grid and its cells a metre.
   */
  constructor(
    track: Track,
    seen: Visibility,
    natural: NaturalWeight,
    weighting: Weighting,
    fieldRad: number,
    maxUvM: number,
    size: number,
    shown: number,
    pixelRad: number,
    uv: { readonly size: number; readonly cellsPerMetre: number },
  ) {
    this.track = track;
    this.seen = seen;
    this.natural = natural;
    this.scheme = weighting.scheme;
    this.size = size;
    this.shown = shown;
    this.pixelRad = pixelRad;
    this.channelHz = previewChannels(track);
    this.reachM = OUTWARD * maxUvM;
    const maxUv = this.reachM * wavelengthsPerMetre(this.channelHz[this.channelHz.length - 1]);
    this.density = emptyDensity(fieldRad, maxUv);
    this.transform = new SymmetricTransform(size);
    // Samples strewn over a cell and counted at its middle fade the image by the cell's transform.
    this.level = Float64Array.from({ length: shown }, (_, k) => 1 / sinc((k - shown / 2) / size));
    const { reach } = this.density;
    this.toImage = Int32Array.from({ length: 2 * reach + 1 }, (_, k) =>
      Math.round(((k - reach) * size * pixelRad) / this.density.fieldRad),
    );
    this.lastColumn = Math.min(size / 2, this.toImage[2 * reach]);
    this.cells = new Float64Array(size * (this.lastColumn + 1));
    this.taper =
      weighting.taperRad === null ? 0 : (Math.PI * weighting.taperRad) ** 2 / (4 * Math.LN2 * this.density.fieldRad ** 2);
    this.uvSize = uv.size;
    this.uvCellsPerMetre = uv.cellsPerMetre;
    this.uvCounts = new Int32Array(uv.size * uv.size);
    this.fill(weighting);
  }

  /** Moves stations to where a new track has them; everything else of the track must be as it was. */
  moveTo(track: Track): void {
    const { stationXyzM: before } = this.track;
    const after = track.stationXyzM;
    const n = track.diameterM.length;
    const moved = Uint8Array.from({ length: n }, (_, i) =>
      Number([0, 1, 2].some((axis) => before[3 * i + axis] !== after[3 * i + axis])),
    );
    for (const [now, sign] of [
      [this.track, -1],
      [track, 1],
    ] as const) {
      this.track = now;
      for (let i = 0; i < n; i++) for (let j = i + 1; j < n; j++) if (moved[i] || moved[j]) this.baseline(i, j, sign);
    }
  }

  /** The image now. */
  image(): BeamPlane {
    const { size, shown, lastColumn, cells } = this;
    const values = this.transform.image({ size, lastColumn, cells, start: (a) => size * a }, shown);
    for (let y = 0; y < shown; y++) {
      const row = this.level[y] / (2 * this.total);
      for (let x = 0; x < shown; x++) values[shown * y + x] *= row * this.level[x];
    }
    return { ...squareAxes(shown, this.pixelRad), values };
  }

  /** Samples counted for drawing, both halves. */
  uv(): Float32Array {
    return foldedCounts(this.uvCounts, this.uvSize);
  }

  private fill(weighting: Weighting): void {
    const n = this.track.diameterM.length;
    // Densities first, without weights: f² is made from all of them.
    for (let i = 0; i < n; i++) for (let j = i + 1; j < n; j++) this.baseline(i, j, 1, true);
    const moments = densityMoments(this.density);
    this.f2 = weighting.scheme === "robust" ? ((5 * 10 ** -weighting.robustness) ** 2 * moments.sum) / moments.squares : 0;
    const { weight, reach } = this.density;
    const row = 2 * reach + 1;
    for (let cell = 0; cell < weight.length; cell++)
      if (weight[cell] > 0) this.put(Math.floor(cell / row), (cell % row) - reach, this.cellWeight(weight[cell]));
  }

  /** Weight of all samples of a cell together. */
  private cellWeight(w: number): number {
    if (this.scheme === "natural") return w;
    if (this.scheme === "robust") return w / (1 + w * this.f2);
    return w > 1e-9 ? 1 : 0;
  }

  private baseline(i: number, j: number, sign: 1 | -1, densityOnly = false): void {
    const { stationXyzM, hourAngleRad, decRad } = this.track;
    const times = hourAngleRad.length;
    const stepRad = times > 1 ? hourAngleRad[1] - hourAngleRad[0] : 0;
    const xM = stationXyzM[3 * j] - stationXyzM[3 * i];
    const yM = stationXyzM[3 * j + 1] - stationXyzM[3 * i + 1];
    const zM = stationXyzM[3 * j + 2] - stationXyzM[3 * i + 2];
    for (const [from, to] of sharedRuns(this.seen.flags, times, i, j)) {
      const arc: Arc = { xM, yM, zM, startRad: hourAngleRad[from], stepRad, count: to - from };
      if (arcReach(arc, decRad) * this.uvCellsPerMetre < this.uvSize / 2 - 1) {
        countArc(this.uvCounts, this.uvSize, this.uvCellsPerMetre, decRad, arc, sign);
      }
      for (const hz of this.channelHz) this.weighArc(arc, wavelengthsPerMetre(hz), sign * this.natural(i, j), densityOnly);
    }
  }

  private weighArc(arc: Arc, perMetre: number, weight: number, densityOnly: boolean): void {
    const { decRad } = this.track;
    const { fieldRad, reach, weight: density } = this.density;
    const scale = perMetre * fieldRad;
    if (arcReach(arc, decRad) * scale >= reach) return;
    const x = arc.xM * scale;
    const y = arc.yM * scale;
    const sinDec = Math.sin(decRad);
    const rise = arc.zM * scale * Math.cos(decRad);
    let p = x * Math.sin(arc.startRad) + y * Math.cos(arc.startRad);
    let q = x * Math.cos(arc.startRad) - y * Math.sin(arc.startRad);
    const cos = Math.cos(arc.stepRad);
    const sin = Math.sin(arc.stepRad);
    const row = 2 * reach + 1;
    for (let k = 0; k < arc.count; k++) {
      const cell = densityIndex(this.density, p, rise - q * sinDec);
      const before = density[cell];
      const after = before + (cell === reach ? 2 * weight : weight);
      density[cell] = after;
      if (!densityOnly) this.put(Math.floor(cell / row), (cell % row) - reach, this.cellWeight(after) - this.cellWeight(before));
      const next = p * cos + q * sin;
      q = q * cos - p * sin;
      p = next;
    }
  }

  /** Adds weight to the image cell of a density cell, and to its mirror image where both lie in column 0. */
  private put(ku: number, kv: number, change: number): void {
    const { size, cells, toImage } = this;
    const { reach } = this.density;
    const weight = this.taper > 0 ? change * Math.exp(-this.taper * (ku * ku + kv * kv)) : change;
    const a = toImage[ku + reach];
    if (a > this.lastColumn) return;
    const b = toImage[kv + reach];
    if (ku === 0 && kv === 0) {
      // The origin's cell already counts every sample and its conjugate.
      cells[0] += weight;
      this.total += weight / 2;
      return;
    }
    cells[size * a + (b & (size - 1))] += weight;
    if (a === 0 || 2 * a === size) cells[size * a + (-b & (size - 1))] += weight;
    this.total += weight;
  }
}

function sinc(x: number): number {
  return x === 0 ? 1 : Math.sin(Math.PI * x) / (Math.PI * x);
}

/**
 * A field of density cells and a pixel that go together: a whole, odd number of density cells to each cell of the image's
 * grid, so that moving samples from the middle of one to the middle of the other is even and leaves no ghost.
 *
 * @param fieldRad - Of the settled density cells. It is kept, and the pixel fitted to it, unless the image would then cover
 *   too little: then the density cells of the preview are made as fine as the image's.
 * @param pixelRad - Wanted; the one returned is at most 1.3 times as wide.
 */
export function previewGeometry(fieldRad: number, pixelRad: number, size: number): { fieldRad: number; pixelRad: number } {
  const ratio = fieldRad / (size * pixelRad);
  if (ratio < 1 / WIDER) return { fieldRad: size * pixelRad, pixelRad };
  const cells = 2 * Math.ceil((ratio / WIDER - 1) / 2) + 1;
  return { fieldRad, pixelRad: fieldRad / (cells * size) };
}

const WIDER = 1.3;

/** How far past the first samples' reach the grids go. */
const OUTWARD = 1.25;

/** A preview pools no more channels than a drag can afford. */
function previewChannels(track: Track): readonly number[] {
  const n = track.diameterM.length;
  const samples = ((n * (n - 1)) / 2) * track.hourAngleRad.length * track.channelHz.length;
  return samples <= 2_000_000 ? [...track.channelHz] : [track.frequencyHz];
}
