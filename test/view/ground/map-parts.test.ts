import { describe, expect, it } from "vitest";
import { clippedRing } from "../../../src/view/ground/clip.ts";
import { fittedCamera } from "../../../src/view/ground/fit.ts";
import { floatingAt } from "../../../src/view/ground/floating.ts";
import { localFrame } from "../../../src/view/ground/frame.ts";
import { mapCommand } from "../../../src/view/ground/keys.ts";
import { CROWDED_DISC_PX, DISC_PX, discRadii, markBoxes, namedMarks } from "../../../src/view/ground/marks.ts";
import { placeModel } from "../../../src/view/ground/model.ts";
import { sheetFor } from "../../../src/view/ground/sheet.ts";
import { planWith, smallRows } from "./plans.ts";

const key = (name: string, more: object = {}) => ({
  key: name,
  shiftKey: false,
  altKey: false,
  ctrlKey: false,
  metaKey: false,
  ...more,
});

describe("mapCommand", () => {
  it("picks with arrows on the ground and steps 10, 100 and 1 m with one lifted", () => {
    expect(mapCommand(key("ArrowLeft"), false)).toEqual({ do: "pick", direction: "left" });
    expect(mapCommand(key("ArrowUp"), true)).toEqual({ do: "step", eastM: 0, northM: 10 });
    expect(mapCommand(key("ArrowRight", { shiftKey: true }), true)).toEqual({ do: "step", eastM: 100, northM: 0 });
    expect(mapCommand(key("ArrowDown", { altKey: true }), true)).toMatchObject({ do: "step", northM: -1 });
  });

  it("lifts, drops, puts back, lets go of the selection, zooms and fits", () => {
    expect(mapCommand(key("Enter"), false)).toEqual({ do: "lift" });
    expect(mapCommand(key("Enter"), true)).toEqual({ do: "drop" });
    expect(mapCommand(key("Escape"), true)).toEqual({ do: "putBack" });
    expect(mapCommand(key("Escape"), false)).toEqual({ do: "clear" });
    expect(mapCommand(key("0"), false)).toEqual({ do: "fit" });
    expect(mapCommand(key("+"), false)).toMatchObject({ do: "zoom" });
  });

  it("leaves the page's and the browser's keys alone", () => {
    expect(mapCommand(key("0", { ctrlKey: true }), false)).toBeUndefined();
    expect(mapCommand(key("ArrowLeft", { metaKey: true }), true)).toBeUndefined();
    expect(mapCommand(key("z"), false)).toBeUndefined();
  });
});

describe("clippedRing", () => {
  const box = { x: 0, y: 0, width: 100, height: 100 };

  it("leaves what lies inside, drops what lies outside, cuts what crosses", () => {
    expect(clippedRing([10, 10, 90, 10, 50, 80], box)).toEqual([10, 10, 90, 10, 50, 80]);
    expect(clippedRing([200, 200, 300, 200, 250, 300], box)).toEqual([]);
    const cut = clippedRing([-50, 20, 50, 20, 50, 60, -50, 60], box);
    const xs = cut.filter((_, i) => i % 2 === 0);
    expect(Math.min(...xs)).toBe(0);
    expect(Math.max(...xs)).toBe(50);
  });

  it("keeps a ring round the whole box as the box", () => {
    const around = clippedRing([-1e6, -1e6, 1e6, -1e6, 1e6, 1e6, -1e6, 1e6], box);
    let area = 0;
    for (let i = 0; i < around.length; i += 2) {
      const j = (i + 2) % around.length;
      area += around[i] * around[j + 1] - around[j] * around[i + 1];
    }
    expect(Math.abs(area / 2)).toBeCloseTo(10_000, 6);
  });
});

describe("floatingAt", () => {
  const bounds = { x: 0, y: 0, width: 800, height: 600 };
  const size = { width: 200, height: 100 };

  it("stands on the side away from where the station came from, inside the map", () => {
    expect(floatingAt({ x: 400, y: 300 }, { x: 350, y: 250 }, size, bounds)).toEqual({ x: 424, y: 324 });
    expect(floatingAt({ x: 400, y: 300 }, { x: 450, y: 350 }, size, bounds)).toEqual({ x: 176, y: 176 });
    expect(floatingAt({ x: 790, y: 590 }, { x: 700, y: 500 }, size, bounds)).toEqual({ x: 566, y: 466 });
  });
});

describe("fittedCamera", () => {
  const frame = localFrame({ latitudeDeg: -31, longitudeDeg: 24, heightM: 1000 });
  const spots = (rows: readonly (readonly [number, number])[]) => rows.map(([lat, lon]) => frame.point(lat, lon, 1000));
  const inside = (points: ReturnType<typeof spots>, wide: boolean) => {
    const sheet = sheetFor(fittedCamera(points, frame, 900, 700, 40), frame, 900, 700, wide);
    const at = { x: 0, y: 0 };
    return points.every((point) => {
      sheet.draw(point, at);
      return at.x > 35 && at.x < 865 && at.y > 35 && at.y < 665;
    });
  };

  it("shows every station, from a hundred metres to the whole Earth", () => {
    expect(
      inside(
        spots([
          [-31, 24],
          [-31.0005, 24.0007],
        ]),
        false,
      ),
    ).toBe(true);
    expect(
      inside(
        spots([
          [-31, 24],
          [-31.3, 24.1],
          [-30.7, 23.8],
        ]),
        false,
      ),
    ).toBe(true);
    expect(
      inside(
        spots([
          [-31, 24],
          [-20, 30],
          [-34, 18],
        ]),
        false,
      ),
    ).toBe(true);
    expect(
      inside(
        spots([
          [50, 0],
          [-40, 150],
          [20, -155],
          [-25, 27],
          [38, -107],
        ]),
        true,
      ),
    ).toBe(true);
  });

  it("gives a lone station a kilometre", () => {
    expect(fittedCamera(spots([[-31, 24]]), frame, 900, 700, 40).metresPerPx).toBeCloseTo(1000 / 820, 9);
  });
});

describe("marks", () => {
  const points = { x: Float64Array.of(100, 106, 300, Number.NaN), y: Float64Array.of(100, 100, 300, Number.NaN), count: 4 };

  it("draws crowded discs smaller", () => {
    expect([...discRadii(points)]).toEqual([CROWDED_DISC_PX, CROWDED_DISC_PX, DISC_PX, DISC_PX]);
  });

  it("guards the marks in sight", () => {
    expect(markBoxes(points, discRadii(points), { x: 50, y: 50 })).toHaveLength(4);
  });

  it("names the selection and the hub first, then stations from the outside in, then candidates", () => {
    const model = placeModel(planWith(smallRows), "all", "K2", false);
    const at = { x: Float64Array.of(100, 120, 500, 110), y: Float64Array.of(100, 100, 100, 100), count: 4 };
    const named = namedMarks(model, at, { x: 101, y: 101 }, (text) => text.length * 6, 14);
    expect(named.map(({ text, role }) => `${role} ${text}`)).toEqual([
      "selected Kestrel",
      "hub Hub house",
      "station K3",
      "station Kite",
      "candidate Spare",
    ]);
    expect(named[0].wish.always).toBe(true);
  });
});
