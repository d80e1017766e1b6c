import { checkQuarter } from "./checks.ts";

/** How long a source stays at or above an elevation: half its arc in radians of hour angle, or one of the two extremes. */
export type HalfArc =
  | { readonly kind: "rises"; readonly halfArcRad: number }
  | { readonly kind: "always" }
  | { readonly kind: "never" };

/**
 * When a source is at or above an elevation: from −halfArc to +halfArc of hour angle at the station's own meridian.
 *
 * @param elevationRad - The limit, radians, [−π/2, π/2].
 * @param decRad - Declination of date, radians, [−π/2, π/2].
 * @param latRad - Geodetic latitude, radians, [−π/2, π/2].
 * @returns `always` also where the lowest elevation just meets the limit; a half arc of 0 where the highest does. Where the
 *   elevation never changes, at a pole or for a source at one, mostly `always` or `never`.
 * @throws {@link DomainError} for an angle outside its range.
 *
 * cos H = (sin e − sin φ sin δ)/(cos φ cos δ), in the half-angle form: tan²(H/2) = (sin e₊ − sin e)/(sin e − sin e₋) with
 * the elevations e₊, e₋ of the two culminations. The arccosine would lose half its digits where a source only grazes the
 * limit. No refraction.
 */
export function halfArcAbove(elevationRad: number, decRad: number, latRad: number): HalfArc {
  checkQuarter({ elevationRad, decRad, latRad });
  const highest = Math.PI / 2 - Math.abs(latRad - decRad);
  const lowest = Math.abs(latRad + decRad) - Math.PI / 2;
  if (elevationRad <= lowest) return { kind: "always" };
  if (elevationRad > highest) return { kind: "never" };
  const below = sineDifference(highest, elevationRad);
  const above = sineDifference(elevationRad, lowest);
  return { kind: "rises", halfArcRad: 2 * Math.atan2(Math.sqrt(below), Math.sqrt(above)) };
}

/** Half of sin a − sin b for π/2 ≥ a ≥ b ≥ −π/2, without its cancellation; never negative. */
function sineDifference(a: number, b: number): number {
  return Math.max(0, Math.sin((a - b) / 2) * Math.cos((a + b) / 2));
}
