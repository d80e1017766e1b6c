/** How long a source stays at or above an elevation: half the arc in radians of hour angle, or one of the two ends. */
export type HalfArc =
  | { readonly kind: "rises"; readonly halfArcRad: number }
  | { readonly kind: "always" }
  | { readonly kind: "never" };

/**
 * When a source is at or above an elevation: from −halfArc to +halfArc of hour angle at the station's own meridian.
 *
 * cos H = (sin e − sin φ sin δ)/(cos φ cos δ); no refraction. At a pole, or for a source at a pole, the elevation never
 * changes and one of the other kinds is returned.
 */
export function halfArcAbove(elevationRad: number, decRad: number, latRad: number): HalfArc {
  const level = Math.sin(latRad) * Math.sin(decRad);
  const swing = Math.cos(latRad) * Math.cos(decRad);
  const wanted = Math.sin(elevationRad);
  // Highest and lowest elevations by their own formula: sums of sines cancel where they touch the limit.
  const highest = Math.PI / 2 - Math.abs(latRad - decRad);
  const lowest = Math.abs(latRad + decRad) - Math.PI / 2;
  if (elevationRad <= lowest) return { kind: "always" };
  if (elevationRad > highest) return { kind: "never" };
  return { kind: "rises", halfArcRad: Math.acos(Math.min(1, Math.max(-1, (wanted - level) / swing))) };
}
