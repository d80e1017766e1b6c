import { describe, expect, it } from "vitest";
import { arcReach, countArc, foldedCounts, sharedRuns } from "../../../src/engine/synthesis/cells.ts";
import { squareAxes } from "../../../src/engine/synthesis/plane.ts";
import { PreviewGrid, previewGeometry } from "../../../src/engine/synthesis/preview.ts";
import type { Track } from "../../../src/engine/synthesis/track.ts";
import { SEES } from "../../../src/engine/synthesis/visibility.ts";
import type { Weighting } from "../../../src/engine/synthesis/weights.ts";
import { settle } from "../../support/settle.ts";
import { madeUpTrack } from "../../support/track.ts";

describe("nearest cells by rotation", () => {
  it("are those of the plain formula, sample by sample", () => {
    const size = 512;
    const arc = { xM: 812.3, yM: -2931.7, zM: 1544.1, startRad: -1.02, stepRad: 0.0087266, count: 239 };
    const decRad = -0.52;
    const scale = (size / 2 - 2) / arcReach(arc, decRad);
    const got = new Int32Array(size * size);
    countArc(got, size, scale, decRad, arc, 1);
    const want = new Int32Array(size * size);
    for (let k = 0; k < arc.count; k++) {
      const h = arc.startRad + k * arc.stepRad;
      const u = arc.xM * Math.sin(h) + arc.yM * Math.cos(h);
      const v = -arc.xM * Math.sin(decRad) * Math.cos(h) + arc.yM * Math.sin(decRad) * Math.sin(h) + arc.zM * Math.cos(decRad);
      want[size * (Math.floor(v * scale + 0.5) + size / 2) + Math.floor(u * scale + 0.5) + size / 2]++;
    }
    expect(got).toEqual(want);
    countArc(got, size, scale, decRad, arc, -1);
    expect(got.every((n) => n === 0)).toBe(true);
  });

  it("fold to a point-symmetric grid", () => {
    const counts = new Int32Array(64);
    counts[8 * 6 + 3] = 5;
    const folded = foldedCounts(counts, 8);
    expect([folded[8 * 6 + 3], folded[8 * 2 + 5]]).toEqual([5, 5]);
  });

  it("run over the times that both stations see", () => {
    const flags = Uint8Array.of(SEES, SEES, 1, SEES, SEES, SEES, 3, SEES, SEES, SEES, SEES, 2);
    expect([...sharedRuns(flags, 6, 0, 1)]).toEqual([
      [1, 2],
      [3, 5],
    ]);
  });
});

describe("the preview grid", () => {
  const weightings: readonly Weighting[] = [
    { scheme: "natural", robustness: 0, taperRad: null },
    { scheme: "robust", robustness: 0, taperRad: null },
    { scheme: "uniform", robustness: 0, taperRad: 2e-5 },
  ];
  const field = 3e-3;
  const start = (track: Track, weighting: Weighting) => {
    const settled = settle(track, weighting, field);
    const reach = Math.max(settled.spans.maxUM, settled.spans.maxVM);
    const { fieldRad, pixelRad } = previewGeometry(settled.fieldRad, 0.12 / settled.maxUv, 512);
    const uv = { size: 256, cellsPerMetre: 256 / (2.6 * reach) };
    const grid = new PreviewGrid(track, settled.seen, settled.natural, weighting, fieldRad, reach, 512, 256, pixelRad, uv);
    return { grid, settled, pixelRad };
  };
  const moved = (track: Track, station: number, eastM: number): Track => {
    const stationXyzM = track.stationXyzM.slice();
    stationXyzM[3 * station + 1] += eastM;
    return { ...track, stationXyzM };
  };

  it.each(weightings)("stays within a few thousandths of the settled beam: $scheme", (weighting) => {
    const track = madeUpTrack({ stations: 48, integrationS: 120, sefdJy: [400, 500] });
    const { grid, settled, pixelRad } = start(track, weighting);
    const got = grid.image();
    const want = settled.plane(squareAxes(256, pixelRad));
    let worst = 0;
    for (let k = 0; k < want.values.length; k++) worst = Math.max(worst, Math.abs(got.values[k] - want.values[k]));
    // Phases at the edge are off by up to π/4, evenly: 0.32 rms over the root of some 2 × 10⁵ samples, five times for the worst
    // pixel, and twice again since neighbours along a track share their cell.
    expect(worst).toBeLessThan((2 * 5 * 0.32) / Math.sqrt(settled.spans.samples));
  });

  it.each(weightings)(
    "after a move and back is where it began, and after a move where a new grid would begin: $scheme",
    (weighting) => {
      const track = madeUpTrack({ stations: 10, integrationS: 600, seed: 9 });
      const { grid } = start(track, weighting);
      const before = grid.image().values;
      const uvBefore = grid.uv();
      grid.moveTo(moved(track, 4, 130));
      const away = grid.image().values;
      expect(away).not.toEqual(before);
      grid.moveTo(track);
      const back = grid.image().values;
      for (let k = 0; k < back.length; k++) expect(Math.abs(back[k] - before[k])).toBeLessThan(1e-12); // rounding of sums undone
      expect(grid.uv()).toEqual(uvBefore);
    },
  );
});
