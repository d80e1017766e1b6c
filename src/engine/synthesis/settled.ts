import { wavelengthsPerMetre } from "./extent.ts";
import { correction, type Kernel, kernelFor } from "./kernel.ts";
import type { BeamPlane, PlaneAxes } from "./plane.ts";
import { columnStart, foldInPlace, type HalfGrid, halfGrid, spread, type ToCells } from "./spread.ts";
import { SymmetricTransform } from "./transform.ts";
import type { BaselineRun } from "./walk.ts";

/** Error promised of every settled beam, at every pixel, as a fraction of the peak. */
export const SETTLED_TOLERANCE = 1e-6;

/**
 * A settled beam in the making: samples are spread over a grid twice as fine as the image needs, transformed, and the
 * spreading is divided out. Agrees with the direct sum to 1e-6 of the peak at every pixel.
 */
export class SettledBeam {
  readonly axes: PlaneAxes;
  private readonly kernel: Kernel;
  private readonly grid: HalfGrid;
  private readonly map: ToCells;

  /**
   * @param axes - The image wanted.
   * @param maxUWavelengths - Bounds of |u| and |v| over all samples: they size the grid.
   * @param maxVWavelengths - Goes with maxUWavelengths.
   * @param tolerance - Of the peak, everywhere in the image.
   */
  constructor(axes: PlaneAxes, maxUWavelengths: number, maxVWavelengths: number, tolerance = SETTLED_TOLERANCE) {
    this.axes = axes;
    this.kernel = kernelFor(tolerance);
    const size = this.kernel.oversampling * 2 ** Math.ceil(Math.log2(Math.max(16, axes.size)));
    this.map = { xu: axes.xl * size, xv: axes.xm * size, yu: axes.yl * size, yv: axes.ym * size };
    this.grid = halfGrid(size, Math.abs(this.map.xu) * maxUWavelengths + Math.abs(this.map.xv) * maxVWavelengths);
  }

  /** Adds one baseline's samples at one channel. */
  add(run: BaselineRun, channelHz: number, weights: Float64Array): void {
    spread(this.grid, this.kernel, this.map, wavelengthsPerMetre(channelHz), run.count, run.uM, run.vM, weights);
  }

  /** The image. Call once: the grid is folded in place. @param totalWeight - Σ w over the samples added. */
  finish(totalWeight: number): BeamPlane {
    const { grid, axes, kernel } = this;
    foldInPlace(grid);
    const { size, lastColumn, cells } = grid;
    const values = new SymmetricTransform(size).image(
      { size, lastColumn, cells, start: (column) => columnStart(grid, column) },
      axes.size,
    );
    const half = axes.size / 2;
    const spreadOut = correction(kernel, half, size);
    for (let y = 0; y < axes.size; y++) {
      const row = 1 / (2 * totalWeight * spreadOut[Math.abs(y - half)]);
      for (let x = 0; x < axes.size; x++) values[axes.size * y + x] *= row / spreadOut[Math.abs(x - half)];
    }
    return { ...axes, values };
  }
}
