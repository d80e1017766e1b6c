/** A rectangle in pixels. */
export interface Box {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

/** A label that wants to stand beside a point, or centred on it. */
export interface LabelWish {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
  /** Distance from the point to the label, pixels; "centre" puts it on the point. */
  readonly clearance: number | "centre";
  /** Drawn even where it collides: a selected station never loses its name. */
  readonly always?: boolean;
}

/** Where around its point a label is tried, in order: right and left first, as names are read along a line. */
const SIDES: readonly (readonly [x: number, y: number])[] = [
  [1, 0.15],
  [-1, 0.15],
  [0, -1],
  [0, 1],
  [0.75, -0.75],
  [0.75, 0.75],
  [-0.75, -0.75],
  [-0.75, 0.75],
];

/** Buckets that find what a box touches without asking every other box. */
class Taken {
  readonly #cells = new Map<number, Box[]>();
  readonly #side = 64;

  *#keys(box: Box): Iterable<number> {
    const x1 = Math.floor((box.x + box.width) / this.#side);
    const y1 = Math.floor((box.y + box.height) / this.#side);
    for (let y = Math.floor(box.y / this.#side); y <= y1; y++) {
      for (let x = Math.floor(box.x / this.#side); x <= x1; x++) yield y * 4096 + x;
    }
  }

  add(box: Box): void {
    for (const key of this.#keys(box)) {
      const cell = this.#cells.get(key);
      if (cell) cell.push(box);
      else this.#cells.set(key, [box]);
    }
  }

  touches(box: Box): boolean {
    for (const key of this.#keys(box)) {
      for (const other of this.#cells.get(key) ?? []) if (overlap(box, other)) return true;
    }
    return false;
  }
}

const overlap = (a: Box, b: Box): boolean =>
  a.x < b.x + b.width && b.x < a.x + a.width && a.y < b.y + b.height && b.y < a.y + a.height;

/**
 * Greedy label placement: wishes are served in the order given, each at the first free side of its point.
 *
 * @param wishes - First come, first served.
 * @param marks - What no label may cover: the station marks.
 * @param bounds - Labels stay inside.
 * @returns One box a wish, in order; undefined where there is no room.
 */
export function placeLabels(wishes: readonly LabelWish[], marks: readonly Box[], bounds: Box): readonly (Box | undefined)[] {
  const taken = new Taken();
  for (const mark of marks) taken.add(mark);
  return wishes.map((wish) => {
    const boxes = candidates(wish);
    const free = boxes.find((box) => within(box, bounds) && !taken.touches(box)) ?? (wish.always ? boxes[0] : undefined);
    if (free) taken.add(free);
    return free;
  });
}

function candidates({ x, y, width, height, clearance }: LabelWish): readonly Box[] {
  if (clearance === "centre") return [{ x: x - width / 2, y: y - height / 2, width, height }];
  return SIDES.map(([sx, sy]) => ({
    x: x - width / 2 + sx * clearance + Math.sign(sx) * (width / 2),
    y: y - height / 2 + sy * clearance + (Math.abs(sy) === 1 ? sy * (height / 2) : (sy * height) / 2),
    width,
    height,
  }));
}

const within = (box: Box, bounds: Box): boolean =>
  box.x >= bounds.x &&
  box.y >= bounds.y &&
  box.x + box.width <= bounds.x + bounds.width &&
  box.y + box.height <= bounds.y + bounds.height;
