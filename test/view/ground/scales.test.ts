import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { localFrame } from "../../../src/view/ground/frame.ts";
import { edgeTicks, graticuleStepDeg } from "../../../src/view/ground/graticule.ts";
import { niceAtLeast, niceAtMost } from "../../../src/view/ground/nice.ts";
import { scaleBar } from "../../../src/view/ground/scale-bar.ts";
import { sheetFor } from "../../../src/view/ground/sheet.ts";
import { tickStepM, ticks } from "../../../src/view/ground/ticks.ts";

describe("nice steps", () => {
  it("are 1, 2, 5 times a power of ten, just above or just below", () => {
    expect([0.003, 1, 1.1, 2, 4.9, 5, 5.1, 700].map(niceAtLeast)).toEqual([0.005, 1, 2, 2, 5, 5, 10, 1000]);
    expect([0.003, 1, 1.9, 2, 4.9, 5, 9.9, 700].map(niceAtMost)).toEqual([0.002, 1, 1, 2, 2, 5, 5, 500]);
  });

  it("enclose every size within a factor of 2.5", () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-6, max: 1e9, noNaN: true }), (x) => {
        expect(niceAtLeast(x) / x).toBeGreaterThan(1 - 1e-9);
        expect(niceAtLeast(x) / x).toBeLessThan(2.5 + 1e-9);
        expect(x / niceAtMost(x)).toBeGreaterThan(1 - 1e-9);
        expect(x / niceAtMost(x)).toBeLessThan(2.5 + 1e-9);
      }),
      { seed: 20260101 },
    );
  });
});

describe("ticks", () => {
  it("count kilometres from the origin, the unit on the middle one", () => {
    expect(ticks(-12_000, 13_000, 5000, "E").map(({ text }) => text)).toEqual(["−10", "−5", "0\u00a0km E", "5", "10"]);
    expect(ticks(-12_000, 13_000, 5000, "N").map(({ valueM }) => valueM)).toEqual([-10_000, -5000, 0, 5000, 10_000]);
  });

  it("write metres below steps of 100 m, with the decimals the step needs", () => {
    expect(ticks(-30, 30, 20, "N").map(({ text }) => text)).toEqual(["−20", "0\u00a0m N", "20"]);
    expect(ticks(0, 0.3, 0.1, "E").map(({ text }) => text)).toEqual(["0.0", "0.1", "0.2\u00a0m E", "0.3"]);
    expect(ticks(0, 1000, 500, "E").map(({ text }) => text)).toEqual(["0.0", "0.5\u00a0km E", "1.0"]);
  });

  it("stand at least so many pixels apart", () => {
    expect(tickStepM(40, 60)).toBe(5000);
    expect(tickStepM(0.01, 60)).toBe(1);
  });
});

describe("scaleBar", () => {
  it("takes the longest round length that fits", () => {
    expect(scaleBar(41, 150)).toEqual({ lengthM: 5000, lengthPx: 5000 / 41, text: "5\u00a0km" });
    expect(scaleBar(0.01, 150).text).toBe("1\u00a0m");
    expect(scaleBar(0.005, 90).text).toBe("20\u00a0cm");
    expect(scaleBar(40_000, 150).text).toBe("5\u202f000\u00a0km");
  });
});

describe("graticule", () => {
  it("widens with the view", () => {
    // 1° of a great circle on the mean sphere is 111.195 km: 110 px at 1 km a pixel are 0.99°.
    expect(graticuleStepDeg(1000)).toBe(1);
    expect(graticuleStepDeg(10_000)).toBe(10);
    expect(graticuleStepDeg(60_000)).toBe(30);
    expect(graticuleStepDeg(100)).toBe(0.1);
  });

  it("names the lines that meet the edges", () => {
    const frame = localFrame({ latitudeDeg: 50, longitudeDeg: 0, heightM: 0 });
    const sheet = sheetFor({ latitudeDeg: 50, longitudeDeg: 0, metresPerPx: 2500 }, frame, 900, 700, false);
    const { top, left } = edgeTicks(sheet, 5, 8);
    expect(top.map(({ text }) => text)).toContain("0°");
    expect(top.map(({ text }) => text)).toContain("5° W");
    expect(left.map(({ text }) => text)).toContain("50° N");
    // The meridian of the middle runs straight up.
    expect(Math.abs((top.find(({ text }) => text === "0°")?.px ?? 0) - 450)).toBeLessThan(0.5);
  });

  it("names nothing where the whole globe is in view", () => {
    const frame = localFrame({ latitudeDeg: 50, longitudeDeg: 0, heightM: 0 });
    const sheet = sheetFor({ latitudeDeg: 50, longitudeDeg: 0, metresPerPx: 50_000 }, frame, 900, 700, false);
    expect(edgeTicks(sheet, 30, 8)).toEqual({ top: [], left: [] });
  });
});
