import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { beamImage } from "../../src/assess/image.ts";
import { setup } from "../../src/assess/setup.ts";
import { ARCSEC_PER_RAD } from "../../src/base/constants.ts";
import { exactBeam, exactSamples } from "../../src/engine/synthesis/exact.ts";
import { readPlan } from "../../src/plan/read.ts";
import { parkMiller } from "../support/random.ts";

/** The promise of a settled beam, as a fraction of the peak. */
const PROMISE = 1e-6;
const PIXELS = 2000;

/** Corners, the middles of the edges, the centre and its neighbours, then pixels at random. */
function pixels(size: number): readonly (readonly [number, number])[] {
  const random = parkMiller(size);
  const rim = [0, 1, size / 2 - 1, size / 2, size / 2 + 1, size - 2, size - 1];
  const fixed = rim.flatMap((y) => rim.map((x) => [x, y] as const));
  const strewn = Array.from(
    { length: PIXELS - fixed.length },
    () => [Math.floor(random() * size), Math.floor(random() * size)] as const,
  );
  return [...fixed, ...strewn];
}

describe("the settled beam of every scenario against the direct sum, whole chain from the plan file", () => {
  it.each([
    ["thistledown", "trident", "south"],
    ["sallow-flat", "outliers", "low"],
    ["long-meridian", "globe", "core"],
  ])(
    `%s, %s, %s: ${PIXELS} pixels within ${PROMISE} of the peak`,
    async (file, layout, observation) => {
      const { plan } = readPlan(readFileSync(`scenarios/${file}.plan.json`, "utf8"));
      const { size, pixelRad, values, result } = await beamImage(plan, layout, observation);
      const { track, weighting } = setup(plan, layout, observation);
      // The field that the program says it used, which no other part of this sum shares with it.
      const exact = exactSamples(track, { ...weighting, fieldRad: (result.densityFieldArcsec as number) / ARCSEC_PER_RAD });
      expect(exact.weight.length).toBe(result.samplesKept);
      let worst = 0;
      for (const [x, y] of pixels(size)) {
        const want = exactBeam(exact, (x - size / 2) * pixelRad, (y - size / 2) * pixelRad);
        worst = Math.max(worst, Math.abs(values[size * y + x] - want));
      }
      expect(worst).toBeLessThanOrEqual(PROMISE);
    },
    300_000,
  );
});
