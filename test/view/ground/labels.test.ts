import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { type Box, placeLabels } from "../../../src/view/ground/labels.ts";

const bounds: Box = { x: 0, y: 0, width: 800, height: 600 };
const wish = (x: number, y: number, more: object = {}) => ({ x, y, width: 60, height: 14, clearance: 9, ...more });
const apart = (a: Box, b: Box) => a.x >= b.x + b.width || b.x >= a.x + a.width || a.y >= b.y + b.height || b.y >= a.y + a.height;

describe("placeLabels", () => {
  it("puts a free label to the right of its point", () => {
    const [box] = placeLabels([wish(400, 300)], [], bounds);
    expect(box?.x).toBe(409);
    expect(Math.abs((box?.y ?? 0) + 7 - 300)).toBeLessThan(3);
  });

  it("goes to the left at the right edge, and below where both are taken", () => {
    expect(placeLabels([wish(780, 300)], [], bounds)[0]?.x).toBe(780 - 9 - 60);
    const marks = [
      { x: 405, y: 292, width: 80, height: 16 },
      { x: 310, y: 292, width: 80, height: 16 },
      { x: 360, y: 270, width: 80, height: 20 },
    ];
    expect(placeLabels([wish(400, 300)], marks, bounds)[0]?.y).toBe(309);
  });

  it("serves wishes in order and leaves out what has no room, unless it must show", () => {
    const wall = [{ x: 0, y: 0, width: 800, height: 600 }];
    expect(placeLabels([wish(400, 300)], wall, bounds)[0]).toBeUndefined();
    expect(placeLabels([wish(400, 300, { always: true })], wall, bounds)[0]).toBeDefined();
    const [first, second] = placeLabels(
      [wish(400, 300, { clearance: "centre" }), wish(400, 302, { clearance: "centre" })],
      [],
      bounds,
    );
    expect(first).toBeDefined();
    expect(second).toBeUndefined();
  });

  it("never lets labels touch one another, a mark or the edge", () => {
    const point = fc.record({
      x: fc.integer({ min: 0, max: 800 }),
      y: fc.integer({ min: 0, max: 600 }),
      width: fc.integer({ min: 10, max: 120 }),
    });
    fc.assert(
      fc.property(fc.array(point, { maxLength: 120 }), (points) => {
        const marks = points.map(({ x, y }) => ({ x: x - 4, y: y - 4, width: 8, height: 8 }));
        const boxes = placeLabels(
          points.map(({ x, y, width }) => ({ x, y, width, height: 14, clearance: 9 })),
          marks,
          bounds,
        ).filter((box) => box !== undefined);
        boxes.forEach((box, i) => {
          expect(box.x >= 0 && box.y >= 0 && box.x + box.width <= 800 && box.y + box.height <= 600).toBe(true);
          expect(marks.every((mark) => apart(box, mark))).toBe(true);
          expect(boxes.slice(i + 1).every((other) => apart(box, other))).toBe(true);
        });
      }),
      { seed: 20260101, numRuns: 60 },
    );
  });
});
