import { ARCSEC_PER_RAD } from "../base/constants.ts";
import { beamAt, fitLobe } from "../engine/measure/lobe.ts";
import { walkRays } from "../engine/measure/rays.ts";
import { sidelobes } from "../engine/measure/sidelobes.ts";
import { densityField, naturalWeight } from "../engine/synthesis/density.ts";
import { extent, wavelengthsPerMetre } from "../engine/synthesis/extent.ts";
import { PreviewGrid, previewGeometry } from "../engine/synthesis/preview.ts";
import { visibility } from "../engine/synthesis/visibility.ts";
import { Walk } from "../engine/synthesis/walk.ts";
import { beamFigures, chords } from "./assess.ts";
import type { MeasuredBeam } from "./beam.ts";
import { axisCuts } from "./cuts.ts";
import type { AssessResult, Picture, PreviewRequest } from "./result.ts";
import { setup } from "./setup.ts";

/** Cells a side of the preview's uv grid, and pixels a side of its image. */
const GRID = 512;
const SHOWN = 256;
/** Room round the samples on the drawn uv grid, so that a dragged station stays on it. */
const UV_ROOM = 1.3;

interface Running {
  readonly key: string;
  readonly grid: PreviewGrid;
  readonly pixelRad: number;
  readonly uvCellWavelengths: number;
  readonly seen: ReturnType<typeof visibility>;
}

/** Pictures while stations move; keeps its grids from one to the next. */
export class PreviewSession {
  private running: Running | undefined;

  /**
   * The picture with stations where the plan now has them.
   *
   * Lengths, beam and sidelobe figures follow; all other figures are those of `request.base`, the last settled result.
   * @returns undefined where the base has no beam to start from: then only a settled picture will do.
   */
  picture(request: PreviewRequest): Picture | undefined {
    const { plan, layout, observation, base } = request;
    const given = setup(plan, layout, observation);
    const { track } = given;
    if (base.beam.pixelArcsec === null || base.longestProjectedM === null) return undefined;
    if (this.running?.key !== request.key) this.running = this.start(request, given);
    const spans = extent(new Walk(track, this.running.seen));
    if (Math.max(spans.maxUM, spans.maxVM) > this.running.grid.reachM) this.running = this.start(request, given);
    const { grid, pixelRad, uvCellWavelengths } = this.running;
    grid.moveTo(track);
    const image = grid.image();
    const lobe = fitLobe(image);
    const measured = lobe && measure(image, lobe, base);
    const lengths = chords(given.ecefM);
    const ratio = base.shortestProjectedM && spans.shortestM > 0 ? base.shortestProjectedM / spans.shortestM : 1;
    const scaled = (x: number | null): number | null => (x === null ? null : x * ratio);
    const result: AssessResult = {
      ...base,
      longestBaselineM: lengths.longest,
      shortestBaselineM: lengths.shortest,
      longestProjectedM: spans.longestM,
      shortestProjectedM: spans.shortestM,
      beam: measured ? { ...beamFigures(measured), pixelArcsec: base.beam.pixelArcsec, sizePx: base.beam.sizePx } : base.beam,
      largestScaleArcsec: scaled(base.largestScaleArcsec),
      recoverable: { gaussianArcsec: scaled(base.recoverable.gaussianArcsec), discArcsec: scaled(base.recoverable.discArcsec) },
    };
    return {
      settled: false,
      result,
      beam: { size: image.size, pixelRad, values: Float32Array.from(image.values) },
      uv: { size: request.uvSize, cellWavelengths: uvCellWavelengths, counts: grid.uv() },
      cuts: measured ? axisCuts(measured) : null,
    };
  }

  private start(request: PreviewRequest, given: ReturnType<typeof setup>): Running {
    const { track, weighting } = given;
    const seen = visibility(track);
    const spans = extent(new Walk(track, seen));
    const perMetre = wavelengthsPerMetre(track.frequencyHz);
    const uvCellsPerMetre = request.uvSize / (2 * UV_ROOM * spans.longestM);
    const topPerMetre = wavelengthsPerMetre(track.channelHz[track.channelHz.length - 1]);
    const reachM = Math.max(spans.maxUM, spans.maxVM);
    const settledPixelRad = (request.base.beam.pixelArcsec as number) / ARCSEC_PER_RAD;
    const { fieldRad, pixelRad } = previewGeometry(densityField(given.fieldRad, reachM * topPerMetre), settledPixelRad, GRID);
    const grid = new PreviewGrid(track, seen, naturalWeight(track.sefdJy), weighting, fieldRad, reachM, GRID, SHOWN, pixelRad, {
      size: request.uvSize,
      cellsPerMetre: uvCellsPerMetre,
    });
    return { key: request.key, grid, pixelRad, uvCellWavelengths: perMetre / uvCellsPerMetre, seen };
  }
}

function measure(image: MeasuredBeam["image"], lobe: NonNullable<MeasuredBeam["lobe"]>, base: AssessResult): MeasuredBeam {
  const at = beamAt([image]);
  const rays = walkRays(at, lobe);
  const edge = (image.size / 2 - 5) * image.xl;
  const sidelobeRadiusRad = Math.min(edge, (base.beam.sidelobeRadiusArcsec ?? Number.POSITIVE_INFINITY) / ARCSEC_PER_RAD);
  return {
    image,
    at,
    lobe,
    shape: lobe,
    rays,
    sidelobes: sidelobes(image, rays, sidelobeRadiusRad) ?? null,
    sidelobeRadiusRad,
    warnings: [],
  };
}
