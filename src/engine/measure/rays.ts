import { alongAngle, type BeamAt, type Ellipse } from "./lobe.ts";

/** What a beam does along rays from its peak; half of 720 rays suffice, since the beam is point-symmetric. */
export interface Rays {
  /** Radii along ray k, at position angle π·k/count; NaN where the beam does not get there inside the image. */
  readonly halfRad: Float64Array;
  readonly zeroRad: Float64Array;
  /** First local minimum below 0.5, and the beam there. */
  readonly minimumRad: Float64Array;
  readonly minimum: Float64Array;
}

export const RAY_COUNT = 360;

/** Steps a minor FWHM; no ray takes fewer than this many for each width of the lobe along it, however thin the lobe. */
const STEPS = 40;
/** Very thin lobes are walked in steps of their width along the ray over this, so that a ray stays a few thousand steps. */
const LONGEST = 400;

/**
 * Walks every ray from the peak to its first minimum.
 *
 * @param at - The beam; NaN beyond its image.
 * @param lobe - Widths that set the steps: the fitted ellipse, or the one of the peak's curvature.
 *   A major axis may be infinite: then the minor one sets all steps.
 */
export function walkRays(at: BeamAt, lobe: Ellipse): Rays {
  const blank = (): Float64Array => new Float64Array(RAY_COUNT).fill(Number.NaN);
  const rays: Rays = { halfRad: blank(), zeroRad: blank(), minimumRad: blank(), minimum: blank() };
  for (let k = 0; k < RAY_COUNT; k++) {
    const angle = (Math.PI * k) / RAY_COUNT;
    const { l, m } = alongAngle(angle);
    const width = widthAlong(lobe, angle);
    const step = Math.max(lobe.minorRad / STEPS, Number.isFinite(width) ? width / LONGEST : 0);
    let before = 1;
    let here = 1;
    for (let n = 1; ; n++) {
      const next = at(n * step * l, n * step * m);
      if (Number.isNaN(next)) break;
      if (Number.isNaN(rays.halfRad[k]) && next < 0.5) rays.halfRad[k] = crossing(at, l, m, (n - 1) * step, n * step, 0.5);
      if (Number.isNaN(rays.zeroRad[k]) && next < 0) rays.zeroRad[k] = crossing(at, l, m, (n - 1) * step, n * step, 0);
      if (n > 1 && here < 0.5 && here < before && next >= here) {
        const along = (r: number): number => at(r * l, r * m);
        const { offset } = parabola(before, here, next);
        // Once more on a narrower parabola, which leaves its cubic error some hundred times smaller.
        const middle = (n - 1 + offset) * step;
        const narrow = step / 8;
        const { offset: rest, value } = parabola(along(middle - narrow), along(middle), along(middle + narrow));
        rays.minimumRad[k] = middle + rest * narrow;
        rays.minimum[k] = value;
        break;
      }
      before = here;
      here = next;
    }
  }
  return rays;
}

/** Full width of an ellipse along a position angle, radians. */
export function widthAlong(lobe: Ellipse, positionAngleRad: number): number {
  const angle = positionAngleRad - lobe.positionAngleRad;
  return 1 / Math.hypot(Math.cos(angle) / lobe.majorRad, Math.sin(angle) / lobe.minorRad);
}

/** Where the beam falls through `level` between two radii that bracket it: bisection to rounding. */
function crossing(at: BeamAt, l: number, m: number, from: number, to: number, level: number): number {
  let [low, high] = [from, to];
  for (let n = 0; n < 50; n++) {
    const middle = (low + high) / 2;
    if (at(middle * l, middle * m) < level) high = middle;
    else low = middle;
  }
  return (low + high) / 2;
}

/** Extremum of the parabola through (−1, a), (0, b), (1, c). */
export function parabola(a: number, b: number, c: number): { offset: number; value: number } {
  const curve = a - 2 * b + c;
  if (curve === 0) return { offset: 0, value: b };
  const offset = (a - c) / (2 * curve);
  return { offset, value: b - ((a - c) * offset) / 4 };
}

/** Longest and shortest chord of the half-level contour through the peak, radians; undefined where a ray never falls to half. */
export function halfPowerWidths(rays: Rays): { majorRad: number; minorRad: number } | undefined {
  if (rays.halfRad.some(Number.isNaN)) return undefined;
  return { majorRad: 2 * cyclicExtreme(rays.halfRad, 1), minorRad: 2 * cyclicExtreme(rays.halfRad, -1) };
}

/** Largest (sign 1) or smallest (sign −1) over the half turn of rays, refined by a parabola over angle. */
export function cyclicExtreme(radii: Float64Array, sign: 1 | -1): number {
  const n = radii.length;
  let best = 0;
  for (let k = 1; k < n; k++) if (sign * radii[k] > sign * radii[best]) best = k;
  return parabola(radii[(best + n - 1) % n], radii[best], radii[(best + 1) % n]).value;
}

/** A radius at any position angle, by straight interpolation between rays; NaN next to a ray without one. */
export function radiusAt(radii: Float64Array, positionAngleRad: number): number {
  const n = radii.length;
  const turn = (positionAngleRad / Math.PI) * n;
  const k = Math.floor(turn);
  const f = turn - k;
  const first = radii[((k % n) + n) % n];
  const second = radii[(((k + 1) % n) + n) % n];
  return f === 0 ? first : first * (1 - f) + second * f;
}
