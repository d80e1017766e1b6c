import { type BeamPlane, interpolate, planeReach } from "../synthesis/plane.ts";
import { alongAngle } from "./lobe.ts";
import { RAY_COUNT, type Rays, radiusAt } from "./rays.ts";

/** One extreme of the beam beyond its main lobe. */
export interface Sidelobe {
  /** Fraction of the peak. */
  readonly value: number;
  readonly offsetRad: number;
  /** North through east, [0, 2π); its mirror image is as large. */
  readonly positionAngleRad: number;
}

export interface Sidelobes {
  readonly highest: Sidelobe;
  readonly deepest: Sidelobe;
  readonly rms: number;
}

/**
 * The beam beyond its main lobe and within a radius: largest, smallest and root mean square.
 *
 * The main lobe reaches to the first minimum along each ray, and where a ray has none to the edge of the image. Extremes
 * are found on the pixels of the half plane m ≥ 0 and refined between them; the minima that end the main lobe count.
 *
 * @param plane - Square pixels, l to the east.
 * @returns undefined when nothing lies beyond the main lobe within the radius.
 */
export function sidelobes(plane: BeamPlane, rays: Rays, radiusRad: number): Sidelobes | undefined {
  const { size, values, xl: pixelRad } = plane;
  const half = size / 2;
  const outer = radiusRad / pixelRad;
  const reach = Math.min(half - 1, Math.ceil(outer));
  const inner = lobeRadii(rays, pixelRad);
  let squares = 0;
  let area = 0;
  let highest = Number.NEGATIVE_INFINITY;
  let deepest = Number.POSITIVE_INFINITY;
  const beyond = new Uint8Array(size * size);
  for (let y = 0; y <= reach; y++) {
    for (let x = y === 0 ? 1 : -reach; x <= reach; x++) {
      const r = Math.sqrt(x * x + y * y);
      if (r < inner.least - 1 || r > outer + 1) continue;
      const lobe = r > inner.most + 1 ? inner.most : radiusAt(inner.radii, Math.atan2(x, y));
      // A pixel that either edge cuts counts by its part beyond it: whole pixels would leave 2 % of chance in the rms.
      const part = Math.min(1, Math.max(0, r - lobe + 0.5)) * Math.min(1, Math.max(0, outer - r + 0.5));
      if (!(part > 0)) continue;
      const at = size * (y + half) + x + half;
      const value = values[at];
      squares += part * value * value;
      area += part;
      if (r < lobe || r > outer) continue;
      beyond[at] = 1;
      if (value > highest) highest = value;
      if (value < deepest) deepest = value;
    }
  }
  if (!(highest >= deepest)) return undefined;
  const high = refined(plane, beyond, highest, 1);
  let low = refined(plane, beyond, deepest, -1);
  for (let k = 0; k < RAY_COUNT; k++) {
    if (rays.minimumRad[k] <= radiusRad && rays.minimum[k] < low.value) {
      low = { value: rays.minimum[k], offsetRad: rays.minimumRad[k], positionAngleRad: (Math.PI * k) / RAY_COUNT };
    }
  }
  return { highest: high, deepest: low, rms: Math.sqrt(squares / area) };
}

/** The main lobe's radii in pixels, the least and the most of them. */
function lobeRadii(rays: Rays, pixelRad: number): { radii: Float64Array; least: number; most: number } {
  const radii = rays.minimumRad.map((r) => (Number.isNaN(r) ? Number.POSITIVE_INFINITY : r / pixelRad));
  const least = Math.min(...radii);
  const most = Math.max(...radii);
  return { radii, least, most };
}

/** Extremes within a tenth of the largest pixel are refined, so that one just missed by the pixels cannot win unseen. */
const CLOSE = 0.1;

function refined(plane: BeamPlane, beyond: Uint8Array, extreme: number, sign: 1 | -1): Sidelobe {
  const { size, values, xl: pixelRad } = plane;
  const half = size / 2;
  const reach = planeReach(plane);
  const threshold = sign * extreme - CLOSE * Math.abs(extreme);
  let best = { value: Number.NaN, x: 0, y: 0 };
  for (let y = 0; y < half; y++) {
    for (let x = -half + 1; x < half; x++) {
      const at = size * (y + half) + x + half;
      if (!beyond[at] || sign * values[at] < threshold) continue;
      let top = { value: values[at], x, y };
      if (Math.abs(x) < reach && y < reach && isLocal(values, at, size, sign)) top = climb(plane, x, y, sign);
      if (Number.isNaN(best.value) || sign * top.value > sign * best.value) best = top;
    }
  }
  const angle = Math.atan2(best.x, best.y);
  return {
    value: best.value,
    offsetRad: Math.hypot(best.x, best.y) * pixelRad,
    positionAngleRad: angle < 0 ? angle + 2 * Math.PI : angle,
  };
}

function isLocal(values: Float64Array, at: number, size: number, sign: 1 | -1): boolean {
  const here = sign * values[at];
  for (const step of [1, size - 1, size, size + 1]) {
    if (sign * values[at + step] > here || sign * values[at - step] > here) return false;
  }
  return true;
}

/** Pattern search between the pixels around a local extreme, never farther than one pixel from it. */
function climb(plane: BeamPlane, x0: number, y0: number, sign: 1 | -1): { value: number; x: number; y: number } {
  let best = { value: interpolate(plane, x0, y0), x: x0, y: y0 };
  for (let step = 0.5; step > 1e-4; ) {
    let moved = false;
    for (const [dx, dy] of [
      [step, 0],
      [-step, 0],
      [0, step],
      [0, -step],
    ]) {
      const x = best.x + dx;
      const y = best.y + dy;
      if (Math.abs(x - x0) > 1 || Math.abs(y - y0) > 1) continue;
      const value = interpolate(plane, x, y);
      if (sign * value > sign * best.value) {
        best = { value, x, y };
        moved = true;
      }
    }
    if (!moved) step /= 2;
  }
  return best;
}

/** Profile of the beam along a position angle, `count` points from −`reachRad` to `reachRad`; for drawing and tables. */
export function cutOffsets(reachRad: number, count: number): Float64Array {
  return Float64Array.from({ length: count }, (_, k) => -reachRad + (2 * reachRad * k) / (count - 1));
}

export function cut(at: (l: number, m: number) => number, positionAngleRad: number, offsetsRad: Float64Array): Float64Array {
  const { l, m } = alongAngle(positionAngleRad);
  return offsetsRad.map((r) => at(r * l, r * m));
}
