import type { Box } from "./labels.ts";

/**
 * A closed ring cut to a box (Sutherland & Hodgman 1974, "Reentrant polygon clipping"), as flat pixels x0, y0, x1, y1 ….
 * Parts of a reentrant ring stay joined along the box's edge, so the box must lie outside what is seen. Without this a
 * dashed boundary seen from 10 m away would be a million dashes long.
 */
export function clippedRing(ring: readonly number[], box: Box): readonly number[] {
  let at = ring;
  const sides: readonly (readonly [axis: 0 | 1, limit: number, sign: 1 | -1])[] = [
    [0, box.x, 1],
    [0, box.x + box.width, -1],
    [1, box.y, 1],
    [1, box.y + box.height, -1],
  ];
  for (const [axis, limit, sign] of sides) {
    const kept: number[] = [];
    const depth = (i: number): number => sign * (at[i + axis] - limit);
    for (let i = 0, j = at.length - 2; i < at.length; j = i, i += 2) {
      const [di, dj] = [depth(i), depth(j)];
      if (di >= 0 !== dj >= 0) {
        const t = dj / (dj - di);
        kept.push(at[j] + t * (at[i] - at[j]), at[j + 1] + t * (at[i + 1] - at[j + 1]));
      }
      if (di >= 0) kept.push(at[i], at[i + 1]);
    }
    at = kept;
  }
  return at;
}
