/** Points on screen: `x[i]`, `y[i]` in pixels; NaN where a point is out of sight. */
export interface ScreenPoints {
  readonly x: Float64Array;
  readonly y: Float64Array;
  readonly count: number;
}

/** Index of the point nearest (x, y), at most `reachPx` away; −1 for none. */
export function nearestPoint(points: ScreenPoints, x: number, y: number, reachPx: number): number {
  let best = -1;
  let least = reachPx * reachPx;
  for (let i = 0; i < points.count; i++) {
    const dx = points.x[i] - x;
    const dy = points.y[i] - y;
    const d2 = dx * dx + dy * dy;
    if (d2 <= least) {
      least = d2;
      best = i;
    }
  }
  return best;
}

export type Direction = "left" | "right" | "up" | "down";

const AXES: { readonly [D in Direction]: readonly [x: number, y: number] } = {
  left: [-1, 0],
  right: [1, 0],
  up: [0, -1],
  down: [0, 1],
};

/**
 * Index of the next point from (x, y) in a direction: within 45° of it, the one with the least distance along plus twice
 * the distance across; with none there, within 80°; −1 for none. `except` is left out.
 */
export function pointInDirection(points: ScreenPoints, x: number, y: number, direction: Direction, except = -1): number {
  const [ax, ay] = AXES[direction];
  for (const slope of [1, Math.tan((80 * Math.PI) / 180)]) {
    let best = -1;
    let least = Number.POSITIVE_INFINITY;
    for (let i = 0; i < points.count; i++) {
      if (i === except) continue;
      const dx = points.x[i] - x;
      const dy = points.y[i] - y;
      const along = dx * ax + dy * ay;
      const across = Math.abs(dx * ay - dy * ax);
      if (!(along > 0) || across > slope * along) continue;
      if (along + 2 * across < least) {
        least = along + 2 * across;
        best = i;
      }
    }
    if (best >= 0) return best;
  }
  return -1;
}
