import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { pannedCamera, zoomedCamera } from "../../../src/view/ground/camera.ts";
import { localFrame } from "../../../src/view/ground/frame.ts";
import { angleBetween, drawnPoints, sheetFor } from "../../../src/view/ground/sheet.ts";

const frame = localFrame({ latitudeDeg: -31, longitudeDeg: 24, heightM: 1000 });
const [W, H] = [940, 900];
const camera = (latitudeDeg: number, longitudeDeg: number, metresPerPx: number) => ({ latitudeDeg, longitudeDeg, metresPerPx });
const drawn = (sheet: ReturnType<typeof sheetFor>, lat: number, lon: number, h = 1000) => {
  const at = { x: 0, y: 0 };
  sheet.draw(frame.point(lat, lon, h), at);
  return at;
};

describe("sheetFor", () => {
  it("is local near the origin, the globe from far off or elsewhere, the world for an array that no side shows", () => {
    expect(sheetFor(camera(-31, 24, 0.01), frame, W, H, false).kind).toBe("local");
    expect(sheetFor(camera(-31, 24, 400), frame, W, H, false).kind).toBe("local");
    expect(sheetFor(camera(-31, 24, 2000), frame, W, H, false).kind).toBe("globe");
    expect(sheetFor(camera(50, 10, 10), frame, W, H, false).kind).toBe("globe");
    expect(sheetFor(camera(31, -156, 10), frame, W, H, false).kind).toBe("globe");
    expect(sheetFor(camera(0, 0, 40_000), frame, W, H, true).kind).toBe("world");
    expect(sheetFor(camera(0, 0, 2_000), frame, W, H, true).kind).toBe("globe");
  });

  it("puts the camera's place in the middle, north up and east to the right", () => {
    for (const [scale, wide] of [
      [1, false],
      [5000, false],
      [40_000, true],
    ] as const) {
      const sheet = sheetFor(camera(-31, 24, scale), frame, W, H, wide);
      const middle = drawn(sheet, -31, 24);
      expect(Math.hypot(middle.x - W / 2, middle.y - H / 2)).toBeLessThan(1e-6);
      expect(drawn(sheet, -30.99, 24).y).toBeLessThan(middle.y);
      expect(drawn(sheet, -31, 24.01).x).toBeGreaterThan(middle.x);
    }
  });

  it("gives the place back that it drew, on every kind of sheet", () => {
    fc.assert(
      fc.property(
        fc.constantFrom(
          [0.5, false] as const,
          [200, false] as const,
          [3000, false] as const,
          [12_000, false] as const,
          [45_000, true] as const,
        ),
        fc.double({ min: 40, max: W - 40, noNaN: true }),
        fc.double({ min: 40, max: H - 40, noNaN: true }),
        fc.double({ min: 0, max: 3000, noNaN: true }),
        ([scale, wide], x, y, h) => {
          const sheet = sheetFor(camera(-31, 24, scale), frame, W, H, wide);
          const place = sheet.place(x, y, h);
          if (!place) return;
          const again = drawn(sheet, place.latitudeDeg, place.longitudeDeg, h);
          // Half a pixel is what `place` itself takes for the same pixel on a flat world; locally it is rounding.
          expect(Math.hypot(again.x - x, again.y - y)).toBeLessThan(sheet.kind === "local" ? 1e-4 : 0.5);
        },
      ),
      { seed: 20260101, numRuns: 400 },
    );
  });

  it("has no place off the globe and draws nothing behind it", () => {
    const sheet = sheetFor(camera(-31, 24, 30_000), frame, W, H, false);
    expect(sheet.place(5, 5)).toBeUndefined();
    expect(drawn(sheet, 31, -156).x).toBeNaN();
    const flat = sheetFor(camera(0, 24, 50_000), frame, W, H, true);
    expect(flat.place(5, 5)).toBeUndefined();
    expect(flat.place(W / 2, 20)).toBeUndefined();
  });

  it("hands over from local to globe within a few pixels near the middle", () => {
    // The globe is drawn on a sphere: radii of curvature at 31° S differ from its own by up to 0.4 %.
    const local = sheetFor(camera(-31, 24, 400), frame, W, H, false);
    const globe = sheetFor(camera(-31, 24, 1200), frame, W, H, false);
    expect([local.kind, globe.kind]).toEqual(["local", "globe"]);
    const a = drawn(local, -30.5, 24.5);
    const b = drawn(globe, -30.5, 24.5);
    expect(Math.abs((a.x - W / 2) / ((b.x - W / 2) * 3) - 1)).toBeLessThan(0.005);
    expect(Math.abs((a.y - H / 2) / ((b.y - H / 2) * 3) - 1)).toBeLessThan(0.005);
  });
});

describe("cameras", () => {
  it("pulls the ground along with the pointer", () => {
    const sheet = sheetFor(camera(-31, 24, 20), frame, W, H, false);
    const under = sheet.place(300, 400);
    const next = sheetFor(pannedCamera(sheet, 50, -30), frame, W, H, false);
    expect(under).toBeDefined();
    if (!under) return;
    const at = drawn(next, under.latitudeDeg, under.longitudeDeg);
    expect(Math.hypot(at.x - 350, at.y - 370)).toBeLessThan(1e-4);
  });

  it("keeps what is under the pointer while it zooms, and stays in its limits", () => {
    const sheet = sheetFor(camera(-31, 24, 20), frame, W, H, false);
    const under = sheet.place(700, 200);
    const closer = zoomedCamera(sheet, 2, 700, 200);
    expect(closer.metresPerPx).toBe(10);
    const at = drawn(sheetFor(closer, frame, W, H, false), under?.latitudeDeg ?? 0, under?.longitudeDeg ?? 0);
    expect(Math.hypot(at.x - 700, at.y - 200)).toBeLessThan(1e-4);
    expect(zoomedCamera(sheet, 1e12, 10, 10).metresPerPx).toBe(0.005);
    expect(zoomedCamera(sheet, 1e-12, 10, 10).metresPerPx).toBe(60_000);
  });
});

describe("angleBetween", () => {
  it("is exact where the answer is known", () => {
    const a = (lat1: number, lon1: number, lat2: number, lon2: number) =>
      angleBetween({ latitudeDeg: lat1, longitudeDeg: lon1 }, { latitudeDeg: lat2, longitudeDeg: lon2 });
    expect(a(0, 0, 0, 90)).toBeCloseTo(Math.PI / 2, 14);
    expect(a(90, 0, -90, 55)).toBeCloseTo(Math.PI, 7);
    expect(a(10, 179, 10, -179)).toBeCloseTo(a(10, 0, 10, 2), 14);
  });
});

describe("drawnPoints", () => {
  it("uses its arrays again while they are long enough", () => {
    const sheet = sheetFor(camera(-31, 24, 20), frame, W, H, false);
    const three = [0, 1, 2].map((k) => frame.point(-31 + k / 100, 24, 1000));
    const first = drawnPoints(sheet, three);
    const second = drawnPoints(sheet, three.slice(0, 2), first);
    expect(second.x).toBe(first.x);
    expect(second.count).toBe(2);
  });
});
