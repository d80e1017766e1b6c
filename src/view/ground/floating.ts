import type { Box } from "./labels.ts";

interface Point {
  readonly x: number;
  readonly y: number;
}

/** Top left corner of a call-out beside a point: on the side away from where it came from, inside the bounds. */
export function floatingAt(at: Point, from: Point, size: { readonly width: number; readonly height: number }, bounds: Box): Point {
  const gap = 24;
  const beside = (centre: number, origin: number, length: number, low: number, high: number): number => {
    const after = centre + gap;
    const before = centre - gap - length;
    const wanted = centre >= origin ? after : before;
    const other = centre >= origin ? before : after;
    const fits = (start: number): boolean => start >= low && start + length <= high;
    return fits(wanted) ? wanted : fits(other) ? other : Math.min(Math.max(wanted, low), Math.max(low, high - length));
  };
  return {
    x: beside(at.x, from.x, size.width, bounds.x, bounds.x + bounds.width),
    y: beside(at.y, from.y, size.height, bounds.y, bounds.y + bounds.height),
  };
}
