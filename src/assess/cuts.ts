import { ARCSEC_PER_RAD, RAD_PER_DEG } from "../base/constants.ts";
import { cut, cutOffsets } from "../engine/measure/sidelobes.ts";
import type { MeasuredBeam } from "./beam.ts";
import type { BeamCut } from "./result.ts";

/** How far the cuts reach from the peak, in FWHM (geometric mean), and how finely they are sampled. */
const REACH = 6;
const POINTS = 481;

/** Profiles along the fitted major and minor axes; null where the beam has no fitted ellipse. */
export function axisCuts(beam: MeasuredBeam): { major: BeamCut; minor: BeamCut } | null {
  const { lobe } = beam;
  if (!lobe) return null;
  const along = (angleRad: number): BeamCut => beamCut(beam, angleRad, REACH * Math.sqrt(lobe.majorRad * lobe.minorRad));
  return { major: along(lobe.positionAngleRad), minor: along((lobe.positionAngleRad + Math.PI / 2) % Math.PI) };
}

/** Profile along one position angle, cut short where the image ends. */
export function beamCut(beam: MeasuredBeam, positionAngleRad: number, reachRad: number): BeamCut {
  const edge = (beam.image.size / 2 - 5) * beam.image.xl;
  const offsets = cutOffsets(Math.min(reachRad, edge), POINTS);
  return {
    positionAngleDeg: positionAngleRad / RAD_PER_DEG,
    offsetArcsec: offsets.map((r) => r * ARCSEC_PER_RAD),
    value: cut(beam.at, positionAngleRad, offsets),
  };
}
