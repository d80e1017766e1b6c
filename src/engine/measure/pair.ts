import { alongAngle, type BeamAt } from "./lobe.ts";
import { parabola } from "./rays.ts";

/** Two point sources seen through the beam. */
export interface PairOutcome {
  /** 1 − minimum between / fainter local maximum; null when the fainter source is only a shoulder of the brighter. */
  readonly dip: number | null;
  readonly verdict: "resolved" | "marginal" | "blended";
}

/**
 * Whether two point sources can be told apart: the summed profile along the line through both.
 *
 * resolved: a dip, and separation ≥ the first minimum of the beam along that angle (Rayleigh, Phil. Mag. 8 (1879) 261,
 * with the beam in the place of the diffraction pattern); marginal: a dip, closer; blended: no dip.
 *
 * @param fluxRatio - Fainter over brighter, (0, 1].
 * @param firstMinimumRad - Along this position angle; NaN where the beam has none, and then a dip is only marginal.
 * @param stepRad - Sampling of the profile, ≤ minor FWHM/40.
 * @returns undefined where the beam is not known as far as the profile needs it.
 */
export function pairOutcome(
  at: BeamAt,
  separationRad: number,
  positionAngleRad: number,
  fluxRatio: number,
  firstMinimumRad: number,
  stepRad: number,
): PairOutcome | undefined {
  const { l, m } = alongAngle(positionAngleRad);
  const steps = Math.max(40, Math.ceil(separationRad / stepRad));
  const step = separationRad / steps;
  // Each source's own maximum is sought within half the separation of it.
  const margin = Math.ceil(steps / 2);
  const profile = new Float64Array(steps + 2 * margin + 1);
  for (let k = 0; k < profile.length; k++) {
    const s = (k - margin) * step;
    const t = s - separationRad;
    profile[k] = at(s * l, s * m) + fluxRatio * at(t * l, t * m);
    if (Number.isNaN(profile[k])) return undefined;
  }
  const bright = localMaximum(profile, margin, margin);
  const faint = localMaximum(profile, margin + steps, margin);
  if (bright === undefined || faint === undefined || bright >= faint) return { dip: null, verdict: "blended" };
  let lowest = bright;
  for (let k = bright; k <= faint; k++) if (profile[k] < profile[lowest]) lowest = k;
  if (lowest === bright || lowest === faint) return { dip: null, verdict: "blended" };
  const value = (k: number): number => parabola(profile[k - 1], profile[k], profile[k + 1]).value;
  const dip = 1 - value(lowest) / Math.min(value(bright), value(faint));
  if (!(dip > 0)) return { dip: null, verdict: "blended" };
  return { dip, verdict: separationRad >= firstMinimumRad ? "resolved" : "marginal" };
}

/** The local maximum nearest to `near`, within `reach` of it and not at the ends of the profile. */
function localMaximum(profile: Float64Array, near: number, reach: number): number | undefined {
  for (let d = 0; d <= reach; d++) {
    for (const k of d === 0 ? [near] : [near - d, near + d]) {
      if (k < 1 || k > profile.length - 2) continue;
      if (profile[k] >= profile[k - 1] && profile[k] > profile[k + 1]) return k;
    }
  }
  return undefined;
}
