import { describe, expect, it } from "vitest";
import { SEES, SHADOWED, TOO_HIGH, TOO_LOW, visibility } from "../../../src/engine/synthesis/visibility.ts";
import { trackOf } from "../../support/track.ts";

const DEG = Math.PI / 180;

describe("elevation limits", () => {
  it("holds to cos H = (sin e − sin φ sin δ)/(cos φ cos δ) at both limits", () => {
    const lat = -31.6 * DEG;
    const dec = -30 * DEG;
    const track = trackOf(
      [
        [0, 0, 0],
        [5000, 0, 0],
      ],
      { fromH: -8, toH: 8, integrationS: 60, lowestDeg: 20, highestDeg: 80 },
    );
    const { flags, visible } = visibility(track);
    const limit = (e: number) => Math.acos((Math.sin(e * DEG) - Math.sin(lat) * Math.sin(dec)) / (Math.cos(lat) * Math.cos(dec)));
    const times = track.hourAngleRad.length;
    let want = 0;
    for (let t = 0; t < times; t++) {
      const h = Math.abs(track.hourAngleRad[t]);
      const flag = h > limit(20) ? TOO_LOW : h < limit(80) ? TOO_HIGH : SEES;
      expect(flags[t]).toBe(flag);
      expect(flags[times + t]).toBe(flag);
      if (flag === SEES) want += 2;
    }
    expect(visible).toBe(want);
  });
});

describe("shadowing", () => {
  const snapshot = (enu: number[][], diameterM: number, elevationDeg: number) => {
    // A source due north of a station at the equator, at transit: elevation 90° − declination.
    const track = trackOf(enu, { latitudeDeg: 0, decDeg: 90 - elevationDeg, fromH: 0, toH: 0, diameterM, lowestDeg: 0 });
    return visibility(track);
  };

  // Source: geometry, sin e = D/b for a pair in line with the source: 45.584691403° for 25 m dishes 35 m apart,
  // 53.130102354° for 12 m dishes 15 m apart.
  it.each([
    [25, 35, 45.584691403],
    [12, 15, 53.130102354],
  ])("begins below sin e = D/b: D %f m, b %f m, %f°", (diameter, spacing, elevation) => {
    const pair = [
      [0, 0, 0],
      [0, spacing, 0],
    ];
    expect([...snapshot(pair, diameter, elevation - 1e-6).flags]).toEqual([SHADOWED, SEES]);
    expect([...snapshot(pair, diameter, elevation + 1e-6).flags]).toEqual([SEES, SEES]);
  });

  it("blocks neither of two stations equally near the source", () => {
    expect(
      snapshot(
        [
          [0, 0, 0],
          [10, 0, 0],
        ],
        12,
        45,
      ).shadowed,
    ).toBe(0);
  });

  it("counts a station and time once, however many block it, and stations that do not see still block", () => {
    const line = [
      [0, 0, 0],
      [0, 13, 0],
      [0, 26, 0],
    ];
    const { flags, shadowed, visible } = snapshot(line, 12, 20);
    expect([...flags]).toEqual([SHADOWED, SHADOWED, SEES]);
    expect({ shadowed, visible }).toEqual({ shadowed: 2, visible: 3 });
    const track = trackOf(line, { latitudeDeg: 0, decDeg: 70, fromH: 0, toH: 0, diameterM: 12, lowestDeg: 0 });
    track.lowestRad[2] = 30 * DEG;
    expect([...visibility(track).flags]).toEqual([SHADOWED, SHADOWED, TOO_LOW]);
  });
});
