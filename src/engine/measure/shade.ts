import { DomainError } from "../../base/errors.ts";

/** Part of a disc that one of its size hides, centres apart as seen from the source: (2/π)(acos t − t√(1−t²)), t = distance/diameter. */
export function hiddenPart(apartM: number, diameterM: number): number {
  if (!(apartM >= 0)) throw new DomainError("apartM", apartM, "metres, 0 or more");
  if (!(diameterM > 0)) throw new DomainError("diameterM", diameterM, "metres above 0");
  const t = apartM / diameterM;
  return t >= 1 ? 0 : (2 / Math.PI) * (Math.acos(t) - t * Math.sqrt(1 - t * t));
}

/** Elevation below which two antennas in line with the source shade each other, radians: sin e = D/b; a right angle where they always do. */
export function shadeElevationRad(diameterM: number, spacingM: number): number {
  if (!(diameterM >= 0)) throw new DomainError("diameterM", diameterM, "metres, 0 or more");
  if (!(spacingM > 0)) throw new DomainError("spacingM", spacingM, "metres above 0");
  return Math.asin(Math.min(1, diameterM / spacingM));
}
