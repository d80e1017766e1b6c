import type { Checkpoint } from "../base/checkpoint.ts";
import { ARCSEC_PER_RAD } from "../base/constants.ts";
import { alongAngle, type BeamAt, beamAt, curvatureEllipse, type Ellipse, fitLobe } from "../engine/measure/lobe.ts";
import { type Rays, walkRays } from "../engine/measure/rays.ts";
import { type Sidelobes, sidelobes } from "../engine/measure/sidelobes.ts";
import { type BeamPlane, type PlaneAxes, squareAxes } from "../engine/synthesis/plane.ts";
import { type Synthesis, settledPlane } from "./synthesis.ts";

/** A settled beam with all that is measured on it. */
export interface MeasuredBeam {
  /** The image, square pixels, l to the east. */
  readonly image: BeamPlane;
  readonly at: BeamAt;
  /** The fitted Gaussian; null where there is no width across a line of samples, or the half level leaves the image. */
  readonly lobe: Ellipse | null;
  /** The fitted lobe, else that of the peak's curvature. */
  readonly shape: Ellipse;
  readonly rays: Rays;
  readonly sidelobes: Sidelobes | null;
  readonly sidelobeRadiusRad: number;
  readonly warnings: readonly string[];
}

/** Zoomed image of the main lobe: pixels a side, and pixels a FWHM along each axis of the lobe. */
const ZOOM_SIZE = 256;
const ZOOM_PER_FWHM = 32;
/** Below this many pixels a fitted minor FWHM the zoom is drawn again, finer. */
const ZOOM_LEAST = 20;
/** Beams longer than this many widths have no width along: the samples lie in one line. */
const LONGEST_AXIS_RATIO = 1e5;
const PIXELS_PER_FWHM = 6;
const LARGEST_IMAGE = 4096;
const SIDELOBE_FWHMS = 20;

/**
 * The settled beam, its main lobe on a zoomed image of its own, and its sidelobes.
 *
 * The zoom is drawn in the lobe's own proportions, so that a lobe of any axis ratio has enough pixels along both axes.
 *
 * @param radiusArcsec - Within which sidelobes are looked for; null: 20 geometric-mean FWHM.
 * @returns undefined when there is no beam: no samples, or all of them at the centre of the uv plane.
 */
export async function measureBeam(
  synthesis: Synthesis,
  radiusArcsec: number | null,
  checkpoint?: Checkpoint,
): Promise<MeasuredBeam | undefined> {
  const { sums, setup } = synthesis;
  if (!(sums.weight > 0) || !(sums.uu + sums.vv > 0)) return undefined;
  const warnings: string[] = [];
  const curvature = curvatureEllipse(sums.uu / sums.weight, sums.uv / sums.weight, sums.vv / sums.weight);
  const inLine = !(curvature.majorRad < LONGEST_AXIS_RATIO * curvature.minorRad);
  if (inLine) warnings.push("the uv samples lie in one line: the beam has no width along it, so it has no fitted ellipse");
  const { zoom, lobe } = await zoomedLobe(synthesis, curvature, inLine, checkpoint);
  if (!lobe && !inLine) warnings.push("the half level does not close around the peak: the beam has no fitted ellipse");
  const shape = lobe ?? curvature;
  const meanRad = inLine ? shape.minorRad : Math.sqrt(shape.majorRad * shape.minorRad);
  const wantedRad = radiusArcsec === null ? SIDELOBE_FWHMS * meanRad : radiusArcsec / ARCSEC_PER_RAD;
  const axes = imageAxes(setup.observation.image, curvature.minorRad, wantedRad);
  const image = await settledPlane(synthesis, axes, checkpoint, 0.6, 0.95);
  const at = beamAt([zoom, image]);
  const rays = walkRays(at, shape);
  const imageRadius = (axes.size / 2 - 1) * axes.xl;
  if (wantedRad > imageRadius) {
    warnings.push(
      `the image reaches ${arcsec(imageRadius)} arcsec: sidelobes are looked for that far, not within ${arcsec(wantedRad)} arcsec`,
    );
  }
  const sidelobeRadiusRad = Math.min(wantedRad, imageRadius);
  const found = sidelobes(image, rays, sidelobeRadiusRad);
  if (!found) warnings.push("nothing lies beyond the main lobe within the sidelobe radius");
  const open = rays.minimumRad.filter(Number.isNaN).length;
  if (open > 0) {
    warnings.push(
      `on ${open} of ${rays.minimumRad.length} rays the beam has no first minimum inside the image: there the main lobe runs to its edge`,
    );
  }
  const positive = rays.zeroRad.filter(Number.isNaN).length;
  if (positive > 0) {
    warnings.push(`on ${positive} of ${rays.zeroRad.length} rays the beam does not fall to zero before its first minimum`);
  }
  await checkpoint?.(1);
  return { image, at, lobe, shape, rays, sidelobes: found ?? null, sidelobeRadiusRad, warnings };
}

/** The zoomed image, drawn again coarser or finer until the fitted lobe suits it. */
async function zoomedLobe(
  synthesis: Synthesis,
  curvature: Ellipse,
  inLine: boolean,
  checkpoint: Checkpoint | undefined,
): Promise<{ zoom: BeamPlane; lobe: Ellipse | null }> {
  let scale = 1;
  for (let attempt = 1; ; attempt++) {
    const zoom = await settledPlane(synthesis, zoomAxes(curvature, inLine, scale), checkpoint, 0.3, 0.6);
    if (inLine) return { zoom, lobe: null };
    const lobe = fitLobe(zoom);
    const pixels = lobe ? (lobe.minorRad / curvature.minorRad) * (ZOOM_PER_FWHM / scale) : Number.POSITIVE_INFINITY;
    if ((lobe && pixels >= ZOOM_LEAST) || attempt === 6) return { zoom, lobe: lobe ?? null };
    scale *= lobe ? 0.5 : 2;
  }
}

function zoomAxes(curvature: Ellipse, inLine: boolean, scale: number): PlaneAxes {
  const { l, m } = alongAngle(curvature.positionAngleRad);
  const across = (scale * curvature.minorRad) / ZOOM_PER_FWHM;
  const along = inLine ? across : (scale * curvature.majorRad) / ZOOM_PER_FWHM;
  return { size: ZOOM_SIZE, xl: m * across, xm: -l * across, yl: l * along, ym: m * along };
}

/** Pixel: a sixth of the minor FWHM of the peak's curvature. Size: a power of two that covers the radius, at most 4096. */
function imageAxes(
  wanted: { readonly pixelArcsec: number | null; readonly sizePx: number | null },
  minorRad: number,
  radiusRad: number,
): PlaneAxes {
  const pixelRad = wanted.pixelArcsec === null ? minorRad / PIXELS_PER_FWHM : wanted.pixelArcsec / ARCSEC_PER_RAD;
  if (wanted.sizePx !== null) return squareAxes(wanted.sizePx - (wanted.sizePx % 2), pixelRad);
  const covering = 2 ** Math.ceil(Math.log2(2 * (radiusRad / pixelRad + 5)));
  return squareAxes(Math.min(LARGEST_IMAGE, Math.max(64, covering)), pixelRad);
}

const arcsec = (rad: number): string => String(Number((rad * ARCSEC_PER_RAD).toPrecision(4)));
